import { beforeAll, describe, expect, it } from "vitest";
import type { Book } from "../../../../src/core/review/book.ts";
import type { Claim } from "../../../../src/core/review/claim.ts";
import type { SheetData } from "../../../../src/desk/book/bookData.ts";
import mtcars from "../../../reference/mtcars.json" with { type: "json" };
import { bookOf, sheetOf } from "../../../support/deskBook.ts";
import { claimsIn, readOnDesk } from "../../../support/readBook.ts";

/** R's mtcars. */
const data: SheetData["rows"] = [
  ["Mileage", "Weight", "Power", "Quarter"],
  ...mtcars.y.map((miles, row) => [miles, ...mtcars.X.map((column) => column[row]!)]),
];

const [constant, weight, power] = mtcars.coefficients;
const [errorOfConstant, errorOfWeight, errorOfPower] = mtcars.se.classical;
const linest = (row: number, column: number): string =>
  `=INDEX(LINEST(Cars!A2:A33,Cars!B2:D33,TRUE,TRUE),${row},${column})`;
const filled = (value: number, row: number, column: number) => ({
  value,
  formula: linest(row, column),
  style: { numberFormat: row === 2 ? '"("0.000")"' : "0.000" },
});

/** Coefficients and most standard errors are formulas, one standard error is typed. */
const formulas = sheetOf("Formulas", [
  ["Weight", filled(weight!, 1, 3)],
  [null, filled(errorOfWeight!, 2, 3)],
  ["Power", filled(power!, 1, 2)],
  [null, "(0.0150)"],
  ["Constant", filled(constant!, 1, 4)],
  [null, filled(errorOfConstant!, 2, 4)],
  ["Standard errors in brackets"],
]);

/** Two reports below one another, each with its own note, the second with two lines in brackets. */
const stacked = sheetOf("Stacked", [
  ["Weight", -4.36],
  ["", "(0.75)"],
  ["Constant", 27.6],
  ["", "(8.4)"],
  ["R squared", 0.8],
  ["standard errors in brackets"],
  [],
  ["Power", -0.068],
  ["", "(6.7)"],
  ["", "[0.000]"],
  ["Constant", 30.1],
  ["", "(18.4)"],
  ["", "[0.000]"],
  ["F", 45.5],
  ["", "(0.000)"],
  ["R squared", 0.6],
  ["t ratios in round brackets and p-values in square brackets"],
]);

/** Each column explains something else, as its heading says; one driver is in the first model alone. */
const outcomes = sheetOf("Outcomes", [
  ["", "log Mileage", "Quarter"],
  ["Weight", -0.2, 0.94],
  ["", "(0.02)", "(0.27)"],
  ["Power", -0.0015, ""],
  ["", "(0.0003)", ""],
  ["n", 32, 31],
  ["R squared", "", 0.031],
]);

/** No outcome is named; Power is a driver of the first model alone. */
const nested = sheetOf("Nested", [
  ["", "(1)", "(2)"],
  ["Weight", -3.878, -5.344],
  ["", "(0.633)", "(0.559)"],
  ["Power", -0.0318, "-"],
  ["", "(0.0090)", ""],
]);

/** A report under its data, in the same columns. */
const below = sheetOf("Below", [...data, [], ["Weight", -3.88], ["", "(0.63)"], ["Power", -0.03], ["", "(0.009)"]]);

const wordsOf = ({ reported }: Claim) =>
  reported.map(({ quantity, value }) => [`${quantity.kind} ${"term" in quantity ? quantity.term : ""}`.trim(), value]);

describe("tables with numbers in brackets", () => {
  let book: Book;
  beforeAll(async () => {
    book = await readOnDesk(bookOf(sheetOf("Cars", data), formulas, stacked, outcomes, nested, below));
  });
  const on = (sheet: string) => claimsIn(book, { sheet }).claims;

  it("go with the formulas that give their coefficients, typed brackets among them", () => {
    const claims = on("Formulas");
    expect(claims.map(({ origin }) => origin.kind)).toEqual(["formula"]);
    const errors = claims[0]!.reported.filter(({ quantity }) => quantity.kind === "standard-error");
    expect(errors.map(({ cell, shown }) => `${cell} ${shown}`).toSorted()).toEqual([
      "Formulas!B2 0.753",
      "Formulas!B4 0.0150",
      "Formulas!B6 8.420",
    ]);
    expect(errors.find(({ cell }) => cell === "Formulas!B4")).toMatchObject({
      value: 0.015,
      halfUnit: expect.closeTo(0.00005, 12) as number,
    });
    expect(Math.abs(errorOfPower! - 0.015)).toBeLessThan(0.00005);
  });

  it("end at the numbers of the whole regression, each with its own note", () => {
    const [first, second, ...more] = on("Stacked");
    expect(more).toEqual([]);
    expect(wordsOf(first!)).toEqual([
      ["coefficient 0", -4.36],
      ["standard-error 0", 0.75],
      ["coefficient null", 27.6],
      ["standard-error null", 8.4],
      ["r-squared", 0.8],
    ]);
    expect(wordsOf(second!)).toEqual([
      ["coefficient 0", -0.068],
      ["ratio 0", -6.7],
      ["coefficient null", 30.1],
      ["ratio null", 18.4],
      ["f", 45.5],
      ["r-squared", 0.6],
    ]);
    expect(first!.assumed!.join(" ")).not.toContain("bracket");
    expect(second!.assumed!.slice(2)).toEqual([
      "The t ratios in brackets carry no sign; each was given the sign of its coefficient.",
      "A further line of numbers in brackets under the coefficients was not read.",
    ]);
  });

  it("have outcomes that are no driver of another model beside", () => {
    expect(on("Nested").map(({ outcome }) => outcome.name)).toEqual(["Mileage", "Mileage"]);
  });

  it("may name an outcome over each column, and leave out figures of some", () => {
    const [first, second] = on("Outcomes");
    expect(first!.outcome).toMatchObject({ name: "Mileage", form: "logarithm" });
    expect(first!.assumed).toContain('The outcome was taken to be "Mileage", which stands over the coefficients.');
    expect(second!.outcome).toMatchObject({ name: "Quarter", form: "as it is" });
    expect(wordsOf(first!).at(-1)).toEqual(["observations", 32]);
    expect(wordsOf(second!).slice(-2)).toEqual([
      ["observations", 31],
      ["r-squared", 0.031],
    ]);
    const onlyNamed = { reported: "Outcomes!C2:C3", outcome: "Mileage", drivers: null };
    expect(claimsIn(book, { pointed: onlyNamed }).claims.map(({ outcome }) => outcome.name)).toEqual(["Mileage"]);
  });

  it("may stand below their data, which are meant sooner than the same headings elsewhere", () => {
    const [claim] = on("Below");
    expect(claim!.outcome).toMatchObject({ sheet: "Below", from: 1, count: 32 });
    expect(claim!.drivers.map(({ name }) => name)).toEqual(["Weight", "Power"]);
  });
});
