import type { ErrorsChoice } from "../../core/covariance/choice.ts";
import type { Decision } from "../../core/decision/decision.ts";

export const spreads = ["even", "uneven"] as const;
export const followOns = ["none", "some"] as const;

export interface CaseCell {
  readonly spread: (typeof spreads)[number];
  readonly followOn: (typeof followOns)[number];
  readonly errors: "classical" | "White" | "Newey-West";
}

/** The four cases, as the trade fills them. */
export const caseCells: readonly CaseCell[] = [
  { spread: "even", followOn: "none", errors: "classical" },
  { spread: "even", followOn: "some", errors: "Newey-West" },
  { spread: "uneven", followOn: "none", errors: "White" },
  { spread: "uneven", followOn: "some", errors: "Newey-West" },
];

/** Whether the tests point at a cell: nowhere where spread was not asked, on the left where follow-on was not. */
export const pointedAt = ({ fourCase }: Decision, cell: CaseCell): boolean =>
  cell.spread === fourCase.spread && cell.followOn === (fourCase.followOn === "not asked" ? "none" : fourCase.followOn);

/** Whether the standard errors of a cell are the ones in force; Newey-West stands in two cells and is marked once. */
export function isInForce(decision: Decision, cell: CaseCell): boolean {
  const { inForce, fourCase } = decision;
  const row = fourCase.spread === "uneven" ? "uneven" : "even";
  return kindOf(cell) === inForce.errors.kind && (cell.errors !== "Newey-West" || cell.spread === row);
}

const kindOf = ({ errors }: CaseCell): ErrorsChoice["kind"] => {
  switch (errors) {
    case "classical":
      return "classical";
    case "White":
      return "white";
    case "Newey-West":
      return "newey-west";
  }
};
