import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { durbinWatson } from "../../../../src/core/diagnostics/durbinWatson.ts";
import { breaksGuard } from "../../../../src/core/diagnostics/guards/breaks.ts";
import { collinearity } from "../../../../src/core/diagnostics/guards/collinearity.ts";
import { collinearityGuard } from "../../../../src/core/diagnostics/guards/collinearityGuard.ts";
import { rowsGuard } from "../../../../src/core/diagnostics/guards/rows.ts";
import { trending, trendingGuard } from "../../../../src/core/diagnostics/guards/trending.ts";
import { unitRoot, unitRootPoints } from "../../../../src/core/diagnostics/guards/unitRoot.ts";
import { largestChow } from "../../../../src/core/diagnostics/largestChow.ts";
import { randomFrom } from "../../../support/random.ts";
import { expectDigits } from "../../../support/digits.ts";
import {
  designOf,
  fitOf,
  inGroups,
  reference,
  referenceFit,
  referenceIds,
  throughTime,
} from "../../../support/referenceFit.ts";

interface Found {
  readonly influence: { readonly vif: readonly number[]; readonly condition: number };
  readonly followOn?: { readonly unitRoot: Readonly<Record<string, number>> };
}
const { figures, unitRootPoints: points } = JSON.parse(
  readFileSync(new URL("../../../reference/diagnostics/secondLibrary.json", import.meta.url), "utf8"),
) as { readonly figures: Readonly<Record<string, Found>>; readonly unitRootPoints: Readonly<Record<string, number[]>> };

describe("collinearity", () => {
  it.each(referenceIds)("variance inflation of %s", (id) => {
    const known = [reference(id).vif ?? []].flat();
    const { terms } = collinearity(referenceFit(id));
    known.forEach((vif, j) => expectDigits(terms[j]!.inflation, vif, 10));
    expect(terms).toHaveLength(reference(id).drivers.length);
  });

  it.each(Object.entries(figures))(
    "condition of %s as in the second library",
    (id, { influence: { vif, condition } }) => {
      const found = collinearity(referenceFit(id));
      expectDigits(found.conditionNumber, condition, 8);
      vif.forEach((value, j) => expectDigits(found.terms[j]!.inflation, value, 9));
    },
  );

  const random = randomFrom(64);
  const columns = Array.from({ length: 4 }, () => Array.from({ length: 50 }, () => 10 + random.normal()));
  const sum = columns[0]!.map((value, i) => value + columns[1]![i]! + 0.02 * random.normal());
  const y = columns[2]!.map((value) => value + random.normal());
  const names = ["Price", "Fuel", "Rent", "Total"];

  it("names the columns that make up a near dependency", () => {
    const fit = fitOf(designOf(y, [columns[0]!, columns[1]!, columns[2]!, sum], { names }));
    const found = collinearity(fit);
    expect(found.terms.map(({ inflation }) => inflation > 10)).toEqual([true, true, false, true]);
    expect(found.terms.find(({ term }) => term === "Total")!.madeOf).toHaveLength(2);
    expect(new Set(found.terms.find(({ term }) => term === "Total")!.madeOf)).toEqual(new Set(["Price", "Fuel"]));
    for (const { term, madeOf } of found.terms.slice(0, 2))
      expect([term, madeOf]).toEqual([term, ["Total", term === "Price" ? "Fuel" : "Price"]]);
    const [closest] = found.dependencies;
    const carried = closest!.shares.filter(({ share }) => share > 0.5).map(({ term }) => term);
    expect(carried).toEqual(["Price", "Fuel", "Total"]);
    expect(closest!.index).toBeCloseTo(found.conditionNumber, 6);
    for (const { shares } of found.dependencies)
      for (const { share } of shares) expect(share >= 0 && share <= 1).toBe(true);
    const guard = collinearityGuard(found);
    expect(guard.finding).toBe("worth knowing");
    expect(guard.sentences[0]).toMatch(
      /^Total is nearly made up of (Price and Fuel|Fuel and Price): its standard error is \d+ times what it would be/,
    );
  });

  it("finds nothing among drivers that do not move together", () => {
    const fit = fitOf(designOf(y, columns, { names }));
    expect(collinearityGuard(collinearity(fit))).toMatchObject({ finding: "nothing found" });
    // Columns about 10 with a deviation of 1: the indices reach 20, not 30.
    expect(collinearity(fit).conditionNumber).toBeGreaterThan(15);
    expect(collinearity(fit).dependencies).toEqual([]);
    expect(collinearityGuard(collinearity(referenceFit("longley")))).toMatchObject({
      guard: "collinearity",
      finding: "worth knowing",
    });
  });

  it("calls a dependency near from a condition index of 30 on", () => {
    const x = Array.from({ length: 50 }, () => random.normal());
    const beside = (noise: number): number[] => x.map((value) => value + noise * random.normal());
    const loose = collinearity(fitOf(designOf(y, [x, beside(0.2)])));
    expect(loose.conditionNumber).toBeGreaterThan(5);
    expect(loose.dependencies).toEqual([]);
    expect(collinearity(fitOf(designOf(y, [x, beside(0.02)]))).dependencies).toHaveLength(1);
  });

  it("does not change with a driver's unit", () => {
    const one = collinearity(fitOf(designOf(y, columns)));
    const other = collinearity(
      fitOf(
        designOf(
          y,
          columns.map((column, j) => (j === 1 ? column.map((x) => 1000 * x) : column)),
        ),
      ),
    );
    expectDigits(other.conditionNumber, one.conditionNumber, 11);
    one.terms.forEach(({ inflation }, j) => expectDigits(other.terms[j]!.inflation, inflation, 11));
  });
});

describe("trending series", () => {
  it.each(Object.entries(figures).filter(([, { followOn }]) => followOn !== undefined))(
    "unit root of the residuals of %s",
    (id, { followOn }) => {
      const { residuals } = referenceFit(id);
      for (const [lags, statistic] of Object.entries(followOn!.unitRoot)) {
        const found = unitRoot(residuals, { variables: 2, deterministic: "constant", lags: Number(lags) });
        expectDigits(found!.statistic, statistic, 9);
      }
    },
  );

  it.each(Object.entries(points))("points at %s", (key, expected) => {
    const [trend, variables, rows] = key.split(" ");
    const found = unitRootPoints(Number(variables), trend === "c" ? "constant" : "trend", Number(rows));
    found!.forEach((value, i) => expectDigits(value, expected[i]!, 12));
  });

  function walks(seed: number, n: number, linked: number) {
    const random = randomFrom(seed);
    let [level, other] = [50, 20];
    const x = Array.from({ length: n }, () => (level += random.normal()));
    const y = x.map((value) => linked * value + (1 - linked) * (other += random.normal()) + 0.5 * random.normal());
    return fitOf(designOf(y, [x], { order: throughTime(n) }));
  }

  it("are told from series that belong together", () => {
    const apart = walks(3, 120, 0);
    const found = trending(apart, durbinWatson(apart))!;
    expect(found.unitRoot!.lags).toBe(4);
    const guard = trendingGuard({ ...found, suspected: true });
    expect(found.unitRoot!.statistic).toBeGreaterThan(found.unitRoot!.critical![1]);
    expect(guard.finding).toBe("look into it");
    expect(guard.sentences[1]).toMatch(/not shown to return to zero/);
    const together = walks(3, 120, 1);
    const linked = trending(together, durbinWatson(together))!;
    expect(linked.suspected).toBe(false);
    expect(trendingGuard(linked).finding).toBe("nothing found");
    expect(trendingGuard({ ...linked, suspected: true })).toMatchObject({ finding: "worth knowing" });
    // Between the 5 % and the 10 % point.
    const undecided = { statistic: -3.2, lags: 2, critical: [-4, -3.4, -3.1] } as const;
    expect(trendingGuard({ ...linked, suspected: true, unitRoot: undecided })).toMatchObject({
      finding: "look into it",
    });
    const manyDrivers = { ...undecided, critical: null };
    expect(trendingGuard({ ...linked, suspected: true, unitRoot: manyDrivers }).sentences[1]).toMatch(
      /too many drivers/,
    );
  });

  it("are not asked of cases, and without the unit root across gaps", () => {
    const cases = referenceFit("mtcars");
    expect(trending(cases, durbinWatson(cases))).toBeNull();
    const { y, X } = reference("investment");
    const gapped = fitOf(
      designOf(y, X, {
        order: throughTime(
          19,
          y.map((_, i) => (i < 9 ? i : i + 1)),
        ),
      }),
    );
    const found = trending(gapped, durbinWatson(gapped))!;
    expect(found.unitRoot).toBeNull();
    expect(trendingGuard({ ...found, suspected: true }).sentences[1]).toMatch(/could not be tested/);
  });
});

describe("rows and breaks", () => {
  it("counts gaps and says that they keep their place", () => {
    const order = throughTime(4, [0, 1, 4, 5]);
    expect(rowsGuard({ ...order, gapLabels: ["March 2021", "April 2021"] } as typeof order)).toEqual({
      guard: "time",
      finding: "worth knowing",
      sentences: [
        "2 rows are not used: March 2021 and April 2021.",
        "Each keeps its place: rows on either side of it are not taken for neighbours.",
      ],
    });
    expect(rowsGuard(throughTime(4))).toBeNull();
    expect(rowsGuard({ kind: "cases" })).toBeNull();
  });

  it("counts groups and weighs the largest", () => {
    const few = rowsGuard(inGroups([0, 0, 0, 0, 0, 1, 2, 3]));
    expect(few).toMatchObject({ guard: "groups", finding: "look into it" });
    expect(few!.sentences).toHaveLength(2);
    expect(few!.sentences[1]).toBe('"0" holds 63 % of the rows, so that there are fewer groups than it seems.');
    expect(rowsGuard(inGroups(Array.from({ length: 100 }, (_, i) => Math.floor(i / 2))))).toMatchObject({
      finding: "nothing found",
    });
  });

  it("says where the coefficients change", () => {
    const at = (level: number) => ({ level, followsOn: false });
    const outcomes = [largestChow(referenceFit("investment"))];
    const found = breaksGuard(outcomes, at(0.05), (row) => String(1964 + row));
    expect(found).toMatchObject({ guard: "breaks", finding: "look into it" });
    expect(found!.sentences[0]).toMatch(/It is largest between 1975 and 1976\.$/);
    expect(breaksGuard(outcomes, at(1e-20), String)).toMatchObject({ finding: "nothing found" });
    expect(breaksGuard([], at(0.05), String)).toBeNull();
  });
});
