import type { ReportedNumber } from "./claim.ts";
import type { Comparison } from "./claimReview.ts";

/** How a cell shows its number, so that another number can be shown in the same way. */
export interface ShownDigits {
  /** The sign behind the number as the cell has it: "", "%" or " %". */
  readonly percent: string;
  readonly scientific: boolean;
  /** Thousands apart by commas. */
  readonly grouped: boolean;
  readonly decimals: number;
}

/** More decimals than these say nothing of a double near one. */
const mostDecimals = 15;

export function digitsShown({ shown, halfUnit }: Pick<ReportedNumber, "shown" | "halfUnit">): ShownDigits {
  const percent = / ?%/.exec(shown)?.[0] ?? "";
  const scientific = /\dE[+-]?\d/i.test(shown);
  const grouped = /\d,\d{3}(?!\d)/.test(shown);
  // A formula's whole number counts to digits that its cell does not show.
  const written = /\.(\d+)/.exec(shown)?.[1]?.length ?? (/^-?\d+$/.test(shown) ? 0 : undefined);
  const decimals = written ?? (scientific ? 0 : Math.round(-Math.log10(2 * halfUnit * (percent === "" ? 1 : 100))));
  return { percent, scientific, grouped, decimals: Math.max(0, Math.min(mostDecimals, decimals)) };
}

/** A number in the way in which a reported one is shown: 0.0416 beside "4.20%" is "4.16%". */
export function showWith({ percent, scientific, grouped, decimals }: ShownDigits, value: number): string {
  if (scientific)
    return value
      .toExponential(decimals)
      .replace(/e([+-])(\d)$/, "e$10$2")
      .replace("e", "E");
  const scaled = percent === "" ? value : 100 * value;
  const text = scaled.toLocaleString("en-US", {
    minimumFractionDigits: decimals,
    maximumFractionDigits: decimals,
    useGrouping: grouped,
  });
  return (/^-0(\.0*)?$/.test(text) ? text.slice(1) : text) + percent;
}

/** The digits that a recomputed number needs: those of the reported one, and more where the two would look alike. */
export function digitsFor({ reported, recomputed, agrees }: Comparison): ShownDigits {
  const digits = digitsShown(reported);
  if (agrees || recomputed === null) return digits;
  const looksAlike = ({ decimals }: ShownDigits): boolean =>
    showWith({ ...digits, decimals }, recomputed) === showWith({ ...digits, decimals }, reported.value);
  let finer = digits;
  while (looksAlike(finer) && finer.decimals < mostDecimals) finer = { ...finer, decimals: finer.decimals + 1 };
  return finer;
}

export const recomputedInWords = (comparison: Comparison): string =>
  comparison.recomputed === null ? "cannot be formed" : showWith(digitsFor(comparison), comparison.recomputed);
