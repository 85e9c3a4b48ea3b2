import type { Answer } from "../core/answer/answer.ts";
import { columnLetters } from "../core/table/address.ts";
import { page, wrappedHeight } from "./columns.ts";
import type { SheetFacts } from "./facts.ts";
import { headingFormat } from "./pageFormats.ts";
import type { PlanCell, PlanFormat, PlanLink } from "./plan.ts";
import { type Section, cellOf, number, section, text } from "./section.ts";

const mostRowsListed = 50;
const listHeading = ["Row", "Cell", "Left out because"] as const;

/** Ranges, rows used and left out, settings, fingerprint and version: enough to make it again. */
export function howMadeSection(answer: Answer, facts: SheetFacts): Section {
  const made = madeRows(answer, facts);
  const settings = facts.settings.map(([label, value]) => ({ label, value, target: null }));
  const leftOut = leftOutRows(answer);
  const settingsRow = made.length + 1;
  const listRow = settingsRow + 1 + settings.length;
  const formats: PlanFormat[] = [
    headingFormat(0),
    { area: { row: 1, column: 0, rows: made.length, columns: 1 }, style: "label" },
    ...made.map(({ value }, index) => valueFormat(index + 1, value)),
    { area: { row: settingsRow, column: 0, rows: 1, columns: 2 }, style: "table heading", heads: settings.length },
    ...settings.map(({ value }, index) => valueFormat(settingsRow + 1 + index, value)),
    ...(leftOut.length === 0
      ? []
      : [
          {
            area: { row: listRow, column: 0, rows: 1, columns: 3 },
            style: "table heading",
            heads: leftOut.length - 1,
          } as const,
        ]),
  ];
  return section(
    [
      [text("How this was made")],
      ...made.map(lineCells),
      [text("Setting"), text("Value")],
      ...settings.map(lineCells),
      ...leftOut,
    ],
    formats,
    [...rangeLinks(made), ...leftOutLinks(answer, listRow + 1)],
  );
}

/** The range of the settings on the sheet, for the functions of a live sheet: "$A$40:$B$45". */
export function settingsArea(answer: Answer, facts: SheetFacts, startRow: number): string {
  const first = startRow + madeRows(answer, facts).length + 2;
  const last = first + Math.max(facts.settings.length, 1);
  return `$${columnLetters(0)}$${first + 1}:$${columnLetters(1)}$${last}`;
}

/** A label and what stands beside it, over the rest of the page. */
interface Line {
  readonly label: string;
  readonly value: string | number;
  /** The cells to jump to. */
  readonly target: string | null;
}

const lineCells = ({ label, value }: Line): PlanCell[] => [text(label), cellOf(value)];

const valueFormat = (row: number, value: string | number): PlanFormat => ({
  area: { row, column: 1, rows: 1, columns: page.columns - 1 },
  merge: true,
  wrap: true,
  align: "left",
  rowHeight: wrappedHeight(String(value), 1),
});

function madeRows(answer: Answer, { ranges, table, fingerprint, version }: SheetFacts): Line[] {
  const plain = (label: string, value: string | number): Line => ({ label, value, target: null });
  const range = (label: string, value: string): Line => ({ label, value, target: value.replaceAll("$", "") });
  return [
    range("Outcome", ranges.outcome),
    range("Drivers", ranges.drivers),
    ...(ranges.key === null ? [] : [range("Time or group of each row", ranges.key)]),
    ...(table === null ? [] : [plain("Table of these ranges", table.name)]),
    plain("Rows used, when made", answer.observations),
    plain("Rows left out, when made", answer.leftOutCount),
    ...answer.notes.map((note) => plain("Done to the data", note)),
    plain("Fingerprint when made (SHA-256)", fingerprint),
    plain("Version", version),
  ];
}

const rangeLinks = (made: readonly Line[]): PlanLink[] =>
  made.flatMap(({ value, target }, index) =>
    target?.includes("!") === true ? [{ row: index + 1, column: 1, text: String(value), target }] : [],
  );

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
