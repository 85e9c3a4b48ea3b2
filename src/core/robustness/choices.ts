import type { Covariance, ErrorsChoice, GroupedVersion, WhiteVersion } from "../covariance/choice.ts";
import { classicalCovariance } from "../covariance/classical.ts";
import { covarianceOf } from "../covariance/covarianceOf.ts";
import { vanishingTerm } from "../covariance/vanishing.ts";
import { whiteCovariances } from "../covariance/white.ts";
import type { Fit } from "../fit/fit.ts";
import type { Reference } from "../inference/reference.ts";
import { type Result, success } from "../problem/result.ts";

/** One kind of standard errors that could have been chosen, and the laws its ratios could have been compared with. */
export interface Alternative {
  readonly covariance: Covariance;
  readonly references: readonly Reference[];
  /** t degrees of freedom by coefficient, where the kind has its own. */
  readonly degreesOfFreedom: Covariance["degreesOfFreedom"];
}

export interface AlternativeSettings {
  /** Lags of Newey-West as in force or as the policy would take them; null where rows do not run through time. */
  readonly lags: number | null;
  readonly adjusted: boolean;
}

const versions: readonly WhiteVersion[] = ["HC0", "HC1", "HC2", "HC3", "HC4"];
const groupedVersions: readonly GroupedVersion[] = ["CR0", "CR1", "CR2"];

/**
 * Every kind that what rows are allows: classical, HC0 to HC4 (those that a leverage of one leaves defined), Newey-West
 * up a ladder of lags, by group.
 */
export function alternatives(fit: Fit, settings: AlternativeSettings): Result<Alternative[]> {
  const laws: Reference[] = [{ law: "t", degreesOfFreedom: fit.degreesOfFreedom }, { law: "normal" }];
  const white = Object.values(whiteCovariances(fit, versions)).filter(({ used }) => used.fallback === null);
  const plain = white.map((covariance) => ({ covariance, references: laws, degreesOfFreedom: null }));
  const others = [{ kind: "classical" } as const, ...ladderChoices(fit, settings), ...groupedChoices(fit)];
  const found: Alternative[] = [];
  for (const choice of others) {
    const covariance = covarianceOf(fit, choice);
    if (!covariance.ok) return covariance;
    found.push(alternativeOf(fit, covariance.value, laws));
  }
  const classical = classicalCovariance(fit);
  const all = [...found.slice(0, 1), ...plain, ...found.slice(1)];
  return success(all.filter(({ covariance }) => vanishingTerm(covariance, classical) === null));
}

function alternativeOf(fit: Fit, covariance: Covariance, laws: readonly Reference[]): Alternative {
  const { lags } = covariance.used;
  const { degreesOfFreedom } = covariance;
  if (covariance.choice.kind !== "newey-west" || lags === null)
    return { covariance, references: laws, degreesOfFreedom };
  const fixedB: Reference = {
    law: "fixed-b",
    b: (lags + 1) / fit.rowCount,
    degreesOfFreedom: fit.degreesOfFreedom,
  };
  return { covariance, references: [...laws, fixedB], degreesOfFreedom };
}

const ladderChoices = (fit: Fit, { lags, adjusted }: AlternativeSettings): ErrorsChoice[] =>
  lags === null
    ? []
    : lagLadder(lags, fit).map((rung) => ({ kind: "newey-west", lags: { kind: "given", lags: rung }, adjusted }));

const groupedChoices = ({ design }: Fit): ErrorsChoice[] =>
  design.order.kind === "groups" ? groupedVersions.map((version) => ({ kind: "grouped", version })) : [];

/** Multiplications that the ladder may take: about a second. */
const mostWork = 4e8;
const fewestRungs = 5;

/**
 * The numbers of lags looked at: 0, 1, ..., 2L + 4, below n. Where a rung costs much (many rows) the ladder is thinned
 * to evenly spaced ones; the first, L and the last stay.
 * @param lags - L.
 */
export function lagLadder(lags: number, { rowCount, columnCount }: Pick<Fit, "rowCount" | "columnCount">): number[] {
  const last = Math.min(2 * lags + 4, rowCount - 1);
  const affordable = Math.max(fewestRungs, Math.floor(mostWork / (rowCount * columnCount ** 2)));
  if (last + 1 <= affordable) return Array.from({ length: last + 1 }, (_, rung) => rung);
  const spaced = Array.from({ length: affordable }, (_, i) => Math.round((last * i) / (affordable - 1)));
  return [...new Set([...spaced, Math.min(lags, last)])].sort((one, other) => one - other);
}
