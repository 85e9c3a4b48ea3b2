import type { ErrorsChoice } from "../covariance/choice.ts";
import type { JointOutcome } from "../inference/joint.ts";
import type { Answer } from "./answer.ts";
import type { AskedEstimate } from "./asked.ts";
import { type Grid, lawInWords } from "./tables.ts";

const estimateHeadings = [
  "asked for",
  "estimate",
  "standard error",
  "ratio",
  "p-value",
  "low",
  "high",
  "held against",
] as const;

/** One row a number that was asked for, under the standard errors in force; figures that cannot be had are empty. */
export const estimatesTable = ({ estimates }: Pick<Answer, "estimates">): Grid => [
  [...estimateHeadings],
  ...estimates.map((asked) => [
    asked.text,
    ...figuresOf(asked),
    asked.side === "both" ? asked.against : heldInWords(asked),
  ]),
];

const figuresOf = ({ estimate }: AskedEstimate): (number | string)[] => {
  if (estimate === null) return estimateHeadings.slice(1, -1).map(() => "");
  const { value, standardError, ratio, pValue, low, high } = estimate;
  return [value, standardError, ratio, pValue, low, high];
};

/** "0", "above 0 (one-sided)". */
export const heldInWords = ({ against, side }: Pick<AskedEstimate, "against" | "side">): string =>
  side === "both" ? String(against) : `${side} ${against} (one-sided)`;

const jointHeadings = ["standard errors", "statistic", "reference", "p-value"] as const;

/** The equations tested together under each kind of standard errors; headings alone where none were asked for. */
export function askedJointTable({ joint, decision }: Pick<Answer, "joint" | "decision">): Grid {
  const { asked } = joint;
  if (asked === null) return [[...jointHeadings]];
  const kinds: readonly (readonly [ErrorsChoice["kind"], string, JointOutcome | null])[] = [
    ["classical", "classical", asked.classical],
    ["white", "White", asked.white],
    ["newey-west", "Newey-West", asked.neweyWest],
    ["grouped", "grouped", asked.grouped],
  ];
  const rows = kinds.flatMap(([kind, label, outcome]) => {
    if (outcome?.kind !== "computed") return [];
    const { figure } = outcome;
    const name = kind === decision.inForce.errors.kind ? `${label} (in force)` : label;
    return [[name, figure.statistic, lawInWords(figure), figure.pValue]];
  });
  return [[...jointHeadings], ...rows];
}
