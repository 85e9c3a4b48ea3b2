import type { Question } from "../core/answer/question.ts";
import { type SettingPair, settingsSaid } from "../core/answer/settingsSaid.ts";
import { type SheetArea, columnLetters, quoteSheet } from "../core/table/address.ts";
import type { Column, Source } from "../core/table/source.ts";
import type { SheetFacts } from "../sheet/facts.ts";
import { type TableInHand, columnsOfTable } from "./tableInHand.ts";

export interface Made {
  /** "1 December 2026" */
  readonly date: string;
  readonly version: string;
  readonly fingerprint: string;
  /** The sheet row of the headings, from 0; null where the data have none. */
  readonly headingRow: number | null;
  /** The table that they are, if they are one. */
  readonly table: TableInHand | null;
}

/** What a result sheet says of where its figures come from, and the ranges that a live sheet's functions read. */
export function sheetFactsOf({ source, model, options }: Question, made: Made): SheetFacts {
  const columnOf = (name: string): Column | undefined => source.columns.find((column) => column.name === name);
  const { rows } = model;
  const key = rows.kind === "time" ? rows.order : rows.kind === "groups" ? rows.by : null;
  const drivers = plainDrivers(model);
  // Functions find the second groups among the columns of the drivers.
  const second = rows.kind === "groups" && rows.second !== null ? [rows.second] : [];
  const beside = [...drivers, ...second];
  const rangesBy = (textOf: (area: SheetArea) => string): SheetFacts["ranges"] => {
    const areaOf = (names: readonly string[]): string => {
      const area = spanOf(
        names.map(columnOf).filter((column) => column !== undefined),
        { source, made },
      );
      return area === null ? "" : textOf(area);
    };
    return {
      outcome: areaOf([model.outcome.column]),
      drivers: areaOf(beside),
      key: key === null ? null : areaOf([key]),
    };
  };
  const { table } = made;
  return {
    date: made.date,
    version: made.version,
    fingerprint: made.fingerprint,
    ranges: rangesBy(addressText),
    table: table === null ? null : { name: table.name, columns: rangesBy((area) => textInTable(table, area)) },
    settings: [
      ...settingsSaid(model, options),
      ...columnsSetting(drivers.map(columnOf), beside.map(columnOf)),
      ...hiddenSetting(source),
    ],
  };
}

interface Context {
  readonly source: Source;
  readonly made: Made;
}

/** "Months!$C$3:$E$99" */
function addressText(area: SheetArea): string {
  const corner = (row: number, column: number): string => `$${columnLetters(column)}$${row + 1}`;
  const last = corner(area.row + area.rows - 1, area.column + area.columns - 1);
  return `${quoteSheet(area.sheet)}!${corner(area.row, area.column)}:${last}`;
}

const textInTable = (table: TableInHand, { column, columns }: SheetArea): string =>
  columnsOfTable(table, column, column + columns - 1);

/** The smallest rectangle that holds the columns, headings included. */
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

/** Worksheet functions know no such setting: they see every row, so that it stands on kept sheets alone. */
export const hiddenSetting = ({ hidden }: Source): SettingPair[] =>
  hidden?.leftOut === true ? [["hidden rows", "left out"]] : [];

type Columns = readonly (Column | undefined)[];

const placesOf = (columns: Columns): number[] =>
  columns.flatMap((column) => (column?.place.kind === "sheet" ? [column.place.column] : []));

/** Each column that drivers are made of, once; earlier values of the outcome are made of the outcome's own. */
const plainDrivers = ({ outcome, drivers }: Question["model"]): string[] => [
  ...new Set(drivers.map(({ column }) => column).filter((column) => column !== outcome.column)),
];

/** Where the drivers' rectangle holds other columns too, or another order, the setting that picks them by number. */
function columnsSetting(drivers: Columns, rectangle: Columns): SettingPair[] {
  const places = placesOf(drivers);
  const all = placesOf(rectangle);
  const first = Math.min(...all);
  const side = all.length === places.length && places.every((column, index) => column === first + index);
  return side ? [] : [["columns", places.map((column) => column - first + 1).join(", ")]];
}
