import { sense } from "../../table/senses.ts";
import { standsInCells } from "../forms.ts";
import type { Frame, FrameLine } from "./frame.ts";

/** Sums typed with two decimals or more still agree to this share of themselves. */
const tolerance = 1e-6;

/**
 * Whether a row below the claimed ones adds them up in any claimed line, or averages them in every line in which it
 * holds a number: one value of many may be the mean of the others by chance.
 */
export function looksLikeSummary(frame: Frame, row: number): "sum" | "mean" | null {
  const { lines, driverCount } = frame;
  const ownCells = lines.slice(0, driverCount + 1).filter(({ line }) => standsInCells(line));
  const filled = ownCells.filter(({ senses }) => senses[row] === sense.number);
  const made = filled.map((line) => madeOf(line, frame, row));
  if (made.includes("sum")) return "sum";
  return made.length > 0 && made.every((one) => one === "mean") ? "mean" : null;
}

function madeOf({ numbers }: FrameLine, { first, count }: Frame, row: number): "sum" | "mean" | null {
  let sum = 0;
  let rows = 0;
  for (let above = first; above < Math.min(row, first + count); above++) {
    if (above === row) continue;
    sum += numbers[above]!;
    rows += numbers[above] === 0 ? 0 : 1;
  }
  const near = (value: number): boolean => Math.abs(numbers[row]! - value) <= tolerance * Math.abs(value);
  if (rows <= 2 || sum === 0) return null;
  return near(sum) ? "sum" : near(sum / rows) ? "mean" : null;
}
