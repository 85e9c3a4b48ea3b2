import { afterAll, beforeAll, describe, expect, it } from "vitest";
import type { Claim, ClaimedLine, Quantity } from "../../../../src/core/review/claim.ts";
import { type BookClaims, claimsOf } from "../../../../src/core/review/claimsOf.ts";
import type { BookCell, BookData, SheetData } from "../../../../src/desk/book/bookData.ts";
import { bookOf, sheetOf } from "../../../support/deskBook.ts";
import { type DeskHost, errand, openDeskHost } from "../../../support/deskHost.ts";

/** Cups sold, price and rain by day, with a title, units and a total; a table; and the same lying across a sheet. */
const days = Array.from({ length: 12 }, (_, day) => [
  day + 1,
  31 + ((day * 7) % 12),
  2.25 + ((day * 5) % 9) / 8,
  (day * 3) % 7,
]);

const data = sheetOf("Data", [
  ["Cups sold in May"],
  [],
  ["Day", "Cups", "Price", "Rain"],
  ["", "pcs", "EUR", "mm"],
  ...days,
  ["Total", { value: 417, formula: "=SUM(B5:B16)" }],
]);
const table = sheetOf("It's a table", [["Day", "Cups", "Price", "Rain [mm]"], ...days], {
  tables: [{ name: "Sales", address: "A1:D13" }],
});
const across = sheetOf(
  "Across",
  ["Cups", "Price", "Rain"].map((name, index) => [name, ...days.map((day) => day[index + 1]!)]),
);

/** Each formula stands at the left of a row of its own; its saved values are whatever: nothing is refitted here. */
interface Form {
  readonly formula: string;
  readonly values?: readonly (readonly number[])[];
  readonly says: string;
}

const plain = "Cups 5-16 on Price 5-16";
const positions = "Cups 5-16 on position of Position in the range 5-16";
const both = "Cups 5-16 on Price 5-16, Rain 5-16";

const forms: readonly Form[] = [
  { formula: "=SLOPE(Data!B5:B16,Data!C5:C16)", says: `${plain}: coefficient 0` },
  { formula: "=INTERCEPT(Data!$B$5:$B$16,Data!$C$5:$C$16)", says: `${plain}: coefficient c` },
  { formula: "=RSQ(Data!B5:B16,Data!C5:C16)", says: `${plain}: r-squared` },
  { formula: "=STEYX(Data!B5:B16,Data!C5:C16)", says: `${plain}: sigma` },
  { formula: "=CORREL(Data!C5:C16,Data!B5:B16)", says: `${plain}: correlation` },
  { formula: "=FORECAST(3,Data!B5:B16,Data!C5:C16)", says: `${plain}: prediction 3` },
  { formula: "=FORECAST.LINEAR(Data!C6,Data!B5:B16,Data!C5:C16)", says: `${plain}: prediction 2.875` },
  { formula: "=SLOPE(Data!B:B,Data!C:C)", says: `${plain}: coefficient 0` },
  { formula: "=SLOPE(Data!B3:B16,Data!C3:C16)", says: `${plain}: coefficient 0` },
  { formula: "=SLOPE(Cups,Price)", says: `${plain}: coefficient 0` },
  { formula: "=SLOPE(Sales[Cups],Sales[[#Data],[Price]])", says: "Cups 2-13 on Price 2-13: coefficient 0" },
  { formula: "=SLOPE('It''s a table'!B2:B13,Sales[Rain '[mm']])", says: "Cups 2-13 on Rain [mm] 2-13: coefficient 0" },
  { formula: "=SLOPE(Across!B1:M1,Across!B2:M2)", says: "Cups 2-13 on Price 2-13: coefficient 0" },
  {
    formula: "=LINEST(Data!B5:B16,Data!C5:D16,TRUE,TRUE)",
    values: [
      [0.5, -7, 50],
      [0.25, 1.5, 4],
      [0.75, 2, NaN],
      [13.5, 9, NaN],
      [120, 40, NaN],
    ],
    says: `${both}: coefficient 1, coefficient 0, coefficient c, standard-error 1, standard-error 0, standard-error c, r-squared, sigma, f, degrees-of-freedom, explained-sum-of-squares, residual-sum-of-squares`,
  },
  {
    formula: "=LINEST(Data!B5:B16,Data!C5:C16,FALSE)",
    values: [[3, 0]],
    says: `${plain} without constant: coefficient 0`,
  },
  {
    formula: "=LINEST(Across!B1:M1,Across!B2:M3)",
    values: [[1, 2, 3]],
    says: "Cups 2-13 on Price 2-13, Rain 2-13: coefficient 1, coefficient 0, coefficient c",
  },
  { formula: "=INDEX(LINEST(Data!B5:B16,Data!C5:D16,TRUE,TRUE),2,1)", says: `${both}: standard-error 1` },
  { formula: "=INDEX(LINEST(Data!B5:B16,Data!C5:D16),3)", says: `${both}: coefficient c` },
  { formula: "=INDEX(LINEST(Data!B5:B16,Data!C5:D16,,TRUE),3,2)", says: `${both}: sigma` },
  {
    formula: "=INDEX(LINEST(Data!B5:B16,Data!C5:D16),1,{2,1})",
    values: [[4, 5]],
    says: `${both}: coefficient 0, coefficient 1`,
  },
  {
    formula: "=TRANSPOSE(LINEST(Data!B5:B16,Data!C5:D16))",
    values: [[1], [2], [3]],
    says: `${both}: coefficient 1, coefficient 0, coefficient c`,
  },
  {
    formula: "=LET(y,Data!B5:B16,x,Data!C5:D16,all,LINEST(y,x,TRUE,TRUE),INDEX(all,1,2)/INDEX(all,2,2))",
    says: `${both}: ratio 0`,
  },
  { formula: "=INDEX(Fit,1,2)", says: `${both}: coefficient 0` },
  { formula: "=IFERROR(ROUND(SLOPE(Data!B5:B16,Data!C5:C16),2),0)", says: `${plain}: coefficient 0` },
  { formula: '=IF(COUNT(Data!B5:B16)>3,SLOPE(Data!B5:B16,Data!C5:C16),"")', says: `${plain}: coefficient 0` },
  {
    formula: "=INTERCEPT(Data!B5:B16,Data!C5:C16)+SLOPE(Data!B5:B16,Data!C5:C16)*3.5",
    says: `${plain}: prediction 3.5`,
  },
  { formula: "=-12*SLOPE(Data!B5:B16,Data!C5:C16)", says: `${plain}: coefficient 0` },
  { formula: "=CORREL(Data!B5:B16,Data!C5:C16)^2", says: `${plain}: r-squared` },
  {
    formula: "=TREND(Data!B5:B16,Data!C5:D16,{3,2})",
    says: `not read: The rows that are predicted are worked out at calculation.`,
  },
  {
    formula: "=TREND(Data!B5:B16,Data!C5:D16,Data!C5:D6)",
    values: [[40], [41]],
    says: `${both}: prediction 2.25 0, prediction 2.875 3`,
  },
  {
    formula: "=LINEST(Data!B5:B16,LN(Data!C5:C16))",
    values: [[1, 2]],
    says: "Cups 5-16 on logarithm of Price 5-16: coefficient 0, coefficient c",
  },
  {
    formula: "=LINEST(LN(Data!B5:B16),Data!C5:C16^2)",
    values: [[1, 2]],
    says: "logarithm of Cups 5-16 on square of Price 5-16: coefficient 0, coefficient c",
  },
  {
    formula: "=LINEST(Data!B5:B16,Data!C5:C16^{1,2,3})",
    values: [[1, 2, 3, 4]],
    says: "Cups 5-16 on Price 5-16, square of Price 5-16, cube of Price 5-16: coefficient 2, coefficient 1, coefficient 0, coefficient c",
  },
  {
    formula: "=LINEST(Data!B5:B16,CHOOSE({1,2},Data!D5:D16,Data!C5:C16))",
    values: [[1, 2, 3]],
    says: "Cups 5-16 on Rain 5-16, Price 5-16: coefficient 1, coefficient 0, coefficient c",
  },
  {
    formula: "=LINEST(Data!B5:B16,HSTACK(Data!D5:D16,Data!C5:C16))",
    values: [[1, 2, 3]],
    says: "Cups 5-16 on Rain 5-16, Price 5-16: coefficient 1, coefficient 0, coefficient c",
  },
  {
    formula: '=LINEST(Data!B5:B16,CHOOSECOLS(Data!A5:D16,4,MATCH("Price",Data!A3:D3,0)))',
    values: [[1, 2, 3]],
    says: "Cups 5-16 on Rain 5-16, Price 5-16: coefficient 1, coefficient 0, coefficient c",
  },
  {
    formula: "=SLOPE(CHOOSEROWS(Across!B1:M3,1),CHOOSEROWS(Across!B1:M3,-2))",
    says: "Cups 2-13 on Price 2-13: coefficient 0",
  },
  {
    formula: "=SLOPE(Data!B5:B16,CHOOSECOLS(Data!A5:D16,5))",
    says: "not read: There are no cells in use in CHOOSECOLS of Data!A5:D16.",
  },
  {
    formula: '=SLOPE(Data!B5:B16,CHOOSECOLS(Data!A5:D16,MATCH("Wind",Data!A3:D3,0)))',
    says: "not read: CHOOSECOLS works out at calculation which cells are used.",
  },
  { formula: "=SLOPE(INDEX(Data!A5:D16,0,2),INDEX(Data!A5:D16,,3))", says: `${plain}: coefficient 0` },
  {
    formula: "=LOGEST(Data!B5:B16,Data!C5:C16)",
    values: [[2, 3]],
    says: "logarithm of Cups 5-16 on Price 5-16: coefficient 0, coefficient c",
  },
  {
    formula:
      "=T.DIST.2T(ABS(INDEX(LINEST(Data!B5:B16,Data!C5:D16,1,1),1,1)/INDEX(LINEST(Data!B5:B16,Data!C5:D16,1,1),2,1)),9)",
    says: `${both}: p-value 1`,
  },
  {
    formula: "=SLOPE(Data!B5:B16,Data!C5:C16)-T.INV.2T(0.05,10)*INDEX(LINEST(Data!B5:B16,Data!C5:C16,,1),2,1)",
    says: `${plain}: low 0`,
  },
  {
    formula: "=SLOPE(Data!B5:B16,OFFSET(Data!C5,0,0,12,1))",
    says: "not read: OFFSET works out at calculation which cells are used.",
  },
  {
    formula: '=SLOPE(INDIRECT("Data!B5:B16"),Data!C5:C16)',
    says: "not read: INDIRECT works out at calculation which cells are used.",
  },
  {
    formula: "=SLOPE([Other.xlsx]Sheet1!B5:B16,Data!C5:C16)",
    says: "not read: The data lie in another workbook ([Other.xlsx]Sheet1).",
  },
  {
    formula: "=SLOPE(Data!B5:B16,Data!C5:C15)",
    says: "not read: The ranges are not equally long: 12 cells in Data!B5:B16, 11 in Data!C5:C15.",
  },
  {
    formula: "=LINEST(Data!B5:B16)",
    values: [[1, 2]],
    says: `${positions}: coefficient 0, coefficient c`,
  },
  {
    formula: "=LINEST(Data!B5:B16,,FALSE,FALSE)",
    values: [[1, 0]],
    says: `${positions} without constant: coefficient 0`,
  },
  { formula: "=INDEX(LINEST(Data!B5:B16,,TRUE,TRUE),2,1)", says: `${positions}: standard-error 0` },
  {
    formula: "=TREND(Data!B5:B16)",
    values: [[40], [41]],
    says: `${positions}: prediction 1, prediction 2`,
  },
  {
    formula: "=TREND(Data!B5:B16,,{13;14.5})",
    values: [[40], [41]],
    says: `${positions}: prediction 13, prediction 14.5`,
  },
  { formula: "=TREND(Data!B5:B16,,Data!A16)", says: `${positions}: prediction 12` },
  {
    formula: "=LOGEST(Data!B5:B16)",
    values: [[1, 2]],
    says: "logarithm of Cups 5-16 on position of Position in the range 5-16: coefficient 0, coefficient c",
  },
  { formula: "=SLOPE(Data!B5:B16,)", says: "not read: SLOPE has too few arguments." },
  {
    formula: "=LINEST(Data!B5:B16,Data!C5:C16*Data!D5:D16)",
    says: "not read: Two ranges are multiplied with each other.",
  },
  { formula: '="y = "&SLOPE(Data!B5:B16,Data!C5:C16)', says: "not read: The result goes into a text." },
  {
    formula: "=SLOPE(Data!B5:B16,Data!C5:C16)*SLOPE(Data!B5:B16,Data!D5:D16)",
    says: "not read: The result goes into arithmetic that a review cannot follow.",
  },
  {
    formula: "=MEDIAN(LINEST(Data!B5:B16,Data!C5:D16))",
    says: "not read: The result goes into MEDIAN, so that what the cell shows cannot be compared.",
  },
];

const rowsEach = 6;
const rows = forms.flatMap(({ formula, values = [[1.25]] }): BookCell[][] => {
  const spill = values.length * values[0]!.length > 1 ? { spill: "" } : {};
  const lines: BookCell[][] = values.map((line) =>
    line.map((value) => (Number.isNaN(value) ? { error: "#N/A" } : value)),
  );
  lines[0]![0] = { value: values[0]![0]!, formula, ...spill };
  return [...lines, ...Array.from({ length: rowsEach - values.length }, (): BookCell[] => [])];
});

/** The range that a formula fills, put in once it is known where it stands. */
function placed(all: readonly (readonly BookCell[])[]): SheetData["rows"] {
  return all.map((line, row) =>
    line.map((cell) => {
      if (typeof cell !== "object" || cell === null || !("spill" in cell)) return cell;
      const { values = [] } = forms[row / rowsEach]!;
      const end = `${"ABCDE"[values[0]!.length - 1]!}${row + values.length}`;
      return { ...cell, spill: `A${row + 1}:${end}` };
    }),
  );
}

const book: BookData = {
  ...bookOf(data, table, across, sheetOf("Fits", placed(rows))),
  names: [
    { name: "Cups", refersTo: "Data!$B$5:$B$16" },
    { name: "Price", refersTo: "Data!$C$5:$C$16" },
    { name: "Fit", refersTo: "LINEST(Data!$B$5:$B$16,Data!$C$5:$D$16,TRUE,TRUE)" },
  ],
};

const inWords = (line: ClaimedLine): string =>
  `${line.form === "as it is" ? "" : `${line.form} of `}${line.name} ${line.from + 1}-${line.from + line.count}`;

function quantityInWords(quantity: Quantity): string {
  if (quantity.kind === "prediction") return `prediction ${quantity.at.join(" ")}`;
  return "term" in quantity ? `${quantity.kind} ${quantity.term ?? "c"}` : quantity.kind;
}

/** What is said of the formula that stands in a row, from whichever claim its cells went into. */
function saidOf({ claims, unread }: BookClaims, form: number): string {
  const here = (address: string): boolean => {
    const row = Number(/(\d+)$/.exec(address)![1]) - 1;
    return address.startsWith("Fits!") && Math.floor(row / rowsEach) === form;
  };
  const parts = claims.flatMap((claim: Claim) => {
    const reported = claim.reported.filter(({ cell }) => here(cell));
    const drivers = claim.drivers.map(inWords).join(", ");
    const constant = claim.constant ? "" : " without constant";
    return reported.length === 0
      ? []
      : [
          `${inWords(claim.outcome)} on ${drivers}${constant}: ${reported.map(({ quantity }) => quantityInWords(quantity)).join(", ")}`,
        ];
  });
  return [...parts, ...unread.filter(({ cell }) => here(cell)).map(({ why }) => `not read: ${why}`)].join("; ");
}

describe("regression formulas of a workbook", () => {
  let at: DeskHost;
  let found: BookClaims;
  beforeAll(async () => {
    at = await openDeskHost(book);
    const read = await at.host.readBook(errand());
    if (!read.ok) throw new Error(read.problem.code);
    const result = claimsOf(read.value, { pointed: null, sheet: null }, () => undefined);
    if (!result.ok) throw new Error(result.problem.code);
    found = result.value;
  });
  afterAll(() => at.desk.close());

  it.each(forms.map(({ formula, says }, index) => [formula, says, index] as const))("%s", (_, says, index) => {
    expect(saidOf(found, index)).toBe(says);
  });

  it("are gathered into one claim where they use the same cells", () => {
    const claim = found.claims.find(({ place }) => place.startsWith("Fits!A1"))!;
    expect(claim.reported.length).toBeGreaterThan(12);
    expect(claim.origin).toMatchObject({ kind: "formula", formula: forms[0]!.formula });
    expect(claim.others.map(({ name }) => name)).toEqual(["Day", "Rain"]);
  });

  it("are led back through what was done to the result", () => {
    const reported = (form: number) =>
      found.claims.flatMap((claim) => claim.reported).find(({ cell }) => cell === `Fits!A${form * rowsEach + 1}`)!;
    const of = (part: string) => reported(forms.findIndex(({ formula }) => formula.includes(part)));
    expect(of("-12*")).toMatchObject({ value: -1.25 / 12 });
    expect(of("ROUND(")).toMatchObject({ value: 1.25, halfUnit: 0.005 });
    expect(of("LOGEST(").value).toBeCloseTo(Math.log(2), 12);
  });
});
