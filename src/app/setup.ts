import type { Options } from "../core/answer/options.ts";
import type { CalendarDriver, DriverChoice, RowsAre, Transform } from "../core/design/model.ts";
import type { DecimalMark } from "../core/table/textNumbers.ts";

export type Role = "outcome" | "driver" | "time" | "group" | "second group" | "unused";

/** What the user, or a guess, makes of one column. */
export interface ColumnSetup {
  readonly column: string;
  readonly role: Role;
  /** Whether the role is still the guess. */
  readonly guessed: boolean;
  readonly as: DriverChoice["as"];
  /** The category the others are compared with; null takes the most frequent. */
  readonly base: string | null;
  readonly transform: Transform;
  /** What else enters of a column of numbers, as a driver of its own: its square for a curve, its earlier values. */
  readonly also: Transform;
  /** Words for one unit, "repairs a month"; empty for none. */
  readonly unit: string;
  /** The value the driver is tested against. */
  readonly against: number;
  /** The decimal mark under which text is read as numbers; null where it is not. */
  readonly textNumbers: DecimalMark | null;
}

/** Everything that is chosen about the data at hand and the way to the answer. */
export interface Setup {
  readonly columns: readonly ColumnSetup[];
  readonly rows: RowsAre["kind"];
  readonly rowsGuessed: boolean;
  readonly constant: boolean;
  /** Whether rows that are hidden or filtered away are left out. */
  readonly visibleOnly: boolean;
  readonly calendar: readonly CalendarDriver[];
  /** Units and tested values stand with their columns. */
  readonly options: Omit<Options, "units" | "against">;
}

/** The part of a column's set-up that is changed without touching any other column. */
export type ColumnDetails = Partial<
  Pick<ColumnSetup, "as" | "base" | "transform" | "also" | "unit" | "against" | "textNumbers">
>;

export const changeColumn = (setup: Setup, column: string, details: ColumnDetails): Setup => ({
  ...setup,
  columns: setup.columns.map((entry) => (entry.column === column ? { ...entry, ...details } : entry)),
});

/** Roles that one column alone can have. */
const single: readonly Role[] = ["outcome", "time", "group", "second group"];

/**
 * Gives a column a role. Where one column alone can have it, the column that had it takes the role that becomes free,
 * so that two clicks swap outcome and driver; a time or group column makes the rows what it tells.
 */
export function assignRole(setup: Setup, column: string, role: Role): Setup {
  const before = setup.columns.find((entry) => entry.column === column);
  if (before === undefined || before.role === role) return setup;
  const columns = setup.columns.map((entry) => {
    if (entry.column === column) return { ...entry, role, guessed: false };
    const loses = entry.role === role && single.includes(role);
    return loses ? { ...entry, role: freed(before.role, role), guessed: false } : entry;
  });
  return { ...setup, columns, ...rowsToldBy(role, setup) };
}

/** A former outcome may become a driver; a former time or group column is of no use as one. */
const freed = (left: Role, taken: Role): Role => (taken === "outcome" && left === "driver" ? "driver" : "unused");

function rowsToldBy(role: Role, { rows, rowsGuessed }: Setup): Pick<Setup, "rows" | "rowsGuessed"> {
  if (role === "group" || role === "second group") return { rows: "groups", rowsGuessed: false };
  if (role === "time" && rows === "cases") return { rows: "time", rowsGuessed: false };
  return { rows, rowsGuessed };
}

export const columnWithRole = (setup: Setup, role: Role): string | null =>
  setup.columns.find((entry) => entry.role === role)?.column ?? null;
