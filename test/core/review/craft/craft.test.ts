import { beforeAll, describe, expect, it } from "vitest";
import type { BookClaims } from "../../../../src/core/review/claimsOf.ts";
import type { Finding } from "../../../../src/core/review/finding.ts";
import type { BookCell, BookData, SheetData } from "../../../../src/desk/book/bookData.ts";
import { bookOf, sheetOf } from "../../../support/deskBook.ts";
import { claimsIn, readOnDesk } from "../../../support/readBook.ts";

type Rows = BookCell[][];

/** Twenty days, no two alike. */
const sound = (): Rows =>
  Array.from({ length: 20 }, (_, day): BookCell[] => [
    day + 1,
    31 + ((day * 7) % 19) + day / 16,
    2.25 + ((day * 5) % 9) / 8,
    (day * 3) % 17,
  ]);

const numberIn = (cell: BookCell): number =>
  typeof cell === "number"
    ? cell
    : typeof cell === "object" && cell !== null && "value" in cell
      ? Number(cell.value)
      : NaN;

/** What SLOPE gives of cups on price, the price so many rows further on. */
function slopeIn(rows: Rows, further = 0): number {
  const pairs = rows
    .slice(0, rows.length - further)
    .map((row, index) => [row[1]!, rows[index + further]![2]!].map(numberIn));
  const [y, x] = [0, 1].map((side) => pairs.reduce((sum, pair) => sum + pair[side]!, 0) / pairs.length);
  const products = pairs.reduce((sum, pair) => sum + (pair[0]! - y!) * (pair[1]! - x!), 0);
  return products / pairs.reduce((sum, pair) => sum + (pair[1]! - x!) ** 2, 0);
}

const headings: BookCell[] = ["Day", "Cups", "Price", "Rain"];

interface Case {
  readonly rows?: Rows;
  readonly more?: Partial<SheetData>;
  /** With D for the sheet of the data. */
  readonly formula?: string;
  /** How many rows further on its price stands. */
  readonly further?: number;
  readonly report?: Rows;
}

const changed = (change: (rows: Rows) => void): Rows => {
  const rows = sound();
  change(rows);
  return rows;
};

const slope = "=SLOPE(D!B2:B21,D!C2:C21)";

const cases = {
  sound: {},
  text: { rows: changed((rows) => ((rows[4]![2] = "n/a"), (rows[9]![2] = "sold out"), (rows[10]![2] = "closed"))) },
  errors: { rows: changed((rows) => (rows[4]![1] = { error: "#DIV/0!" })) },
  blanks: { rows: changed((rows) => (rows[4]![1] = null)) },
  hiddenRows: { more: { hiddenRows: [3, 4, 5, 30] } },
  hiddenColumn: { more: { hiddenColumns: [2] } },
  hiddenSheet: { more: { hidden: true } },
  shifted: { formula: "=SLOPE(D!B2:B20,D!C3:C21)", further: 1 },
  unequal: { formula: "=SLOPE(D!B2:B21,D!C2:C20)" },
  heading: { formula: "=SLOPE(D!B1:B21,D!C1:C21)" },
  wholeColumns: { formula: "=SLOPE(D!B:B,D!C:C)" },
  overFormula: {
    rows: changed((rows) =>
      rows.forEach((row, day) => {
        if (day !== 6) row[2] = { value: row[2] as number, formula: `=D${day + 2}/8` };
      }),
    ),
  },
  repeated: { rows: changed((rows) => rows.splice(12, 5, ...rows.slice(2, 7))) },
  older: { formula: "=SLOPE(D!B2:B21,D!C2:C21)+1-1", rows: changed((rows) => (rows[3]![1] = 90)) },
  typed: {
    report: [
      ["Driver", "Coefficient", "Std error"],
      ["Price", 1.25, 0.5],
    ],
  },
  typedAmong: {
    report: [
      ["Driver", "Coefficient", "Std error"],
      ["Price", { value: slopeIn(sound()), formula: slope }, 0.5],
    ],
  },
} as const satisfies Record<string, Case>;

type Name = keyof typeof cases;

/** The saved result of each formula is what its cells give; that of `older` is from before they changed. */
const valueOf = (name: string, rows: Rows = sound(), further = 0): number => {
  const value = slopeIn(name === "older" ? sound() : rows, further);
  return Number.isNaN(value) ? 1.25 : value;
};

/** Every case is a sheet of data and a sheet that reports, in one workbook. */
const book: BookData = {
  ...bookOf(
    ...Object.entries<Case>(cases).flatMap(([name, { rows, more, formula, further, report }]) => {
      const sheet = `${name} data`;
      const named = (text: string): string => text.replaceAll("D!", `'${sheet}'!`);
      const cells = report ?? [[{ value: valueOf(name, rows, further), formula: formula ?? slope }]];
      const shown = cells.map((row) =>
        row.map((cell) =>
          typeof cell === "object" && cell !== null && "formula" in cell
            ? { ...cell, formula: named(cell.formula) }
            : cell,
        ),
      );
      return [sheetOf(sheet, [headings, ...(rows ?? sound())], more), sheetOf(`${name} fit`, shown)];
    }),
  ),
};

describe("how the sheets are made", () => {
  let found: Record<Name, BookClaims>;
  beforeAll(async () => {
    const read = await readOnDesk(book);
    found = Object.fromEntries(
      Object.keys(cases).map((name) => [name, claimsIn(read, { sheet: `${name} fit` })]),
    ) as Record<Name, BookClaims>;
  });

  const craft = (name: Name): readonly Finding[] => found[name].craft;
  const only = (name: Name): Finding => {
    expect(craft(name).map(({ code }) => code)).toHaveLength(1);
    return craft(name)[0]!;
  };

  it("says nothing of sheets that are sound, nor of whole columns with their headings", () => {
    expect(craft("sound")).toEqual([]);
    expect(craft("wholeColumns")).toEqual([]);
    expect(found.sound.claims).toHaveLength(1);
  });

  it.each<[Name, string, string[], string]>([
    [
      "text",
      "text-in-range",
      ["'text data'!C6", "'text data'!C11:C12"],
      '3 cells of "Price" hold text where a number is meant, such as "n/a": their rows cannot take part.',
    ],
    [
      "errors",
      "errors-in-range",
      ["'errors data'!B6"],
      '1 cell of "Cups" shows an error, such as #DIV/0!: its row cannot take part.',
    ],
    [
      "blanks",
      "blanks-in-range",
      ["'blanks data'!B6"],
      '1 cell of "Cups" inside the range is empty: its row cannot take part.',
    ],
    [
      "hiddenRows",
      "hidden-rows",
      ["'hiddenRows data'!B4:B6"],
      "3 rows of the data are hidden or filtered away, but count in the regression like the others.",
    ],
    ["hiddenColumn", "hidden-line", ["'hiddenColumn data'!C2"], '"Price" stands in a column that is hidden.'],
    [
      "hiddenSheet",
      "hidden-sheet",
      ["'hiddenSheet data'!C2"],
      'The data stand on sheet "hiddenSheet data", which is hidden.',
    ],
    [
      "shifted",
      "shifted",
      ["'shifted data'!B2:B20", "'shifted data'!C3:C21"],
      'Each "Cups" is set against the "Price" 1 place further on: the ranges are equally long but begin in different places.',
    ],
    [
      "unequal",
      "unequal",
      ["'unequal fit'!A1"],
      "The ranges are not equally long: 20 cells in 'unequal data'!B2:B21, 19 in 'unequal data'!C2:C20.",
    ],
    [
      "overFormula",
      "over-formula",
      ["'overFormula data'!C8"],
      '1 number is typed into "Price", where the other 19 are formulas.',
    ],
    [
      "repeated",
      "repeated",
      ["'repeated data'!B4:B8", "'repeated data'!B14:B18"],
      "5 rows of data in 'repeated data'!B4:B8 stand again, number for number, in 'repeated data'!B14:B18.",
    ],
    [
      "typedAmong",
      "typed-among-formulas",
      ["'typedAmong fit'!C2"],
      "1 number of the report is typed in, where the other is a formula.",
    ],
  ])("tells of %s", (name, code, cells, what) => {
    expect(only(name)).toMatchObject({ code, cells, what });
    expect(only(name).toDo).toMatch(/\.$/);
  });

  it("tells of a formula whose result is older than its cells, and of what they give now", () => {
    const finding = only("older");
    expect(finding).toMatchObject({ code: "older-results", cells: ["'older fit'!A1"], rank: "changes a number" });
    expect(Number(finding.reported)).toBeCloseTo(slopeIn(sound()), 8);
    expect(Number(finding.recomputed)).toBeCloseTo(slopeIn(cases.older.rows), 8);
  });

  it("tells of headings inside the range, one by one", () => {
    expect(craft("heading").map(({ code, cells }) => [code, ...cells])).toEqual([
      ["heading-inside", "'heading data'!B1"],
      ["heading-inside", "'heading data'!C1"],
    ]);
  });

  it("tells of results that no formula supports", () => {
    expect(craft("typed").map(({ code }) => code)).toContain("typed-results");
  });

  it("tells of a workbook that calculates by hand, where formulas report", async () => {
    const read = await readOnDesk({
      ...bookOf(sheetOf("D", [headings, ...sound()]), sheetOf("Fit", [[{ value: slopeIn(sound()), formula: slope }]])),
      manualCalculation: true,
    });
    expect(claimsIn(read).craft).toMatchObject([{ rank: "worth knowing", code: "by-hand", cells: ["Fit!A1"] }]);
  });

  it("ranks what changes a number before what is worth knowing", async () => {
    const rows = changed((all) => ((all[3]![1] = null), (all[4]![1] = "closed")));
    const read = await readOnDesk(
      bookOf(sheetOf("D", [headings, ...rows]), sheetOf("Fit", [[{ value: slopeIn(sound()), formula: slope }]])),
    );
    expect(claimsIn(read).craft.map(({ rank }) => rank)).toEqual(["changes a number", "worth knowing"]);
  });
});
