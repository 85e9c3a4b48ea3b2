import { afterEach, describe, expect, it } from "vitest";
import { blankSheet } from "../../../src/desk/book/blankSheet.ts";
import type { BookChart, BookData, SheetData } from "../../../src/desk/book/bookData.ts";
import { openXlsx } from "../../../src/desk/files/openXlsx.ts";
import { textOf, unpack } from "../../../src/desk/files/parts.ts";
import { saveXlsx } from "../../../src/desk/files/saveXlsx.ts";

const bookOf = (...sheets: readonly SheetData[]): BookData => ({ sheets, names: [], active: 0 });

async function reopened(book: BookData): Promise<BookData> {
  const reading = await openXlsx(await saveXlsx(book));
  if (!reading.ok) throw new Error(reading.because);
  return reading.value;
}

async function reopenedSheet(sheet: SheetData): Promise<SheetData> {
  return (await reopened(bookOf(sheet))).sheets[0]!;
}

async function sheetPart(sheet: SheetData): Promise<string> {
  return textOf(unpack(await saveXlsx(bookOf(sheet)))["xl/worksheets/sheet1.xml"]!);
}

describe("a workbook saved and opened again", () => {
  it("says that it is calculated only when someone asks", async () => {
    const book = bookOf(blankSheet("Data", [[1]]));
    expect(await reopened({ ...book, manualCalculation: true })).toMatchObject({ manualCalculation: true });
    expect(await reopened(book)).not.toHaveProperty("manualCalculation");
  });

  it("keeps values of every kind, to the last digit", async () => {
    const rows = [
      ["Repairs", 0.1 + 0.2, 1.7976931348623157e308, -5e-324],
      [true, false, null, { error: "#N/A" }],
    ];
    expect((await reopenedSheet(blankSheet("Data", rows))).rows).toEqual(rows);
  });

  it("keeps text as text, whatever it looks like", async () => {
    const rows = [["=1+1", "+7", "-3", "@x", "005", "1e3", "TRUE", " a  b ", "Rye & <Co>", 'in "quotes"']];
    expect((await reopenedSheet(blankSheet("Data", rows))).rows).toEqual(rows);
  });

  it("keeps every look that the book has words for", async () => {
    const style = {
      numberFormat: '0.00 "km"',
      bold: true,
      italic: true,
      size: 16,
      color: "#0f4c5c",
      fill: "#e6eef2",
      wrap: true,
      horizontal: "center",
      vertical: "middle",
      lineAbove: "#7a1f1f",
      lineBelow: "#123456",
      indent: 1,
    } as const;
    const rows = [
      [
        { value: 4.25, style },
        { value: null, style: { fill: "#ffeecc" } },
      ],
    ];
    expect((await reopenedSheet(blankSheet("Data", rows))).rows).toEqual(rows);
  });

  it("keeps widths, heights, merges, freeze, hiding, protection, print set-up, tables and links", async () => {
    const sheet: SheetData = {
      ...blankSheet("Rye Street", [
        ["Title", null],
        ["Week", "Tubes"],
        [1, 40],
        [2, 44],
      ]),
      columnWidths: [14, undefined, 9.5],
      rowHeights: [undefined, 32.25],
      merges: ["A1:B1"],
      frozenRows: 2,
      hidden: false,
      hiddenRows: [3],
      hiddenColumns: [1],
      protected: true,
      tables: [{ name: "Stock", address: "A2:B4" }],
      printArea: "A1:F40",
      onePageWide: true,
      landscape: true,
      pageBreaks: [12, 30],
      margins: { left: 36, right: 36, top: 45, bottom: 54, footer: 18 },
      footer: { left: "&A", center: "", right: "Page &P of &N" },
      links: [
        { cell: "B1", target: "https://example.com/stock" },
        { cell: "A3", target: "'Rye Street'!B4" },
      ],
      customProperties: { footing: "answer-1" },
    };
    const again = await reopenedSheet(sheet);
    expect(again).toEqual(sheet);
  });

  it("keeps names, the sheet in front, hidden sheets and what add-ins store", async () => {
    const book: BookData = {
      sheets: [{ ...blankSheet("Hidden", [[1]]), hidden: true }, blankSheet("Shown", [[2]])],
      names: [
        { name: "Tubes", refersTo: "Shown!$A$1:$A$9" },
        { name: "Tubes", refersTo: "Hidden!$A$1", sheet: "Hidden", comment: 'Tubes & "more"' },
      ],
      active: 1,
      customXml: [
        { id: "{11111111-2222-3333-4444-555555555555}", xml: '<model xmlns="urn:footing:model">a &amp; b</model>' },
      ],
      settings: { policy: "careful", rows: [1, 2], quoted: 'say "<no>"' },
    };
    const again = await reopened(book);
    expect(again.names).toEqual(book.names);
    expect(again.active).toBe(1);
    expect(again.sheets.map(({ hidden }) => hidden)).toEqual([true, false]);
    expect(again.customXml).toEqual(book.customXml);
    expect(again.settings).toEqual(book.settings);
  });
});

describe("what is to be printed", () => {
  it("breaks after the row that ends a page, which spreadsheets count from 1", async () => {
    const sheet = { ...blankSheet("Shops", [[1]]), pageBreaks: [7] };
    const part = textOf(unpack(await saveXlsx(bookOf(sheet)))["xl/worksheets/sheet1.xml"]!);
    expect(part).toMatch(/<brk id="7" /);
  });

  it.each([
    ["Shops", "'Shops'!$A$1:$B$9"],
    ["Repairs answer", "'Repairs answer'!$A$1:$B$9"],
    ["Rye's & Hove's", "'Rye''s &amp; Hove''s'!$A$1:$B$9"],
  ])("of the sheet %s is named with the sheet in quotes, as spreadsheets demand", async (name, area) => {
    const sheet = { ...blankSheet(name, [[1]]), printArea: "A1:B9" };
    const workbook = textOf(unpack(await saveXlsx(bookOf(sheet)))["xl/workbook.xml"]!);
    expect(workbook.replaceAll("&apos;", "'")).toContain(`localSheetId="0">${area}</definedName>`);
    expect((await reopenedSheet(sheet)).printArea).toBe("A1:B9");
  });
});

describe("dates", () => {
  const zone = process.env["TZ"];
  afterEach(() => {
    if (zone === undefined) delete process.env["TZ"];
    else process.env["TZ"] = zone;
  });

  it.each(["Pacific/Auckland", "America/Los_Angeles", "Asia/Kathmandu", "UTC"])("do not move in %s", async (place) => {
    process.env["TZ"] = place;
    const serials = [61, 42370, 45000.5, 45382.0625, 45592.9999884259, 73050];
    const rows = serials.map((value) => [{ value, style: { numberFormat: "yyyy-mm-dd hh:mm" } }]);
    const again = await reopenedSheet(blankSheet("Dates", rows));
    again.rows.forEach(([cell], index) => {
      expect(cell).toMatchObject({ style: { numberFormat: "yyyy-mm-dd hh:mm" } });
      expect((cell as { value: number }).value).toBeCloseTo(serials[index]!, 8);
    });
    expect((again.rows[1]![0] as { value: number }).value).toBe(42370);
  });
});

describe("formulas", () => {
  const formulas = [
    { formula: "=SUM(B1:B3)", value: 6, stored: "<f>SUM(B1:B3)</f><v>6</v>" },
    {
      formula: '=FOOTING.CHOICE(B1:B3,"FOOTING.X(")',
      value: "white",
      stored: '<f>_xldudf_FOOTING_CHOICE(B1:B3,"FOOTING.X(")</f>',
    },
    {
      formula: "=NORM.S.DIST(1,TRUE)+STDEV(B1:B3)",
      value: 1.84,
      stored: "<f>_xlfn.NORM.S.DIST(1,TRUE)+STDEV(B1:B3)</f>",
    },
    { formula: "=SUM(SORT(B1#))", value: 6, stored: "<f>SUM(_xlfn._xlws.SORT(_xlfn.ANCHORARRAY(B1)))</f>" },
    {
      formula: "=SUM('Rye''s & A1# '!B1#,Other!$B$1#)+'x A1#'!B2",
      value: 6,
      stored: "<f>SUM(_xlfn.ANCHORARRAY('Rye''s &amp; A1# '!B1),_xlfn.ANCHORARRAY(Other!$B$1))+'x A1#'!B2</f>",
    },
    { formula: "='T.TEST(x'!A1&\"A1#\"", value: "", stored: "<f>'T.TEST(x'!A1&amp;\"A1#\"</f>" },
    { formula: "=SUM(T[T.TEST(x) A1'#])", value: 6, stored: "<f>SUM(T[T.TEST(x) A1'#])</f>" },
    { formula: "=1/0", value: { error: "#DIV/0!" }, stored: ' t="e"><f>1/0</f><v>#DIV/0!</v>' },
    { formula: '=NA()&""', value: { error: "#N/A" }, stored: ' t="e"><f>NA()&amp;""</f><v>#N/A</v>' },
    { formula: "=1=1", value: true, stored: ' t="b"><f>1=1</f><v>1</v>' },
  ];

  it.each(formulas)("$formula is stored as Excel stores it and comes back", async ({ formula, value, stored }) => {
    const sheet = blankSheet("Data", [[{ value, formula }]]);
    expect(await sheetPart(sheet)).toContain(stored);
    expect((await reopenedSheet(sheet)).rows).toEqual([[{ value, formula }]]);
  });

  it("that spill are dynamic arrays over their range, with every value of the result", async () => {
    const anchor = { value: "driver", formula: "=FOOTING.ANSWER(D1:D9,E1:F9)", spill: "A1:B2" };
    const sheet = blankSheet("Data", [
      [anchor, "coefficient"],
      ["Price", -1.25],
    ]);
    const part = await sheetPart(sheet);
    expect(part).toContain('<c r="A1" cm="1" t="str"><f t="array" ref="A1:B2">_xldudf_FOOTING_ANSWER(D1:D9,E1:F9)</f>');
    expect(textOf(unpack(await saveXlsx(bookOf(sheet)))["xl/metadata.xml"]!)).toContain('fDynamic="1"');
    expect((await reopenedSheet(sheet)).rows).toEqual(sheet.rows);
  });

  it("keep their saved results: nobody is told to calculate on opening", async () => {
    const workbook = textOf(unpack(await saveXlsx(bookOf(blankSheet("Data", [[1]]))))["xl/workbook.xml"]!);
    expect(workbook).not.toContain("fullCalcOnLoad");
    expect(workbook).toMatch(/<calcPr calcId="\d{6}"\/>/);
  });
});

describe("charts", () => {
  const chart: BookChart = {
    name: "Residuals",
    title: "Residuals & fitted values",
    kind: "scatter with lines",
    place: { row: 3, column: 5, rows: 14, columns: 7 },
    xTitle: "Fitted",
    yTitle: "Residual",
    xRange: { minimum: 0.5, maximum: null },
    yRange: { minimum: -4, maximum: 4.5 },
    yHidden: true,
    legend: true,
    series: [
      { name: "Rows", x: "Data!$A$1:$A$3", y: "Data!$B$1:$B$3", line: false, markers: true },
      { name: "Odd", x: "Data!$A$1:$A$3", y: "Data!$B$1:$B$3", line: false, markers: true, color: "#7a1f1f" },
      {
        name: "Zero",
        x: "Data!$A$1:$A$2",
        y: "Data!$C$1:$C$2",
        line: true,
        markers: false,
        color: "#0f4c5c",
        lineWeight: 1,
        label: "name",
      },
      { name: "Both", x: "Data!$A$1:$A$3", y: "Data!$C$1:$C$3", line: true, markers: true },
    ],
  };
  const data = [
    [1, 2, 0],
    [2, 5, 0],
    [3, 1, 4],
  ];

  it("come back with their place, titles, series, lines and markers", async () => {
    const sheet = {
      ...blankSheet("Data", data),
      charts: [chart, { ...chart, name: "Second", kind: "lines" as const }],
    };
    const again = await reopenedSheet(sheet);
    expect(again.charts[0]).toEqual(chart);
    expect(again.charts[1]).toMatchObject({ name: "Second", kind: "lines", place: chart.place });
  });

  it("of points alone say that no line joins them", async () => {
    const sheet = { ...blankSheet("Data", data), charts: [chart] };
    const part = textOf(unpack(await saveXlsx(bookOf(sheet)))["xl/charts/chart1.xml"]!);
    const lines = [...part.matchAll(/<c:ser>.*?<\/c:ser>/gs)].map(([series]) => !series.includes("<a:noFill/>"));
    expect(lines).toEqual([false, false, true, true]);
  });
});

describe("a file that is none", () => {
  const because = async (bytes: Uint8Array): Promise<string> => {
    const reading = await openXlsx(bytes);
    return reading.ok ? "" : reading.because;
  };

  it("is refused with its reason", async () => {
    const whole = await saveXlsx(bookOf(blankSheet("Data", [[1]])));
    expect(await because(new Uint8Array())).toBe("the file is empty");
    expect(await because(new TextEncoder().encode("Month,Repairs\n1,2"))).toBe("it is no Excel workbook (.xlsx)");
    expect(await because(whole.slice(0, whole.length / 2))).toBe("it is damaged, or no Excel workbook (.xlsx)");
    expect(await because(Uint8Array.of(0xd0, 0xcf, 0x11, 0xe0, 0, 0, 0, 0))).toContain("old .xls format");
  });

  it("under a password is told apart from the old format", async () => {
    const name = Buffer.from("EncryptedPackage", "utf16le");
    expect(await because(Uint8Array.of(0xd0, 0xcf, 0x11, 0xe0, ...name))).toContain("protected with a password");
  });
});
