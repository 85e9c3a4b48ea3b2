import { describe, expect, it } from "vitest";
import { examplesFor, readAsked } from "../../src/app/asking.ts";
import { inlineAnalyst } from "../../src/worker/inlineAnalyst.ts";
import type { ColumnDetails } from "../../src/app/setup.ts";
import type { Answered } from "../../src/app/state.ts";
import { paneBench } from "../support/paneBench.ts";

/** The pane with a true answer, after what was changed in its set-up. */
async function answeredPane() {
  const bench = paneBench();
  bench.analyse = inlineAnalyst.analyse;
  await bench.read();
  await bench.answer();
  return bench;
}

const answeredOf = (bench: { readonly state: () => { readonly answered: Answered | null } }): Answered => {
  const { answered } = bench.state();
  if (answered === null) throw new Error("no answer");
  return answered;
};

describe("what is typed to be asked of the coefficients", () => {
  it("is read with the names of the answer shown", async () => {
    const answered = answeredOf(await answeredPane());
    expect(readAsked("estimates", " Price index + Advertising , Rainy days < 0", answered)).toEqual({
      texts: ["Price index + Advertising", "Rainy days < 0"],
      problem: null,
    });
    expect(readAsked("estimates", "Price indx", answered).problem).toEqual({
      code: "unknown-coefficient",
      name: "Price indx",
      nearest: "Price index",
    });
    expect(readAsked("jointTest", "Advertising > 0", answered).problem).toMatchObject({
      code: "unknown-value",
      setting: "joint test",
      value: "Advertising > 0",
    });
  });

  it("is left to the next answer where the set-up has changed, since its coefficients may be others", async () => {
    const answered = answeredOf(await answeredPane());
    const outdated = { ...answered, outdated: { because: "set-up" } as const };
    expect(readAsked("estimates", "Anything", outdated).problem).toBeNull();
    expect(readAsked("estimates", "Anything", null).problem).toBeNull();
    const cells = { ...answered, outdated: { because: "cells", cell: "Months!B2" } as const };
    expect(readAsked("estimates", "Anything", cells).problem).not.toBeNull();
  });

  it("goes to the question and comes back in the answer", async () => {
    const bench = await answeredPane();
    const { options } = bench.state().setup!;
    const asked = { estimates: ["Price index + Advertising"], jointTest: ["Advertising = 0", "Rainy days = 0"] };
    bench.pane.store.dispatch({ kind: "setup changed", change: { options: { ...options, ...asked } } });
    await bench.answer();
    const { answer } = answeredOf(bench);
    expect(bench.questions.at(-1)!.options).toMatchObject(asked);
    const [, price, advertising] = answer.coefficients;
    expect(answer.estimates[0]!.estimate!.value).toBeCloseTo(price! + advertising!, 9);
    expect(answer.joint.asked!.texts).toEqual(asked.jointTest);
    // Screen readers are told with the rest of the verdict.
    expect(bench.said()).toContain("Price index + Advertising: the estimate is");
    expect(bench.said()).toContain("Advertising = 0 and Rainy days = 0, taken together:");
  });
});

describe("examples of what may be asked", () => {
  it("are made of the drivers there are, and every one can be asked", async () => {
    const answered = answeredOf(await answeredPane());
    const { estimates, jointTest } = examplesFor(answered.answer);
    expect(estimates.map(({ typed }) => typed)).toEqual([
      "Price index + Advertising",
      "Price index = 1",
      "Price index > 0",
    ]);
    for (const { typed } of estimates) expect(readAsked("estimates", typed, answered).problem).toBeNull();
    expect(jointTest).toHaveLength(2);
    for (const { typed } of jointTest) expect(readAsked("jointTest", typed, answered).problem).toBeNull();
  });

  it("tell of turning points and of the long run where a square and the outcome's past enter", async () => {
    const bench = await answeredPane();
    const change = (column: string, details: ColumnDetails): void =>
      bench.pane.store.dispatch({ kind: "column changed", column, details });
    change("Advertising", { also: { kind: "square" } });
    change("Repairs", { also: { kind: "lag", periods: 1 } });
    await bench.answer();
    const answered = answeredOf(bench);
    const typed = examplesFor(answered.answer).estimates.map((example) => example.typed);
    expect(typed.slice(3)).toEqual([
      "-Advertising / (2 * square of Advertising)",
      "Price index / (1 - Repairs 1 month earlier)",
    ]);
    for (const text of typed) expect(readAsked("estimates", text, answered).problem).toBeNull();
  });

  it("quote a name with a comma, pass over one that cannot be quoted, and need no second driver", async () => {
    const { answer } = answeredOf(await answeredPane());
    const named = (...names: string[]) =>
      examplesFor({
        outcome: "Repairs",
        drivers: names.map((term) => ({ ...answer.drivers[1]!, term })),
      });
    expect(named('12" pipes', "Rain, in mm").estimates.map(({ typed }) => typed)).toEqual([
      '"Rain, in mm" = 1',
      '"Rain, in mm" > 0',
    ]);
    expect(named("Rain").jointTest.map(({ typed }) => typed)).toEqual(["Rain = 1"]);
    expect(named().estimates).toEqual([]);
  });
});
