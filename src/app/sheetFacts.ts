import type { Question } from "../core/answer/question.ts";
import { type SettingPair, settingsSaid } from "../core/answer/settingsSaid.ts";
import { type SheetArea, columnLetters, quoteSheet } from "../core/table/address.ts";
import type { Column, Source } from "../core/table/source.ts";
import type { SheetFacts } from "../sheet/howMadeSection.ts";

export interface Made {
  /** "1 December 2026" */
  readonly date: string;
  readonly version: string;
  readonly fingerprint: string;
  /** The sheet row of the headings, from 0; null where the data have none. */
  readonly headingRow: number | null;
}

/** What a result sheet says of where its figures come from, and the ranges that a live sheet's functions read. */
export function sheetFactsOf({ source, model, options }: Question, made: Made): SheetFacts {
  const columnOf = (name: string): Column | undefined => source.columns.find((column) => column.name === name);
  const areaOf = (names: readonly string[]): string =>
    areaText(
      names.map(columnOf).filter((column) => column !== undefined),
      { source, made },
    );
  const drivers = model.drivers.map(({ column }) => column);
  const { rows } = model;
  const key = rows.kind === "time" ? rows.order : rows.kind === "groups" ? rows.by : null;
  return {
    date: made.date,
    version: made.version,
    fingerprint: made.fingerprint,
    ranges: {
      outcome: areaOf([model.outcome.column]),
      drivers: areaOf(drivers),
      key: key === null ? null : areaOf([key]),
    },
    settings: [...settingsSaid(model, options), ...columnsSetting(drivers.map(columnOf))],
  };
}

interface Context {
  readonly source: Source;
  readonly made: Made;
}

/** The smallest rectangle that holds the columns, headings included: "Months!$C$3:$E$99". */
function areaText(columns: readonly Column[], context: Context): string {
  const area = spanOf(columns, context);
  if (area === null) return "";
  const corner = (row: number, column: number): string => `$${columnLetters(column)}$${row + 1}`;
  const last = corner(area.row + area.rows - 1, area.column + area.columns - 1);
  return `${quoteSheet(area.sheet)}!${corner(area.row, area.column)}:${last}`;
}

function spanOf(columns: readonly Column[], { source, made }: Context): SheetArea | null {
  const places = columns.flatMap(({ place }) => (place.kind === "sheet" ? [place] : []));
  const [first] = places;
  if (first === undefined) return null;
  const numbers = places.map(({ column }) => column);
  const row = made.headingRow ?? first.firstRow;
  return {
    sheet: first.sheet,
    row,
    column: Math.min(...numbers),
    rows: first.firstRow - row + source.rowCount,
    columns: Math.max(...numbers) - Math.min(...numbers) + 1,
  };
}

/** Where the drivers' rectangle holds other columns too, or another order, the setting that picks them by number. */
function columnsSetting(drivers: readonly (Column | undefined)[]): SettingPair[] {
  const places = drivers.flatMap((driver) => (driver?.place.kind === "sheet" ? [driver.place.column] : []));
  const first = Math.min(...places);
  const side = places.every((column, index) => column === first + index);
  return side ? [] : [["columns", places.map((column) => column - first + 1).join(", ")]];
}
