import { afterAll, beforeAll, expect, it } from "vitest";
import type { NodeDesk } from "../../../src/desk/client/openDesk.ts";
import { bookOf, sheetOf } from "../../support/deskBook.ts";
import { codeOf, testDesk } from "../../support/desk.ts";

let desk: NodeDesk;
beforeAll(async () => {
  const rows = [
    ["x", "y", "z"],
    [1, 2, 3],
    [2, 4, 6],
    [3, 6, 9],
  ];
  desk = await testDesk({ book: bookOf(sheetOf("My data", rows)) });
});
afterAll(() => desk.close());

const charts = () => desk.snapshot().sheets[0]?.charts ?? [];

it("builds a scatter chart from series of its own, placed by cells", async () => {
  await desk.Excel.run(async (context) => {
    const sheet = context.workbook.worksheets.getItem("My data");
    const chart = sheet.charts.add("XYScatter", sheet.getRange("A1:C4"), "Columns");
    chart.series.load("items");
    await context.sync();
    // From the last: each is found by its place, and those behind a deleted one move up.
    for (const series of [...chart.series.items].reverse()) series.delete();
    const points = chart.series.add("Residuals");
    points.setXAxisValues(sheet.getRange("A2:A4"));
    points.setValues(sheet.getRange("B2:B4"));
    points.markerBackgroundColor = "#1F2937";
    const line = chart.series.add("Zero");
    line.setXAxisValues(sheet.getRange("A2:A4"));
    line.setValues(sheet.getRange("C2:C4"));
    line.chartType = "XYScatterLinesNoMarkers";
    line.format.line.color = "#ff0000";
    line.format.line.weight = 1;
    chart.title.text = "Residuals over fitted values";
    chart.axes.categoryAxis.title.text = "Fitted";
    chart.axes.valueAxis.title.text = "Residual";
    chart.axes.valueAxis.minimum = -5;
    chart.axes.valueAxis.maximum = 5;
    chart.axes.valueAxis.visible = false;
    line.hasDataLabels = true;
    line.dataLabels.showSeriesName = true;
    line.dataLabels.showValue = false;
    line.dataLabels.position = "Right";
    chart.legend.visible = false;
    chart.name = "Residuals";
    chart.setPosition("E2", "J16");
    await context.sync();
  });
  expect(charts()).toEqual([
    {
      name: "Residuals",
      title: "Residuals over fitted values",
      kind: "scatter",
      place: { row: 1, column: 4, rows: 15, columns: 6 },
      xTitle: "Fitted",
      yTitle: "Residual",
      yRange: { minimum: -5, maximum: 5 },
      yHidden: true,
      legend: false,
      series: [
        {
          name: "Residuals",
          x: "'My data'!$A$2:$A$4",
          y: "'My data'!$B$2:$B$4",
          line: false,
          markers: true,
          color: "#1f2937",
        },
        {
          name: "Zero",
          x: "'My data'!$A$2:$A$4",
          y: "'My data'!$C$2:$C$4",
          line: true,
          markers: false,
          color: "#ff0000",
          lineWeight: 1,
          label: "name",
        },
      ],
    },
  ]);
});

it("guesses series from the range it is given: a column along the axis, text as names", async () => {
  const names = await desk.Excel.run(async (context) => {
    const sheet = context.workbook.worksheets.getItem("My data");
    const chart = sheet.charts.add("Line", sheet.getRange("A1:C4"));
    chart.series.load("items/name");
    chart.load("name");
    await context.sync();
    const found = chart.series.items.map(({ name }) => name);
    chart.delete();
    await context.sync();
    return found;
  });
  expect(names).toEqual(["y", "z"]);
  expect(charts()).toHaveLength(1);
});

it("follows its cells when rows come and the sheet is renamed", async () => {
  desk.book.grid.api.getActiveWorkbook()?.getActiveSheet().insertRows(0, 2);
  await desk.Excel.run(async (context) => {
    context.workbook.worksheets.getItem("My data").name = "Figures";
    await context.sync();
  });
  expect(charts()[0]?.series[0]).toMatchObject({ x: "Figures!$A$4:$A$6", y: "Figures!$B$4:$B$6" });
});

it("refuses blocks as a series and kinds that it does not draw", async () => {
  const failing = (work: (chart: Excel.Chart, sheet: Excel.Worksheet) => void) => () =>
    desk.Excel.run(async (context) => {
      const sheet = context.workbook.worksheets.getItem("Figures");
      work(sheet.charts.getItemAt(0), sheet);
      await context.sync();
    });
  const block = failing((chart, sheet) => chart.series.getItemAt(0).setValues(sheet.getRange("A1:B4")));
  expect(await codeOf(block)).toBe("InvalidArgument");
  expect(await codeOf(failing((_, sheet) => void sheet.charts.add("Pie", sheet.getRange("A1:B4"))))).toBe(
    "ApiNotFound",
  );
  expect(await codeOf(failing((chart) => chart.getImage()))).toBe("ApiNotFound");
});
