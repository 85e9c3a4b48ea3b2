import { describe, expect, it } from "vitest";
import type { Claim, Quantity, ReportedNumber } from "../../../../src/core/review/claim.ts";
import { contradicts, reportedStanding, standingOf } from "../../../../src/core/review/engine/standings.ts";
import { claimFixture } from "../../../support/reviewFixture.ts";

type TermKind = Extract<Quantity, { term: number | null }>["kind"];

const number = (kind: TermKind, value: number, halfUnit: number): ReportedNumber => ({
  quantity: { kind, term: 0 },
  value,
  halfUnit,
  cell: "R!A1",
  shown: String(value),
});

const reporting = (...reported: ReportedNumber[]): Claim => ({ ...claimFixture, reported });

const standing = (...reported: ReportedNumber[]) => reportedStanding(reporting(...reported), 0, 20).standing;

describe("what a report says of a driver", () => {
  it("is read from the p-value where one is given", () => {
    expect(standing(number("coefficient", -2, 0.5), number("p-value", 0.03, 0.005))).toBe("less");
    expect(standing(number("coefficient", 2, 0.5), number("p-value", 0.03, 0.005))).toBe("more");
    expect(standing(number("coefficient", 2, 0.5), number("p-value", 0.06, 0.005))).toBe("not shown");
  });

  it("is open where rounding hides the side of the level", () => {
    expect(standing(number("coefficient", 2, 0.5), number("p-value", 0.05, 0.005))).toBe("open");
    // t(20) at 5 % is 2.086 (any handbook's table): the ratio shown as 2.1 may lie on either side.
    expect(standing(number("ratio", 2.1, 0.05))).toBe("open");
    expect(standing(number("ratio", 2.2, 0.05))).toBe("more");
    expect(standing(number("ratio", -2.0, 0.05))).toBe("not shown");
  });

  it("is formed from the coefficient and its standard error, or the bounds", () => {
    expect(standing(number("coefficient", 3, 0.05), number("standard-error", 1, 0.05))).toBe("more");
    expect(standing(number("coefficient", 2, 0.05), number("standard-error", 1, 0.05))).toBe("open");
    expect(standing(number("coefficient", 1, 0.05), number("standard-error", 1, 0.05))).toBe("not shown");
    expect(standing(number("low", -3, 0.05), number("high", -1, 0.05))).toBe("less");
    expect(standing(number("low", -3, 0.05), number("high", 1, 0.05))).toBe("not shown");
    expect(standing(number("low", -3, 0.05), number("high", 0, 0.05))).toBe("open");
  });

  it("is read from bounds of another level by the ratio that they were made from", () => {
    const at = (level: number, low: number, high: number, halfUnit = 0.0005) =>
      reportedStanding({ ...reporting(number("low", low, halfUnit), number("high", high, halfUnit)), level }, 0, 20)
        .standing;
    // t(20) is 1.725 at 10 %, 2.086 at 5 % and 2.845 at 1 % (any handbook's table); standard errors of 1 throughout.
    expect(at(0.1, 1.9 - 1.725, 1.9 + 1.725)).toBe("not shown");
    expect(at(0.1, 2.2 - 1.725, 2.2 + 1.725)).toBe("more");
    expect(at(0.01, -2.4 - 2.845, -2.4 + 2.845)).toBe("less");
    expect(at(0.1, 2.086 - 1.725, 2.086 + 1.725, 0.05)).toBe("open");
  });

  it("is nothing but a direction where only the coefficient stands", () => {
    expect(reportedStanding(reporting(number("coefficient", -3, 0.05)), 0, 20)).toMatchObject({
      standing: "unsaid",
      direction: "less",
    });
    expect(reportedStanding(reporting(), 0, 20)).toMatchObject({ standing: "unsaid", direction: null, from: null });
  });
});

describe("whether a conclusion changes", () => {
  const said = (...reported: ReportedNumber[]) => reportedStanding(reporting(...reported), 0, 20);

  it("does when what was shown is not, what was not is, or the direction turns", () => {
    const shown = said(number("coefficient", 2, 0.5), number("p-value", 0.01, 0.005));
    expect(contradicts(shown, standingOf(2, 0.2))).toBe(true);
    expect(contradicts(shown, standingOf(-2, 0.01))).toBe(true);
    expect(contradicts(shown, standingOf(1, 0.04))).toBe(false);
    expect(contradicts(said(number("coefficient", 2, 0.5), number("p-value", 0.6, 0.05)), standingOf(2, 0.01))).toBe(
      true,
    );
  });

  it("does not merely because of rounding, nor for what was not said", () => {
    expect(contradicts(said(number("coefficient", 2, 0.5), number("p-value", 0.05, 0.005)), standingOf(2, 0.2))).toBe(
      false,
    );
    expect(contradicts(said(number("coefficient", 2, 0.5)), standingOf(2, 0.2))).toBe(false);
    expect(contradicts(said(number("coefficient", 2, 0.5)), standingOf(-2, 0.01))).toBe(true);
  });
});
