import type { Frame } from "./frame.ts";

/** Sums typed with two decimals or more still agree to this share of themselves. */
const tolerance = 1e-6;

/** Whether a row below the claimed ones adds them up, or averages them, in any claimed line. */
export function looksLikeSummary(frame: Frame, row: number): "sum" | "mean" | null {
  const { lines, driverCount, first, count } = frame;
  for (const { numbers } of lines.slice(0, driverCount + 1)) {
    let sum = 0;
    let rows = 0;
    for (let above = first; above < Math.min(row, first + count); above++) {
      if (above === row) continue;
      sum += numbers[above]!;
      rows += numbers[above] === 0 ? 0 : 1;
    }
    const near = (value: number): boolean => Math.abs(numbers[row]! - value) <= tolerance * Math.abs(value);
    if (rows > 2 && sum !== 0 && near(sum)) return "sum";
    if (rows > 2 && sum !== 0 && near(sum / rows)) return "mean";
  }
  return null;
}
