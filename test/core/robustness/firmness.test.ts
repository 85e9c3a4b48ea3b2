import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { ErrorsChoice } from "../../../src/core/covariance/choice.ts";
import { covarianceOf } from "../../../src/core/covariance/covarianceOf.ts";
import type { Fit } from "../../../src/core/fit/fit.ts";
import type { InferenceTable } from "../../../src/core/inference/inference.ts";
import { inferenceOf } from "../../../src/core/inference/inferenceOf.ts";
import type { Reference } from "../../../src/core/inference/reference.ts";
import { randomFrom } from "../../support/random.ts";
import { lagLadder } from "../../../src/core/robustness/choices.ts";
import { choicesInWords, type ChoiceName } from "../../../src/core/robustness/choicesInWords.ts";
import { type Firmness, firmness } from "../../../src/core/robustness/firmness.ts";
import { leaveOneOut } from "../../../src/core/robustness/leaveOneOut.ts";
import { expectDigits } from "../../support/digits.ts";
import { designOf, fitOf, inGroups, referenceFit, throughTime } from "../../support/referenceFit.ts";

function tableOf(fit: Fit, choice: ErrorsChoice, reference: Reference, level = 0.05): InferenceTable {
  const covariance = covarianceOf(fit, choice);
  if (!covariance.ok) throw new Error(covariance.problem.code);
  return inferenceOf(fit, covariance.value, { reference, against: zeros(fit), level });
}

const zeros = (fit: Fit): number[] => Array.from(fit.coefficients, () => 0);
const neweyWest = (lags: number): ErrorsChoice => ({
  kind: "newey-west",
  lags: { kind: "given", lags },
  adjusted: true,
});

function firmnessOf(fit: Fit, inForce: InferenceTable, lags: number | null): Firmness {
  const found = firmness(fit, { inForce, against: zeros(fit), level: 0.05, lags, adjusted: true });
  if (!found.ok) throw new Error(found.problem.code);
  return found.value;
}

describe("firmness", () => {
  const fit = referenceFit("investment");
  const t: Reference = { law: "t", degreesOfFreedom: 16 };
  const inForce = tableOf(fit, { kind: "classical" }, t);
  const found = firmnessOf(fit, inForce, 5);

  it("puts every choice side by side", () => {
    // Classical and five White versions under two laws, fifteen numbers of lags under three.
    expect(found.choices).toHaveLength(2 + 10 + 45);
    const hc3 = found.choices.find(({ version, law }) => version === "HC3" && law === "normal")!;
    const alone = tableOf(fit, { kind: "white", version: "HC3" }, { law: "normal" });
    expect(hc3.pValue).toEqual(alone.pValue);
    expect(hc3.low).toEqual(alone.low);
    const sevenLags = found.choices.find(({ lags, law }) => lags === 7 && law === "fixed-b")!;
    const again = tableOf(fit, neweyWest(7), { law: "fixed-b", b: 8 / 19, degreesOfFreedom: 16 });
    again.pValue.forEach((p, j) => expectDigits(sevenLags.pValue[j]!, p, 12));
    again.high.forEach((high, j) => expectDigits(sevenLags.high[j]!, high, 12));
  });

  it("calls a conclusion firm when all agree, and names the choices that flip it", () => {
    const [constant, gnp, rate] = found.terms;
    expect(gnp).toMatchObject({ term: "RealGNP", firm: true, flippedBy: [] });
    expect(gnp!.pValues.largest).toBeLessThan(0.05);
    expect(rate!.firm).toBe(true);
    expect(constant!.pValues.smallest).toBe(Math.min(...found.choices.map(({ pValue }) => pValue[0]!)));
    for (const [j, term] of found.terms.entries()) {
      const flips = found.choices.some(({ pValue }) => pValue[j]! < 0.05 !== inForce.pValue[j]! < 0.05);
      expect(term.firm).toBe(!flips);
    }
  });

  it("is asked against the values given", () => {
    const at = fit.coefficients[1]! - 2.05 * inForce.standardErrors[1]!;
    const against = [0, at, 0];
    const covariance = covarianceOf(fit, { kind: "classical" });
    if (!covariance.ok) throw new Error("classical");
    const near = inferenceOf(fit, covariance.value, { reference: t, against, level: 0.05 });
    const result = firmness(fit, { inForce: near, against, level: 0.05, lags: null, adjusted: true });
    if (!result.ok) throw new Error(result.problem.code);
    // 2.05 standard errors: not enough for t with 16 degrees of freedom, enough for the normal law.
    expect(result.value.terms[1]!.firm).toBe(false);
    expect(result.value.terms[1]!.flippedBy).toContain("classical read against the normal distribution");
  });

  it("takes groups with their own degrees of freedom and no lags", () => {
    const random = randomFrom(8);
    const groups = Array.from({ length: 40 }, (_, i) => Math.floor(i / 5));
    const x = groups.map(() => random.normal());
    const y = x.map((value) => 1 + value + random.normal());
    const grouped = fitOf(designOf(y, [x], { order: inGroups(groups) }));
    const cr1 = tableOf(grouped, { kind: "grouped", version: "CR1" }, { law: "t", degreesOfFreedom: 7 });
    const { choices } = firmnessOf(grouped, cr1, null);
    expect(choices.filter(({ kind }) => kind === "newey-west")).toEqual([]);
    const own = choices.find(({ version, law }) => version === "CR1" && law === "t")!;
    own.pValue.forEach((p, j) => expectDigits(p, cr1.pValue[j]!, 12));
  });
});

describe("the ladder of lags", () => {
  it("holds every number to 2L + 4, below n", () => {
    expect(lagLadder(3, { rowCount: 96, columnCount: 4 })).toEqual([0, 1, 2, 3, 4, 5, 6, 7, 8, 9, 10]);
    expect(lagLadder(5, { rowCount: 9, columnCount: 2 })).toEqual([0, 1, 2, 3, 4, 5, 6, 7, 8]);
  });

  it("is thinned where rows are many, but keeps none, L and the last", () => {
    const ladder = lagLadder(1331, { rowCount: 1_048_575, columnCount: 21 });
    expect(ladder.length).toBeLessThan(8);
    expect(ladder).toEqual(expect.arrayContaining([0, 1331, 2666]));
    expect(ladder).toEqual([...ladder].sort((a, b) => a - b));
  });
});

describe("leaving one row out", () => {
  it("changes a coefficient most where n refits say so", () => {
    fc.assert(
      fc.property(fc.nat(9999), fc.integer({ min: 6, max: 30 }), (seed, n) => {
        const random = randomFrom(seed);
        const X = [0, 1].map(() => Array.from({ length: n }, () => 10 + random.normal()));
        const y = X[0]!.map((value) => value + random.normal());
        const fit = fitOf(designOf(y, X));
        const refits = y.map((_, row) =>
          fitOf(
            designOf(
              y.toSpliced(row, 1),
              X.map((column) => column.toSpliced(row, 1)),
            ),
          ),
        );
        leaveOneOut(fit).forEach(({ row, without, change }, j) => {
          const changes = refits.map(({ coefficients }) => coefficients[j]! - fit.coefficients[j]!);
          expect(Math.abs(change)).toBeGreaterThanOrEqual(Math.max(...changes.map(Math.abs)) * (1 - 1e-6));
          expectDigits(change, changes[row]!, 6);
          expectDigits(without, refits[row]!.coefficients[j]!, 6);
        });
      }),
      { seed: 19770212, numRuns: 40 },
    );
  });

  it("passes over a row that alone determines a coefficient", () => {
    const x = [1, 4, 2, 8, 5, 7, 3];
    const alone = [0, 0, 1, 0, 0, 0, 0];
    const fit = fitOf(designOf([3, 9, 100, 15, 12, 13, 7], [x, alone], { order: throughTime(7) }));
    const changes = leaveOneOut(fit);
    for (const { row, without } of changes) {
      expect(row).not.toBe(2);
      expect(Number.isFinite(without)).toBe(true);
    }
    const table = tableOf(fit, { kind: "classical" }, { law: "normal" });
    const versions = firmnessOf(fit, table, 1).choices.map(({ version }) => version);
    expect(new Set(versions)).toEqual(new Set([null, "HC0", "HC1"]));
  });
});

describe("choices in words", () => {
  const of = (kind: ChoiceName["kind"], law: ChoiceName["law"], member: string | number | null): ChoiceName => ({
    kind,
    law,
    version: typeof member === "string" ? member : null,
    lags: typeof member === "number" ? member : null,
  });
  const laws = ["t", "normal"] as const;
  const all = [
    ...laws.map((law) => of("classical", law, null)),
    ...["HC0", "HC3"].flatMap((version) => laws.map((law) => of("white", law, version))),
    ...[0, 1, 2, 4, 8].flatMap((lags) => laws.map((law) => of("newey-west", law, lags))),
  ];
  const some = (keep: (choice: ChoiceName) => boolean): string[] => choicesInWords(all.filter(keep), all);

  it("joins laws, versions and neighbouring lags", () => {
    expect(some(() => true)).toEqual(["classical", "White", "Newey-West with 0 to 8 lags"]);
    expect(some(({ law, kind }) => kind === "classical" && law === "normal")).toEqual([
      "classical read against the normal distribution",
    ]);
    expect(some(({ lags }) => lags !== null && lags !== 2)).toEqual(["Newey-West with 0 to 1 or 4 to 8 lags"]);
    expect(some(({ lags }) => lags === 1)).toEqual(["Newey-West with 1 lag"]);
    expect(some(({ version, law }) => version === "HC3" || (version === "HC0" && law === "t"))).toEqual([
      "White read against the t distribution",
      "White (HC3) read against the normal distribution",
    ]);
    expect(some(() => false)).toEqual([]);
  });
});
