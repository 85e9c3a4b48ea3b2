import { afterAll, beforeAll, describe, expect, it } from "vitest";
import type { SheetData } from "../../src/desk/book/bookData.ts";
import type { PlanCell, SheetPlan } from "../../src/sheet/plan.ts";
import { bookOf, sheetOf } from "../support/deskBook.ts";
import { type DeskHost, errand, openDeskHost } from "../support/deskHost.ts";

const text = (value: string): PlanCell => ({ kind: "text", text: value });
const number = (value: number): PlanCell => ({ kind: "number", number: value });
const formula = (value: string): PlanCell => ({ kind: "formula", formula: value });

/** Texts that a spreadsheet would make something else of if they were typed. */
const treacherous = [
  "=1+1",
  "+3",
  "-3",
  "@SUM(1,2)",
  "'quoted",
  "005",
  "1e3",
  "2024-01-02",
  "TRUE",
  "12 %",
  "#N/A",
  " =2",
  "Jan 2020",
];

const plan: SheetPlan = {
  name: "Repairs answer",
  blocks: [
    {
      row: 0,
      column: 0,
      cells: [
        [text("Repairs explained by Price"), null, null],
        [text("Price"), number(-2.25), formula("=B2*2")],
        [text("Rain"), number(1e-12), formula("=SUM(Data!A2:A3)")],
      ],
    },
    { row: 5, column: 0, cells: treacherous.map((line) => [text(line)]) },
    { row: 5, column: 4, cells: [1, 2, 3, 4].map((x) => [number(x), number(x * x - 3)]) },
  ],
  formats: [
    { area: { row: 0, column: 0, rows: 1, columns: 3 }, style: "title", merge: true, wrap: true, rowHeight: 40 },
    { area: { row: 1, column: 1, rows: 2, columns: 2 }, numberFormat: "0.000", align: "right" },
    { area: { row: 2, column: 2, rows: 1, columns: 1 }, indent: 1 },
    { area: { row: 1, column: 0, rows: 1, columns: 3 }, style: "in force" },
    { area: { row: 2, column: 0, rows: 1, columns: 3 }, style: "table heading" },
  ],
  links: [{ row: 3, column: 0, text: "Data!A3", target: "Data!A3" }],
  columnWidths: [24, 12, 12],
  pageBreaks: [9],
  frozenRows: 1,
  charts: [
    {
      title: "Residuals over fitted values",
      kind: "scatter",
      place: { row: 1, column: 8, rows: 14, columns: 6 },
      xTitle: "Fitted",
      yTitle: "Residual",
      xRange: { minimum: -10, maximum: 5 },
      yHidden: true,
      legend: true,
      series: [
        {
          name: "Residuals",
          x: { row: 5, column: 4, rows: 4, columns: 1 },
          y: { row: 5, column: 5, rows: 4, columns: 1 },
          drawn: "points",
          look: "data",
        },
        {
          name: "Zero",
          x: { row: 5, column: 4, rows: 2, columns: 1 },
          y: { row: 7, column: 5, rows: 2, columns: 1 },
          drawn: "line",
          look: "mark",
        },
        {
          name: "Rain",
          x: { row: 5, column: 4, rows: 1, columns: 1 },
          y: { row: 6, column: 5, rows: 1, columns: 1 },
          drawn: "name",
          look: "mark",
        },
      ],
    },
  ],
  printArea: { row: 0, column: 0, rows: 18, columns: 14 },
};

const book = () => bookOf(sheetOf("Data", [["x"], [7], [8]]));

describe("writing a plan", () => {
  let at: DeskHost;
  let sheet: SheetData;
  const shares: (number | null)[] = [];
  beforeAll(async () => {
    at = await openDeskHost(book());
    const written = await at.host.write(
      plan,
      errand(undefined, (share) => void shares.push(share)),
    );
    expect(written).toEqual({ ok: true, value: { sheet: "Repairs answer" } });
    await at.desk.settle();
    sheet = at.desk.snapshot().sheets.find(({ name }) => name === "Repairs answer")!;
  });
  afterAll(() => at.desk.close());

  it("puts texts, numbers and formulas where they belong, and calculates", () => {
    const cells = at.desk.values("'Repairs answer'!A1:C3");
    expect(cells).toEqual([
      ["Repairs explained by Price", "", ""],
      ["Price", -2.25, -4.5],
      ["Rain", 1e-12, 15],
    ]);
    expect(at.desk.formula("'Repairs answer'!C2")).toBe("=B2*2");
  });

  it("lets no text become anything else", () => {
    const column = at.desk.values(`'Repairs answer'!A6:A${5 + treacherous.length}`);
    expect(column).toEqual(treacherous.map((line) => [line]));
    for (const row of treacherous.keys()) expect(at.desk.error(`'Repairs answer'!A${6 + row}`)).toBeNull();
  });

  it("dresses the cells", () => {
    const styleAt = (row: number, column: number) => {
      const cell = sheet.rows[row]?.[column];
      return typeof cell === "object" && cell !== null && "style" in cell ? cell.style : undefined;
    };
    expect(styleAt(0, 0)).toMatchObject({ bold: true, size: 16, wrap: true });
    expect(styleAt(1, 1)).toMatchObject({ bold: true, fill: "#dbeafe", numberFormat: "0.000", horizontal: "right" });
    expect(styleAt(2, 2)).toMatchObject({ fill: "#f3f4f6", numberFormat: "0.000", indent: 1 });
    expect(styleAt(2, 0)?.lineBelow).toBeDefined();
    expect(sheet.merges).toEqual(["A1:C1"]);
    expect(sheet.columnWidths.slice(0, 3).map((width) => Math.round(width ?? 0))).toEqual([24, 12, 12]);
  });

  it("lays out page, links and what stays in view", () => {
    expect(sheet).toMatchObject({ frozenRows: 1, printArea: "A1:N18", onePageWide: true, pageBreaks: [9] });
    expect(sheet.links).toEqual([{ cell: "A4", target: "Data!A3" }]);
  });

  it("leaves half an inch of paper at the sides, and has the number of each page below it", () => {
    const { left, right, bottom, footer } = sheet.margins!;
    expect([left, right]).toEqual([36, 36]);
    expect(sheet.footer).toEqual({ left: "&A", center: "", right: "Page &P of &N" });
    const lineOfFooter = 12;
    expect(footer + lineOfFooter).toBeLessThan(bottom);
  });

  it("draws the charts with their own series alone", () => {
    expect(sheet.charts).toHaveLength(1);
    expect(sheet.charts[0]).toMatchObject({
      title: "Residuals over fitted values",
      xTitle: "Fitted",
      yTitle: "Residual",
      xRange: { minimum: -10, maximum: 5 },
      yHidden: true,
      legend: true,
      series: [
        {
          name: "Residuals",
          x: "'Repairs answer'!$E$6:$E$9",
          y: "'Repairs answer'!$F$6:$F$9",
          line: false,
          markers: true,
        },
        { name: "Zero", x: "'Repairs answer'!$E$6:$E$7", y: "'Repairs answer'!$F$8:$F$9", line: true, markers: false },
        { name: "Rain", line: false, markers: false, label: "name" },
      ],
    });
  });

  it("shows the new sheet and says how far it came", () => {
    expect(at.desk.snapshot().sheets[at.desk.snapshot().active]?.name).toBe("Repairs answer");
    expect(shares[0]).toBe(0);
    expect(shares).toEqual(shares.toSorted((a, b) => (a ?? 0) - (b ?? 0)));
  });

  it("never writes over a sheet: the next one gets the next name", async () => {
    const written = await at.host.write(plan, errand());
    expect(written).toEqual({ ok: true, value: { sheet: "Repairs answer 2" } });
    expect(at.desk.value("'Repairs answer'!B2")).toBe(-2.25);
  });
});

describe("a plan that cannot be written", () => {
  let at: DeskHost;
  beforeAll(async () => {
    at = await openDeskHost(book(), { profile: "web" });
  });
  afterAll(() => at.desk.close());
  const sheets = () => at.desk.snapshot().sheets.map(({ name }) => name);
  const problemOf = async (what: SheetPlan, signal?: AbortSignal) => {
    const written = await at.host.write(what, errand(signal));
    return written.ok ? null : written.problem;
  };

  it("says that the workbook is protected", async () => {
    at.desk.switches.structureProtected = true;
    expect(await problemOf(plan)).toEqual({ code: "workbook-protected" });
    at.desk.switches.structureProtected = false;
  });

  it("says that another workbook is in front", async () => {
    at.desk.switches.otherWorkbook = true;
    expect(await problemOf(plan)).toEqual({ code: "other-workbook" });
    at.desk.switches.otherWorkbook = false;
    expect(sheets()).toEqual(["Data"]);
  });

  it("is not begun for an errand that is over", async () => {
    expect(await problemOf(plan, AbortSignal.abort())).toEqual({ code: "cancelled" });
    expect(sheets()).toEqual(["Data"]);
  });

  it("is taken away when it is cancelled half-way", async () => {
    const controller = new AbortController();
    const written = await at.host.write(
      plan,
      errand(controller.signal, (share) => {
        if (share !== 0) controller.abort();
      }),
    );
    expect(written).toEqual({ ok: false, problem: { code: "cancelled" } });
    expect(sheets()).toEqual(["Data"]);
  });

  it("is taken away when Excel refuses a part of it", async () => {
    const written = await at.host.write(
      plan,
      errand(undefined, (share) => {
        if (share !== 0) at.desk.switches.otherWorkbook = true;
      }),
    );
    expect(written).toEqual({ ok: false, problem: { code: "other-workbook" } });
    at.desk.switches.otherWorkbook = false;
    expect(sheets()).toEqual(["Data"]);
  });

  it("is sent in pieces that Excel on the web takes", async () => {
    const sentence = "a sentence of some length, as verdicts have them, ".repeat(20);
    const rows = Array.from({ length: 7000 }, (_, row) => [number(row / 7), text(sentence), number(0.5 - row)]);
    const large = {
      ...plan,
      name: "Large",
      blocks: [{ row: 3, column: 0, cells: rows }],
      formats: [],
      links: [],
      charts: [],
    };
    expect(await problemOf(large)).toBeNull();
    for (const row of [0, 1234, 6999]) {
      const address = `Large!A${row + 4}:C${row + 4}`;
      expect(at.desk.values(address)).toEqual([[row / 7, sentence, 0.5 - row]]);
    }
  });
});
