import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { influence, mostInfluential } from "../../../../src/core/diagnostics/guards/influence.ts";
import { influenceGuard } from "../../../../src/core/diagnostics/guards/influenceGuard.ts";
import { tTwoSided } from "../../../../src/core/numeric/distributions.ts";
import type { Fit } from "../../../../src/core/fit/fit.ts";
import { randomFrom } from "../../../support/random.ts";
import { expectDigits } from "../../../support/digits.ts";
import { designOf, fitOf, reference, referenceFit, referenceIds, throughTime } from "../../../support/referenceFit.ts";

interface Found {
  readonly outside: readonly number[];
  readonly cook: readonly number[];
  readonly dffits: readonly number[];
  readonly dfbetas: readonly (readonly number[])[];
}
const { figures } = JSON.parse(
  readFileSync(new URL("../../../reference/diagnostics/secondLibrary.json", import.meta.url), "utf8"),
) as { readonly figures: Readonly<Record<string, { readonly influence: Found }>> };

const rowName = (row: number): string => `row ${row + 2}`;

describe("influence", () => {
  it.each(referenceIds)("the five rows of %s with the largest Cook's distances", (id) => {
    const fit = referenceFit(id);
    const known = reference(id).influence_top5_by_cook;
    const rows = mostInfluential(fit, influence(fit)!, 5);
    expect(rows.map(({ row }) => row + 1)).toEqual(known.row);
    rows.forEach(({ leverage, cook, outside, dffits }, i) => {
      expectDigits(leverage, known.leverage[i]!, 10);
      expectDigits(cook, known.cook[i]!, 10);
      expectDigits(outside, known.rstudent[i]!, 10);
      expectDigits(dffits, known.dffits[i]!, 10);
    });
  });

  it.each(Object.entries(figures))("every row of %s as in the second library", (id, { influence: found }) => {
    const fit = referenceFit(id);
    const measures = influence(fit)!;
    const rows = mostInfluential(fit, measures, fit.rowCount).toSorted((one, other) => one.row - other.row);
    rows.forEach(({ row, dfbetas }) => {
      expectDigits(measures.outside[row]!, found.outside[row]!, 8.5);
      expectDigits(measures.cook[row]!, found.cook[row]!, 8.5);
      expectDigits(measures.dffits[row]!, found.dffits[row]!, 8.5);
      dfbetas.forEach((value, j) => expect(Math.abs(value - found.dfbetas[row]![j]!)).toBeLessThan(1e-8));
    });
  });

  const random = randomFrom(32);
  const x = Array.from({ length: 30 }, () => random.normal());
  const y = x.map((value) => 5 + 2 * value + random.normal());

  it("is what taking the row out shows", () => {
    const fit = fitOf(designOf(y, [x]));
    const [top] = mostInfluential(fit, influence(fit)!, 1);
    const without = fitOf(designOf(y.toSpliced(top!.row, 1), [x.toSpliced(top!.row, 1)]));
    const deviation = without.sigma * Math.sqrt(fit.bread.values[3]!);
    expectDigits(top!.dfbetas[1]!, (fit.coefficients[1]! - without.coefficients[1]!) / deviation, 10);
    const forecast = without.coefficients[0]! + without.coefficients[1]! * x[top!.row]!;
    const error = without.sigma * Math.sqrt(1 / (1 - top!.leverage));
    expectDigits(top!.outside, (y[top!.row]! - forecast) / error, 10);
    expectDigits(top!.outlierPValue, Math.min(1, 30 * tTwoSided(top!.outside, 27)), 12);
  });

  it("of a row with a leverage of one is none, and the words say so", () => {
    const alone = x.map((_, i) => (i === 11 ? 1 : 0));
    const fit = fitOf(designOf(y, [x, alone]));
    const measures = influence(fit)!;
    expect(measures.selfFitting).toEqual([11]);
    expect([measures.outside[11], measures.cook[11], measures.dffits[11]]).toEqual([0, 0, 0]);
    const rows = mostInfluential(fit, measures, 30);
    for (const row of rows)
      for (const value of [row.cook, row.outside, ...row.dfbetas]) expect(Number.isFinite(value)).toBe(true);
    const { sentences, finding } = influenceGuard({ fit, measures, rows }, rowName);
    expect(finding).toBe("worth knowing");
    expect(sentences[0]).toBe(
      "The fit passes through row 13 whatever the outcome there: a driver of its own gives the row no say about the others.",
    );
  });

  it("offers degrees of freedom by coefficient where a row lies far out, and cases alone can take them", () => {
    const one = x.map((value, i) => (i === 4 ? 40 : i === 20 ? -30 : value));
    const offerOf = (fit: Fit): string | undefined => {
      const measures = influence(fit)!;
      const { sentences } = influenceGuard({ fit, measures, rows: mostInfluential(fit, measures, 3) }, rowName);
      return sentences.find((sentence) => sentence.includes("bell-mccaffrey"));
    };
    const fit = fitOf(designOf(y, [one]));
    expect(fit.leverages[20]).toBeLessThan(0.5);
    expect(offerOf(fit)).toBe(
      `The drivers of row 6 lie so far out that a row there makes up to ${Math.floor(100 * fit.leverages[4]!)} % of its own fitted value. White's standard errors are uncertain then; the white version "HC2 bell-mccaffrey" allows for it.`,
    );
    const inTime = fitOf(designOf(y, [one], { order: throughTime(30) }));
    expect(offerOf(inTime)).toBeUndefined();
    const two = x.map((value, i) => (i === 4 ? 9 : value));
    const other = x.map((_, i) => (i === 6 ? 1 : i === 7 ? 0.6 : 0));
    const both = fitOf(designOf(y, [two, other]));
    const [first, second] = [both.leverages[4]!, both.leverages[6]!];
    expect(Math.min(first, second)).toBeGreaterThan(0.5);
    expect(Math.abs(first - second)).toBeGreaterThan(0.02);
    expect(offerOf(both)).toContain(`up to ${Math.floor(100 * Math.max(first, second))} % of its own`);
    // Six columns that each stand on two rows, the first of them almost alone.
    const pairs = [0, 1, 2, 3, 4, 5].map((pair) =>
      y.map((_, i) => (i === 2 * pair ? 1 : i === 2 * pair + 1 ? 0.3 : 0)),
    );
    expect(offerOf(fitOf(designOf(y, pairs)))).toMatch(
      /^The drivers of row 2, row 4, row 6, row 8 and row 10 and 1 more lie so far out/,
    );
  });

  it("names the row that moves a coefficient, and the one that lies far off", () => {
    const far = y.with(7, y[7]! + 40);
    const high = x.with(7, 6);
    const fit = fitOf(designOf(far, [high], { names: ["Price"] }));
    const measures = influence(fit)!;
    const { sentences } = influenceGuard({ fit, measures, rows: mostInfluential(fit, measures, 10) }, rowName);
    expect(sentences[0]).toMatch(
      /^Leaving out row 9 changes the coefficient of .*Price by \d+\.\d.* standard errors\.$/,
    );
    expect(sentences.at(-1)).toMatch(/^row 9 lies \d+\.\d standard deviations off the fit of the other rows\.$/);
    const calm = fitOf(designOf(y, [x]));
    const quiet = influence(calm)!;
    expect(
      influenceGuard({ fit: calm, measures: quiet, rows: mostInfluential(calm, quiet, 10) }, rowName).finding,
    ).toBe("nothing found");
  });

  it("stays a number where all other rows fit perfectly", () => {
    const line = Array.from({ length: 12 }, (_, i) => 3 + 2 * i);
    const fit = fitOf(designOf(line.with(4, 500), [Array.from({ length: 12 }, (_, i) => i)]));
    const measures = influence(fit)!;
    expect(measures.outside[4]).toBeGreaterThan(1e5);
    for (const value of measures.outside) expect(Number.isFinite(value)).toBe(true);
  });

  it("cannot be had without a degree of freedom to spare", () => {
    expect(influence(fitOf(designOf([1, 2, 4], [[1, 2, 5]])))).toBeNull();
  });
});
