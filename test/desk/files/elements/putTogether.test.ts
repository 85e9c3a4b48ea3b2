import { describe, expect, it } from "vitest";
import type { BookCell, BookData } from "../../../../src/desk/book/bookData.ts";
import { putTogether } from "../../../../src/desk/files/elements/putTogether.ts";
import { takeApart } from "../../../../src/desk/files/elements/takeApart.ts";
import { bookOf, sheetOf } from "../../../support/deskBook.ts";

const whole = "=FOOTING.INTERVALS(Data!A1:A9,Data!B1:B9)";
const book = bookOf(
  sheetOf("Result", [
    [null, { value: "low", formula: whole, spill: "B1:C3" }, "high"],
    [null, -1.5, ""],
    [null, 2.25, 8],
  ]),
);

/** The workbook as another program gives it back. */
function changed(change: (rows: BookCell[][]) => void, names = takeApart(book).book.names): BookData {
  const apart = takeApart(book).book;
  const rows = apart.sheets[0]!.rows.map((row) => [...row]);
  change(rows);
  return putTogether({ ...apart, names, sheets: [sheetOf("Result", rows)] });
}

const rowsOf = (data: BookData): readonly (readonly BookCell[])[] => data.sheets[0]!.rows;
const part = (row: number, column: number): string => `=INDEX(${whole.slice(1)},${row},${column})`;
const unknown = { error: "#NAME?" } as const;

describe("a result that was saved cell by cell", () => {
  it("is one again where nothing was changed", () => {
    expect(changed(() => undefined)).toEqual(book);
  });

  it("is calculated anew where LibreOffice found a part of it out of date", () => {
    const stale = changed((rows) => {
      rows[2]![1] = { value: unknown, formula: part(3, 1) };
    });
    expect(rowsOf(stale)[0]![1]).toEqual({ value: unknown, formula: whole, spill: "B1:C3" });
    expect(stale.loosened).toBeUndefined();
  });

  it.each<[string, BookCell]>([
    ["a number", 42],
    ["a text", { value: "mine", style: { bold: true } }],
    ["a formula", { value: 3, formula: "=1+2" }],
    ["the formula of another part", { value: 3, formula: part(1, 1) }],
    ["a part of another result", { value: 3, formula: "=INDEX(FOOTING.FITTED(Data!A1:A9,Data!B1:B9),3,1)" }],
    ["nothing", null],
  ])("is left cell by cell where %s was put into it", (_, cell) => {
    const loose = changed((rows) => {
      rows[2]![1] = cell;
    });
    expect(loose.loosened).toEqual(["Result!B1:C3"]);
    expect(rowsOf(loose)[2]![1]).toEqual(cell);
    expect(rowsOf(loose)[0]).toEqual([
      null,
      { value: "low", formula: part(1, 1) },
      { value: "high", formula: part(1, 2) },
    ]);
    // What stood in for its value is calculated like the others from now on.
    expect(rowsOf(loose)[1]).toEqual([null, { value: -1.5, formula: part(2, 1) }, { value: "", formula: part(2, 2) }]);
  });

  it.each<[string, (rows: BookCell[][]) => unknown]>([
    ["the last cell of a row was emptied", (rows) => rows[2]!.pop()],
    ["the last row was emptied", (rows) => rows.pop()],
    ["two parts of a row changed places", (rows) => rows[2]!.splice(1, 2, rows[2]![2]!, rows[2]![1]!)],
  ])("is left cell by cell where %s", (_, change) => {
    const loose = changed((rows) => void change(rows));
    expect(loose.loosened).toEqual(["Result!B1:C3"]);
    expect(rowsOf(loose)[1]![1]).toEqual({ value: -1.5, formula: part(2, 1) });
  });

  it("takes the formula of most cells for what stands in for its value, also where the first cell has another", () => {
    const other = "=INDEX(FOOTING.FITTED(Data!A1:A9,Data!B1:B9),1,1)";
    const loose = changed((rows) => {
      rows[0]![1] = { value: unknown, formula: other };
      rows[1]![2] = { ...(rows[1]![2] as { readonly formula: string }), value: unknown };
    });
    expect(rowsOf(loose)[0]![1]).toEqual({ value: unknown, formula: other });
    expect(rowsOf(loose)[1]![2]).toEqual({ value: unknown, formula: part(2, 2) });
  });

  it("is forgotten where its cells are gone, overwritten as a whole, or were deleted with their sheet", () => {
    const names = [
      { name: "_Footing_spill_1", refersTo: "Result!#REF!", sheet: "Result" },
      { name: "_Footing_spill_2", refersTo: "Gone!$B$1:$C$3", sheet: "Result" },
      { name: "_Footing_spill_3", refersTo: "Result!$B$1:$C$3", sheet: "Result" },
      { name: "Mine", refersTo: "Result!$B$1" },
    ];
    const gone = changed((rows) => rows.splice(0, 3, [null, 1, 2]), names);
    expect(gone.names).toEqual([{ name: "Mine", refersTo: "Result!$B$1" }]);
    expect(rowsOf(gone)).toEqual([[null, 1, 2]]);
    expect(gone.loosened).toBeUndefined();
  });

  it("is left as it is where no name tells of it: someone may have written such formulas", () => {
    const plain = changed(() => undefined, []);
    expect(rowsOf(plain)[1]![1]).toEqual({ value: -1.5, formula: part(2, 1) });
  });
});
