import type { ResidualPoints } from "../../core/answer/answer.ts";

const brief = new Intl.NumberFormat("en-US", { maximumSignificantDigits: 3 });

/** What the picture of residuals over fitted values shows, for those who do not see it: range, and spread low and high. */
export function overFittedInWords({ fitted, residuals }: ResidualPoints): string {
  const order = fitted.map((_, index) => index).sort((a, b) => fitted[a]! - fitted[b]!);
  const third = Math.max(1, Math.floor(order.length / 3));
  const low = spreadOf(order.slice(0, third).map((index) => residuals[index]!));
  const high = spreadOf(order.slice(-third).map((index) => residuals[index]!));
  const [least, most] = [Math.min(...residuals), Math.max(...residuals)].map((value) => brief.format(value));
  return (
    `Residuals of ${residuals.length} rows over the fitted values, from ${least ?? ""} to ${most ?? ""}. ` +
    `Among the third with the smallest fitted values they spread by ${brief.format(low)}, among the third with the largest by ${brief.format(high)}.`
  );
}

/** What the picture of residuals over rows shows: how often two neighbours stand on the same side of zero. */
export function overRowsInWords({ residuals, rows }: ResidualPoints): string {
  const order = rows.map((_, index) => index).sort((a, b) => rows[a]! - rows[b]!);
  const pairs = order.slice(1).map((index, before) => residuals[index]! * residuals[order[before]!]!);
  const same = pairs.filter((product) => product > 0).length;
  return `Residuals in the order of the rows. Of ${pairs.length} neighbouring pairs, ${same} lie on the same side of zero.`;
}

/** Root mean square about zero, the centre of residuals. */
const spreadOf = (residuals: readonly number[]): number =>
  Math.sqrt(residuals.reduce((sum, residual) => sum + residual * residual, 0) / residuals.length);

export interface LargeResidual {
  /** Sheet row, from 1. */
  readonly row: number;
  readonly words: string;
}

/** The points farthest from the fit, the farthest first. */
export function largestResiduals(
  { residuals, fitted, rows }: ResidualPoints,
  wanted: number,
): readonly LargeResidual[] {
  const order = residuals.map((_, index) => index).sort((a, b) => Math.abs(residuals[b]!) - Math.abs(residuals[a]!));
  return order.slice(0, wanted).map((index) => ({
    row: rows[index]!,
    words: `${brief.format(Math.abs(residuals[index]!))} ${residuals[index]! < 0 ? "below" : "above"} the fitted ${brief.format(fitted[index]!)}`,
  }));
}
