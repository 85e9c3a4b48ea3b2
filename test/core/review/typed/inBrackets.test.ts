import { beforeAll, describe, expect, it } from "vitest";
import type { Book } from "../../../../src/core/review/book.ts";
import type { Claim } from "../../../../src/core/review/claim.ts";
import type { ClaimReview } from "../../../../src/core/review/claimReview.ts";
import { reviewClaim } from "../../../../src/core/review/reviewClaim.ts";
import { notesIn } from "../../../../src/core/review/typed/bracketNotes.ts";
import type { BookCell, SheetData } from "../../../../src/desk/book/bookData.ts";
import mtcars from "../../../reference/mtcars.json" with { type: "json" };
import { bookOf, sheetOf } from "../../../support/deskBook.ts";
import { claimsIn, readOnDesk } from "../../../support/readBook.ts";

/** R's mtcars, with names as a report would give them. */
const cars = sheetOf("Cars", [
  ["Miles per gallon", "Weight", "Power", "Quarter mile"],
  ...mtcars.y.map((miles, row) => [miles, ...mtcars.X.map((column) => column[row]!)]),
]);

const withFormat = (value: number, numberFormat: string): BookCell => ({ value, style: { numberFormat } });
/** What stands in a cell where someone typed a negative number, shown in brackets by its format. */
const negative = (value: number): BookCell => withFormat(-value, "0.000;(0.000)");

const title = ["What drives miles per gallon?"];

/** Figures of R 4.2.2: lm(mpg ~ wt + hp + qsec) and lm(mpg ~ wt + hp), all 32 cars. */
const sound = sheetOf("Sound", [
  title,
  [],
  ["", "(1)", "", "(2)"],
  ["Weight", "-4.359***", "", "-3.878***"],
  [null, negative(0.753), "", "(0.633)"],
  ["Power", -0.0178, "", "-0.0318**"],
  ["", "(0.0150)", "", withFormat(0.009, "\\(0.0000\\)")],
  [],
  ["Quarter mile", 0.511, "", "–"],
  [null, negative(0.439), "", ""],
  ["Constant", 27.611, "", 37.227],
  [null, "(8.420)***", "", "(1.599)"],
  [],
  ["R squared", withFormat(0.8347678, "0.000"), "", 0.827],
  ["Observations", 32, "", 32],
  ["Standard errors in brackets; * p < 0.1, ** p < 0.05, *** p < 0.01"],
]);

/** Figures of R 4.2.2 with the last car left off: lm(mpg ~ wt + hp + qsec, mtcars[-32, ]), and what stands under them. */
const leftOff = (name: string, under: readonly string[], note: readonly string[]): SheetData =>
  sheetOf(name, [
    title,
    ["Variable", "Model"],
    ["Weight", "-4.374"],
    ["", under[0]!],
    ["Power", "-0.0180"],
    ["", under[1]!],
    ["Quarter mile", "0.518"],
    ["", under[2]!],
    ["Constant", "27.619"],
    ["", under[3]!],
    ["R2", 0.837],
    ["n", 31],
    note,
  ]);
const errors = ["(0.761)", "(0.0151)", "(0.444)", "(8.509)"];
const ratios = ["(5.747)", "(1.189)", "(1.166)", "(3.246)"];

/** Brackets for negative numbers, two of them subtotals without a name. */
const accounts = sheetOf("Accounts", [
  ["", "2024"],
  ["Sales", negative(-1250)],
  ["", negative(40)],
  ["Grants", 120],
  ["Wages", negative(310)],
  ["", negative(230)],
]);
/** The same with a single one. */
const fewer = sheetOf("Fewer", [
  ["Sales", negative(-1250)],
  ["", negative(40)],
  ["Wages", negative(310)],
]);

const reviewOf = (claim: Claim): ClaimReview => reviewClaim(claim, () => undefined);

const numbersOf = ({ reported }: Claim) =>
  reported.map(({ quantity, value, halfUnit, cell, shown }) => {
    const term = "term" in quantity ? ` ${quantity.term ?? "c"}` : "";
    return [`${quantity.kind}${term}`, value, Number(halfUnit.toPrecision(6)), cell.replace(/^.*!/, ""), shown];
  });

describe("numbers in brackets under their coefficients", () => {
  let book: Book;
  beforeAll(async () => {
    book = await readOnDesk(
      bookOf(
        cars,
        sound,
        leftOff("Errors", errors, ["t ratios in square brackets, standard errors in parentheses"]),
        leftOff("Ratios", ratios, ["Figures in brackets are t-values, not standard errors."]),
        leftOff("Unsaid errors", errors, []),
        leftOff("Unsaid ratios", ratios, []),
        leftOff("Signed", ["(-5.747)", ...ratios.slice(1)], []),
        accounts,
        fewer,
      ),
    );
  });
  const on = (sheet: string): Claim => claimsIn(book, { sheet }).claims[0]!;
  const kindsOn = (sheet: string): Set<string> => new Set(on(sheet).reported.map(({ quantity }) => quantity.kind));

  it("are found without pointing, each column a regression of its own", () => {
    const { claims, unread } = claimsIn(book, { sheet: "Sound" });
    expect(unread).toEqual([]);
    expect(claims.map(({ place }) => place)).toEqual(["Sound!B3:B12", "Sound!D3:D12"]);
    expect(claims.map(({ drivers }) => drivers.map(({ name }) => name))).toEqual([
      ["Weight", "Power", "Quarter mile"],
      ["Weight", "Power"],
    ]);
    expect(claims.map(({ outcome }) => outcome.name)).toEqual(["Miles per gallon", "Miles per gallon"]);
    expect(claims.flatMap(({ assumed }) => assumed ?? []).join(" ")).not.toContain("bracket");
  });

  it("are read to their digits, marks ignored, a negative under a format with brackets as its size", () => {
    const [first, second] = claimsIn(book, { sheet: "Sound" }).claims;
    expect(numbersOf(first!)).toEqual([
      ["coefficient 0", -4.359, 0.0005, "B4", "-4.359"],
      ["standard-error 0", 0.753, 0.0005, "B5", "0.753"],
      ["coefficient 1", -0.0178, 0.00005, "B6", "-0.0178"],
      ["standard-error 1", 0.015, 0.00005, "B7", "0.0150"],
      ["coefficient 2", 0.511, 0.0005, "B9", "0.511"],
      ["standard-error 2", 0.439, 0.0005, "B10", "0.439"],
      ["coefficient c", 27.611, 0.0005, "B11", "27.611"],
      ["standard-error c", 8.42, 0.0005, "B12", "8.420"],
      ["r-squared", 0.8347678, 0.0005, "B14", "0.835"],
      ["observations", 32, 0.5, "B15", "32"],
    ]);
    expect(numbersOf(second!)[3]).toEqual(["standard-error 1", 0.009, 0.00005, "D7", "0.0090"]);
    expect(
      numbersOf(second!)
        .slice(-2)
        .map(([kind, value]) => [kind, value]),
    ).toEqual([
      ["r-squared", 0.827],
      ["observations", 32],
    ]);
  });

  it("agree with the data where the report is sound", () => {
    for (const claim of claimsIn(book, { sheet: "Sound" }).claims) {
      const review = reviewOf(claim);
      expect(review.compared.filter(({ agrees }) => !agrees)).toEqual([]);
      expect(review.errors?.kinds).toContain("classical");
    }
  });

  it("lead to the row that was left off, as standard errors and as t ratios", () => {
    for (const sheet of ["Errors", "Ratios"]) {
      const review = reviewOf(on(sheet));
      expect(review.explanation?.hypotheses).toEqual(["rows-left-off-at-end"]);
      expect(review.explanation?.cells.join()).toContain("33");
      expect(review.explanation?.compared.every(({ agrees }) => agrees)).toBe(true);
      expect(review.errors?.kinds).toContain("classical");
    }
  });

  it("are what the note says of brackets of their shape", () => {
    expect(on("Errors").assumed!.join(" ")).not.toContain("brackets");
    expect(kindsOn("Errors")).toEqual(new Set(["coefficient", "standard-error", "r-squared", "observations"]));
    expect(kindsOn("Ratios")).toEqual(new Set(["coefficient", "ratio", "r-squared", "observations"]));
    expect(numbersOf(on("Ratios"))[1]).toEqual(["ratio 0", -5.747, 0.0005, "B4", "-5.747"]);
    expect(on("Ratios").assumed!.at(-1)).toBe(
      "The t ratios in brackets carry no sign; each was given the sign of its coefficient.",
    );
  });

  it("are taken without a note for what lies nearer to the data, which is said", () => {
    expect(kindsOn("Unsaid errors").has("ratio")).toBe(false);
    expect(on("Unsaid errors").assumed!.at(-1)).toBe(
      "The report does not say what its numbers in brackets are: they were read as standard errors, which come nearer to what the data give than t ratios would.",
    );
    expect(kindsOn("Unsaid ratios").has("standard-error")).toBe(false);
    expect(on("Unsaid ratios").assumed!.at(-2)).toContain("read as t ratios, which come nearer");
    expect(on("Signed").assumed!.at(-2)).toContain("as standard errors cannot be negative");
  });

  it("are found by pointing at a column, a cell of it or the whole", () => {
    const placesAt = (reported: string): string[] =>
      claimsIn(book, { pointed: { reported, outcome: null, drivers: null } }).claims.map(({ place }) => place);
    expect(placesAt("Sound!D6")).toEqual(["Sound!D3:D12"]);
    expect(placesAt("Sound!A3:D15")).toEqual(["Sound!B3:B12", "Sound!D3:D12"]);
    expect(placesAt("Errors!A4")).toEqual(["Errors!A2:B10"]);
  });

  it("make no report of accounts", () => {
    for (const sheet of ["Accounts", "Fewer"]) {
      expect(claimsIn(book, { sheet })).toMatchObject({ claims: [], unread: [] });
    }
  });
});

describe("a note about brackets", () => {
  it.each([
    ["Standard errors in brackets", "standard-error", null],
    ["Note: s.e. in parentheses.", "standard-error", "round"],
    ["Heteroskedasticity-robust std. errors below the coefficients", "standard-error", null],
    ["The numbers in square brackets are t-statistics", "ratio", "square"],
    ["p-values in brackets", "p-value", null],
    ["Coefficient (t ratio)", "ratio", null],
    ["(standard errors)", "standard-error", null],
  ])("is told from other texts: %s", (text, word, shape) => {
    expect(notesIn(text)).toEqual([{ word, shape }]);
  });

  it.each(["Price (t)", "Standard error", "(1)", "* significant at 5 %", "t ratios and brackets"])(
    "is none in %s",
    (text) => {
      expect(notesIn(text)).toEqual([]);
    },
  );
});
