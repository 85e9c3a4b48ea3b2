import type { Answer } from "../core/answer/answer.ts";
import { columnLetters } from "../core/table/address.ts";
import { headingFormat } from "./plainWordsSection.ts";
import type { PlanCell, PlanFormat, PlanLink } from "./plan.ts";
import { type Section, cellOf, number, section, text } from "./section.ts";

/** What the sheet must say that the answer does not know: places, date, version, fingerprint, settings. */
export interface SheetFacts {
  /** "1 December 2026" */
  readonly date: string;
  readonly version: string;
  /** SHA-256 of the data used, in hexadecimal. */
  readonly fingerprint: string;
  /** Ranges with their headings, "Months!$B$3:$B$99". */
  readonly ranges: SourceRanges;
  /** The table that the ranges are of, if any, and its columns as formulas speak of them, so that they follow it as it grows. */
  readonly table: { readonly name: string; readonly columns: SourceRanges } | null;
  /** Settings by name: those that differ from the defaults, and those the columns call for. */
  readonly settings: readonly (readonly [string, string])[];
}

export interface SourceRanges {
  readonly outcome: string;
  readonly drivers: string;
  readonly key: string | null;
}

const mostRowsListed = 50;
const listHeading = ["Row", "Cell", "Left out because"] as const;

/** Ranges, rows used and left out, settings, fingerprint and version: enough to make it again. */
export function howMadeSection(answer: Answer, facts: SheetFacts): Section {
  const made = madeRows(answer, facts);
  const settings = facts.settings.map(([name, value]): PlanCell[] => [text(name), text(value)]);
  const leftOut = leftOutRows(answer);
  const settingsRow = made.length + 1;
  const listRow = settingsRow + 1 + settings.length;
  const formats: PlanFormat[] = [
    headingFormat(0),
    { area: { row: 1, column: 0, rows: made.length, columns: 1 }, style: "label" },
    { area: { row: 1, column: 1, rows: made.length, columns: 1 }, align: "left" },
    { area: { row: settingsRow, column: 0, rows: 1, columns: 2 }, style: "table heading" },
    ...(leftOut.length === 0
      ? []
      : [{ area: { row: listRow, column: 0, rows: 1, columns: 3 }, style: "table heading" } as const]),
  ];
  return section(
    [[text("How this was made")], ...made, [text("Setting"), text("Value")], ...settings, ...leftOut],
    formats,
    leftOutLinks(answer, listRow + 1),
  );
}

/** The range of the settings on the sheet, for the functions of a live sheet: "$A$40:$B$45". */
export function settingsArea(answer: Answer, facts: SheetFacts, startRow: number): string {
  const first = startRow + madeRows(answer, facts).length + 2;
  const last = first + Math.max(facts.settings.length, 1);
  return `$${columnLetters(0)}$${first + 1}:$${columnLetters(1)}$${last}`;
}

function madeRows(answer: Answer, { ranges, table, fingerprint, version }: SheetFacts): PlanCell[][] {
  const lines: readonly (readonly [string, string | number])[] = [
    ["Outcome", ranges.outcome],
    ["Drivers", ranges.drivers],
    ...(ranges.key === null ? [] : [["Time or group of each row", ranges.key] as const]),
    ...(table === null ? [] : [["Table of these ranges", table.name] as const]),
    ["Rows used, when made", answer.observations],
    ["Rows left out, when made", answer.leftOutCount],
    ...answer.notes.map((note) => ["Done to the data", note] as const),
    ["Fingerprint of the data (SHA-256)", fingerprint],
    ["Version", version],
  ];
  return lines.map(([label, value]) => [text(label), cellOf(value)]);
}

function leftOutRows({ leftOut, leftOutCount }: Answer): PlanCell[][] {
  if (leftOut.length === 0) return [];
  const listed = leftOut.slice(0, mostRowsListed);
  const rest = leftOutCount - listed.length;
  return [
    listHeading.map(text),
    ...listed.map(({ row, because }) => [number(row), null, text(because)]),
    ...(rest > 0 ? [[text(`and ${rest} more rows`)]] : []),
  ];
}

/** Cells on a sheet become links; rows of a function's argument have no address to jump to. */
const leftOutLinks = ({ leftOut }: Answer, firstRow: number): PlanLink[] =>
  leftOut
    .slice(0, mostRowsListed)
    .map(({ cell }, index) => ({ row: firstRow + index, column: 1, text: cell, target: cell }))
    .filter(({ target }) => target.includes("!"));
