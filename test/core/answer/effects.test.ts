import { describe, expect, it } from "vitest";
import { effectOf } from "../../../src/core/answer/effects.ts";
import { type Spoken, driverSentence } from "../../../src/core/answer/verdict.ts";
import type { TermMeaning } from "../../../src/core/design/design.ts";
import type { Transform } from "../../../src/core/design/model.ts";

const none: Transform = { kind: "none" };
const numberOf = (column: string, transform: Transform = none): TermMeaning => ({ kind: "number", column, transform });
const repairs = (transform: Transform = none) => ({ column: "Repairs", transform });

const decision: Spoken["decision"] = {
  policy: "careful",
  fourCase: { spread: "even", followOn: "some" },
  called: {
    errors: { kind: "newey-west", lags: { kind: "given", lags: 4 }, adjusted: true },
    reference: { law: "normal" },
  },
  inForce: {
    errors: { kind: "newey-west", lags: { kind: "given", lags: 4 }, adjusted: true },
    reference: { law: "normal" },
  },
  because: "the errors follow on from month to month",
  override: null,
  testLevel: 0.1,
  restsOn: [],
  cautions: [],
};

interface Said {
  readonly meaning: TermMeaning;
  readonly figures: readonly [coefficient: number, low: number, high: number, pValue: number];
  readonly outcome?: { column: string; transform: Transform };
  readonly units?: Readonly<Record<string, string>>;
  readonly against?: number;
  readonly firmness?: Spoken["driver"]["firmness"];
}

function said({
  meaning,
  figures,
  outcome = repairs(),
  units = {},
  against = 0,
  firmness = { kind: "firm" },
}: Said): string {
  const [coefficient, low, high, pValue] = figures;
  const term = "column" in meaning ? meaning.column : meaning.kind;
  const { kind } = meaning;
  const driver = { term, kind, coefficient, low, high, pValue, against, standardError: 1, ratio: 1, firmness };
  const effect = effectOf({ meaning, outcome, units });
  return driverSentence({
    proviso: "",
    subject: term,
    driver,
    effect,
    decision,
    lags: 4,
    level: 0.05,
    agreeing: "all three kinds of standard error",
  });
}

describe("what a coefficient goes with, in words", () => {
  it.each<[string, Said, string]>([
    [
      "in the units given",
      {
        meaning: numberOf("Rainy days"),
        figures: [-3.1, -5, -1.2, 0.0014],
        units: { "Rainy days": "rainy day", Repairs: "repairs a month" },
      },
      "One more rainy day goes with 3.1 fewer repairs a month (between 1.2 and 5.0 fewer, 95 %). This is firm: all three kinds of standard error agree.",
    ],
    [
      "without units",
      { meaning: numberOf("Price"), figures: [2.26, 0.4, 4.1, 0.018] },
      "Price higher by 1 goes with Repairs higher by 2.3 (between 0.4 and 4.1 higher, 95 %).",
    ],
    [
      "of a driver's earlier value",
      { meaning: numberOf("Price", { kind: "lag", periods: 1 }), figures: [2.26, 0.4, 4.1, 0.018] },
      "Price higher by 1, one period earlier, goes with Repairs higher by 2.3 (between 0.4 and 4.1 higher, 95 %).",
    ],
    [
      "of a driver's earlier value in units, where nothing shows",
      {
        meaning: numberOf("Rainy days", { kind: "lag", periods: 2 }),
        figures: [-0.4, -1.6, 0.8, 0.5],
        units: { "Rainy days": "rainy day" },
      },
      "One more rainy day, 2 periods earlier, could go with Repairs anywhere from 1.6 lower to 0.8 higher (95 %).",
    ],
    [
      "both in logarithms",
      {
        meaning: numberOf("Price", { kind: "logarithm" }),
        figures: [-0.8, -1.2, -0.4, 0.0001],
        outcome: repairs({ kind: "logarithm" }),
      },
      "1 % more Price goes with 0.79 % less Repairs (between 0.40 % and 1.19 % less, 95 %).",
    ],
    [
      "outcome in logarithms",
      { meaning: numberOf("Price"), figures: [0.05, 0.02, 0.08, 0.001], outcome: repairs({ kind: "logarithm" }) },
      "Price higher by 1 goes with 5.1 % more Repairs (between 2.0 % and 8.3 % more, 95 %).",
    ],
    [
      "a category",
      { meaning: { kind: "level", column: "Region", level: "North", base: "South" }, figures: [12, 8, 16, 0.0002] },
      "Region North, compared with South, goes with Repairs higher by 12.0 (between 8.0 and 16.0 higher, 95 %).",
    ],
    [
      "a trend",
      { meaning: { kind: "trend", unit: "month" }, figures: [0.5, 0.1, 0.9, 0.02] },
      "Each further month goes with Repairs higher by 0.50 (between 0.10 and 0.90 higher, 95 %).",
    ],
    [
      "a growth rate of the outcome",
      {
        meaning: numberOf("Price"),
        figures: [1.5, 0.5, 2.5, 0.004],
        outcome: repairs({ kind: "growth rate", periods: 1 }),
      },
      "Price higher by 1 goes with 1.5 percentage points more growth of Repairs (between 0.5 and 2.5 percentage points more, 95 %).",
    ],
  ])("%s", (_, about, sentence) => {
    expect(said(about)).toContain(sentence);
  });

  it.each([
    [
      { Repairs: "repairs a month" },
      none,
      1,
      "could go with anything from 4.1 fewer to 1.6 more repairs a month (95 %)",
    ],
    [{}, { kind: "logarithm" }, 0.01, "could go with anything from 4.0 % less to 1.6 % more Repairs (95 %)"],
    [
      {},
      { kind: "change", periods: 1 },
      1,
      "could go with the change of Repairs anywhere from 4.1 lower to 1.6 higher (95 %)",
    ],
  ] as const)("says what remains possible in the outcome's own terms", (units, transform, scale, words) => {
    const sentence = said({
      meaning: numberOf("Price"),
      figures: [-1.2 * scale, -4.1 * scale, 1.6 * scale, 0.36],
      outcome: repairs(transform),
      units,
    });
    expect(sentence).toContain(words);
  });

  it("says that nothing can be shown, and what remains possible", () => {
    const sentence = said({ meaning: numberOf("Price"), figures: [-1.2, -4.1, 1.6, 0.36] });
    expect(sentence).toContain(
      "Price: no effect can be shown (p = 0.36). Price higher by 1 could go with Repairs anywhere from 4.1 lower to 1.6 higher (95 %).",
    );
  });

  it("says what the conclusion leans on, and why the kind in force counts all the same", () => {
    const leaning = { kind: "leaning", on: ["classical", "White (HC0, HC1)"], farthest: 0.0312 } as const;
    expect(said({ meaning: numberOf("Price"), figures: [-1.2, -4.1, 1.6, 0.14], firmness: leaning })).toContain(
      "This leans on the choice: classical and White (HC0, HC1) would have said otherwise (down to p = 0.031), but the errors follow on from month to month.",
    );
    expect(
      said({ meaning: numberOf("Price"), figures: [-1.2, -2, -0.4, 0.01], firmness: { ...leaning, farthest: 0.12 } }),
    ).toContain("would say otherwise (up to p = 0.12).");
  });

  it("holds the coefficient against another value", () => {
    expect(said({ meaning: numberOf("Price"), figures: [-1.4, -1.8, -1.02, 0.04], against: -1 })).toContain(
      "Price: the coefficient -1.40 (between -1.80 and -1.02, 95 %) differs from the tested value -1 (p = 0.040).",
    );
  });

  it("never speaks of causes or proofs", () => {
    const sentences = [
      said({ meaning: numberOf("Price"), figures: [2.25, 0.4, 4.1, 0.018] }),
      said({ meaning: numberOf("Price"), figures: [-1.2, -4.1, 1.6, 0.36] }),
    ];
    expect(sentences.join(" ")).not.toMatch(/caus|prov|accept|signific/i);
  });
});
