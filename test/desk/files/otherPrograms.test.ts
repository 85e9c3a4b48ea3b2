import { readFile } from "node:fs/promises";
import { describe, expect, it } from "vitest";
import { blankSheet } from "../../../src/desk/book/blankSheet.ts";
import type { BookData, CarriedSheets, SheetData } from "../../../src/desk/book/bookData.ts";
import { addSheets } from "../../../src/desk/files/addSheets.ts";
import { openXlsx } from "../../../src/desk/files/openXlsx.ts";
import { textOf, unpack, type Parts } from "../../../src/desk/files/parts.ts";
import { saveXlsx } from "../../../src/desk/files/saveXlsx.ts";

// Invented stock figures, saved by LibreOffice 7.4 with dates, formulas, a conditional format, a comment and two charts.
const stock = new Uint8Array(await readFile(new URL("../../reference/workbooks/stock.xlsx", import.meta.url)));

async function open(bytes: Uint8Array): Promise<BookData> {
  const reading = await openXlsx(bytes);
  if (!reading.ok) throw new Error(reading.because);
  return reading.value;
}

const withAdded = (original: Uint8Array, ...sheets: readonly SheetData[]): Promise<Uint8Array> =>
  withCarried(original, { sheets, names: [] });

async function withCarried(original: Uint8Array, added: CarriedSheets): Promise<Uint8Array> {
  const reading = await addSheets(original, added);
  if (!reading.ok) throw new Error(reading.because);
  return reading.value;
}

describe("a workbook that another program saved", () => {
  it("is read with its dates, formulas, errors, looks and hidden rows", async () => {
    const [sheet] = (await open(stock)).sheets;
    expect(sheet!.rows[2]).toMatchObject([
      { value: 44200, style: { numberFormat: "dd/mm/yyyy" } },
      40,
      12,
      { value: 315 },
    ]);
    expect(sheet!.rows[2]![3]).toMatchObject({ formula: "=B3*4.5+C3*11.25" });
    expect(sheet!.rows[11]![0]).toMatchObject({ value: { error: "#DIV/0!" }, formula: "=1/0" });
    expect(sheet!.rows[0]![0]).toMatchObject({ style: { bold: true, size: 14, color: "#7a1f1f" } });
    expect(sheet!.hiddenRows).toEqual([5]);
    expect(sheet!.merges).toEqual(["A1:D1"]);
  });

  it("is read with its charts", async () => {
    const [sheet] = (await open(stock)).sheets;
    expect(sheet!.charts.map(({ title, kind }) => [title, kind])).toEqual([
      ["Chains against inner tubes", "scatter with lines"],
      ["Value by week", "lines"],
    ]);
    expect(sheet!.charts[0]!.series).toMatchObject([{ x: "'Rye Street'!$B$3:$B$10", y: "'Rye Street'!$C$3:$C$10" }]);
  });
});

const answer: SheetData = {
  ...blankSheet("Tubes answer", [
    [{ value: "Chains explained by tubes", style: { bold: true, size: 16, color: "#0f4c5c" } }, null],
    [
      { value: 44200, style: { numberFormat: "yyyy-mm-dd" } },
      { value: 1.5, style: { numberFormat: "0.000", fill: "#ffeecc" } },
    ],
    [{ value: "driver", formula: "=FOOTING.ANSWER(A1:A3,B1:B3)", spill: "A3:B4" }, "coefficient"],
    ["Tubes", 0.5],
  ]),
  columnWidths: [30],
  printArea: "A1:H20",
  onePageWide: true,
  tables: [{ name: "Answer", address: "A3:B4" }],
  charts: [
    {
      name: "Residuals",
      title: "Residuals",
      kind: "scatter",
      place: { row: 6, column: 1, rows: 12, columns: 6 },
      xTitle: "x",
      yTitle: "y",
      legend: false,
      series: [
        { name: "Rows", x: "'Tubes answer'!$B$2:$B$4", y: "'Tubes answer'!$B$2:$B$4", line: false, markers: true },
      ],
    },
  ],
};

describe("sheets added to a workbook file", () => {
  it("come out as they went in, beside all that was there", async () => {
    const before = await open(stock);
    const after = await open(await withAdded(stock, answer));
    expect(after.sheets.slice(0, 2)).toEqual(before.sheets);
    expect(after.sheets[2]).toMatchObject(answer);
    expect(after.names).toEqual(before.names);
    expect(after.active).toBe(before.active);
  });

  it("leave every other part as it was, to the byte", async () => {
    const before = unpack(stock);
    const after = unpack(await withAdded(stock, answer));
    const touched = ["[Content_Types].xml", "xl/_rels/workbook.xml.rels", "xl/styles.xml", "xl/workbook.xml"];
    const changed = Object.keys(before).filter((path) => !sameBytes(before[path]!, after[path]));
    expect(changed.sort()).toEqual(touched);
    expect(textOf(after["xl/styles.xml"]!)).toContain(firstStyles(before));
  });

  it("can be added again to what came out", async () => {
    const second = { ...answer, name: "Second answer", tables: [{ name: "Second", address: "A3:B4" }] };
    const twice = await withAdded(await withAdded(stock, answer), second, blankSheet("Third", [[3]]));
    const { sheets } = await open(twice);
    expect(sheets.map(({ name }) => name)).toEqual(["Rye Street", "Notes", "Tubes answer", "Second answer", "Third"]);
    expect(sheets[3]).toMatchObject(second);
    expect(tableNumbers(unpack(twice))).toEqual([1, 2]);
  });

  it("print the area of their own, one page wide", async () => {
    const workbook = textOf(unpack(await withAdded(stock, answer))["xl/workbook.xml"]!);
    const area = `<definedName name="_xlnm.Print_Area" localSheetId="2">'Tubes answer'!$A$1:$H$20</definedName>`;
    expect(workbook).toContain(area);
  });

  it("bring the names that are their own, and no others", async () => {
    const names = [
      { name: "Section_1", refersTo: "'Tubes answer'!$A$1", sheet: "Tubes answer", comment: "A <heading>" },
      { name: "Section_1", refersTo: "Months!$A$1", sheet: "Months" },
      { name: "Footing_data_1", refersTo: "Months!$A$1:$B$9" },
    ];
    const after = await open(await withCarried(stock, { sheets: [blankSheet("Notes of ours", []), answer], names }));
    expect(after.names).toEqual([...(await open(stock)).names, names[0]]);
  });

  it("go into a workbook whose parts carry a namespace prefix", async () => {
    const plain = await saveXlsx({ sheets: [blankSheet("Data", [[1, "a"]])], names: [], active: 0 });
    const prefixed = await withAdded(await withPrefixes(plain), answer);
    const { sheets } = await open(prefixed);
    expect(sheets.map(({ name }) => name)).toEqual(["Data", "Tubes answer"]);
    expect(sheets[1]!.rows[1]).toEqual(answer.rows[1]);
  });

  it("are refused for a file that is no workbook", async () => {
    expect(await addSheets(new TextEncoder().encode("a,b"), { sheets: [answer], names: [] })).toMatchObject({
      ok: false,
    });
  });
});

const sameBytes = (first: Uint8Array, second: Uint8Array | undefined): boolean =>
  second !== undefined && Buffer.from(first).equals(Buffer.from(second));

/** The cell styles that the workbook had, which must stand first so that no cell changes its looks. */
const firstStyles = (parts: Parts): string =>
  /<cellXfs[^>]*>(.*)<\/cellXfs>/s.exec(textOf(parts["xl/styles.xml"]!))![1]!;

const tableNumbers = (parts: Parts): readonly number[] =>
  Object.entries(parts)
    .filter(([path]) => path.startsWith("xl/tables/"))
    .map(([, part]) => Number(/<table [^>]*?\bid="(\d+)"/.exec(textOf(part))![1]))
    .sort();

/** Some programs write every element of the workbook and style parts with a prefix. */
async function withPrefixes(bytes: Uint8Array): Promise<Uint8Array> {
  const { changeParts, pack } = await import("../../../src/desk/files/parts.ts");
  const prefixed = (text: string): string => text.replace(/<(\/?)(?=[a-zA-Z])/g, "<$1x:").replace("xmlns=", "xmlns:x=");
  return pack(changeParts(unpack(bytes), /^xl\/(?:workbook|styles)\.xml$/, prefixed));
}
