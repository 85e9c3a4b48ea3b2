import { leastSquares } from "../../numeric/leastSquares.ts";
import { cellKind } from "../../table/cells.ts";
import type { Claim, ClaimedLine, ReportedNumber } from "../claim.ts";
import type { Finding } from "../finding.ts";
import { formOf } from "../forms.ts";
import { recomputedInWords } from "../shownDigits.ts";
import { craftFinding } from "./craftFinding.ts";
import { found } from "./craftWords.ts";

/** Spreadsheets' own sums of squares lose digits; a difference below this share of a number is theirs, not time's. */
const lostDigits = 1e-6;

/**
 * Formulas whose coefficients are not what their cells give now: they were not calculated since the cells changed.
 * Told only where every claimed cell is a number, so that it cannot be a question of which rows take part.
 */
export function olderResults(claim: Claim): Finding[] {
  const coefficients = claim.reported.filter(({ quantity }) => quantity.kind === "coefficient");
  if (claim.origin.kind !== "formula" || coefficients.length === 0) return [];
  const now = coefficientsNow(claim);
  if (now === null) return [];
  const older = coefficients.flatMap((reported) => {
    const recomputed = now[termOf(reported) ?? claim.drivers.length] ?? null;
    return recomputed === null || agrees(reported, recomputed) ? [] : [{ reported, recomputed, agrees: false }];
  });
  const [first] = older;
  if (first === undefined) return [];
  const cells = older.map(({ reported }) => reported.cell);
  return [
    {
      ...craftFinding("olderResults", { rank: "changes a number", cells, what: found.olderResults(older.length) }),
      reported: first.reported.shown,
      recomputed: recomputedInWords(first),
    },
  ];
}

const termOf = ({ quantity }: ReportedNumber): number | null => ("term" in quantity ? quantity.term : null);

const agrees = ({ value, halfUnit }: ReportedNumber, recomputed: number): boolean =>
  Math.abs(value - recomputed) <= Math.max(1.0001 * halfUnit, lostDigits * Math.abs(recomputed));

/** Of the drivers in their order, then the constant; null where not every cell is a number that can enter. */
function coefficientsNow({ outcome, drivers, constant }: Claim): Float64Array | null {
  const lines = [outcome, ...drivers].map(valuesOf);
  const whole = lines.filter((line) => line !== null);
  if (whole.length < lines.length || outcome.count <= drivers.length + 1) return null;
  const [y, ...x] = whole;
  const ones = new Float64Array(outcome.count).fill(1);
  const solved = leastSquares(constant ? [...x, ones] : x, y!);
  return solved.kind === "solved" ? solved.coefficients : null;
}

function valuesOf({ cells, from, first, count, form }: ClaimedLine): Float64Array | null {
  const values = new Float64Array(count);
  for (let index = 0; index < count; index++) {
    const at = from - first + index;
    const value = formOf[form](cells.numbers[at]!);
    if (cells.kinds[at] !== cellKind.number || !Number.isFinite(value)) return null;
    values[index] = value;
  }
  return values;
}
