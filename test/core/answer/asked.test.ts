import { describe, expect, it } from "vitest";
import { analyse } from "../../../src/core/answer/analyse.ts";
import type { Answer } from "../../../src/core/answer/answer.ts";
import { inquire } from "../../../src/core/answer/inquire.ts";
import { readSettings } from "../../../src/core/answer/settings.ts";
import type { Model } from "../../../src/core/design/model.ts";
import type { Result } from "../../../src/core/problem/result.ts";
import type { Source } from "../../../src/core/table/source.ts";
import { tTwoSided } from "../../../src/core/numeric/distributions.ts";
import { answerJson } from "../../../src/terminal/answerJson.ts";
import { driver, modelWith } from "../../support/models.ts";
import { toCellColumn } from "../../support/cellColumns.ts";

const n = 60;
const price = Array.from({ length: n }, (_, i) => 3 + ((i * 7) % 11) / 2);
const rain = Array.from({ length: n }, (_, i) => ((i * 13) % 17) - 5);
const columns = {
  Repairs: price.map((x, i) => 40 + 6 * x - 0.5 * x ** 2 - 0.75 * rain[i]! + ((i * 29) % 19) / 6),
  Price: price,
  "Price squared": price.map((x) => x ** 2),
  Rain: rain,
};
const source: Source = {
  rowCount: n,
  columns: Object.entries(columns).map(([name, cells], column) => ({
    name,
    place: { kind: "argument", argument: "data", column, firstRow: 1 },
    cells: toCellColumn(cells),
  })),
};
const model: Model = modelWith({ drivers: ["Price", "Price squared", "Rain"].map((name) => driver(name)) });

function ask(settings: readonly (readonly [string, string])[], over = model): Result<Answer> {
  const read = readSettings(settings);
  return read.ok ? analyse({ source, model: over, options: read.value.options }, () => undefined) : read;
}

function answerTo(...settings: readonly (readonly [string, string])[]): Answer {
  const answer = ask(settings);
  if (!answer.ok) throw new Error(JSON.stringify(answer.problem));
  return answer.value;
}

const classical = ["errors", "classical"] as const;

describe("numbers made of the coefficients", () => {
  it("a coefficient by itself is what the answer says of it, against any value and on either side", () => {
    const answer = answerTo(["estimates", "Rain, Rain = -1, Rain > -1, Rain < -1"], classical, [
      "against",
      "Rain = -1",
    ]);
    const [zero, both, above, below] = answer.estimates.map(({ estimate }) => estimate!);
    const own = answer.drivers[3]!;
    expect(zero).toMatchObject({
      value: own.coefficient,
      standardError: expect.closeTo(own.standardError, 13) as number,
    });
    expect(both!.pValue).toBeCloseTo(own.pValue, 13);
    expect([both!.low, both!.high]).toEqual([expect.closeTo(own.low, 12), expect.closeTo(own.high, 12)]);
    expect(own.ratio).toBeGreaterThan(0);
    expect(above!.pValue).toBeCloseTo(own.pValue / 2, 13);
    expect(below!.pValue).toBeCloseTo(1 - own.pValue / 2, 13);
  });

  it("a turning point is that of the curve that was drawn, and stands in the verdict", () => {
    const answer = answerTo(["estimates", "-Price / (2 * Price squared)"], ["units", "Repairs = repairs"]);
    const [b, c] = [answer.coefficients[1]!, answer.coefficients[2]!];
    const { estimate } = answer.estimates[0]!;
    expect(estimate!.value).toBeCloseTo(-b / (2 * c), 12);
    expect(Math.abs(estimate!.value - 6)).toBeLessThan(0.5);
    expect(answer.verdict.find((sentence) => sentence.startsWith("-Price"))).toMatch(
      /^-Price \/ \(2 \* Price squared\): the estimate is 6\.\d+ \(between [56]\.\d+ and [56]\.\d+, 95 %\); it differs from 0 \(p under 0\.0001\)\.$/,
    );
  });

  it("says what one side shows, and what cannot be had", () => {
    const answer = answerTo(["estimates", "Rain < 0, Rain > 0, Price / (Rain - Rain + 1e-9 * Rain)"]);
    const sentences = answer.verdict.filter((sentence) => sentence.includes(": the estimate is"));
    expect(sentences[0]).toMatch(/that it is below 0 is shown \(one-sided p under 0\.0001\)\.$/);
    expect(sentences[1]).toMatch(/that it is above 0 cannot be shown \(one-sided p = 1\.00\)\.$/);
    expect(answer.estimates).toHaveLength(3);
  });

  it("warns of a quotient over what may be zero", () => {
    const answer = answerTo(["estimates", "Price / (Rain + 0.75)"]);
    expect(answer.verdict.find((sentence) => sentence.startsWith("Price /"))).toContain("cannot be told from zero");
  });

  it("names what it does not know", () => {
    expect(ask([["estimates", "Prize + Rain"]])).toMatchObject({
      problem: { code: "unknown-coefficient", name: "Prize", nearest: "Price" },
    });
    expect(ask([["joint test", "Price = 0, Rain > 0"]])).toMatchObject({
      problem: { code: "unknown-value", setting: "joint test", value: "Rain > 0" },
    });
    expect(ask([["joint test", "Price / Rain = 1"]])).toMatchObject({
      problem: { code: "unknown-value", setting: "joint test" },
    });
  });

  it("knows a driver by its column where one term is made of it", () => {
    const logarithm = { ...model, drivers: [driver("Price", { transform: { kind: "logarithm" } }), driver("Rain")] };
    const answer = ask([["estimates", "Price = 1, logarithm of Price"]], logarithm);
    if (!answer.ok) throw new Error(answer.problem.code);
    expect(answer.value.estimates.map(({ estimate }) => estimate?.value)).toEqual(
      Array(2).fill(answer.value.coefficients[1]),
    );
  });
});

describe("a joint test that was asked for", () => {
  it("of one equation is the square of its ratio, under every kind", () => {
    const answer = answerTo(["joint test", "Rain = -1"], classical, ["against", "Rain = -1"]);
    const { asked } = answer.joint;
    const square = answer.drivers[3]!.ratio ** 2;
    expect(asked).toMatchObject({
      texts: ["Rain = -1"],
      inForce: { figure: { law: "F", df: [1, 56], statistic: expect.closeTo(square, 8) as number } },
      neweyWest: null,
      grouped: null,
    });
    expect(asked!.inForce).toEqual(asked!.classical);
    if (asked!.inForce.kind !== "computed") throw new Error("not computed");
    expect(asked!.inForce.figure.pValue).toBeCloseTo(tTwoSided(answer.drivers[3]!.ratio, 56), 12);
  });

  it("of two is what the inquiry gives for the same weights, and is said in the verdict", () => {
    const answer = answerTo(["joint test", "Price = 6, 2 * Price squared + 1 = Rain + 0.75"]);
    const errors = answer.decision.inForce.errors;
    const restrictions = {
      weights: [
        [0, 1, 0, 0],
        [0, 0, 2, -1],
      ],
      equals: [6, -0.25],
    };
    const found = inquire({ source, model }, { kind: "joint test", errors, restrictions });
    expect(found).toMatchObject({ value: { outcome: answer.joint.asked!.inForce } });
    expect(answer.verdict.find((sentence) => sentence.startsWith("Price = 6 and 2 * Price squared"))).toMatch(
      /, taken together: compatible with the data \((F|chi-square)\([\d, ]+\) = \d\.\d\d, p = 0\.\d+\)\.$/,
    );
    expect(answerTo(["joint test", "Rain = 0"]).verdict.join(" ")).toMatch(/Rain = 0: the data speak against it \(/);
    expect(answerJson(answer)).toMatchObject({ joint: { asked: { texts: answer.joint.asked!.texts } } });
  });

  it("says when two equations say the same", () => {
    const { verdict } = answerTo(["joint test", "Rain = 0, 2 * Rain = 0"]);
    expect(verdict.join(" ")).toContain("Rain = 0 and 2 * Rain = 0, taken together: cannot be tested, because the");
  });

  it("is not there where nothing was asked", () => {
    const answer = answerTo();
    expect(answer.joint.asked).toBeNull();
    expect(answerJson(answer)).toMatchObject({ estimates: [] });
  });
});
