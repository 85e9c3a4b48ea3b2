import { beforeAll, describe, expect, it } from "vitest";
import type { Book } from "../../../../src/core/review/book.ts";
import type { Claim, Quantity } from "../../../../src/core/review/claim.ts";
import { claimsOf } from "../../../../src/core/review/claimsOf.ts";
import type { BookCell } from "../../../../src/desk/book/bookData.ts";
import { demoBook } from "../../../../src/desk/demo/demoBook.ts";
import { bookOf, sheetOf } from "../../../support/deskBook.ts";
import { claimsIn, readOnDesk } from "../../../support/readBook.ts";
import { faultOf } from "../../../support/sheet.ts";

const shown = (value: number, numberFormat: string): BookCell => ({ value, style: { numberFormat } });

/** Cups = 40 - 6 Price + 2 Rain and a little beside; Staff has nothing to do with any of them. */
const days = Array.from({ length: 12 }, (_, day) => {
  const [price, rain, staff] = [2.25 + ((day * 5) % 9) / 8, (day * 3) % 7, 3 + ((day * 5) % 4)];
  return [day + 1, 40 - 6 * price + 2 * rain + ((day * 7) % 5) / 10, price, rain, staff, price + 0.125 * rain];
});

const data = sheetOf("Data", [["Day", "Cups", "Unit price", "Rain [mm]", "Staff", "Other price"], ...days]);

const plain = sheetOf("Plain", [
  ["Cups explained"],
  [],
  ["", "Variable", "b", "Std. Err.", "t-stat", "P>|t|", "Lower 95%", "Upper 95%"],
  ["", "(Intercept)", 40.2, shown(0.5, "0.000"), 80.4, 0, 39.1, 41.3],
  ["", "Unit price", "-6.05**", shown(0.12, "0.00%"), -50.4, shown(0.0000012, "0.0E+00"), -6.3, -5.8],
  ["", "Rain (mm)", shown(2012.5, "#,##0.0,"), 0.03, 66, "0.02 %", 1.9, 2.1],
  ["", "R-squared", 0.98],
  ["", "Adj. R2", null, 0.97],
  ["", "Standard error", 0.21],
  ["", "n = 12; F: 245.5"],
]);

const sideways = sheetOf("Sideways", [
  ["", "const", "log unit price", "Rain sq."],
  ["Coef.", 12.5, -8.25, 0.5],
  ["SE", 1.5, 0.75, 0.125],
  ["Dependent variable: Staff"],
  ["Observations", "R sq"],
  [12, 0.25],
]);

const formulas = sheetOf("Formulas", [
  ["Driver", "Coefficient", "Standard error", "t", "p-value"],
  [
    "Rain",
    { value: 2, formula: "=INDEX(LINEST(Data!B2:B13,Data!C2:D13,TRUE,TRUE),1,1)" },
    { value: 0.03, formula: "=INDEX(LINEST(Data!B2:B13,Data!C2:D13,TRUE,TRUE),2,1)" },
    { value: 66.5, formula: "=B2/C2" },
    0.001,
  ],
  ["Price", { value: -6, formula: "=INDEX(LINEST(Data!B2:B13,Data!C2:D13,TRUE,TRUE),1,2)" }, null, null, 0.002],
  [],
  ["Number of observations", { value: 12, formula: "=COUNT(Data!B2:B13)" }],
]);

const strange = sheetOf("Strange", [
  ["Term", "Estimate", "Std error"],
  ["Humidity", 3.5, 1.25],
  ["Rain", 2.5, 0.25],
]);

const nearest = sheetOf("Nearest", [
  ["Term", "Estimate", "Std error"],
  ["Unit price", -6.1, 1.25],
  ["Rain", 2.05, 0.25],
]);

const quantityInWords = (quantity: Quantity): string =>
  "term" in quantity ? `${quantity.kind} ${quantity.term ?? "c"}` : quantity.kind;

const numbersOf = ({ reported }: Claim) =>
  Object.fromEntries(reported.map((one) => [quantityInWords(one.quantity), [one.value, one.halfUnit, one.shown]]));

const linesOf = ({ outcome, drivers }: Claim) =>
  [outcome, ...drivers].map(
    ({ name, form, from, count }) => `${form === "as it is" ? "" : `${form} of `}${name} ${from + 1}+${count}`,
  );

describe("reports of typed numbers", () => {
  let book: Book;
  beforeAll(async () => {
    book = await readOnDesk(bookOf(data, plain, sideways, formulas, strange, nearest));
  });
  const on = (sheet: string): Claim => claimsIn(book, { sheet }).claims[0]!;

  it("may stand below their data, in the same columns: the data end above them", async () => {
    const [headings, ...rows] = [["Cups", "Unit price", "Rain"], ...days.map((day) => day.slice(1, 4))];
    const report = [
      ["What came out"],
      ["Driver", "Coefficient", "Standard error"],
      ["Unit price", -6.1, 1.25],
      ["Rain", 2.05, 0.25],
    ];
    const below = await readOnDesk(bookOf(sheetOf("Below", [headings, ...rows, [], ...report])));
    const expected = ["Cups 2+12", "Unit price 2+12", "Rain 2+12"];
    expect(linesOf(claimsIn(below).claims[0]!)).toEqual(expected);
    const pointed = { reported: "Below!A16:C18", outcome: "Cups", drivers: ["Unit price", "Rain"] };
    expect(linesOf(claimsIn(below, { pointed }).claims[0]!)).toEqual(expected);
  });

  it("are read by headings of many spellings, each number to the digits that it shows", () => {
    const claim = on("Plain");
    expect(claim).toMatchObject({ place: "Plain!B3:H6", origin: { kind: "typed" }, constant: true });
    expect(linesOf(claim)).toEqual(["Cups 2+12", "Unit price 2+12", "Rain [mm] 2+12"]);
    const numbers = numbersOf(claim);
    expect(numbers).toMatchObject({
      "coefficient c": [40.2, 0.05, "40.2"],
      "standard-error c": [0.5, 0.0005, "0.500"],
      "p-value c": [0, 0.5, "0"],
      "coefficient 0": [-6.05, 0.005, "-6.05"],
      "standard-error 0": [0.12, 0.00005, "12.00%"],
      "p-value 0": [0.0000012, 5e-8, "1.2E-06"],
      "coefficient 1": [2012.5, 50, "2.0"],
      "p-value 1": [0.0002, expect.closeTo(0.00005, 12), "0.02 %"],
      "low 0": [-6.3, 0.05, "-6.3"],
      "high 1": [2.1, 0.05, "2.1"],
      "r-squared": [0.98, 0.005, "0.98"],
      "adjusted-r-squared": [0.97, 0.005, "0.97"],
      sigma: [0.21, 0.005, "0.21"],
      observations: [12, 0.5, "12"],
      f: [245.5, 0.05, "245.5"],
    });
    expect(Object.keys(numbers)).toHaveLength(23);
  });

  it("may lie on their side, with forms in the names of the drivers and the outcome named", () => {
    const claim = on("Sideways");
    expect(claim.place).toBe("Sideways!A1:D3");
    expect(linesOf(claim)).toEqual(["Staff 2+12", "logarithm of Unit price 2+12", "square of Rain [mm] 2+12"]);
    expect(numbersOf(claim)).toMatchObject({
      "coefficient c": [12.5, 0.05, "12.5"],
      "standard-error 1": [0.125, 0.0005, "0.125"],
      observations: [12, 0.5, "12"],
      "r-squared": [0.25, 0.005, "0.25"],
    });
    expect(claim.assumed).toContain('The outcome was taken to be "Staff", which the report names as such.');
  });

  it("go with the formulas that give their coefficients", () => {
    const { claims } = claimsIn(book, { sheet: "Formulas" });
    expect(claims).toHaveLength(1);
    expect(claims[0]!.origin.kind).toBe("formula");
    expect(linesOf(claims[0]!)).toEqual(["Cups 2+12", "Unit price 2+12", "Rain [mm] 2+12"]);
    const numbers = numbersOf(claims[0]!);
    expect(numbers["ratio 1"]![0]).toBe(66.5);
    expect(numbers["p-value 0"]).toEqual([0.002, 0.0005, "0.002"]);
    expect(numbers["observations"]![0]).toBe(12);
  });

  it("say what was taken for granted, and take the outcome that comes nearest", () => {
    const claim = on("Nearest");
    expect(claim.outcome.name).toBe("Cups");
    expect(claim.assumed).toEqual([
      "The data were taken from Data!A2:F13, whose headings fit the names of the drivers.",
      'The outcome was taken to be "Cups", whose regression comes nearest to the coefficients reported.',
      "No constant is reported; the regression was taken to have one all the same.",
    ]);
    expect(claim.others.map(({ name }) => name)).toEqual(["Day", "Staff", "Other price"]);
  });

  it("are listed as unread where no column fits a name", () => {
    const { claims, unread } = claimsIn(book, { sheet: "Strange" });
    expect(claims).toEqual([]);
    expect(unread).toEqual([
      {
        cell: "Strange!A1:C3",
        why: 'No column on sheet "Data" fits "Humidity", though others of its drivers stand there; point at the data.',
      },
    ]);
  });

  it("take the data that someone gives, by headings or by addresses", () => {
    const pointed = { reported: "Strange!B2", outcome: "staff", drivers: ["Other price", "Data!D1:D13"] };
    const { claims } = claimsIn(book, { pointed });
    expect(claims.map(linesOf)).toEqual([["Staff 2+12", "Other price 2+12", "Rain [mm] 2+12"]]);
    expect(claims[0]!.assumed).toEqual(["No constant is reported; the regression was taken to have one all the same."]);
  });

  it("answer with a problem where something that was pointed at is not there", () => {
    const fault = (reported: string, outcome: string | null = null, drivers: string[] | null = null) =>
      faultOf(claimsOf(book, { pointed: { reported, outcome, drivers }, sheet: null }, () => undefined));
    expect(fault("Data!A1:F13")).toEqual({ code: "no-report", where: "Data!A1:F13" });
    expect(fault("Plian!A1:B2")).toEqual({ code: "unknown-place", place: "Plian", nearest: "Plain" });
    expect(fault("A1:")).toEqual({ code: "bad-address", address: "A1:" });
    expect(fault("Plain!B3:H6", "Cupz")).toMatchObject({ code: "unknown-heading", heading: "Cupz", nearest: "Cups" });
  });
});

describe("the demo workbook", () => {
  it("has one regression, found without being pointed at: the Handover", async () => {
    const { claims, unread } = claimsIn(await readOnDesk(demoBook()));
    expect(unread).toEqual([]);
    expect(claims).toHaveLength(1);
    const [claim] = claims;
    expect(claim!.place).toBe("Handover!A4:D8");
    expect(linesOf(claim!)).toEqual(["Repairs 5+96", "Price index 5+96", "Advertising 5+96", "Rainy days 5+96"]);
    expect(claim!.reported.filter(({ quantity }) => quantity.kind === "coefficient")).toHaveLength(4);
    expect(numbersOf(claim!)).toMatchObject({ observations: [95, 0.5, "95"], "r-squared": [0.57, 0.0005, "0.570"] });
    expect(claim!.others.map(({ name }) => name)).toEqual(["Month"]);
  });
});
