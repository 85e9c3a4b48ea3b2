import { readFile } from "node:fs/promises";
import { describe, expect, it } from "vitest";
import type { BookCell, BookData, SheetData } from "../../../src/desk/book/bookData.ts";
import { openXlsx } from "../../../src/desk/files/openXlsx.ts";
import { changeParts, pack, textOf, unpack } from "../../../src/desk/files/parts.ts";
import { saveForLibreOffice } from "../../../src/desk/files/saveForLibreOffice.ts";
import { bookOf, sheetOf } from "../../support/deskBook.ts";
import { spilledBook } from "../../support/spilledBook.ts";

async function opened(bytes: Uint8Array): Promise<BookData> {
  const reading = await openXlsx(bytes);
  if (!reading.ok) throw new Error(reading.because);
  return reading.value;
}

async function partsOf(book: BookData): Promise<(path: string) => string> {
  const parts = unpack((await saveForLibreOffice(book)).bytes);
  return (path) => textOf(parts[path]!);
}

const reference = (name: string): Promise<Uint8Array> =>
  readFile(new URL(`../../reference/workbooks/${name}`, import.meta.url)).then((file) => new Uint8Array(file));

/** Rows without the empty cells at their ends, with which programs fill them up to the same length. */
const trimmed = ({ rows }: SheetData): readonly (readonly BookCell[])[] =>
  rows.map((row) => row.slice(0, row.findLastIndex((cell) => cell !== null) + 1));

describe("a workbook saved for LibreOffice", () => {
  it("is the same when the desk opens it again: formulas, spills, values of every kind, looks and names", async () => {
    const { bytes, left } = await saveForLibreOffice(spilledBook);
    const again = await opened(bytes);
    expect(again.sheets.map(trimmed)).toEqual(spilledBook.sheets.map(trimmed));
    expect(again.names).toEqual([]);
    expect(again.loosened).toBeUndefined();
    expect(left).toEqual([]);
  });

  it("has in each cell of a result the formula of its own part with its value", async () => {
    const part = (await partsOf(spilledBook))("xl/worksheets/sheet1.xml");
    const answer = "_xldudf_FOOTING_ANSWER($B$2:$B$4,$C$2:$C$4,$A$2)";
    expect(part).toContain(`<f>INDEX(${answer},1,2)</f><v>coefficient</v>`);
    expect(part).toContain(`<f>INDEX(${answer},2,4)</f><v>-0.0625</v>`);
    expect(part).toContain("<f>INDEX(_xlfn._xlws.SORT(B2:B4),3,1)</f><v>44</v>");
    expect(part).toContain("<f>IF(ISERROR(CHOOSE(1,$B$5,1,4)),$B$5,TRUE)</f>");
  });

  it("leaves results whose functions LibreOffice knows as arrays, which it calculates", async () => {
    const part = (await partsOf(spilledBook))("xl/worksheets/sheet1.xml");
    expect(
      [...part.matchAll(/<f t="array" ref="([^"]*)">([^<]*)</g)].map(([, ref, formula]) => [ref, formula]),
    ).toEqual([["C8:C10", "C2:C4*2"]]);
  });

  it("tells how far each result went by a hidden name of its sheet", async () => {
    const part = (await partsOf(spilledBook))("xl/workbook.xml").replaceAll("&apos;", "'");
    expect(part.match(/<definedName [^>]*>[^<]*</g)).toEqual([
      `<definedName hidden="1" name="_Footing_spill_1" localSheetId="0">'Rye''s tubes'!$A$5:$D$7<`,
      `<definedName hidden="1" name="_Footing_spill_2" localSheetId="0">'Rye''s tubes'!$A$8:$A$10<`,
      `<definedName hidden="1" name="_Footing_spill_1" localSheetId="1">Other!$A$1:$A$3<`,
    ]);
  });

  it("tells which stay as Excel needs them, since nothing in them would be kept or they ask for their place", async () => {
    const results = bookOf(
      sheetOf("Odd", [
        [
          { value: true, formula: "=UNIQUE(D1:D9>3)", spill: "A1:A2" },
          { value: 1, formula: "=SORT(ROW()+D1:D2)", spill: "B1:B2" },
          { value: 1, formula: "=SORT(D1:D2)", spill: "C1:C2" },
        ],
        [false, 2, { error: "#CALC!" }],
        [
          { value: "", formula: "=FOOTING.CHOICE(D1:D2,E1:E2)" },
          { value: "white", formula: "=FOOTING.CHOICE(D1:D2,E1:E2)" },
          { value: "", formula: '=IF(D1=0,"",D1)' },
        ],
      ]),
    );
    const { bytes, left } = await saveForLibreOffice(results);
    expect(left).toEqual(["Odd!A1:A2", "Odd!B1:B2", "Odd!C1:C2", "Odd!A3"]);
    expect((await opened(bytes)).sheets.map(trimmed)).toEqual(results.sheets.map(trimmed));
  });
});

// The workbook above, saved for LibreOffice and saved again by LibreOffice 7.4: with a row inserted above on both sheets.
const moved: readonly (readonly (readonly BookCell[])[])[] = [
  [
    [],
    ["Week", "Tubes", "Price"],
    [day(44200), 40, 5.25],
    [day(44207), 44, 5],
    [day(44214), 39, 5.5],
    [
      { value: "", formula: "=FOOTING.ANSWER($B$3:$B$5,$C$3:$C$5,$A$3)", spill: "A6:D8" },
      "coefficient",
      { value: 4.1875, style: { numberFormat: "#,##0.00", bold: true } },
      true,
    ],
    [day(44221.5), { error: "#N/A" }, false, -0.0625],
    ["  ", "#DIV/0!", 'say "=1+1"', ""],
    [
      { value: 39, formula: "=SORT(B3:B5)", spill: "A9:A11" },
      { value: 2, formula: "=SUM(A6#)" },
      { value: 10.5, formula: "=C3:C5*2", spill: "C9:C11" },
      { value: 5, formula: "=FOOTING.LAGS(96)" },
    ],
    [40, null, 10],
    [44, null, 11],
  ],
  [[], [{ value: 78, formula: "=SORT('Rye''s tubes'!A9#*2)", spill: "A2:A4" }], [80], [88]],
];

function day(value: number): BookCell {
  return { value, style: { numberFormat: String.raw`yyyy\-mm\-dd` } };
}

describe("a workbook that LibreOffice has saved again", () => {
  it("has every formula and result as before, moved with their rows", async () => {
    const book = await opened(await reference("tubes.xlsx"));
    expect(book.sheets.map(trimmed)).toEqual(moved);
    expect(book.names).toEqual([]);
    expect(book.loosened).toBeUndefined();
  });

  it("has truth values as they were, where LibreOffice has written TRUE() for TRUE", async () => {
    const sheet = sheetOf("Truths", [[{ value: true, formula: '=IF(FALSE,ISTRUE(),"TRUE()")=TRUE' }]]);
    const parts = unpack((await saveForLibreOffice(bookOf(sheet))).bytes);
    const written = changeParts(parts, /sheet1\.xml$/, (part) =>
      part.replace("(FALSE", "(FALSE()").replace("=TRUE<", "=TRUE()<"),
    );
    const byLibreOffice = changeParts(written, /app\.xml$/, (part) =>
      part.replace("Microsoft Excel", "LibreOffice/7.4.7.2"),
    );
    expect((await opened(pack(byLibreOffice))).sheets[0]!.rows).toEqual(sheet.rows);
    expect((await opened(pack(written))).sheets[0]!.rows[0]![0]).toMatchObject({
      formula: '=IF(FALSE(),ISTRUE(),"TRUE()")=TRUE()',
    });
  });

  it("keeps what was typed into a result there, the other cells of it go on by themselves, and says so", async () => {
    // C5 was 4.1875 and is 7.5; a row was inserted within the result, and "mine" typed into it.
    const book = await opened(await reference("tubes-changed.xlsx"));
    expect(book.loosened).toEqual(["'Rye''s tubes'!A5:D8"]);
    const rows = trimmed(book.sheets[0]!);
    const part = (row: number, column: number): string =>
      `=INDEX(FOOTING.ANSWER($B$2:$B$4,$C$2:$C$4,$A$2),${row},${column})`;
    expect(rows[4]).toMatchObject([
      { value: "", formula: part(1, 1) },
      { value: "coefficient", formula: part(1, 2) },
      { value: 7.5, style: { numberFormat: "#,##0.00" } },
      { value: true, formula: part(1, 4) },
    ]);
    expect(rows[6]).toMatchObject([{ value: "mine" }]);
    expect(rows[7]).toMatchObject([
      { value: "  ", formula: part(3, 1) },
      { value: "#DIV/0!", formula: part(3, 2) },
      { value: 'say "=1+1"', formula: part(3, 3) },
      { value: "", formula: part(3, 4) },
    ]);
    expect(rows[8]?.[0]).toEqual({ value: 39, formula: "=SORT(B2:B4)", spill: "A9:A11" });
    expect(book.names).toEqual([]);
  });
});
