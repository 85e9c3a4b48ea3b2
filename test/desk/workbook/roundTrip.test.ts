import { expect, it } from "vitest";
import type { BookData } from "../../../src/desk/book/bookData.ts";
import { bookOf, sheetOf } from "../../support/deskBook.ts";
import { testDesk } from "../../support/desk.ts";

const book: BookData = {
  ...bookOf(
    sheetOf(
      "Repairs answer",
      [
        [{ value: "Title", style: { bold: true, size: 14, color: "#1f2937", fill: "#f3f4f6" } }],
        ["y", "x", null, true, { error: "#N/A" }, ""],
        [
          { value: 45293, style: { numberFormat: "yyyy-mm-dd", horizontal: "right", vertical: "top", indent: 2 } },
          { value: 2.5, style: { italic: true, wrap: true, lineAbove: "#111111", lineBelow: "#222222" } },
        ],
        [{ value: 3, formula: "=SEQUENCE(2)", spill: "A4:A5" }],
        [4, { value: 5, formula: "=A4+2" }, "1e3", "#N/A is text here"],
      ],
      {
        columnWidths: [20, undefined, 8.43],
        rowHeights: [undefined, 30],
        merges: ["A1:C1"],
        frozenRows: 2,
        hiddenRows: [3],
        protected: true,
        tables: [{ name: "Data", address: "A2:B3" }],
        printArea: "A1:D20",
        onePageWide: true,
        landscape: true,
        pageBreaks: [8],
        margins: { left: 30, right: 36, top: 40, bottom: 54, footer: 20 },
        footer: { left: "", center: "&P", right: "" },
        links: [{ cell: "B2", target: "Other!A1" }],
        customProperties: { model: "7" },
        charts: [
          {
            name: "Residuals",
            title: "Residuals",
            kind: "scatter with lines",
            place: { row: 6, column: 1, rows: 12, columns: 5 },
            xTitle: "x",
            yTitle: "",
            xRange: { minimum: 0, maximum: null },
            yHidden: true,
            legend: false,
            series: [
              {
                name: "a",
                x: "'Repairs answer'!$A$2:$A$3",
                y: "'Repairs answer'!$B$2:$B$3",
                line: true,
                markers: false,
                label: "name",
              },
            ],
          },
        ],
      },
    ),
    sheetOf("Other", [], { hidden: true }),
  ),
  names: [
    { name: "Outcome", refersTo: "'Repairs answer'!$A$2:$A$3" },
    { name: "Part", refersTo: "'Repairs answer'!$A$2", sheet: "Repairs answer", comment: "The first" },
    { name: "Part", refersTo: "Other!$B$2", sheet: "Other" },
  ],
  customXml: [{ id: "{1}", xml: "<model/>" }],
  settings: { level: 0.05 },
};

const byPlace = (one: { readonly sheet?: string }, other: { readonly sheet?: string }): number =>
  sheetOrder.indexOf(one.sheet) - sheetOrder.indexOf(other.sheet);
const sheetOrder = [undefined, "Repairs answer", "Other"];

it("gives back what it opened", async () => {
  const desk = await testDesk({ book });
  await desk.settle();
  const { names, ...rest } = desk.snapshot();
  expect({ ...rest, names: names.toSorted(byPlace) }).toEqual(book);
  desk.close();
});

it("moves tables, links and names with their rows", async () => {
  const desk = await testDesk({ book });
  desk.book.grid.api.getActiveWorkbook()?.getActiveSheet().insertRows(1, 2);
  await desk.settle();
  const [sheet] = desk.snapshot().sheets;
  expect(sheet?.tables).toEqual([{ name: "Data", address: "A4:B5" }]);
  expect(sheet?.links).toEqual([{ cell: "B4", target: "Other!A1" }]);
  expect(
    desk
      .snapshot()
      .names.toSorted(byPlace)
      .map(({ refersTo }) => refersTo),
  ).toEqual(["'Repairs answer'!$A$4:$A$5", "'Repairs answer'!$A$4", "Other!$B$2"]);
  desk.book.grid.api.getActiveWorkbook()?.getActiveSheet().deleteRows(0, 4);
  await desk.settle();
  expect(desk.snapshot().sheets[0]?.tables).toEqual([{ name: "Data", address: "A1:B1" }]);
  expect(desk.snapshot().sheets[0]?.links).toEqual([]);
  desk.close();
});
