import { defaultOptions } from "../core/answer/options.ts";
import type { ColumnDescription } from "../core/table/describe.ts";
import { type ProposedRoles, proposeRoles } from "../core/table/roles.ts";
import type { ColumnSetup, Role, Setup } from "./setup.ts";

/** A set-up guessed from the columns alone; every role is marked as a guess. */
export function proposeSetup(columns: readonly ColumnDescription[]): Setup {
  const proposed = proposeRoles(columns);
  return {
    columns: columns.map((column) => columnSetup(column, proposed)),
    rows: proposed.rowsAre,
    rowsGuessed: true,
    constant: true,
    visibleOnly: false,
    calendar: [],
    options: defaultOptions,
  };
}

const columnSetup = (column: ColumnDescription, proposed: ProposedRoles): ColumnSetup => ({
  column: column.name,
  role: roleOf(column.name, proposed),
  guessed: true,
  as: asOf(column),
  base: null,
  transform: { kind: "none" },
  also: { kind: "none" },
  unit: "",
  against: 0,
  textNumbers: null,
});

function roleOf(name: string, { outcome, drivers, time, groups }: ProposedRoles): Role {
  if (name === outcome) return "outcome";
  if (name === time) return "time";
  if (name === groups) return "group";
  return drivers.includes(name) ? "driver" : "unused";
}

/** How a column would be read if it became a driver. */
function asOf({ holds }: ColumnDescription): ColumnSetup["as"] {
  switch (holds) {
    case "categories":
    case "text":
      return "category";
    case "dates":
    case "periods":
      return "date";
    case "numbers":
    case "mixed":
    case "nothing":
      return "number";
  }
}
