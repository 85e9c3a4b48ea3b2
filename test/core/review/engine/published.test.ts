import { describe, expect, it } from "vitest";
import type { Quantity, ReportedNumber } from "../../../../src/core/review/claim.ts";
import { reviewClaim } from "../../../../src/core/review/reviewClaim.ts";
import { claimOf, sheetOf } from "../../../planted/sheet.ts";
import { reference } from "../../../support/referenceFit.ts";

/**
 * Regressions as the summary of R's lm prints them. The digits were typed from memory; the data and the same figures in
 * full, from R, stand in test/reference (SOURCES.md), and a slip of memory would show as a number that differs. R rounds
 * such tables twice: the standard error 0.084914926 stands there as 8.492e-02.
 */
interface Printed {
  readonly id: string;
  /** Constant first: estimate, standard error, t value, p-value. */
  readonly terms: readonly (readonly [string, string, string, string])[];
  readonly whole: Readonly<Record<string, string>>;
}

const stackloss: Printed = {
  id: "stackloss",
  terms: [
    ["-39.9197", "11.8960", "-3.356", "0.00375"],
    ["0.7156", "0.1349", "5.307", "5.8e-05"],
    ["1.2953", "0.3680", "3.520", "0.00263"],
    ["-0.1521", "0.1563", "-0.973", "0.34405"],
  ],
  whole: {
    sigma: "3.243",
    "degrees-of-freedom": "17",
    "r-squared": "0.9136",
    "adjusted-r-squared": "0.8983",
    f: "59.9",
    "f-p-value": "3.016e-09",
  },
};

const mtcars: Printed = {
  id: "mtcars",
  terms: [
    ["27.61053", "8.41993", "3.279", "0.00278"],
    ["-4.35880", "0.75270", "-5.791", "3.22e-06"],
    ["-0.01782", "0.01498", "-1.190", "0.24418"],
    ["0.51083", "0.43922", "1.163", "0.25463"],
  ],
  whole: {
    sigma: "2.578",
    "degrees-of-freedom": "28",
    "r-squared": "0.8348",
    "adjusted-r-squared": "0.8171",
    f: "47.15",
    "f-p-value": "4.506e-11",
  },
};

const longley: Printed = {
  id: "longley",
  terms: [
    ["-3.482e+03", "8.904e+02", "-3.911", "0.003560"],
    ["1.506e-02", "8.492e-02", "0.177", "0.863141"],
    ["-3.582e-02", "3.349e-02", "-1.070", "0.312681"],
    ["-2.020e-02", "4.884e-03", "-4.136", "0.002535"],
    ["-1.033e-02", "2.143e-03", "-4.822", "0.000944"],
    ["-5.110e-02", "2.261e-01", "-0.226", "0.826212"],
    ["1.829e+00", "4.555e-01", "4.016", "0.003037"],
  ],
  whole: {
    sigma: "0.3049",
    "degrees-of-freedom": "9",
    "r-squared": "0.9955",
    "adjusted-r-squared": "0.9925",
    f: "330.3",
    "f-p-value": "4.984e-10",
  },
};

/** Half a unit of the last digit of "59.9", "5.8e-05". */
function halfUnitOf(shown: string): number {
  const [digits = "", exponent = "0"] = shown.split("e");
  return 0.5 * 10 ** (Number(exponent) - (digits.split(".")[1]?.length ?? 0));
}

const typed = (quantity: Quantity, shown: string): ReportedNumber => ({
  quantity,
  value: Number(shown),
  halfUnit: halfUnitOf(shown),
  cell: "Report!B2",
  shown,
});

const kinds = ["coefficient", "standard-error", "ratio", "p-value"] as const;

function claimFrom({ id, terms, whole }: Printed) {
  const { y, X, drivers } = reference(id);
  const sheet = sheetOf({
    id,
    key: { name: "Case", cells: y.map((_, row) => `no. ${row + 1}`) },
    outcome: { name: "Outcome", values: y },
    drivers: drivers.map((name, j) => ({ name, values: X[j]! })),
    spare: { name: "Spare", values: y.map((_, row) => (row * 37) % 11) },
  });
  const numbers = terms.flatMap((printed, row) =>
    printed.map((shown, column) => typed({ kind: kinds[column]!, term: row === 0 ? null : row - 1 }, shown)),
  );
  const wholes = Object.entries(whole).map(([kind, shown]) => typed({ kind } as Quantity, shown));
  return claimOf(sheet, { constant: true, forms: {} }, [...numbers, ...wholes]);
}

describe("published regressions", () => {
  it.each([stackloss, mtcars, longley])("$id comes out of its data, with classical standard errors", (printed) => {
    const review = reviewClaim(claimFrom(printed), () => undefined);
    expect(review.compared.filter(({ agrees }) => !agrees)).toEqual([]);
    expect(review.errors?.kinds[0]).toBe("classical");
    expect(review.explanation).toBeNull();
    expect(review.tried).toEqual([]);
    expect(review.answer).not.toBeNull();
  });

  it("would be told from the same with a digit changed", () => {
    const claim = claimFrom(stackloss);
    const reported = claim.reported.map((number, index) =>
      index === 4 ? { ...number, value: 0.7256, shown: "0.7256" } : number,
    );
    const review = reviewClaim({ ...claim, reported }, () => undefined);
    expect(review.compared.filter(({ agrees }) => !agrees).map(({ reported: { shown } }) => shown)).toEqual(["0.7256"]);
    expect(review.findings.map(({ code }) => code)).toContain("one-number-differs");
  });

  it("shows longley without its last year for what it is", () => {
    const claim = claimFrom(longley);
    const cut = {
      ...claim,
      outcome: { ...claim.outcome, count: 15 },
      drivers: claim.drivers.map((line) => ({ ...line, count: 15 })),
    };
    const review = reviewClaim(cut, () => undefined);
    expect(review.explanation?.hypotheses).toEqual(["extra-rows-at-end"]);
  });
});
