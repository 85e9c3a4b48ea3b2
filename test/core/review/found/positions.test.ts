import { beforeAll, describe, expect, it } from "vitest";
import type { Claim } from "../../../../src/core/review/claim.ts";
import { rangeOfLine, titleOf } from "../../../../src/core/review/reviewWords.ts";
import { reviewClaim } from "../../../../src/core/review/reviewClaim.ts";
import type { BookCell } from "../../../../src/desk/book/bookData.ts";
import mtcars from "../../../reference/mtcars.json" with { type: "json" };
import { bookOf, sheetOf } from "../../../support/deskBook.ts";
import { claimsIn, readOnDesk } from "../../../support/readBook.ts";

/** Figures of R 4.2.2: lm(mpg ~ t), lm(log(mpg) ~ t) and lm(mpg ~ 0 + t) with t <- 1:32, over mtcars. */
const linest: readonly (readonly [number, number | null])[] = [
  [0.0544171554252, 19.1927419354839],
  [0.116877809258, 2.209887094658],
  [0.00717396820715, 6.10455829900118],
  [0.21677417727032, 30],
  [8.07822672287, 1117.96896077713],
];
const next = [20.9885080645, 21.0429252199];
const growth = [1.00146977803, 18.78917403257];

const spilled = (formula: string, spill: string, rows: readonly (readonly (number | null)[])[]): BookCell[][] =>
  rows.map((row, at) => row.map((value, column) => (at + column === 0 ? { value, formula, spill } : value)));

const cars = sheetOf("Cars", [["Miles per gallon"], ...mtcars.y.map((miles) => [miles])]);
const fits = sheetOf("Fits", [
  ...spilled("=LINEST(Cars!A2:A33,,TRUE,TRUE)", "A1:B5", linest),
  [],
  ...spilled(
    "=TREND(Cars!A2:A33,,{33;34})",
    "A7:A8",
    next.map((value) => [value]),
  ),
]);
const powers = sheetOf("Powers", spilled("=LOGEST(Cars!A2:A33)", "A1:B1", [growth]));
const noConstant = sheetOf(
  "No constant",
  spilled("=LINEST(Cars!A2:A33,,FALSE,TRUE)", "A1:B3", [
    [0.940236013986, 0],
    [0.105254053382, null],
    [0.720213457561, null],
  ]),
);
const early = sheetOf("Early", spilled("=LINEST(Cars!A2:A30)", "A1:B1", [[0.0, 0.0]]));

describe("regressions whose drivers are 1, 2, 3 and so on", () => {
  let claims: readonly Claim[];
  beforeAll(async () => {
    claims = claimsIn(await readOnDesk(bookOf(cars, fits, powers, noConstant, early))).claims;
  });
  const on = (sheet: string): Claim => claims.find(({ place }) => place.includes(sheet))!;

  it.each(["Fits", "Powers", "No constant"])("come out of the cells (%s)", (sheet) => {
    const review = reviewClaim(on(sheet), () => undefined);
    expect(review.compared.length).toBeGreaterThanOrEqual(2);
    expect(review.compared.filter(({ agrees }) => !agrees)).toEqual([]);
    expect(review.answer).not.toBeNull();
  });

  it("are one with predictions beyond the range", () => {
    const { reported } = on("Fits");
    expect(reported.filter(({ quantity }) => quantity.kind === "prediction").map(({ value }) => value)).toEqual(next);
    expect(titleOf(on("Fits"))).toBe("Miles per gallon explained by Position in the range");
  });

  it("take their rows for a course of time", () => {
    const { answer } = reviewClaim(on("Fits"), () => undefined);
    expect(answer!.inference.neweyWest).not.toBeNull();
  });

  it("are told of where the range stops before the data do", () => {
    const { findings } = reviewClaim(on("Early"), () => undefined);
    const beyond = findings.find(({ code }) => code === "range-stops-early")!;
    expect(beyond.cells).toEqual(["Cars!A31:A33"]);
    expect(rangeOfLine(on("Early").drivers[0]!)).toBe("Cars!A2:A30");
  });

  it("differ where the results are older than the cells", () => {
    const fit = on("Powers");
    const older: Claim = { ...fit, reported: fit.reported.map((one) => ({ ...one, value: one.value + 0.001 })) };
    expect(reviewClaim(older, () => undefined).compared.some(({ agrees }) => !agrees)).toBe(true);
  });
});
