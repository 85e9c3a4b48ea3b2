import { describe, expect, it } from "vitest";
import { decide } from "../../../src/core/decision/decide.ts";
import type { Evidence } from "../../../src/core/decision/evidence.ts";
import { autocorrelationOrder } from "../../../src/core/decision/testOrder.ts";
import type { ErrorsWish } from "../../../src/core/decision/wish.ts";
import type { RowOrder } from "../../../src/core/design/design.ts";
import { type TestName, type TestOutcome, computed, notApplicable } from "../../../src/core/diagnostics/outcome.ts";

const wish: ErrorsWish = {
  policy: "careful",
  fixed: null,
  whiteVersion: "HC3",
  groupedVersion: "CR1",
  lags: null,
  adjusted: true,
};

const cases: RowOrder = { kind: "cases" };

const months = (count: number, season = 12): RowOrder => ({
  kind: "time",
  positions: Int32Array.from({ length: count }, (_, index) => index),
  period: { name: "monthly", unit: "month", season },
  labels: { first: "Jan 2016", last: "Dec 2023" },
  gaps: 0,
  gapLabels: [],
});

const shops: RowOrder = {
  kind: "groups",
  groups: Int32Array.of(0, 0, 1, 1),
  labels: ["North", "South"],
  second: null,
  positions: null,
  by: "Shop",
};

/** A test whose chi-square form has one p-value and whose F form another. */
function test(name: TestName, chiSquare: number, f: number, order: number | null = null): TestOutcome {
  return computed({
    test: name,
    form: null,
    order,
    figure: { statistic: 3.25, law: "chi-square", df: [2], pValue: chiSquare },
    fForm: { statistic: 1.75, law: "F", df: [2, 90], pValue: f },
    details: {},
  });
}

const evidence = (tests: readonly TestOutcome[], order: RowOrder, rows = 96): Evidence => ({
  tests,
  order,
  sizes: { rows, columns: 4, lags: 12 },
  testOrder: autocorrelationOrder(order, rows),
});

const decided = (found: Evidence, asked: Partial<ErrorsWish> = {}) => {
  const result = decide(found, { ...wish, ...asked });
  if (!result.ok) throw new Error(result.problem.code);
  return result.value;
};

const clean = [test("koenker", 0.61, 0.62), test("white", 0.41, 0.43), test("breusch-godfrey", 0.5, 0.52, 12)];
const uneven = [test("koenker", 0.61, 0.62), test("white", 0.02, 0.03), test("breusch-godfrey", 0.5, 0.52, 12)];
const following = [test("koenker", 0.61, 0.62), test("white", 0.41, 0.43), test("breusch-godfrey", 0.001, 0.002, 12)];
const both = [test("koenker", 0.004, 0.005), test("white", 0.41, 0.43), test("breusch-godfrey", 0.001, 0.002, 12)];

describe("the four cases", () => {
  it.each([
    ["even spread, no follow-on", clean, "even", "none", "classical"],
    ["uneven spread, no follow-on", uneven, "uneven", "none", "white"],
    ["even spread, follow-on", following, "even", "some", "newey-west"],
    ["uneven spread, follow-on", both, "uneven", "some", "newey-west"],
  ] as const)("%s", (_, tests, spread, followOn, errors) => {
    const decision = decided(evidence(tests, months(96)));
    expect(decision.fourCase).toEqual({ spread, followOn });
    expect(decision.called.errors.kind).toBe(errors);
    expect(decision.inForce).toEqual(decision.called);
  });

  it("does not ask about follow-on where rows are separate cases", () => {
    const decision = decided(evidence(both, cases));
    expect(decision.fourCase).toEqual({ spread: "uneven", followOn: "not asked" });
    expect(decision.called.errors).toEqual({ kind: "white", version: "HC3" });
    expect(decision.restsOn.map(({ outcome }) => outcome.test)).toEqual(["koenker", "white"]);
    expect(decision.cautions.join(" ")).toContain("rows are separate cases");
  });

  it("takes errors by group where rows are in groups, whatever the tests say", () => {
    const decision = decided(evidence(clean, shops, 40));
    expect(decision.called).toEqual({
      errors: { kind: "grouped", version: "CR1" },
      reference: { law: "t", degreesOfFreedom: 1 },
    });
  });

  it("asks no question of groups, and counts them for the law", () => {
    const four: RowOrder = { ...shops, groups: Int32Array.of(0, 1, 2, 3), labels: ["N", "E", "S", "W"] };
    const decision = decided(evidence(both, four, 40));
    expect(decision.fourCase).toEqual({ spread: "not asked", followOn: "not asked" });
    expect(decision.called.reference).toEqual({ law: "t", degreesOfFreedom: 3 });
    const years = { groups: Int32Array.of(0, 1, 0, 1), labels: ["2019", "2020"], by: "Year" };
    expect(decided(evidence(both, { ...four, second: years }, 40)).called.reference).toEqual({
      law: "t",
      degreesOfFreedom: 1,
    });
  });

  it("asks about follow-on at the order that decides alone", () => {
    const orders = [test("breusch-godfrey", 0.001, 0.001, 1), test("breusch-godfrey", 0.5, 0.52, 12)];
    const decision = decided(evidence([...clean.slice(0, 2), ...orders, test("arch", 0.001, 0.001, 12)], months(96)));
    expect(decision.fourCase.followOn).toBe("none");
    expect(decision.restsOn.map(({ outcome }) => [outcome.test, outcome.order])).toEqual([
      ["koenker", null],
      ["white", null],
      ["breusch-godfrey", 12],
    ]);
  });

  it("takes a p-value at the level itself for no rejection", () => {
    const border = [test("koenker", 0.1, 0.1), test("white", 0.5, 0.5), test("breusch-godfrey", 0.1, 0.1, 12)];
    expect(decided(evidence(border, months(96))).fourCase).toEqual({ spread: "even", followOn: "none" });
  });

  it("takes Newey-West with the lags found, and its factor as wished", () => {
    const errors = { kind: "newey-west", lags: { kind: "given", lags: 12 }, adjusted: false };
    expect(decided(evidence(following, months(96)), { adjusted: false }).called.errors).toEqual(errors);
  });

  it("takes robust errors where the spread could not be tested", () => {
    const decision = decided(
      evidence([notApplicable("koenker", "no constant"), notApplicable("white", "no constant")], cases),
    );
    expect(decision.called.errors.kind).toBe("white");
    expect(decision.because).toContain("could not be tested");
  });
});

describe("policies", () => {
  const borderline = [test("koenker", 0.06, 0.07), test("white", 0.3, 0.31), test("breusch-godfrey", 0.2, 0.21, 12)];

  it("careful looks at F forms at 10 %", () => {
    expect(decided(evidence(borderline, months(96))).fourCase.spread).toBe("uneven");
    const onlyChiSquare = [test("koenker", 0.06, 0.13), test("white", 0.3, 0.31)];
    expect(decided(evidence(onlyChiSquare, cases)).fourCase.spread).toBe("even");
  });

  it("textbook looks at chi-square forms at 5 % and takes the normal", () => {
    expect(decided(evidence(borderline, months(96)), { policy: "textbook" }).fourCase.spread).toBe("even");
    const onlyF = [test("koenker", 0.04, 0.06), test("white", 0.3, 0.31)];
    const decision = decided(evidence(onlyF, cases), { policy: "textbook" });
    expect(decision.fourCase.spread).toBe("uneven");
    expect(decision.called.reference).toEqual({ law: "normal" });
  });

  it("careful compares White with t and Newey-West with the fixed-b law", () => {
    expect(decided(evidence(uneven, months(96))).called.reference).toEqual({ law: "t", degreesOfFreedom: 92 });
    expect(decided(evidence(following, months(96))).called.reference).toEqual({
      law: "fixed-b",
      b: 13 / 96,
      degreesOfFreedom: 92,
    });
  });

  it("always-robust shows the tests but does not ask them", () => {
    const inTime = decided(evidence(clean, months(96)), { policy: "always-robust" });
    expect(inTime.fourCase).toEqual({ spread: "not asked", followOn: "not asked" });
    expect(inTime.called.errors.kind).toBe("newey-west");
    expect(decided(evidence(clean, cases), { policy: "always-robust" }).called.errors.kind).toBe("white");
  });
});

describe("a kind fixed by hand", () => {
  it("is put in force beside what was called for, with its reason", () => {
    const decision = decided(evidence(following, months(96)), {
      fixed: { errors: "classical", reason: "agreed with the board" },
    });
    expect(decision.called.errors.kind).toBe("newey-west");
    expect(decision.inForce.errors.kind).toBe("classical");
    expect(decision.override).toBe("agreed with the board");
    expect(decision.cautions.join(" ")).toContain("fixed by hand");
  });

  it("says so where no reason was given", () => {
    expect(decided(evidence(clean, cases), { fixed: { errors: "white", reason: null } }).override).toBe("none given");
  });

  it("may be any kind that rows allow, under the law of its kind", () => {
    const inForce = (order: RowOrder, errors: "classical" | "white" | "newey-west" | "grouped") =>
      decided(evidence(clean, order), { fixed: { errors, reason: null } }).inForce;
    expect(inForce(months(96), "newey-west").errors.kind).toBe("newey-west");
    expect(inForce(shops, "grouped").errors.kind).toBe("grouped");
    expect(inForce(shops, "classical")).toEqual({
      errors: { kind: "classical" },
      reference: { law: "t", degreesOfFreedom: 92 },
    });
    expect(decide(evidence(clean, months(96)), { ...wish, fixed: { errors: "grouped", reason: null } })).toEqual({
      ok: false,
      problem: { code: "errors-need-order", errors: "grouped", rows: "time" },
    });
    expect(decided(evidence(clean, cases)).override).toBeNull();
  });

  it("may be HC2 with degrees of freedom of its own, which is a t in every policy", () => {
    const asked = { policy: "textbook", whiteVersion: "HC2 bell-mccaffrey" } as const;
    expect(decided(evidence(uneven, cases), asked).called).toEqual({
      errors: { kind: "white", version: "HC2", degrees: "bell-mccaffrey" },
      reference: { law: "t", degreesOfFreedom: 92 },
    });
  });

  it("is refused where rows do not allow it", () => {
    const refused = decide(evidence(clean, cases), { ...wish, fixed: { errors: "newey-west", reason: null } });
    expect(refused).toEqual({ ok: false, problem: { code: "errors-need-order", errors: "newey-west", rows: "cases" } });
  });
});

describe("the order of autocorrelation looked for", () => {
  it.each([
    [months(96), 96, 12],
    [months(80), 80, 12],
    [months(79), 79, 2],
    [months(71), 71, 2],
    [months(24, 4), 24, 4],
    [months(23, 4), 23, 2],
    [months(156, 52), 156, 2],
    [months(312, 52), 312, 52],
    [months(50, 1), 50, 2],
    [cases, 200, 2],
  ] as const)("%#", (order, rows, expected) => {
    expect(autocorrelationOrder(order, rows)).toBe(expected);
  });
});

describe("cautions", () => {
  it("speak of few rows where nothing was found and where Newey-West is in force", () => {
    expect(decided(evidence(clean, months(96))).cautions[0]).toContain(
      'treat "even spread" and "no follow-on" as not contradicted',
    );
    expect(decided(evidence(following, months(96))).cautions[0]).toContain("a stated 5 % can really be 10 to 20 %");
    expect(decided(evidence(clean, months(400), 400)).cautions).toEqual([]);
  });

  it("say first how little is left where rows are hardly more than coefficients", () => {
    const few = { ...evidence(clean, cases), sizes: { rows: 5, columns: 4, lags: 0 } };
    expect(decided(few).cautions[0]).toContain("There is only 1 row more than coefficients");
    const enough = { ...evidence(clean, cases), sizes: { rows: 14, columns: 4, lags: 0 } };
    expect(decided(enough).cautions[0]).not.toContain("more than coefficients");
  });

  it("count the groups where they are few", () => {
    expect(decided(evidence(clean, shops, 40)).cautions[0]).toContain("only 2 groups");
    const said = (groupedVersion: "CR1" | "CR2"): string =>
      decided(evidence(clean, shops, 40), { groupedVersion }).cautions.join(" ");
    expect(said("CR1")).toContain("The version CR2 corrects for part of it.");
    expect(said("CR2")).toContain("only 2 groups");
    expect(said("CR2")).not.toContain("corrects for part");
  });
});
