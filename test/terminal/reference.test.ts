import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { digitsOf } from "../support/digits.ts";
import { shelf, terminal } from "../support/terminal.ts";

/**
 * From a file to the JSON of the terminal, against figures that R's sandwich and lmtest found for published data
 * (test/reference, SOURCES.md): the whole chain, not the estimators alone.
 */
interface Reference {
  readonly rows: "time" | "unordered";
  readonly outcome: string;
  readonly drivers: string | readonly string[];
  readonly y: readonly number[];
  readonly X: readonly (readonly number[])[];
  readonly coefficients: readonly number[];
  readonly sigma: number;
  readonly r2: number;
  readonly adj_r2: number;
  readonly rss: number;
  readonly logLik: number;
  readonly AIC: number;
  readonly BIC: number;
  readonly se: Readonly<Record<string, readonly number[]>>;
  readonly ratio: Readonly<Record<"classical" | "HC3", Readonly<Record<"t" | "p_t" | "p_normal", readonly number[]>>>>;
  readonly interval95: Readonly<Record<"classical" | "HC3", Readonly<Record<"low_t" | "high_t", readonly number[]>>>>;
  readonly newey_west?: readonly { lag: number; se: readonly number[]; se_adjusted: readonly number[] }[];
  readonly influence_top5_by_cook: { readonly row: readonly number[]; readonly cook: readonly number[] };
  readonly tests: Readonly<Record<string, { statistic: number; p: number; df: number | readonly number[] }>>;
}

interface Printed {
  readonly terms: readonly string[];
  readonly coefficients: readonly number[];
  readonly standardErrors: {
    readonly classical: readonly number[];
    readonly white: Readonly<Record<string, readonly number[]>>;
    readonly neweyWest: {
      readonly lags: number;
      readonly adjusted: readonly number[];
      readonly unadjusted: readonly number[];
    };
  };
  readonly fit: Readonly<Record<string, number>>;
  readonly tests: {
    readonly koenker: Figure;
    readonly white: Figure & { readonly form: string };
    readonly chow?: Figure;
    readonly "breusch-godfrey"?: readonly { order: number; chiSquare: Figure; f: Figure }[];
  };
  readonly guards: { readonly rows: readonly { row: number; cell: string; cook: number }[] };
  readonly inference: Readonly<Record<"classical" | "white", Readonly<Record<string, readonly number[]>>>>;
}

interface Figure {
  readonly statistic: number;
  readonly df: readonly number[];
  readonly pValue: number;
}

const reference = (id: string): Reference =>
  JSON.parse(readFileSync(new URL(`../reference/${id}.json`, import.meta.url), "utf8")) as Reference;

const driversOf = ({ drivers }: Reference): readonly string[] => [drivers].flat();

/** The data as a file: numbers with all their digits. */
function csvOf(data: Reference): string {
  const rows = data.y.map((y, row) => [y, ...data.X.map((column) => column[row]!)].join(","));
  return [[data.outcome, ...driversOf(data)].join(","), ...rows].join("\n");
}

async function printed(data: Reference, lags: number | null): Promise<Printed> {
  const rows = data.rows === "time" ? ["--rows", "time"] : ["--rows", "cases"];
  const lagged = lags === null ? [] : ["--lags", String(lags)];
  const words = ["answer", "data.csv", "--outcome", data.outcome, "--drivers", driversOf(data).join(",")];
  const ran = await terminal([...words, ...rows, ...lagged, "--json"], shelf({ "data.csv": csvOf(data) }));
  expect([ran.status, ran.err]).toEqual([0, ""]);
  return JSON.parse(ran.out) as Printed;
}

function expectAll(found: readonly number[] | undefined, expected: readonly number[], what: string, digits = 10): void {
  expect(found?.length, what).toBe(expected.length);
  expected.forEach((value, index) => {
    expect(
      digitsOf(found?.[index] ?? Number.NaN, value),
      `${what} ${index}: ${found?.[index]} for ${value}`,
    ).toBeGreaterThan(digits);
  });
}

/** Longley's columns are so nearly dependent that R itself carries fewer digits there, least at an end of an interval near zero; the covariances' own test, at 60 digits, shows which is right. */
const digitsThatRReaches: Readonly<Record<string, number>> = { longley: 6.5 };

describe.each(["longley", "school-scores-3", "investment", "orange-juice-6-lags", "cars"])("%s", (id) => {
  const data = reference(id);
  const digits = digitsThatRReaches[id] ?? 10;

  it("has R's coefficients, standard errors and fit", async () => {
    const found = await printed(data, null);
    expect(found.terms).toEqual(["constant", ...driversOf(data)]);
    expectAll(found.coefficients, data.coefficients, "coefficients", digits);
    expectAll(found.standardErrors.classical, data.se["classical"]!, "classical", digits);
    for (const version of ["HC0", "HC1", "HC2", "HC3", "HC4", "HC4m", "HC5"]) {
      expectAll(found.standardErrors.white[version], data.se[version]!, version, digits);
    }
    const { sigma, rSquared, adjustedRSquared, rss, logLikelihood, aic, bic } = found.fit;
    const fit = [sigma!, rSquared!, adjustedRSquared!, rss!, logLikelihood!, aic!, bic!];
    expectAll(fit, [data.sigma, data.r2, data.adj_r2, data.rss, data.logLik, data.AIC, data.BIC], "fit", digits);
  });

  it("has R's ratios, p-values and intervals", async () => {
    const { inference } = await printed(data, null);
    const kinds = [
      ["classical", "classical"],
      ["white", "HC3"],
    ] as const;
    for (const [ours, theirs] of kinds) {
      expectAll(inference[ours]["ratio"], data.ratio[theirs].t, `${theirs} ratio`, digits);
      expectAll(inference[ours]["pValueNormal"], data.ratio[theirs].p_normal, `${theirs} p normal`, digits);
      expectAll(inference[ours]["pValueT"], data.ratio[theirs].p_t, `${theirs} p t`, digits);
      expectAll(inference[ours]["low"], data.interval95[theirs].low_t, `${theirs} low`, digits);
      expectAll(inference[ours]["high"], data.interval95[theirs].high_t, `${theirs} high`, digits);
    }
  });

  it("has R's tests of spread", async () => {
    const { tests } = await printed(data, null);
    const expectTest = (found: Figure, name: string): void => {
      const expected = data.tests[name]!;
      expectAll([found.statistic, found.pValue], [expected.statistic, expected.p], name, 10);
      expect(found.df).toEqual([expected.df].flat());
    };
    expectTest(tests.koenker, "breusch_pagan_koenker");
    if (data.tests["white"] !== undefined && tests.white.form === "squares and cross-products")
      expectTest(tests.white, "white");
    else expect(["squares", "fitted values"]).toContain(tests.white.form);
  });
});

describe.each(["longley", "investment", "orange-juice-6-lags"])("%s through time", (id) => {
  const data = reference(id);
  const digits = digitsThatRReaches[id] ?? 10;

  it("has R's Newey-West at each number of lags, and its tests of follow-on", async () => {
    for (const { lag, se, se_adjusted } of data.newey_west!) {
      const { neweyWest } = (await printed(data, lag)).standardErrors;
      expect(neweyWest.lags).toBe(lag);
      expectAll(neweyWest.unadjusted, se, `lags ${lag}`, digits);
      expectAll(neweyWest.adjusted, se_adjusted, `lags ${lag} adjusted`, digits);
    }
    const orders = (await printed(data, null)).tests["breusch-godfrey"] ?? [];
    for (const { order, chiSquare, f } of orders) {
      const expected = data.tests[`breusch_godfrey_chisq_${order}`];
      const expectedF = data.tests[`breusch_godfrey_F_${order}`];
      if (expected === undefined || expectedF === undefined) continue;
      expectAll([chiSquare.statistic, chiSquare.pValue], [expected.statistic, expected.p], `LM ${order}`, digits);
      expectAll([f.statistic, f.pValue], [expectedF.statistic, expectedF.p], `F ${order}`, digits);
    }
    expect(orders.some(({ order }) => order === 1)).toBe(true);
  });

  it("has R's Chow test at half of the rows, and knows influential rows by their cells", async () => {
    const found = await printed(data, null);
    const expected = data.tests["chow_at_half"]!;
    expectAll(
      [found.tests.chow!.statistic, found.tests.chow!.pValue],
      [expected.statistic, expected.p],
      "Chow",
      digits - 1,
    );
    const [first] = found.guards.rows;
    expect(first!.row).toBe(data.influence_top5_by_cook.row[0]! + 1);
    expect(first!.cell).toBe(`data!A${first!.row}`);
    expectAll([first!.cook], [data.influence_top5_by_cook.cook[0]!], "Cook", digits);
  });
});
