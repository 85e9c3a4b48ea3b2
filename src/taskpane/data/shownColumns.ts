import type { ColumnSetup } from "../../app/setup.ts";

/** So many columns are listed at once; of more, those that take part and the first ones. */
export const roomForColumns = 40;

export interface ShownColumns {
  /** Places of the columns that are listed, in the order of the sheet. */
  readonly shown: readonly number[];
  /** How many more there are with what is looked for in their names. */
  readonly hidden: number;
}

/** The columns whose names hold what is looked for, as many as there is room for; those that take part are all shown. */
export function shownColumns(columns: readonly ColumnSetup[], wanted: string, room: number): ShownColumns {
  const sought = wanted.trim().toLowerCase();
  const found = columns.flatMap(({ column }, place) => (column.toLowerCase().includes(sought) ? [place] : []));
  const shown = found.filter((place, index) => index < room || columns[place]!.role !== "unused");
  return { shown, hidden: found.length - shown.length };
}
