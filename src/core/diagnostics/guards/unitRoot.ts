import { levelRatio } from "../../numeric/levelRatio.ts";
import { unitRootSurfaces } from "./mackinnon2010.ts";

export interface UnitRoot {
  /** t ratio of the level in the regression of the changes; far below zero where the residuals return to zero. */
  readonly statistic: number;
  /** How many earlier changes were let in. */
  readonly lags: number;
  /** The critical values at 1, 5 and 10 %; null where there are more variables than the table has. */
  readonly critical: readonly [number, number, number] | null;
}

export interface UnitRootSettings {
  /** The outcome and the drivers that may wander. */
  readonly variables: number;
  readonly deterministic: keyof typeof unitRootSurfaces;
  readonly lags: number;
}

/**
 * Residual-based test of whether residuals wander without returning (Engle and Granger).
 * H0: they have a unit root, so that outcome and drivers merely wander side by side. The t ratio of e_(t-1) in the
 * regression of e_t - e_(t-1) on it and on earlier changes, without a constant.
 * @param residuals - n values, one a period, without gaps.
 * @returns null where too few rows are left for the regression.
 * @see Engle and Granger (1987), Econometrica 55, 251-276.
 */
export function unitRoot(
  residuals: Float64Array,
  { variables, deterministic, lags }: UnitRootSettings,
): UnitRoot | null {
  const rows = residuals.length - 1 - lags;
  if (rows <= lags + 1) return null;
  const statistic = levelRatio(residuals, lags);
  return statistic === null ? null : { statistic, lags, critical: unitRootPoints(variables, deterministic, rows) };
}

/** beta_0 + beta_1 / T + beta_2 / T^2 + beta_3 / T^3 at 1, 5 and 10 %. */
export function unitRootPoints(
  variables: number,
  deterministic: keyof typeof unitRootSurfaces,
  rows: number,
): readonly [number, number, number] | null {
  const surfaces = unitRootSurfaces[deterministic][variables - 2];
  if (surfaces === undefined) return null;
  const at = (surface: readonly number[]): number => surface.reduceRight((sum, beta) => sum / rows + beta, 0);
  return [at(surfaces[0]), at(surfaces[1]), at(surfaces[2])];
}
