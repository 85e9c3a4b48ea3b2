import { describe, expect, it } from "vitest";
import { analyse } from "../../../src/core/answer/analyse.ts";
import type { Answer } from "../../../src/core/answer/answer.ts";
import { askedJointTable, estimatesTable } from "../../../src/core/answer/askedTables.ts";
import { defaultOptions } from "../../../src/core/answer/options.ts";
import { monthsQuestion } from "../../support/answersOfMonths.ts";

function answerTo(options: Partial<typeof defaultOptions>): Answer {
  const answer = analyse({ ...monthsQuestion, options: { ...defaultOptions, ...options } }, () => undefined);
  if (!answer.ok) throw new Error(answer.problem.code);
  return answer.value;
}

describe("the figures of what was asked of the coefficients", () => {
  it("of one coefficient are those of its own line", () => {
    const answer = answerTo({ estimates: ["Rain", "Rain > 0"] });
    const [headings, own, above] = estimatesTable(answer);
    expect(headings).toEqual([
      "asked for",
      "estimate",
      "standard error",
      "ratio",
      "p-value",
      "low",
      "high",
      "held against",
    ]);
    const { coefficient, standardError, ratio, pValue, low, high } = answer.drivers[2]!;
    const figures = [coefficient, standardError, ratio, pValue, low, high];
    expect(own).toEqual(["Rain", ...figures.map((figure) => expect.closeTo(figure, 10) as number), 0]);
    expect(above!.at(-1)).toBe("above 0 (one-sided)");
    expect(above![4]).toBeCloseTo(ratio > 0 ? pValue / 2 : 1 - pValue / 2, 10);
  });

  it("are left empty where a number cannot be had", () => {
    const answer = answerTo({ estimates: ["Price"] });
    const none = { ...answer, estimates: answer.estimates.map((asked) => ({ ...asked, estimate: null })) };
    expect(estimatesTable(none)[1]).toEqual(["Price", "", "", "", "", "", "", 0]);
  });

  it("of equations stand under each kind, the one in force marked", () => {
    const answer = answerTo({ jointTest: ["Price = 0", "Rain = 0"] });
    const [, ...rows] = askedJointTable(answer);
    // The same restrictions as the test of all drivers.
    const { classical, white, neweyWest } = answer.joint;
    const expected = [classical, white, neweyWest].map((outcome) => {
      if (outcome?.kind !== "computed") throw new Error("not computed");
      return [outcome.figure.statistic, outcome.figure.pValue];
    });
    expect(rows.map(([, statistic, , pValue]) => [statistic, pValue])).toEqual(expected);
    expect(rows.map(([, , law]) => law)).toEqual(["F(2, 45)", "chi-square(2)", "chi-square(2)"]);
    expect(rows.filter(([kind]) => String(kind).endsWith("(in force)"))).toHaveLength(1);
  });

  it("are headings alone where nothing was asked", () => {
    const answer = answerTo({});
    expect([estimatesTable(answer).length, askedJointTable(answer).length]).toEqual([1, 1]);
  });
});
