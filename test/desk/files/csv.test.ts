import { describe, expect, it } from "vitest";
import { blankSheet } from "../../../src/desk/book/blankSheet.ts";
import type { SheetData } from "../../../src/desk/book/bookData.ts";
import { openCsv } from "../../../src/desk/files/openCsv.ts";
import { saveCsv } from "../../../src/desk/files/saveCsv.ts";

function rowsOf(file: string | Uint8Array): SheetData["rows"] {
  const reading = openCsv(file, "Data");
  if (!reading.ok) throw new Error(reading.because);
  return reading.value.sheets[0]!.rows;
}

const date = (value: number, numberFormat = "yyyy-mm-dd"): object => ({ value, style: { numberFormat } });

describe("reading separated text", () => {
  it.each([
    ["commas", "Shop,Takings\nRye,12.5\nHove,-3e2", ["Shop", "Takings"], ["Rye", 12.5]],
    [
      "semicolons, with decimal commas",
      "Shop;Takings;Hours\nRye;12,5;7\nHove;3,25;8",
      ["Shop", "Takings", "Hours"],
      ["Rye", "12,5", 7],
    ],
    ["semicolons where every cell has a decimal comma", "1,5;2,5\n3,5;4,5", ["1,5", "2,5"], ["3,5", "4,5"]],
    ["tabs", "Shop\tTakings, total\nRye\t12", ["Shop", "Takings, total"], ["Rye", 12]],
    [
      "a title line above",
      "Takings of the spring\nShop;Takings\nRye;1\nHove;2",
      ["Takings of the spring"],
      ["Shop", "Takings"],
    ],
    ["a declared separator", "sep=|\na|b\n1|2", ["a", "b"], [1, 2]],
  ])("finds %s", (_, text, ...firstTwo) => {
    expect(rowsOf(text).slice(0, 2)).toEqual(firstTwo);
  });

  it("honours quotes over separators, line ends and quotes", () => {
    expect(rowsOf('Name,Note\n"Rye, Street","two\nlines"\n"say ""no""",2')).toEqual([
      ["Name", "Note"],
      ["Rye, Street", "two\nlines"],
      ['say "no"', 2],
    ]);
  });

  it("takes for a number only what leaves no doubt", () => {
    const text = "12;-0.5;.5;1.;1e3;+4;005;1,5;1 000;12%;0x1F;1e999;NaN";
    expect(rowsOf(text)).toEqual([[12, -0.5, 0.5, 1, 1000, 4, "005", "1,5", "1 000", "12%", "0x1F", "1e999", "NaN"]]);
  });

  it("reads truth values, errors, blanks and ISO dates", () => {
    const text = "TRUE,false,#N/A,#div/0!,,2016-01-31,2016-02-29,2015-02-29,1899-01-01,2024-03-31 14:30,2019-07";
    expect(rowsOf(text)).toEqual([
      [
        ...[true, false, { error: "#N/A" }, { error: "#DIV/0!" }, null],
        ...[date(42400), date(42429), "2015-02-29", "1899-01-01"],
        ...[date(45382 + 14.5 / 24, "yyyy-mm-dd hh:mm:ss"), "2019-07"],
      ],
    ]);
  });

  it("knows the encodings that spreadsheets write", () => {
    const text = "Größe,Café\n1,2";
    const utf16 = Buffer.concat([Buffer.from([0xff, 0xfe]), Buffer.from(text, "utf16le")]);
    const western = Buffer.from(text, "latin1");
    const files = [text, `\uFEFF${text}`, new TextEncoder().encode(`\uFEFF${text}`), utf16, western];
    for (const file of files) expect(rowsOf(file)[0]).toEqual(["Größe", "Café"]);
  });

  it("says why a file cannot be read", () => {
    expect(openCsv(" \n ", "Data")).toEqual({ ok: false, because: "the file is empty" });
    expect(openCsv("a\0b", "Data")).toEqual({ ok: false, because: "it is no text file" });
  });
});

describe("writing separated text", () => {
  const rows: SheetData["rows"] = [
    ["Month", "Takings, total", 'say "no"'],
    [{ value: 42400, style: { numberFormat: "mmm yyyy" } }, 0.1 + 0.2, -5],
    [{ value: 45382.5, style: { numberFormat: "yyyy-mm-dd hh:mm" } }, true, { error: "#N/A" }],
    [null, { value: 3, formula: "=1+2", style: { numberFormat: "0.00" } }, "=1+1"],
  ];

  it("writes numbers in full, dates in ISO form, and no text that would be run", () => {
    expect(
      saveCsv(blankSheet("Data", rows))
        .replace(/^\uFEFF/, "")
        .trimEnd()
        .split("\r\n"),
    ).toEqual([
      'Month,"Takings, total","say ""no"""',
      "2016-01-31,0.30000000000000004,-5",
      "2024-03-31 12:00:00,TRUE,#N/A",
      ",3,'=1+1",
    ]);
  });

  it("comes back as the same values", () => {
    const values = rowsOf(saveCsv(blankSheet("Data", rows)));
    expect(values[1]).toEqual([date(42400), 0.1 + 0.2, -5]);
    expect(values[3]).toEqual([null, 3, "=1+1"]);
  });
});
