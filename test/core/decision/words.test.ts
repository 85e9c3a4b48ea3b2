import { describe, expect, it } from "vitest";
import { becauseOf } from "../../../src/core/decision/because.ts";
import { cautionsOf } from "../../../src/core/decision/cautions.ts";
import type { Decision, FourCase } from "../../../src/core/decision/decision.ts";
import type { Evidence } from "../../../src/core/decision/evidence.ts";
import type { ErrorsChoice } from "../../../src/core/covariance/choice.ts";
import type { RowOrder } from "../../../src/core/design/design.ts";
import { inGroups, throughTime } from "../../support/referenceFit.ts";

const time = throughTime(30);
const months = { ...time, period: { name: "monthly", unit: "month", season: 12 } } as RowOrder;
const cases: RowOrder = { kind: "cases" };
const asked = (spread: FourCase["spread"], followOn: FourCase["followOn"]): FourCase => ({ spread, followOn });

const classical: ErrorsChoice = { kind: "classical" };
const white: ErrorsChoice = { kind: "white", version: "HC3" };
const neweyWest: ErrorsChoice = { kind: "newey-west", lags: { kind: "given", lags: 3 }, adjusted: true };
const chosen = (errors: ErrorsChoice): Decision["called"] => ({ errors, reference: { law: "normal" } });

describe("why these standard errors", () => {
  const because = (policy: Decision["policy"], fourCase: FourCase, errors: ErrorsChoice, order: RowOrder = months) =>
    becauseOf({ policy, fourCase, called: chosen(errors) }, order);

  it.each([
    [asked("even", "some"), neweyWest, months, "the errors follow on from month to month"],
    [
      asked("uneven", "some"),
      neweyWest,
      months,
      "the errors follow on from month to month, and their spread is uneven",
    ],
    [asked("uneven", "none"), white, months, "the spread of the errors is uneven"],
    [asked("not asked", "not asked"), white, cases, "whether the spread of the errors is even could not be tested"],
    [asked("even", "none"), classical, months, "the tests find neither uneven spread nor errors that follow on"],
    [asked("even", "not asked"), classical, cases, "the tests find no uneven spread"],
  ] as const)("%o", (fourCase, errors, order, words) => {
    expect(because("careful", fourCase, errors, order)).toBe(words);
    expect(because("always-robust", fourCase, errors, order)).toBe(
      "the policy takes robust standard errors whatever the tests say",
    );
  });

  it("is the groups' where rows are in groups, one way or two", () => {
    const grouped: ErrorsChoice = { kind: "grouped", version: "CR1" };
    const shops = { ...inGroups([0, 1]), by: "Shop" } as RowOrder;
    const words = (order: RowOrder) => because("always-robust", asked("not asked", "not asked"), grouped, order);
    expect(words(shops)).toBe("rows of one Shop may share what the drivers leave unexplained");
    const second = { groups: Int32Array.of(0, 1), labels: ["A", "B"], by: "Year" };
    expect(words({ ...shops, second } as RowOrder)).toBe(
      "rows of one Shop or of one Year may share what the drivers leave unexplained",
    );
  });
});

describe("cautions", () => {
  const evidence = (order: RowOrder, spare: number): Evidence => ({
    tests: [],
    order,
    sizes: { rows: spare + 3, columns: 3, lags: 2 },
    testOrder: 2,
  });
  const settled = (fourCase: FourCase, called: ErrorsChoice, inForce = called) => ({
    ...({ policy: "careful", fourCase, restsOn: [] } as const),
    called: chosen(called),
    inForce: chosen(inForce),
  });
  const about = (words: string, found: Parameters<typeof cautionsOf>): boolean =>
    cautionsOf(...found).some((sentence) => sentence.includes(words));

  it("about hardly any rows end at ten to spare", () => {
    const none = settled(asked("even", "none"), classical);
    expect(cautionsOf(none, evidence(months, 9))[0]).toContain("There are only 9 rows more than coefficients");
    expect(cautionsOf(none, evidence(months, 1))[0]).toContain("There is only 1 row more than coefficients");
    expect(about("more than coefficients", [none, evidence(months, 10)])).toBe(false);
  });

  it("about tests that miss a problem end at a hundred degrees of freedom, and are of classical errors alone", () => {
    const missed = "the tests can miss a problem";
    const even = settled(asked("even", "none"), classical);
    expect(about(missed, [even, evidence(months, 99)])).toBe(true);
    expect(about(missed, [even, evidence(months, 100)])).toBe(false);
    expect(about(missed, [settled(asked("even", "some"), neweyWest), evidence(months, 50)])).toBe(false);
    expect(about(missed, [settled(asked("not asked", "none"), classical), evidence(months, 50)])).toBe(false);
    expect(about('treat "even spread" and "no follow-on" as', [even, evidence(months, 50)])).toBe(true);
    const apart = settled(asked("even", "not asked"), classical);
    expect(about('treat "even spread" as not contradicted', [apart, evidence(cases, 50)])).toBe(true);
  });

  it("about Newey-West end at a hundred degrees of freedom, by what is in force", () => {
    const optimistic = "even the robust p-value is too optimistic";
    const called = settled(asked("even", "some"), neweyWest);
    expect(about(optimistic, [called, evidence(months, 99)])).toBe(true);
    expect(about(optimistic, [called, evidence(months, 100)])).toBe(false);
    const fixed = settled(asked("even", "some"), neweyWest, classical);
    expect(about(optimistic, [fixed, evidence(months, 50)])).toBe(false);
    expect(about("fixed by hand and are not those", [fixed, evidence(months, 50)])).toBe(true);
    expect(about("fixed by hand", [called, evidence(months, 50)])).toBe(false);
  });

  it("about groups end at 42 of them, of two ways the fewer, and those about order are for cases", () => {
    const grouped = settled(asked("not asked", "not asked"), { kind: "grouped", version: "CR1" });
    const groups = (count: number): RowOrder => inGroups(Array.from({ length: 2 * count }, (_, i) => i >> 1));
    expect(about("There are only 41 groups", [grouped, evidence(groups(41), 200)])).toBe(true);
    expect(about("There are only", [grouped, evidence(groups(42), 200)])).toBe(false);
    const second = { groups: Int32Array.from({ length: 84 }, (_, i) => i % 7), labels: "abcdefg".split(""), by: "Day" };
    const crossed = { ...groups(42), second } as RowOrder;
    expect(about("There are only 7 groups", [grouped, evidence(crossed, 200)])).toBe(true);
    expect(about("rows are separate cases", [grouped, evidence(crossed, 200)])).toBe(false);
    expect(
      about("rows are separate cases", [settled(asked("even", "not asked"), classical), evidence(cases, 200)]),
    ).toBe(true);
  });
});
