import { criticalValue } from "../../inference/ratioLaw.ts";
import type { Claim, Quantity, ReportedNumber } from "../claim.ts";

/** What figures say of a driver at 5 %: shown one way or the other, not shown; open where rounding hides it. */
export type Standing = "more" | "less" | "not shown" | "open" | "unsaid";

/** What was reported of one driver, as far as it goes. */
export interface Reported {
  readonly standing: Standing;
  /** The direction of the coefficient, whatever is said of its certainty; null where it is not reported. */
  readonly direction: "more" | "less" | null;
  /** The figure that it was read from, as the cell shows it; null where nothing is reported of the driver. */
  readonly from: { readonly kind: Quantity["kind"]; readonly shown: string } | null;
}

export const level = 0.05;

/** The share that says yes to a question about a rounded number: all of its range, none of it, or some. */
type Verdict = "yes" | "no" | "open";

/**
 * What the report says of a driver: from the p-value where one is given, else from the ratio, the coefficient and its
 * standard error, or the bounds.
 * @param term - which driver. @param degrees - of freedom, for ratios.
 */
export function reportedStanding(claim: Claim, term: number, degrees: number): Reported {
  const { reported, level: claimed = level } = claim;
  const of = (kind: Quantity["kind"]): ReportedNumber | null =>
    reported.find(({ quantity }) => quantity.kind === kind && "term" in quantity && quantity.term === term) ?? null;
  const direction = directionOf([of("coefficient"), of("ratio"), of("low"), of("high")]);
  const found =
    byPValue(of("p-value")) ??
    byRatio(of("ratio"), degrees) ??
    byError(of("coefficient"), of("standard-error"), degrees) ??
    byBounds({ low: of("low"), high: of("high") }, degrees, claimed);
  if (found === null) {
    const coefficient = of("coefficient");
    const from = coefficient === null ? null : { kind: "coefficient" as const, shown: coefficient.shown };
    return { standing: "unsaid", direction, from };
  }
  const { verdict, number } = found;
  const standing = verdict === "no" ? "not shown" : verdict === "open" || direction === null ? "open" : direction;
  return { standing, direction, from: { kind: number.quantity.kind, shown: number.shown } };
}

function directionOf(numbers: readonly (ReportedNumber | null)[]): Reported["direction"] {
  const [coefficient, ratio, low, high] = numbers;
  const signed = coefficient ?? ratio ?? null;
  if (signed !== null) return signed.value > 0 ? "more" : signed.value < 0 ? "less" : null;
  if (low === undefined || high === undefined || low === null || high === null) return null;
  return low.value + high.value > 0 ? "more" : "less";
}

interface Found {
  readonly verdict: Verdict;
  readonly number: ReportedNumber;
}

/** Whether a number in a range lies below a border. */
const below = (border: number, least: number, most: number): Verdict =>
  most < border ? "yes" : least >= border ? "no" : "open";

function byPValue(number: ReportedNumber | null): Found | null {
  if (number === null) return null;
  return { verdict: below(level, number.value - number.halfUnit, number.value + number.halfUnit), number };
}

const opposite: Readonly<Record<Verdict, Verdict>> = { yes: "no", no: "yes", open: "open" };

function byRatio(number: ReportedNumber | null, degrees: number): Found | null {
  if (number === null) return null;
  const size = Math.abs(number.value);
  const verdict = opposite[below(criticalAt(degrees), size - number.halfUnit, size + number.halfUnit)];
  return { verdict, number };
}

const criticalAt = (degreesOfFreedom: number, at: number = level): number =>
  criticalValue(at, degreesOfFreedom > 0 ? { law: "t", degreesOfFreedom } : { law: "normal" });

function byError(coefficient: ReportedNumber | null, error: ReportedNumber | null, degrees: number): Found | null {
  if (coefficient === null || error === null) return null;
  const size = Math.abs(coefficient.value);
  const least = Math.max(0, size - coefficient.halfUnit) / (error.value + error.halfUnit);
  const most = (size + coefficient.halfUnit) / Math.max(error.value - error.halfUnit, Number.MIN_VALUE);
  const ratio = coefficient.value / error.value;
  const number = { ...error, quantity: { kind: "ratio", term: null } as const, shown: `about ${ratio.toPrecision(2)}` };
  return { verdict: opposite[below(criticalAt(degrees), least, most)], number };
}

interface Bounds {
  readonly low: ReportedNumber | null;
  readonly high: ReportedNumber | null;
}

/** Bounds of another level than that of the question are led back to the ratio that they were made from. */
function byBounds({ low, high }: Bounds, degrees: number, claimed: number): Found | null {
  if (low === null || high === null) return null;
  const number = { ...low, shown: `${low.shown} to ${high.shown}` };
  if (claimed === level) return { verdict: isApart(low, high), number };
  const rounding = Math.max(low.halfUnit, high.halfUnit);
  const [middle, reach] = [Math.abs(low.value + high.value) / 2, (high.value - low.value) / 2];
  const quantile = criticalAt(degrees, claimed);
  const least = (quantile * Math.max(0, middle - rounding)) / (reach + rounding);
  const most = (quantile * (middle + rounding)) / Math.max(reach - rounding, Number.MIN_VALUE);
  return { verdict: opposite[below(criticalAt(degrees), least, most)], number };
}

/** Whether zero lies outside. */
function isApart(low: ReportedNumber, high: ReportedNumber): Verdict {
  const positive = opposite[below(0, low.value - low.halfUnit, low.value + low.halfUnit)];
  const negative = below(0, high.value - high.halfUnit, high.value + high.halfUnit);
  if (positive === "yes" || negative === "yes") return "yes";
  return positive === "no" && negative === "no" ? "no" : "open";
}

/** What a coefficient and its p-value say. */
export const standingOf = (coefficient: number, pValue: number): Standing =>
  pValue < level ? (coefficient > 0 ? "more" : "less") : "not shown";

/** Whether a reader of the one would act otherwise on the other; what is open or unsaid is not held against it. */
export function contradicts(reported: Reported, standing: Standing): boolean {
  const said = reported.standing;
  if (said === "open") return false;
  if (said === "unsaid") {
    return (
      reported.direction !== null && (standing === "more" || standing === "less") && standing !== reported.direction
    );
  }
  return said !== standing;
}
