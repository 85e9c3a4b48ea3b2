import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { blankSheet } from "../../../src/desk/book/blankSheet.ts";
import type { BookChart } from "../../../src/desk/book/bookData.ts";
import { openDesk } from "../../../src/desk/client/openDesk.ts";
import { pictureOf, type Picture } from "../../../src/desk/page/charts/pictureOf.ts";
import { recordOf, sheetNamed } from "../../../src/desk/workbook/book.ts";

const chart: BookChart = {
  name: "Residuals",
  title: "Residuals over fitted values",
  kind: "scatter with lines",
  place: { row: 0, column: 4, rows: 15, columns: 6 },
  xTitle: "Fitted",
  yTitle: "Residual",
  yRange: { minimum: -10, maximum: 10 },
  legend: true,
  series: [
    { name: "Rows", x: "'My data'!$A$2:$A$5", y: "'My data'!$B$2:$B$5", line: false, markers: true },
    { name: "Bar", x: "'My data'!$A$2:$A$5", y: "'My data'!$C$2:$C$5", line: true, markers: false, color: "#7a1f1f" },
  ],
};

const rows = [
  ["x", "y", "z"],
  [10, 4, 0],
  [20, null, 3],
  [30, "n/a", null],
  [40, -6.5, 5],
];

let desk: Awaited<ReturnType<typeof openDesk>>;
beforeAll(async () => {
  const sheet = { ...blankSheet("My data", rows), charts: [chart, { ...chart, kind: "columns" as const }] };
  desk = await openDesk({ book: { sheets: [sheet], names: [], active: 0 } });
});
afterAll(() => desk.close());

function drawn(index: number): Picture {
  const sheet = sheetNamed(desk.book, "My data")!;
  return pictureOf(desk.book, sheet, recordOf(desk.book, sheet).charts[index]!);
}

describe("a chart to be drawn", () => {
  it("has a point for each row with two numbers, and gaps for the others", () => {
    const [points, line] = drawn(0).series;
    expect(points!.points).toEqual([{ x: 10, y: 4 }, null, null, { x: 40, y: -6.5 }]);
    expect(line!.points).toEqual([{ x: 10, y: 0 }, { x: 20, y: 3 }, null, { x: 40, y: 5 }]);
    expect([line!.color, line!.line, line!.markers]).toEqual(["#7a1f1f", true, false]);
    expect(points!.color).not.toBe(line!.color);
  });

  it("keeps titles and the ends of its axes", () => {
    const picture = drawn(0);
    expect([picture.title, picture.x.title, picture.y.title]).toEqual([
      "Residuals over fitted values",
      "Fitted",
      "Residual",
    ]);
    expect([picture.y.minimum, picture.y.maximum]).toEqual([-10, 10]);
    expect(picture.x.minimum).toBeLessThanOrEqual(10);
  });

  it("counts columns instead of placing them", () => {
    expect(drawn(1).series[0]!.points[3]).toEqual({ x: 4, y: -6.5 });
    expect(drawn(1).series[1]!.points[1]).toEqual({ x: 2, y: 3 });
  });

  it("follows its cells", async () => {
    desk.edit("'My data'!B3", 7);
    await desk.settle();
    expect(drawn(0).series[0]!.points[1]).toEqual({ x: 20, y: 7 });
  });
});
