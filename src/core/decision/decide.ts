import type { ErrorsChoice } from "../covariance/choice.ts";
import type { RowOrder } from "../design/design.ts";
import { fewestGroups } from "../design/groupings.ts";
import type { Reference } from "../inference/reference.ts";
import { type Result, failure, success } from "../problem/result.ts";
import { becauseOf } from "./because.ts";
import { cautionsOf } from "./cautions.ts";
import type { Decision, FourCase } from "./decision.ts";
import type { Evidence } from "./evidence.ts";
import { rulesOf, student } from "./policies.ts";
import { type ErrorsWish, whiteErrors } from "./wish.ts";

type Consulted = Decision["restsOn"][number];
type Chosen = Decision["called"];

/** One row of the table of rules: the first whose case holds is called for. */
interface Rule {
  readonly holds: (fourCase: FourCase, order: RowOrder["kind"]) => boolean;
  readonly call: ErrorsChoice["kind"];
}

const rules: readonly Rule[] = [
  { holds: (_, order) => order === "groups", call: "grouped" },
  { holds: ({ followOn }) => followOn === "some", call: "newey-west" },
  { holds: ({ spread }) => spread === "uneven", call: "white" },
  { holds: ({ spread }) => spread === "even", call: "classical" },
  { holds: (_, order) => order === "time", call: "newey-west" },
  { holds: () => true, call: "white" },
];

/**
 * Which standard errors the evidence calls for, with which reference distribution, and why: the four cases.
 * Spread is uneven if Koenker's or White's test rejects; follow-on is asked by the LM test of Breusch and Godfrey,
 * and only where rows run through time. A kind fixed by the user is put in force beside what was called for.
 * @returns Problem "errors-need-order" where the fixed kind does not fit what rows are.
 */
export function decide(evidence: Evidence, wish: ErrorsWish): Result<Decision> {
  const { asksTests, testLevel } = rulesOf(wish.policy);
  const restsOn = consult(evidence, wish);
  const fourCase = asksTests ? caseOf(restsOn, evidence.order) : notAsked;
  const rule = rules.find(({ holds }) => holds(fourCase, evidence.order.kind));
  const called = chosen(rule?.call ?? "white", evidence, wish);
  const fixed = wish.fixed === null ? null : wish.fixed.errors;
  if (fixed !== null && !fits(fixed, evidence.order)) {
    return failure({ code: "errors-need-order", errors: fixed, rows: evidence.order.kind });
  }
  const inForce = fixed === null ? called : chosen(fixed, evidence, wish);
  const settled = { policy: wish.policy, fourCase, called, inForce, testLevel, restsOn };
  return success({
    ...settled,
    because: becauseOf(settled, evidence.order),
    override: wish.fixed === null ? null : (wish.fixed.reason ?? "none given"),
    cautions: cautionsOf(settled, evidence),
  });
}

const notAsked: FourCase = { spread: "not asked", followOn: "not asked" };

/** The tests that bear on the four cases, each with the p-value of the form that counts under the policy. */
function consult({ tests, order, testOrder }: Evidence, { policy }: ErrorsWish): Consulted[] {
  const { figureOf, testLevel } = rulesOf(policy);
  const asked = tests.filter(
    (outcome) =>
      outcome.test === "koenker" ||
      outcome.test === "white" ||
      (outcome.test === "breusch-godfrey" && order.kind === "time" && outcome.order === testOrder),
  );
  return asked.flatMap((outcome) => {
    if (outcome.kind !== "computed") return [];
    const { pValue } = figureOf(outcome);
    return [{ outcome, pValue, rejected: pValue < testLevel }];
  });
}

function caseOf(consulted: readonly Consulted[], order: RowOrder): FourCase {
  if (order.kind === "groups") return notAsked;
  const spread = consulted.filter(({ outcome }) => outcome.test !== "breusch-godfrey");
  const followOn = consulted.filter(({ outcome }) => outcome.test === "breusch-godfrey");
  return {
    spread: spread.length === 0 ? "not asked" : spread.some(({ rejected }) => rejected) ? "uneven" : "even",
    followOn: followOn.length === 0 ? "not asked" : followOn.some(({ rejected }) => rejected) ? "some" : "none",
  };
}

/** Newey-West needs time; where rows are in groups, the time within each. */
function fits(kind: ErrorsChoice["kind"], order: RowOrder): boolean {
  if (kind === "grouped") return order.kind === "groups";
  if (kind !== "newey-west" || order.kind === "time") return true;
  return order.kind === "groups" && order.positions !== null;
}

/** A kind with its settings and the law the policy compares its ratios with. */
export function chosen(
  kind: ErrorsChoice["kind"],
  { order, sizes }: Pick<Evidence, "order" | "sizes">,
  wish: ErrorsWish,
): Chosen {
  const { whiteReference, neweyWestReference } = rulesOf(wish.policy);
  switch (kind) {
    case "classical":
      return { errors: { kind }, reference: student(sizes) };
    case "white": {
      const errors = whiteErrors(wish.whiteVersion);
      return { errors, reference: errors.degrees === undefined ? whiteReference(sizes) : student(sizes) };
    }
    case "newey-west":
      return {
        errors: { kind, lags: { kind: "given", lags: sizes.lags }, adjusted: wish.adjusted },
        reference: neweyWestReference(sizes),
      };
    case "grouped":
      return { errors: { kind, version: wish.groupedVersion }, reference: groupedReference(order) };
  }
}

/** t with one degree of freedom fewer than there are groups, of two ways the fewer (common practice for CR1). */
const groupedReference = (order: RowOrder): Reference => ({
  law: "t",
  degreesOfFreedom: order.kind === "groups" ? fewestGroups(order) - 1 : 1,
});
