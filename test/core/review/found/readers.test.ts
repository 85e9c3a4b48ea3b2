import { beforeAll, describe, expect, it } from "vitest";
import type { BookClaims } from "../../../../src/core/review/claimsOf.ts";
import type { BookFormula } from "../../../../src/core/review/book.ts";
import type { Claim, Quantity } from "../../../../src/core/review/claim.ts";
import { readersAmong } from "../../../../src/core/review/formula/readers.ts";
import { reviewClaim } from "../../../../src/core/review/reviewClaim.ts";
import type { BookCell, BookData } from "../../../../src/desk/book/bookData.ts";
import mtcars from "../../../reference/mtcars.json" with { type: "json" };
import { bookOf, sheetOf } from "../../../support/deskBook.ts";
import { claimsIn, readOnDesk } from "../../../support/readBook.ts";

const cars = sheetOf("Cars", [
  ["Miles per gallon", "Weight", "Power"],
  ...mtcars.y.map((miles, row) => [miles, mtcars.X[0]![row]!, mtcars.X[1]![row]!]),
]);

/** Figures of R 4.2.2, lm(mpg ~ wt + hp, mtcars), as LINEST lays them out: the last driver first. */
const linest = [
  [-0.0317729469822, -3.8778307424047, 37.2272701164472],
  [0.00902970967586, 0.6327334943774, 1.59878753799939],
];
const [power, weight] = linest[0]!;
const block = "LINEST(Cars!A2:A33,Cars!B2:C33,TRUE,TRUE)";

/** Spilled, then entered as an array, each with the names of its columns above. */
const calc = sheetOf("Calc", [
  ["Power", "Weight", "Constant"],
  ...linest.map((row, at): BookCell[] =>
    row.map((value, column) => (at + column === 0 ? { value, formula: `=${block}`, spill: "A2:C3" } : value)),
  ),
  [],
  ["Power", "Weight", "Constant"],
  ...linest.map((row): BookCell[] => row.map((value) => ({ value, formula: `=${block}` }))),
]);

/** Formulas that read those cells: what each shows, and what of the regression that is. */
const readers: readonly (readonly [formula: string, value: number, says: string])[] = [
  ["=Calc!B2", weight!, "coefficient 0"],
  ["=+Calc!$C$2", linest[0]![2]!, "coefficient c"],
  ["=INDEX(Calc!A2#,1,2)", weight!, "coefficient 0"],
  ["=INDEX(Calc!$A$2#,2,1)", linest[1]![0]!, "standard-error 1"],
  ["=_xlfn.ANCHORARRAY(Calc!A2)", power!, "coefficient 1"],
  ["=ROUND(Calc!B6,2)", -3.88, "coefficient 0"],
  ["=Calc!B6/Calc!B7", weight! / linest[1]![1]!, "ratio 0"],
  ["=ABS(Calc!A3)", linest[1]![0]!, "standard-error 1"],
  ["=INDEX(Calc!$A$2:$C$3,1,2)", weight!, "coefficient 0"],
  ['=INDEX(Calc!$A$2:$C$3,2,MATCH("power",Calc!$A$1:$C$1,0))', linest[1]![0]!, "standard-error 1"],
  ['=INDEX(Calc!A2#,1,XMATCH("Weight",Calc!A1:C1))', weight!, "coefficient 0"],
  [`=INDEX(${block},1,COLUMNS(Cars!B2:C33)+1-MATCH("Power",Cars!B1:C1,0))`, power!, "coefficient 1"],
  ["=A1", weight!, "coefficient 0"],
  ["=A13", weight!, "coefficient 0"],
  ["=Slope", weight!, "coefficient 0"],
  ["=Calc!C2+Calc!B2*3+Calc!A2*110", 22.098753721, "prediction 3 110"],
  ["=Calc!B2-T.INV.2T(0.05,29)*Calc!B3", -5.1719160406755, "low 0"],
  // No reports, but uses of them.
  ["=Calc!B2*10", 10 * weight!, ""],
  ["=-Calc!B2", -weight!, ""],
  ["=IF(Calc!B2>0,1,0)", 0, ""],
  ["=A21+0", 1, ""],
  ["=A20+0", 1, ""],
];

const sheets = [
  cars,
  calc,
  sheetOf(
    "Read",
    readers.map(([formula, value]) => [{ value, formula }]),
  ),
  sheetOf("Wrong", [
    ["Driver", "Coefficient", "Standard error"],
    ["Weight", { value: power!, formula: "=Calc!A2" }, { value: linest[1]![0]!, formula: "=Calc!A3" }],
    ["Power", { value: weight!, formula: "=Calc!B2" }, { value: linest[1]![1]!, formula: "=Calc!B3" }],
  ]),
  sheetOf("Chosen", [
    [
      {
        value: 1,
        formula:
          '=SLOPE(INDEX(Cars!A2:C33,0,MATCH("Miles per gallon",Cars!A1:C1,0)),INDEX(Cars!A2:C33,0,MATCH(B1,Cars!A1:C1,0)))',
      },
      "power",
    ],
    [{ value: 1, formula: "=SLOPE(INDEX(Cars!A2:C33,,1),XLOOKUP(B1,Cars!A1:C1,Cars!A2:C33))" }],
    [{ value: 1, formula: '=SLOPE(INDEX(Cars!A2:C33,,1),INDEX(Cars!A2:C33,,MATCH("Torque",Cars!A1:C1,0)))' }],
    [{ value: 1, formula: '=SLOPE(INDEX(Cars!A2:C33,,1),INDEX(Cars!A2:C33,,MATCH("Power",Cars!A1:C1)))' }],
    [{ value: 1, formula: "=SLOPE(INDEX(Cars!A2:C33,,1),INDEX(Cars!A2:C33,0,C5))" }, null, 3],
  ]),
];

const book: BookData = { ...bookOf(...sheets), names: [{ name: "Slope", refersTo: "Calc!$B$2" }] };

const inWords = (quantity: Quantity): string => {
  if (quantity.kind === "prediction") return `prediction ${quantity.at.join(" ")}`;
  return "term" in quantity ? `${quantity.kind} ${quantity.term ?? "c"}` : quantity.kind;
};

describe("formulas that read the results of a regression in other cells", () => {
  let found: BookClaims;
  let whole: Claim;
  beforeAll(async () => {
    found = claimsIn(await readOnDesk(book));
    whole = found.claims.find(({ drivers }) => drivers.length === 2)!;
  });

  it.each(readers.map(([formula, , says], row) => [formula, says, `Read!A${row + 1}`] as const))(
    "%s",
    (_, says, cell) => {
      const here = whole.reported.filter((one) => one.cell === cell);
      expect(here.map(({ quantity }) => inWords(quantity)).join()).toBe(says);
    },
  );

  it("go into the one claim, whose place is where it is made, and come out", () => {
    expect(whole.place).toBe("Calc!A2:C7");
    const { compared } = reviewClaim(whole, () => undefined);
    expect(compared.filter(({ agrees }) => !agrees)).toEqual([]);
    expect(found.unread.filter(({ cell }) => cell.startsWith("Read!"))).toEqual([]);
  });

  it("are told of where they show one driver's figures under the name of another", () => {
    const cells = found.craft.filter(({ code }) => code === "named-otherwise").flatMap((finding) => finding.cells);
    expect(new Set(cells)).toEqual(new Set(["Wrong!B2", "Wrong!B3", "Wrong!C2", "Wrong!C3"]));
  });

  it.each(["Chosen!A1", "Chosen!A2", "Chosen!A5"])(
    "may choose columns by their headings or by a number (%s)",
    (cell) => {
      const claim = found.claims.find(({ reported }) => reported.some((one) => one.cell === cell))!;
      expect([claim.outcome.name, ...claim.drivers.map(({ name }) => name)]).toEqual(["Miles per gallon", "Power"]);
    },
  );

  it("are not guessed at where the heading is not there, or where its place hangs on the order of the cells", () => {
    const why = found.unread.filter(({ cell }) => cell.startsWith("Chosen!"));
    expect(why).toEqual([{ cell: "Chosen!A3:A4", why: "INDEX works out at calculation which cells are used." }]);
  });
});

describe("looking through thousands of formulas", () => {
  it("stops on the way, and finds the last that reads a result and the copy before it", () => {
    const formulaAt = (row: number, formula: string): BookFormula => ({ row, column: 5, formula, rows: 1, columns: 1 });
    const others = Array.from({ length: 3_500 }, (_, row) => formulaAt(row, `=B${row + 1}*2`));
    others[100] = formulaAt(100, "=F3500+0");
    others[3_499] = formulaAt(3_499, "=Calc!A2");
    const linestAt = { row: 1, column: 0, formula: `=${block}`, rows: 2, columns: 3 };
    const sheets = [
      { sheet: { sheet: "Calc", formulas: [linestAt] }, others: [] },
      { sheet: { sheet: "Work", formulas: [] }, others },
    ];
    const steps = readersAmong(sheets, []);
    let stops = 0;
    let step = steps.next();
    for (; step.done !== true; step = steps.next()) stops += 1;
    expect(step.value.map((found) => found.map(({ row }) => row))).toEqual([[], [100, 3_499]]);
    expect(stops).toBeGreaterThanOrEqual(6);
  });
});
