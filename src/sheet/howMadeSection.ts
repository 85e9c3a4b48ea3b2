import type { Answer } from "../core/answer/answer.ts";
import { columnLetters } from "../core/table/address.ts";
import { headingFormat } from "./plainWordsSection.ts";
import type { PlanCell, PlanFormat, PlanLink } from "./plan.ts";
import { countFormat, formatFor, shareFormat } from "./numberFormats.ts";
import { type Section, cellOf, number, section, text } from "./section.ts";

/** What the sheet must say that the answer does not know: places, date, version, fingerprint, settings. */
export interface SheetFacts {
  /** "1 December 2026" */
  readonly date: string;
  readonly version: string;
  /** SHA-256 of the data used, in hexadecimal. */
  readonly fingerprint: string;
  /** Ranges with their headings, "Months!$B$3:$B$99". */
  readonly ranges: { readonly outcome: string; readonly drivers: string; readonly key: string | null };
  /** Settings by name: those that differ from the defaults, and those the columns call for. */
  readonly settings: readonly (readonly [string, string])[];
}

const mostRowsListed = 50;
const listHeading = ["Row", "Cell", "Left out because"] as const;

/** Ranges, rows used and left out, settings, fingerprint and version: enough to make it again. */
export function howMadeSection(answer: Answer, facts: SheetFacts): Section {
  const lines = madeLines(answer, facts);
  const made = lines.map(madeRow);
  const settings = facts.settings.map(([name, value]): PlanCell[] => [text(name), text(value)]);
  const leftOut = leftOutRows(answer);
  const settingsRow = made.length + 1;
  const listRow = settingsRow + 1 + settings.length;
  const formats: PlanFormat[] = [
    headingFormat(0),
    { area: { row: 1, column: 0, rows: made.length, columns: 1 }, style: "label" },
    { area: { row: 1, column: 1, rows: made.length, columns: 1 }, align: "left" },
    ...madeFormats(lines),
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
  const first = startRow + madeLines(answer, facts).length + 2;
  const last = first + Math.max(facts.settings.length, 1);
  return `$${columnLetters(0)}$${first + 1}:$${columnLetters(1)}$${last}`;
}

interface MadeLine {
  readonly label: string;
  readonly value: string | number;
  readonly numberFormat?: string;
}

function madeLines(answer: Answer, { ranges, fingerprint, version }: SheetFacts): MadeLine[] {
  return [
    { label: "Outcome", value: ranges.outcome },
    { label: "Drivers", value: ranges.drivers },
    ...(ranges.key === null ? [] : [{ label: "Time or group of each row", value: ranges.key }]),
    { label: "Rows used", value: answer.observations, numberFormat: countFormat },
    { label: "Rows left out", value: answer.leftOutCount, numberFormat: countFormat },
    ...fitLines(answer),
    ...answer.notes.map((note) => ({ label: "Done to the data", value: note })),
    { label: "Fingerprint of the data (SHA-256)", value: fingerprint },
    { label: "Version", value: version },
  ];
}

function fitLines({ fit }: Answer): MadeLine[] {
  return [
    { label: fit.uncentred ? "R-squared about zero" : "R-squared", value: fit.rSquared, numberFormat: shareFormat },
    { label: "Adjusted R-squared", value: fit.adjustedRSquared, numberFormat: shareFormat },
    { label: "Standard error of the regression", value: fit.sigma, numberFormat: formatFor([fit.sigma]) },
    { label: "Degrees of freedom", value: fit.degreesOfFreedom, numberFormat: countFormat },
    { label: "AIC", value: fit.aic, numberFormat: formatFor([fit.aic]) },
    { label: "BIC", value: fit.bic, numberFormat: formatFor([fit.bic]) },
  ];
}

const madeRow = ({ label, value }: MadeLine): PlanCell[] => [text(label), cellOf(value)];

const madeFormats = (lines: readonly MadeLine[]): PlanFormat[] =>
  lines.flatMap(({ numberFormat }, index) =>
    numberFormat === undefined ? [] : [{ area: { row: index + 1, column: 1, rows: 1, columns: 1 }, numberFormat }],
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
