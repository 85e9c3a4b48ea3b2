import { chiSquareQuantile, fQuantile } from "../numeric/distributions.ts";
import type { Figure } from "./outcome.ts";

/**
 * The point that a statistic must pass to reject at a level.
 * @param level - in (0, 1).
 * @returns null for laws without degrees of freedom, whose p-value is found directly.
 */
export function criticalValueOf({ law, df }: Pick<Figure, "law" | "df">, level: number): number | null {
  switch (law) {
    case "chi-square":
      return chiSquareQuantile(1 - level, df[0]!);
    case "F":
      return fQuantile(1 - level, df[0]!, df[1]!);
    case "normal":
    case "exact":
    case "limit":
      return null;
  }
}
