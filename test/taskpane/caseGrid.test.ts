import { describe, expect, it } from "vitest";
import type { ErrorsChoice } from "../../src/core/covariance/choice.ts";
import type { Decision, FourCase } from "../../src/core/decision/decision.ts";
import { settledBy } from "../../src/core/answer/findings.ts";
import { caseCells, isInForce, pointedAt } from "../../src/taskpane/pictures/caseGrid.ts";
import { answerFixture } from "../support/answerFixture.ts";

const classical: ErrorsChoice = { kind: "classical" };
const white: ErrorsChoice = { kind: "white", version: "HC3" };
const neweyWest: ErrorsChoice = { kind: "newey-west", lags: { kind: "thumb" }, adjusted: true };

const decisionOf = (fourCase: FourCase, errors: ErrorsChoice): Decision => ({
  ...answerFixture.decision,
  fourCase,
  inForce: { ...answerFixture.decision.inForce, errors },
});

const marked = (decision: Decision, mark: typeof isInForce): string[] =>
  caseCells.filter((cell) => mark(decision, cell)).map(({ spread, followOn }) => `${spread}/${followOn}`);

describe("the four cases", () => {
  it.each([
    ["even", "none", classical],
    ["uneven", "none", white],
    ["even", "some", neweyWest],
    ["uneven", "some", neweyWest],
  ] as const)("mark %s and %s once, in force and by the tests", (spread, followOn, errors) => {
    const decision = decisionOf({ spread, followOn }, errors);
    expect(marked(decision, isInForce)).toEqual([`${spread}/${followOn}`]);
    expect(marked(decision, pointedAt)).toEqual([`${spread}/${followOn}`]);
  });

  it("mark what is in force apart from where the tests point", () => {
    const fixed = decisionOf({ spread: "uneven", followOn: "some" }, classical);
    expect(marked(fixed, isInForce)).toEqual(["even/none"]);
    expect(marked(fixed, pointedAt)).toEqual(["uneven/some"]);
  });

  it("stay on the left where follow-on was not asked", () => {
    const cases = decisionOf({ spread: "even", followOn: "not asked" }, classical);
    expect(marked(cases, pointedAt)).toEqual(["even/none"]);
  });

  it("mark nothing where standard errors go by group: the tests are not asked", () => {
    const notAsked = { spread: "not asked", followOn: "not asked" } as const;
    const grouped = decisionOf(notAsked, { kind: "grouped", version: "CR1" });
    expect(marked(grouped, isInForce)).toEqual([]);
    expect(marked(grouped, pointedAt)).toEqual([]);
  });
});

describe("the p-values that put the answer there", () => {
  const [koenker, first] = answerFixture.tests;
  const decision: Decision = {
    ...answerFixture.decision,
    restsOn: [
      { outcome: koenker!, pValue: 0.2, rejected: false },
      { outcome: { ...koenker!, test: "white" }, pValue: 0.04, rejected: true },
      { outcome: first!, pValue: 0.5, rejected: false },
    ],
  };

  it("are the smallest of those looked at for each question", () => {
    expect(settledBy(decision, "spread")).toMatchObject({ pValue: 0.04, outcome: { test: "white" } });
    expect(settledBy(decision, "follow-on")).toMatchObject({ pValue: 0.5, outcome: { test: "breusch-godfrey" } });
  });

  it("are missing where a question was not asked", () => {
    expect(settledBy({ ...decision, restsOn: decision.restsOn.slice(0, 2) }, "follow-on")).toBeNull();
  });
});
