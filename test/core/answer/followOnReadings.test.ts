import { describe, expect, it } from "vitest";
import { analyse } from "../../../src/core/answer/analyse.ts";
import type { Answer } from "../../../src/core/answer/answer.ts";
import { defaultOptions } from "../../../src/core/answer/options.ts";
import { readingOf } from "../../../src/core/answer/tables.ts";
import { carriedOver, drawsFrom } from "../../../src/sheet/sample/draws.ts";
import { driver, modelWith } from "../../support/models.ts";
import { must, sourceOf } from "../../support/sheet.ts";

/** Ninety-six periods with the same coefficients throughout; a share of each error carries over into the next. */
function answerWith(share: number): Answer {
  const draws = drawsFrom(5);
  const [errors, price, rain] = [share, 0.5, 0.8].map((carried) => carriedOver(draws, 96, carried));
  const repairs = errors!.map((error, t) => 430 + 4 * price![t]! - 3 * rain![t]! + 5 * error);
  return must(
    analyse(
      {
        source: sourceOf({ Repairs: repairs, Price: price!, Rain: rain! }),
        model: modelWith({ drivers: [driver("Price"), driver("Rain")], rows: { kind: "time", order: null } }),
        options: defaultOptions,
      },
      () => undefined,
    ),
  );
}

const readingIn = (answer: Answer, test: string): string => {
  const outcome = answer.tests.find((one) => one.test === test)!;
  return outcome.kind === "computed" ? readingOf(outcome, answer) : outcome.because;
};

describe("tests that take errors not to follow on", () => {
  it("are doubted where they do: nothing changes here, though the test says so", () => {
    const answer = answerWith(0.7);
    expect(answer.decision.fourCase.followOn).toBe("some");
    expect(readingIn(answer, "largest-chow")).toBe(
      "The coefficients change somewhere. But the errors follow on, and this test then says so too often.",
    );
    expect(readingIn(answer, "breusch-godfrey")).not.toContain("too often");
    expect(answer.guards.found.find(({ guard }) => guard === "breaks")?.finding).toBe("worth knowing");
  });

  it("are taken at their word where no follow-on shows", () => {
    const answer = answerWith(0);
    expect(answer.decision.fourCase.followOn).toBe("none");
    expect(answer.tests.map(({ test }) => readingIn(answer, test)).join(" ")).not.toContain("too often");
  });
});
