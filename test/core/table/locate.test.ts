import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Cell } from "../../../src/core/table/cells.ts";
import { readBlock } from "../../../src/core/table/locate.ts";
import type { Source } from "../../../src/core/table/source.ts";
import { cellInWords } from "../../../src/core/table/spots.ts";
import { blockOf, day, faultOf, must } from "../../support/sheet.ts";

const headings: Cell[] = ["Month", "Repairs", "Price"];
const data: Cell[][] = [
  [day(2024, 1, 1), 210, 31],
  [day(2024, 2, 1), 198, 33],
  [day(2024, 3, 1), 240, 29],
];

const names = ({ columns }: Source): string[] => columns.map(({ name }) => name);
const cellsOf = ({ columns, rowCount }: Source, column: number): string[] =>
  Array.from({ length: rowCount }, (_, row) => cellInWords(columns[column]!.cells, row));
const firstCell = ({ columns }: Source, column: number) => columns[column]!.place;

describe("the table in a block", () => {
  it("reads headings and data that fill the block", () => {
    const { source, headingRow, notes } = must(readBlock(blockOf([headings, ...data])));
    expect(names(source)).toEqual(["Month", "Repairs", "Price"]);
    expect(cellsOf(source, 1)).toEqual(["210", "198", "240"]);
    expect([headingRow, source.rowCount, notes]).toEqual([0, 3, []]);
    expect(firstCell(source, 1)).toEqual({ kind: "sheet", sheet: "Months", column: 1, firstRow: 1 });
  });

  it("steps over a title, blank rows and an empty column at the side", () => {
    const rows = [["Kestrel & Vane, repairs"], [], ["", ...headings], [], ...data.map((row) => ["", ...row])];
    const { source, headingRow, notes } = must(
      readBlock(blockOf(rows, { firstRow: 4, firstColumn: 2, sheet: "My data" })),
    );
    expect(names(source)).toEqual(["Month", "Repairs", "Price"]);
    expect(headingRow).toBe(6);
    expect(firstCell(source, 0)).toEqual({ kind: "sheet", sheet: "My data", column: 3, firstRow: 8 });
    expect(notes).toEqual([]);
  });

  it("finds the headings of a single column below its title", () => {
    const { source } = must(readBlock(blockOf([["My figures"], [], ["Price"], [1.5], [2.5], [4.5]])));
    expect(names(source)).toEqual(["Price"]);
    expect(source.rowCount).toBe(3);
  });

  it("is not led astray by a date or a version above the headings", () => {
    const above = [["As of", day(2024, 4, 2)], ["Version", "3"], headings, ...data];
    expect(names(must(readBlock(blockOf(above))).source)).toEqual(["Month", "Repairs", "Price"]);
  });

  it("is not led astray by stray cells beside the table", () => {
    const beside = (row: Cell[], i: number): Cell[] => [...row, ...Array<Cell>(i).fill(null), "see there"];
    const rows = [
      ["Title"],
      headings,
      ...data.map((row, i) => beside(row, 1 + i)),
      [null, null, null, 5, null, null, null, 7],
    ];
    const { source, headingRow } = must(readBlock(blockOf(rows)));
    expect([headingRow, names(source).slice(0, 3)]).toEqual([1, ["Month", "Repairs", "Price"]]);
  });

  it("names columns by their letters where there are no headings, and eats no row", () => {
    const { source, headingRow, notes } = must(readBlock(blockOf(data, { firstColumn: 1 })));
    expect(names(source)).toEqual(["Column B", "Column C", "Column D"]);
    expect([headingRow, source.rowCount]).toEqual([null, 3]);
    expect(notes).toEqual(["No headings were found, so columns go by their letters."]);
  });

  it("says which title above data without headings was not read", () => {
    const { source, notes } = must(readBlock(blockOf([["Draft"], ...data])));
    expect(source.rowCount).toBe(3);
    expect(notes).toEqual([
      'No headings were found, so columns go by their letters. Row 1 above the data was not read: "Draft".',
    ]);
  });

  it("makes repeated and missing headings distinct", () => {
    const rows = [
      ["Price", null, "price", "Price"],
      [1, 2, 3, 4],
      [5, 6, 7, 9],
    ];
    expect(names(must(readBlock(blockOf(rows))).source)).toEqual([
      "Price",
      "Column B",
      "price (column C)",
      "Price (column D)",
    ]);
  });

  it("leaves a row of units under the headings aside, and says so", () => {
    const { source, notes } = must(readBlock(blockOf([headings, [null, "a month", "EUR"], ...data])));
    expect(source.rowCount).toBe(3);
    expect(notes).toEqual(['Row 2 under the headings holds no data and was not read: "a month", "EUR".']);
  });

  it("tells headings from units that cover all columns", () => {
    const { source, notes } = must(readBlock(blockOf([headings, ["date", "a month", "EUR"], ...data])));
    expect([names(source), source.rowCount]).toEqual([["Month", "Repairs", "Price"], 3]);
    expect(notes).toHaveLength(1);
  });

  it("keeps a first row of text that is data, to be faulted with its cell", () => {
    const rows = [
      ["Shop", "Takings", "Staff"],
      ["North", "n.k.", "NA"],
      ["South", 5, 7],
      ["East", 6, 9],
    ];
    const { source } = must(readBlock(blockOf(rows)));
    expect(cellsOf(source, 1)).toEqual(["n.k.", "5", "6"]);
  });

  it("keeps blank rows inside and trims those at the end", () => {
    const { source } = must(readBlock(blockOf([headings, data[0]!, [], data[1]!, [], [null, " "]])));
    expect(cellsOf(source, 1)).toEqual(["210", "", "198"]);
  });

  it("keeps marks, errors and text among numbers as they stand", () => {
    const rows = [headings, [day(2024, 1, 1), "NA", { error: "#DIV/0!" }], ...data.slice(1)];
    const { source } = must(readBlock(blockOf(rows)));
    expect([cellsOf(source, 1)[0], cellsOf(source, 2)[0]]).toEqual(["NA", "#DIV/0!"]);
  });

  it("leaves notes below the data aside, set apart or in a column of dates", () => {
    const apart = must(readBlock(blockOf([headings, ...data, [], ["Source: till"], ["all invented"]])));
    expect([apart.source.rowCount, apart.notes]).toEqual([
      3,
      ['Rows 6 to 7 below the data were not read: "Source: till".'],
    ]);
    const close = must(readBlock(blockOf([headings, ...data, ["Source: till"]])));
    expect([close.source.rowCount, close.notes]).toEqual([3, ['Row 5 below the data was not read: "Source: till".']]);
  });

  it("leaves a total aside if it adds up, and keeps it if it does not", () => {
    const total = must(readBlock(blockOf([headings, ...data, ["Total", 648, 93], [], ["Note"]])));
    expect([total.source.rowCount, total.notes]).toEqual([
      3,
      ['Row 5 ("Total") sums up the rows above it and was not read.', 'Row 7 below the data was not read: "Note".'],
    ]);
    const mean = must(readBlock(blockOf([headings, ...data, ["Average", 216, 31]])));
    expect(mean.source.rowCount).toBe(3);
    expect(must(readBlock(blockOf([headings, ...data, ["Total", 650, 90]]))).source.rowCount).toBe(4);
  });

  it("keeps a last row whose numbers are missing", () => {
    const rows = [
      ["Shop", "Takings"],
      ["North", 5],
      ["South", 6],
      ["East", null],
    ];
    expect(must(readBlock(blockOf(rows))).source.rowCount).toBe(3);
  });

  it("leaves empty columns away and names those that have a heading", () => {
    const rows = [["Month", "Forecast", "Repairs"], ...data.map(([month, repairs]) => [month!, null, repairs!])];
    const { source, notes } = must(readBlock(blockOf(rows)));
    expect([names(source), notes]).toEqual([["Month", "Repairs"], ['Column "Forecast" is empty and was left away.']]);
    expect(faultOf(readBlock(blockOf(rows), ["forecast"]))).toEqual({
      code: "empty-column",
      column: "Forecast",
      where: "column B",
    });
  });

  it("takes the row that holds the wanted headings", () => {
    const rows = [["Repairs", "summary", "sheet"], ["Month", "Repairs", "Price"], ...data];
    expect(must(readBlock(blockOf(rows), ["repairs", "PRICE "])).headingRow).toBe(1);
  });

  it("takes numbers for headings where they are wanted, or are years in turn", () => {
    const rows: Cell[][] = [
      ["Region", 2019, 2020],
      ["North", 5.5, 6.5],
      ["South", 7.5, 9.5],
    ];
    expect(names(must(readBlock(blockOf(rows))).source)).toEqual(["Region", "2019", "2020"]);
    const codes = rows.map((row, i) => (i === 0 ? ["Region", 11, 44] : row));
    expect(names(must(readBlock(blockOf(codes), ["11", "44"])).source)).toEqual(["Region", "11", "44"]);
  });

  it("reads tables of words and of numbers kept as text", () => {
    const words = [
      ["Name", "Town"],
      ["Kestrel", "Hull"],
      ["Vane", "York"],
    ];
    expect(must(readBlock(blockOf(words))).headingRow).toBe(0);
    const texts = [
      ["Price", "Repairs"],
      ["1,5", "210"],
      ["2,5", "198"],
    ];
    expect(must(readBlock(blockOf(texts))).headingRow).toBe(0);
    expect(must(readBlock(blockOf(texts.slice(1)))).headingRow).toBeNull();
  });

  it("faults a block without data or without the headings asked for", () => {
    expect(faultOf(readBlock(blockOf([[null, " "], []])))).toEqual({ code: "no-data", where: "Months!A1:B2" });
    expect(faultOf(readBlock(blockOf([headings])))).toEqual({
      code: "no-data",
      where: "Months!A1:C1, below the headings",
    });
    expect(faultOf(readBlock(blockOf(data), ["Price"]))).toEqual({ code: "no-headings", where: "Months!A1:C3" });
    expect(must(readBlock(blockOf(data), ["Column B"])).headingRow).toBeNull();
  });

  it("finds the same table wherever it stands in the block", () => {
    fc.assert(
      fc.property(fc.nat(4), fc.nat(3), fc.boolean(), (above, beside, titled) => {
        const pad = (row: Cell[]): Cell[] => [...Array<Cell>(beside).fill(null), ...row];
        const blank = Array.from({ length: above }, (): Cell[] => []);
        const title: Cell[][] = titled ? [["A title"], []] : [];
        const { source, headingRow } = must(readBlock(blockOf([...title, ...blank, pad(headings), ...data.map(pad)])));
        expect(names(source)).toEqual(headings);
        expect(headingRow).toBe(title.length + above);
        expect(cellsOf(source, 2)).toEqual(["31", "33", "29"]);
      }),
      { seed: 15, numRuns: 100 },
    );
  });
});
