import { readFileSync } from "node:fs";
import { beforeAll, describe, expect, it } from "vitest";
import { demoBook } from "../../src/desk/demo/demoBook.ts";
import { openXlsx } from "../../src/desk/files/openXlsx.ts";
import { textOf, unpack } from "../../src/desk/files/parts.ts";
import { saveXlsx } from "../../src/desk/files/saveXlsx.ts";
import { digitsOf } from "../support/digits.ts";
import { type Shelf, shelf, terminal } from "../support/terminal.ts";

const workbook = (name: string): Uint8Array =>
  new Uint8Array(readFileSync(new URL(`../reference/workbooks/${name}`, import.meta.url)));

const run = (line: readonly string[], files: Shelf) => terminal(["answer", ...line], files);

let demo: Shelf;
beforeAll(async () => {
  demo = shelf({ "demo.xlsx": await saveXlsx(demoBook()) });
});

const months = [
  "demo.xlsx",
  "--outcome",
  "Repairs",
  "--drivers",
  "Price index,Advertising,Rainy days",
  "--order",
  "Month",
];
const shops = ["demo.xlsx", "--outcome", "Takings", "--drivers", "Staff hours,Floor area,Footfall"];
const parts = ["demo.xlsx", "--sheet", "Parts", "--outcome", "Unit cost", "--drivers", "Lot size,Lead time"];
const weeks = ["demo.xlsx", "--outcome", "Courier cost", "--drivers", "Parcels,Fuel", "--order", "Week from"];

describe("the demo workbook reaches all four cases", () => {
  it.each([
    ["Months", months, "uneven", "some", "newey-west"],
    ["Shops", shops, "uneven", "not asked", "white"],
    ["Parts", parts, "even", "not asked", "classical"],
    ["Weeks", weeks, "even", "some", "newey-west"],
  ])("%s", async (_, line, spread, followOn, errors) => {
    const ran = await run([...line, "--json"], demo);
    expect(ran.status).toBe(0);
    const { choice } = JSON.parse(ran.out) as { choice: { fourCase: object; errors: string } };
    expect(choice.fourCase).toEqual({ spread, followOn });
    expect(choice.errors).toBe(errors);
  });
});

describe("what a person reads", () => {
  it("is the verdict, the choice, the drivers and the caution", async () => {
    const { out, err, status } = await run(months, demo);
    expect([status, err]).toEqual([0, ""]);
    expect(out).toContain("96 months from January 2016 to\n  December 2023");
    expect(out).toMatch(/The errors follow on from month to month, and their spread is uneven, so the Newey-West/);
    expect(out).toMatch(/Price index: no effect can be shown \(p = 0\.36\)/);
    expect(out).toMatch(
      /This leans on the choice: classical, White and\s+Newey-West with 0\s+lags would\s+have said otherwise/,
    );
    expect(out).toContain("have a qualified person look before money or a filing depends on it");
  });

  it("takes ranges for headings", async () => {
    const byRange = [
      "demo.xlsx",
      "--sheet",
      "Months",
      "--outcome",
      "B4:B100",
      "--drivers",
      "C4:E100",
      "--order",
      "A4:A100",
    ];
    const [named, ranged] = [await run([...months, "--json"], demo), await run([...byRange, "--json"], demo)];
    expect(JSON.parse(ranged.out)).toEqual(JSON.parse(named.out));
  });

  it("takes settings by the names they have everywhere", async () => {
    const line = [
      ...months,
      "--policy",
      "textbook",
      "--white-version",
      "HC1",
      "--lags",
      "5",
      "--level",
      "0.1",
      "--json",
    ];
    const { choice, standardErrors } = JSON.parse((await run(line, demo)).out) as {
      choice: { policy: string; lags: number; reference: object };
      standardErrors: { neweyWest: { lags: number } };
    };
    expect(choice).toMatchObject({ policy: "textbook", lags: 5, reference: { law: "normal" } });
    expect(standardErrors.neweyWest.lags).toBe(5);
  });

  it("shows the usage", async () => {
    const { out, status } = await terminal(["--help"], shelf({}));
    expect(status).toBe(0);
    expect(out).toContain("--white-version");
  });
});

/** Ozone on solar radiation, wind and temperature: R 4.2.2, lm and sandwich::vcovHC(type = "HC3"); test/reference/SOURCES.md. */
const airquality = {
  coefficients: [-64.3420789285917, 0.0598205899684985, -3.33359130553, 1.65209291099271],
  classical: [23.0547243474709, 0.0231864659413458, 0.654407102054186, 0.25352979303236],
  HC3: [21.9164975986282, 0.0198041005631949, 0.914467583918274, 0.207917217751411],
};

describe("workbooks that another program saved", () => {
  const files = shelf({
    "airquality.xlsx": workbook("airquality.xlsx"),
    "text.xlsx": workbook("airquality-text.xlsx"),
    "longley.xlsx": workbook("longley.xlsx"),
  });
  const ozone = ["--outcome", "Ozone", "--drivers", "Solar.R,Wind,Temp"];

  it("title, blank rows, dates and text NA: R's numbers, and every row left out is named", async () => {
    const ran = await run(["airquality.xlsx", ...ozone, "--json"], files);
    const found = JSON.parse(ran.out) as {
      observations: number;
      coefficients: number[];
      standardErrors: { classical: number[]; white: Record<string, number[]> };
      leftOut: { row: number; cell: string; because: string }[];
    };
    expect(found.observations).toBe(111);
    const pairs = [
      [found.coefficients, airquality.coefficients],
      [found.standardErrors.classical, airquality.classical],
      [found.standardErrors.white["HC3"]!, airquality.HC3],
    ] as const;
    for (const [ours, theirs] of pairs) {
      theirs.forEach((value, index) => expect(digitsOf(ours[index]!, value)).toBeGreaterThan(11));
    }
    expect(found.leftOut).toHaveLength(43);
    expect(found.leftOut[0]).toEqual({ row: 8, cell: "airquality!B8", because: '"Ozone" holds "NA"' });
  });

  it("text among numbers: the cell and what to do, as a sentence and as data", async () => {
    const ran = await run(["text.xlsx", ...ozone, "--json"], files);
    expect(ran.status).toBe(2);
    expect(ran.err).toBe(
      `Cell 'airquality-text'!E31 in column "Temp" holds "n.k.", which is not a number. Correct the cell, empty it to leave the row out, or read a driver as categories.\n`,
    );
    expect(JSON.parse(ran.out)).toMatchObject({
      problem: { code: "text-in-number-column", cells: ["'airquality-text'!E31"], message: ran.err.trim() },
    });
  });

  it("years run through time", async () => {
    const drivers = "GNP.deflator,GNP,Unemployed,Armed.Forces,Population,Year";
    const line = ["longley.xlsx", "--outcome", "Employed", "--drivers", drivers, "--order", "year"];
    const ran = await run(line, files);
    expect(ran.out).toMatch(/16\s+years\s+from\s+1947\s+to\s+1962/);
  });
});

describe("faults of the input", () => {
  it.each([
    ["no book", [], "missing-option"],
    ["no outcome", ["demo.xlsx", "--drivers", "Fuel"], "missing-option"],
    ["no such file", ["gone.xlsx", "--outcome", "Repairs", "--drivers", "Fuel"], "unreadable-file"],
    ["no such heading", [...shops, "--outcome", "Takngs"], "unknown-heading"],
    ["no such sheet", ["demo.xlsx", "--sheet", "Month", "--outcome", "Repairs", "--drivers", "Fuel"], "unknown-place"],
    ["no such flag", [...shops, "--polcy", "careful"], "unknown-setting"],
    ["no such value", [...shops, "--policy", "carefull"], "unknown-value"],
    ["Newey-West without time", [...shops, "--errors", "newey-west"], "errors-need-order"],
    ["a copy over the workbook itself", [...months, "--save", "./demo.xlsx"], "unwritable-file"],
    ["a copy that is no workbook", [...months, "--save", "kept.csv"], "unwritable-file"],
    [
      "ranges of unequal height",
      ["demo.xlsx", "--sheet", "Months", "--outcome", "B4:B100", "--drivers", "C4:C90"],
      "unequal-heights",
    ],
  ])("%s", async (_, line, code) => {
    const ran = await run([...line, "--json"], demo);
    expect(ran.status).toBe(2);
    const { problem } = JSON.parse(ran.out) as { problem: { code: string; message: string } };
    expect(problem.code).toBe(code);
    expect(ran.err).toBe(`${problem.message}\n`);
  });

  it("a heading above two columns is not settled by guessing", async () => {
    const files = shelf({ "fees.csv": "Sales,Fee,Fee\n3,1,9\n5,2,7\n4,4,6\n8,5,5\n9,8,3\n" });
    const ran = await run(["fees.csv", "--outcome", "Sales", "--drivers", "fee"], files);
    expect(ran.status).toBe(2);
    expect(ran.err).toContain('"fee" stands above more than one column, in fees!B2:B6 and fees!C2:C6.');
    const byPlace = await run(["fees.csv", "--outcome", "Sales", "--drivers", "Fee (column C)"], files);
    expect(byPlace.status).toBe(0);
  });

  it("name the nearest word", async () => {
    const ran = await run([...shops, "--outcome", "Takngs"], demo);
    expect(ran.err).toContain('Did you mean "Takings"?');
  });
});

describe("--save", () => {
  it("keeps the workbook and adds the result sheet", async () => {
    const ran = await run([...months, "--save", "kept.xlsx"], demo);
    expect(ran.out).toContain('Sheet "Repairs answer" is in kept.xlsx.');
    const kept = await openXlsx(demo.files.get("kept.xlsx")!);
    if (!kept.ok) throw new Error(kept.because);
    const names = kept.value.sheets.map(({ name }) => name);
    expect(names).toEqual([...demoBook().sheets.map(({ name }) => name), "Repairs answer"]);
    expect(kept.value.sheets.at(-1)!.charts.map(({ series }) => series.length)).toEqual([7, 1, 1]);
  });

  it("the fingerprint is of the columns used, whatever stands beside them", async () => {
    const rows = ["Sales,Fee", "3,1", "5,2", "4,4", "8,5", "9,8"];
    const files = shelf({ "bare.csv": rows.join("\n"), "more.csv": rows.map((row, at) => `${row},x${at}`).join("\n") });
    const line = ["--outcome", "Sales", "--drivers", "Fee", "--save", "out.xlsx"];
    const prints: unknown[] = [];
    for (const book of ["bare.csv", "more.csv"]) {
      await run([book, ...line], files);
      const opened = await openXlsx(files.files.get("out.xlsx")!);
      if (!opened.ok) throw new Error(opened.because);
      prints.push(/"([0-9a-f]{64})"/.exec(JSON.stringify(opened.value.sheets.at(-1)!.rows))?.[1]);
    }
    expect(prints[0]).toHaveLength(64);
    expect(prints[1]).toBe(prints[0]);
  });

  it("--live: an outcome that stands between its drivers, in groups that cross", async () => {
    const lines = Array.from({ length: 40 }, (_, row) => {
      const [a, b] = [(row * 7) % 11, (row * 5) % 13];
      return `S${row % 5},M${row % 8},${a},${3 + 2 * a - b + ((row * row) % 7)},${b}`;
    });
    const files = shelf({ "mid.csv": ["Shop,Month,A,Y,B", ...lines].join("\n") });
    const asked = ["mid.csv", "--outcome", "Y", "--drivers", "A,B", "--groups", "Shop", "--second-groups", "Month"];
    await run([...asked, "--live", "--save", "live.xlsx"], files);
    const opened = await openXlsx(files.files.get("live.xlsx")!);
    if (!opened.ok) throw new Error(opened.because);
    const sheet = opened.value.sheets.at(-1)!;
    expect(JSON.stringify(sheet.rows)).toContain("=FOOTING.ANSWER(mid!$D$1:$D$41,mid!$B$1:$E$41,");
    expect(JSON.stringify(sheet.rows)).not.toContain('"error"');
  });

  it("--live: the same figures as worksheet functions with their values", async () => {
    await run([...months, "--save", "kept.xlsx"], demo);
    await run([...months, "--live", "--save", "live.xlsx"], demo);
    const pages = ["kept.xlsx", "live.xlsx"].map(async (name) => {
      const opened = await openXlsx(demo.files.get(name)!);
      if (!opened.ok) throw new Error(opened.because);
      return opened.value.sheets.at(-1)!.rows;
    });
    const [kept, live] = await Promise.all(pages);
    const bare = (cell: unknown): unknown =>
      typeof cell === "object" && cell !== null && "value" in cell ? cell.value : cell;
    const texts = (rows: typeof kept): string[] =>
      rows!
        .map((row) =>
          row
            .slice(0, 11)
            .map(bare)
            .filter((value) => value !== null && value !== "")
            .join(" | "),
        )
        .filter((row) => row !== "");
    expect(texts(live)).toEqual(texts(kept));
    expect(JSON.stringify(live)).toContain("=FOOTING.ANSWER(Months!$B$4:$B$100,Months!$C$4:$E$100,");
  });

  it("--live --for-libreoffice: each cell by itself, and one result again on the desk", async () => {
    await run([...months, "--live", "--save", "excel.xlsx"], demo);
    await run([...months, "--live", "--for-libreoffice", "--save", "office.xlsx"], demo);
    const parts = unpack(demo.files.get("office.xlsx")!);
    const sheet = Object.keys(parts).find((path) => /^xl\/worksheets\/footing1-/.test(path))!;
    expect(textOf(parts[sheet]!)).toContain("<f>INDEX(_xldudf_FOOTING_ANSWER(");
    expect(textOf(parts[sheet]!)).not.toContain('t="array"');
    expect(textOf(parts["xl/workbook.xml"]!)).toMatch(
      /<definedName hidden="1" name="_Footing_spill_1" localSheetId="6">/,
    );
    const [excel, office] = await Promise.all(
      ["excel.xlsx", "office.xlsx"].map((name) => openXlsx(demo.files.get(name)!)),
    );
    expect(office).toEqual(excel);
  });
});
