import { afterEach, beforeEach, expect, it } from "vitest";
import type { BookCell, BookData, SheetData } from "../../../src/desk/book/bookData.ts";
import { openXlsx } from "../../../src/desk/files/openXlsx.ts";
import { saveForLibreOffice } from "../../../src/desk/files/saveForLibreOffice.ts";
import { changeParts, pack, unpack } from "../../../src/desk/files/parts.ts";
import { bookOf, sheetOf } from "../../support/deskBook.ts";
import { type DeskPane, openDeskPane } from "../../support/deskPane.ts";

const rows = Array.from({ length: 20 }, (_, week): BookCell[] => [3 * week + ((week * 7) % 5), week]);
const tubes = sheetOf("Data", [["Tubes", "Week"], ...rows]);
const results = sheetOf("Results", [
  [{ value: null, formula: "=FOOTING.ANSWER(Data!A1:A21,Data!B1:B21)" }],
  [],
  [],
  [
    { value: null, formula: "=SUM(FOOTING.COEFFICIENTS(Data!A1:A21,Data!B1:B21))" },
    { value: null, formula: '=IF(B2="","",B2*2)' },
  ],
]);

let at: DeskPane;
beforeEach(async () => {
  at = await openDeskPane(bookOf(tubes, results));
  await at.desk.settle();
});
afterEach(() => at.close());

const shown = (): SheetData["rows"] => at.desk.snapshot().sheets[1]!.rows;

async function reopened(bytes: Uint8Array): Promise<BookData> {
  const reading = await openXlsx(bytes);
  if (!reading.ok) throw new Error(reading.because);
  at.close();
  at = await openDeskPane(reading.value);
  await at.desk.settle();
  return reading.value;
}

async function edited(): Promise<SheetData["rows"]> {
  at.desk.edit("Data!A5", 99);
  await at.desk.settle();
  return shown();
}

it("a workbook saved for LibreOffice and opened again shows the same, and follows its cells", async () => {
  const before = shown();
  expect(before[0]![0]).toMatchObject({ value: "driver", spill: "A1:K3" });
  const { bytes } = await saveForLibreOffice(at.desk.snapshot());
  const after = await edited();
  expect(after).not.toEqual(before);
  await reopened(bytes);
  expect(shown()).toEqual(before);
  expect(await edited()).toEqual(after);
});

it("what LibreOffice found out of date is calculated when the desk opens it", async () => {
  const before = shown();
  const { bytes } = await saveForLibreOffice(at.desk.snapshot());
  // As LibreOffice leaves it when a cell was changed that all results depend on.
  const unknown = (part: string): string =>
    part.replace(/(<c r="[^"]*")[^>]*>(<f>[^<]*<\/f>)<v(?:\/>|>[^<]*<\/v>)/g, '$1 t="e">$2<v>#NAME?</v>');
  const book = await reopened(pack(changeParts(unpack(bytes), /worksheets\/sheet2\.xml$/, unknown)));
  expect(book.sheets[1]!.rows[0]![0]).toMatchObject({ value: { error: "#NAME?" }, spill: "A1:K3" });
  expect(shown()).toEqual(before);
});
