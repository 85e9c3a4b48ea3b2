import { leastSquares } from "../../numeric/leastSquares.ts";
import { contentsOf } from "../../table/contents.ts";
import { holdingOf } from "../../table/holding.ts";
import { plainHeading } from "../../table/headingRow.ts";
import { cellKind } from "../../table/cells.ts";
import type { ClaimedForm } from "../claim.ts";
import { formOf } from "../forms.ts";
import type { DataColumn } from "./dataTables.ts";
import { formIn, type Match, scoreOf } from "./matchNames.ts";
import { outcomeNameIn } from "./reportWords.ts";

/** The column that a report explains, and how that was told. */
export interface Outcome {
  readonly column: DataColumn;
  readonly form: ClaimedForm;
  readonly because: "heading" | "named" | "spoken of" | "only one" | "nearest";
}

export interface Report {
  /** What stands over its coefficients where they are one column of several, the nearest first. */
  readonly headings: readonly string[];
  /** Texts of the report and around it. */
  readonly texts: readonly string[];
  readonly drivers: readonly Match[];
  /** As reported, in the drivers' order. */
  readonly coefficients: readonly number[];
}

/**
 * The outcome among the columns that are no drivers: the one that stands over the coefficients, the one that the report
 * names as such, the one that its texts speak of, the only one there is, or the one whose regression comes nearest to the coefficients.
 * @returns null where no column of numbers is left.
 */
export function guessOutcome(columns: readonly DataColumn[], report: Report): Outcome | null {
  const used = new Set(report.drivers.map(({ column }) => column.column));
  const left = columns.filter((column) => !used.has(column.column) && holdsNumbers(column));
  const named = headingAmong(left, report.headings) ?? namedAmong(left, report.texts);
  if (named !== null) return named;
  const spoken = left.filter(({ name }) => report.texts.some((text) => speaksOf(text, name)));
  if (spoken.length === 1) return { column: spoken[0]!, form: "as it is", because: "spoken of" };
  if (left.length === 1) return { column: left[0]!, form: "as it is", because: "only one" };
  const nearest = nearestTo(spoken.length > 1 ? spoken : left, report);
  return nearest === null ? null : { column: nearest, form: "as it is", because: "nearest" };
}

function holdsNumbers({ source }: DataColumn): boolean {
  const contents = contentsOf(source);
  return holdingOf(source, contents) === "numbers" && !contents.values.counter;
}

/** From this likeness on a heading is no other column's. */
const surelyMeant = 3;

function headingAmong(columns: readonly DataColumn[], headings: readonly string[]): Outcome | null {
  for (const heading of headings) {
    const { base, form } = formIn(heading);
    const column = columns.find(({ name }) => scoreOf(base, name) >= surelyMeant);
    if (column !== undefined) return { column, form, because: "heading" };
  }
  return null;
}

function namedAmong(columns: readonly DataColumn[], texts: readonly string[]): Outcome | null {
  for (const [index, text] of texts.entries()) {
    const said = outcomeNameIn(text);
    if (said === null) continue;
    const { base, form } = formIn(said === "" ? (texts[index + 1] ?? "") : said);
    const scored = columns.map((column) => ({ column, score: scoreOf(base, column.name) }));
    const best = scored.sort((one, other) => other.score - one.score)[0];
    if (best !== undefined && best.score > 0) return { column: best.column, form, because: "named" };
  }
  return null;
}

/** Whether a text has a heading among its words, in the singular or the plural. */
function speaksOf(text: string, heading: string): boolean {
  const words = plainHeading(heading)
    .replaceAll(/[^\p{L}\p{N} ]/gu, " ")
    .trim();
  if (words.length < 3) return false;
  const stem = words.replace(/s$/, "");
  return (
    ` ${plainHeading(text).replaceAll(/[^\p{L}\p{N}]+/gu, " ")} `.match(new RegExp(` ${stem}(?:s|es)? `, "u")) !== null
  );
}

/** More rows than these tell no more of which column is meant. */
const mostRows = 5000;

function nearestTo(columns: readonly DataColumn[], report: Report): DataColumn | null {
  const distances = columns.map((column) => ({ column, distance: distanceOf(column, report) }));
  const [best] = distances.sort((one, other) => one.distance - other.distance);
  return best?.column ?? null;
}

/** How far the coefficients of a column's regression lie from those reported, as a mean of shares; 2 where it has none. */
function distanceOf(column: DataColumn, { drivers, coefficients }: Report): number {
  const lines = [{ column, form: "as it is" as const }, ...drivers];
  const rows = completeRows(lines.map((line) => line.column));
  const [y, ...x] = lines.map(({ column, form }) =>
    Float64Array.from(rows, (row) => formOf[form](column.source.cells.numbers[row]!)),
  );
  if (rows.length <= x.length + 1 || [y!, ...x].some((line) => !line.every(Number.isFinite))) return 2;
  const ones = new Float64Array(rows.length).fill(1);
  const solved = leastSquares([...x, ones], y!);
  if (solved.kind !== "solved") return 2;
  const shares = coefficients.map((reported, term) => {
    const fitted = solved.coefficients[term]!;
    return Math.abs(fitted - reported) / (Math.abs(fitted) + Math.abs(reported) || 1);
  });
  return shares.reduce((sum, share) => sum + share, 0) / Math.max(1, shares.length);
}

function completeRows(columns: readonly DataColumn[]): number[] {
  const count = Math.min(mostRows, columns[0]!.source.cells.kinds.length);
  const rows: number[] = [];
  for (let row = 0; row < count; row++) {
    if (columns.every(({ source }) => source.cells.kinds[row] === cellKind.number)) rows.push(row);
  }
  return rows;
}
