import { beforeAll, describe, expect, it } from "vitest";
import type { BookClaims } from "../../../../src/core/review/claimsOf.ts";
import type { Claim } from "../../../../src/core/review/claim.ts";
import type { ClaimReview } from "../../../../src/core/review/claimReview.ts";
import { reviewClaim } from "../../../../src/core/review/reviewClaim.ts";
import type { BookCell, SheetData } from "../../../../src/desk/book/bookData.ts";
import mtcars from "../../../reference/mtcars.json" with { type: "json" };
import { bookOf, sheetOf } from "../../../support/deskBook.ts";
import { claimsIn, readOnDesk } from "../../../support/readBook.ts";

const cars = sheetOf("Cars", [
  ["Miles per gallon", "Weight", "Power", "Quarter mile"],
  ...mtcars.y.map((miles, row) => [miles, ...mtcars.X.map((column) => column[row]!)]),
]);

const withFormat = (value: number, numberFormat: string): BookCell => ({ value, style: { numberFormat } });
const inBrackets = (value: number): BookCell => withFormat(-value, "0.000;(0.000)");
const title = ["What drives miles per gallon?"];

/** Figures of R 4.2.2: lm(mpg ~ wt + hp + qsec, mtcars) and lm(mpg ~ wt + hp, mtcars), coefficient and standard error. */
const three = [
  ["Weight", "-4.359", "(0.753)"],
  ["Power", "-0.0178", "(0.0150)"],
  ["Quarter mile", "0.511", "(0.439)"],
  ["Constant", "27.611", "(8.420)"],
];
const two = [
  ["Weight", "-3.878", "(0.633)"],
  ["Power", "-0.0318", "(0.0090)"],
  ["Constant", "37.227", "(1.599)"],
];
const wholes = [
  ["R squared", withFormat(0.8347678, "0.000")],
  ["Observations", 32],
];
const note = ["Standard errors in brackets"];

/** Intervals as R's confint gives them for the first, at 95, 90 and 99 %. */
const at95 = ["-5.901, -2.817", "-0.0485, 0.0129", "-0.389, 1.411", "10.363, 44.858"];
const at90 = ["-5.639; -3.078", "-0.0433; 0.0077", "-0.236; 1.258", "13.287; 41.934"];
const at99 = ["-6.439, -2.279", "-0.0592, 0.0236", "-0.703, 1.725", "4.344, 50.877"];
/** With HC3 errors by its formula in R, against the normal law. */
const robust = ["-6.221 to -2.497", "-0.0449 to 0.0093", "-0.339 to 1.361", "12.818 to 42.403"];

const named = three.map(([name = "", coefficient = ""]) => [name, coefficient] as const);
const under = (ends: readonly string[], [open, close]: readonly [string, string] = ["[", "]"]): BookCell[][] =>
  named.flatMap(([name, coefficient], row) => [
    [name, coefficient],
    ["", `${open}${ends[row]!}${close}`],
  ]);
const beside = (ends: readonly string[]): BookCell[][] =>
  named.map(([name, coefficient], row) => [name, coefficient, ends[row]!]);

const flat = (rows: readonly (readonly string[])[]): BookCell[] => rows.flatMap(([, ...figures]) => figures);
const heads = (rows: readonly (readonly string[])[]): BookCell[] => rows.flatMap(([name = ""]) => [name, ""]);

const sheets: readonly SheetData[] = [
  sheetOf("Beside", [title, ...three, ...wholes, note]),
  sheetOf("By format", [
    title,
    ["", "Coefficient (standard error)"],
    ["Weight", -4.359, inBrackets(0.753)],
    ["Power", withFormat(-0.0178, "0.0000"), inBrackets(0.015)],
    ["Quarter mile", 0.511, inBrackets(0.439)],
    ["Constant", 27.611, inBrackets(8.42)],
  ]),
  sheetOf("Lying beside", [
    title,
    ["", ...heads(three), "R squared", "Observations"],
    ["Model 1", ...flat(three), 0.835, 32],
    note,
  ]),
  sheetOf("Lying under", [
    title,
    ["", "Weight", "Power", "Quarter mile", "Constant", "n"],
    ["Model 1", ...three.map(([, b]) => b!), 32],
    ["", ...three.map(([, , error]) => error!)],
    ["Model 2", two[0]![1]!, two[1]![1]!, "", two[2]![1]!, 32],
    ["", two[0]![2]!, two[1]![2]!, "", two[2]![2]!],
    note,
  ]),
  sheetOf("Ratios beside", [
    title,
    ["Weight", "-4.359", "(5.79)"],
    ["Power", "-0.0178", "(1.19)"],
    ["Quarter mile", "0.511", "(1.16)"],
    ["Constant", "27.611", "(3.28)"],
    ["t ratios in brackets"],
  ]),
  sheetOf("Headed", [title, ["Driver", "Coefficient", "Std. error"], ...three, ...wholes]),
  sheetOf("Headed intervals", [title, ["Driver", "Coefficient", "95 % CI"], ...beside(at95)]),
  sheetOf("Two columns", [
    title,
    ["Driver", "Coefficient", "[95% conf. interval]"],
    ["Weight", "-4.359", -5.901, -2.817],
    ["Power", "-0.0178", withFormat(-0.0485, "0.0000"), withFormat(0.0129, "0.0000")],
    ["Quarter mile", 0.511, -0.389, 1.411],
    ["Constant", 27.611, 10.363, 44.858],
  ]),
  sheetOf("Under", [title, ...under(at95), ["95 % confidence intervals in square brackets"]]),
  sheetOf("Under 90", [title, ...under(at90, ["(", ")"]), ...wholes, ["90 % intervals in brackets"]]),
  sheetOf("Under 99", [title, ...under(at99), ...wholes]),
  sheetOf("Robust", [title, ["Driver", "Coefficient", "95 % confidence interval"], ...beside(robust)]),
  sheetOf("Commas", [
    title,
    ...under(
      at90.map((ends) => ends.replaceAll(".", ",")),
      ["(", ")"],
    ),
    ["90 % intervals in brackets"],
  ]),
  sheetOf("Two lines", [
    title,
    ...three.flatMap(([name = "", coefficient = "", error = ""], row): BookCell[][] => [
      [name, coefficient],
      ["", error],
      ["", `[${at95[row]!}]`],
    ]),
    ["Standard errors in round brackets, 95 % confidence intervals in square ones"],
  ]),
];

/** What has brackets beside numbers and is no report. */
const accounts: readonly SheetData[] = [
  sheetOf("Accounts", [
    ["", "2024", "2023"],
    ["Sales", 1250, inBrackets(40)],
    ["Grants", 120, "(30)"],
    ["Wages", 310, inBrackets(230)],
    ["Count", 12],
    ["Low season, 90 % of the year"],
  ]),
  sheetOf("Across", [
    ["", "Sales", "Grants", "Wages", "Cases"],
    ["2024", 1250, 120, 80, 12],
    ["", "(40)", "(30)", inBrackets(12)],
  ]),
  sheetOf("Ranges", [
    ["Test", "Result", "Usual"],
    ["Iron", 5.1, "[3.9, 5.5]"],
    ["Zinc", 1.2, "[0.7, 1.4]"],
    ["Lead", 0.1, "[0.0, 0.5]"],
  ]),
];

const reviewOf = (claim: Claim): ClaimReview => reviewClaim(claim, () => undefined);

describe("reports with brackets beside their coefficients, and with intervals", () => {
  let found: BookClaims;
  beforeAll(async () => {
    found = claimsIn(await readOnDesk(bookOf(cars, ...sheets, ...accounts)));
  });
  const on = (sheet: string): readonly Claim[] =>
    found.claims.filter(({ place }) => place.startsWith(`${sheet}!`) || place.startsWith(`'${sheet}'!`));

  it.each([
    ["Beside", 10, "classical"],
    ["By format", 8, "classical"],
    ["Lying beside", 10, "classical"],
    ["Ratios beside", 8, "classical"],
    ["Headed", 10, "classical"],
    ["Headed intervals", 12, "classical"],
    ["Two columns", 12, "classical"],
    ["Under", 12, "classical"],
    ["Under 90", 14, "classical, bounds at 90 %"],
    ["Under 99", 14, "classical, bounds at 99 %"],
    ["Robust", 12, "White (HC3), compared with the normal law"],
    ["Commas", 12, "classical, bounds at 90 %"],
    ["Two lines", 16, "classical"],
  ] as const)("are read whole and come out (%s)", (sheet, count, kind) => {
    const [claim, ...others] = on(sheet);
    expect(others).toEqual([]);
    expect(claim!.drivers.map(({ name }) => name)).toEqual(["Weight", "Power", "Quarter mile"]);
    const { compared, errors } = reviewOf(claim!);
    expect(compared.map(({ reported }) => reported.quantity.kind)).toHaveLength(count);
    expect(compared.filter(({ agrees }) => !agrees)).toEqual([]);
    expect(errors!.kinds).toContain(kind);
  });

  it("are each a model of its own where several stand in rows", () => {
    const claims = on("Lying under");
    expect(claims.map(({ drivers }) => drivers.length)).toEqual([3, 2]);
    expect(claims.map(({ reported }) => reported.length)).toEqual([9, 7]);
    for (const claim of claims) expect(reviewOf(claim).compared.filter(({ agrees }) => !agrees)).toEqual([]);
  });

  it("are asked for the level that they say, and for three where they say none", () => {
    expect(on("Under 90")[0]!.level).toBe(0.1);
    expect(on("Headed intervals")[0]!.level).toBe(0.05);
    expect(on("Under 99")[0]!.level).toBeUndefined();
    expect(on("Under 99")[0]!.assumed!.join(" ")).toContain("95 %, 90 % and 99 % were tried");
    const wrong: Claim = { ...on("Under 90")[0]!, level: 0.05 };
    const { compared, findings, verdict } = reviewOf(wrong);
    expect(verdict).toContain("The coefficients come out of the cells. The bounds come out of the cells at 90 %");
    expect(compared.some(({ agrees }) => !agrees)).toBe(true);
    expect(findings.find(({ code }) => code === "bounds-of-another-level")!.what).toBe(
      "The bounds come out of the cells at 90 %, not at 95 % as the report says.",
    );
    expect(reviewOf({ ...wrong, level: 0.2 }).findings.map(({ code }) => code)).toContain("bounds-of-another-level");
  });

  it("draw their conclusions at the level of the question, whatever that of the interval", () => {
    // R: p of the quarter mile is 0.25, of the weight 3e-6; no interval of theirs says otherwise.
    const { consequences } = reviewOf(on("Under 99")[0]!);
    expect(consequences.map(({ asReported }) => asReported)).toEqual([
      "shown to go with less (interval -6.439 to -2.279)",
      "no effect shown (interval -0.0592 to 0.0236)",
      "no effect shown (interval -0.703 to 1.725)",
    ]);
  });

  it("are not taken for what accounts and lists have in brackets", () => {
    for (const { name } of accounts) {
      expect(on(name)).toEqual([]);
      expect(found.unread.filter(({ cell }) => cell.startsWith(name))).toEqual([]);
    }
  });
});
