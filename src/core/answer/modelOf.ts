import type { DriverChoice, Model, RowsAre, Transform } from "../design/model.ts";
import { nearestName } from "../problem/nearestName.ts";
import { type Result, failure, success } from "../problem/result.ts";
import type { Settings } from "./settingValues.ts";

/** Which columns play which part; the key is the time or the group of each row. */
export interface Parts {
  readonly outcome: string;
  readonly drivers: readonly string[];
  readonly key: string | null;
  /** What the key holds where the settings do not say what rows are. */
  readonly keyIs: "time" | "groups";
  /** For rows in groups: the time within each group, where known. */
  readonly order: string | null;
}

/**
 * Brings settings and columns together into a model.
 * @returns Problem "unknown-heading" where a setting names a column that plays no part, "no-drivers" where none is left.
 */
export function modelOf(settings: Settings, parts: Parts): Result<Model> {
  const chosen = chooseDrivers(settings.columns, parts.drivers);
  if (!chosen.ok) return chosen;
  if (chosen.value.length === 0) return failure({ code: "no-drivers" });
  const rows = rowsOf(settings, parts);
  if (rows === null) return failure({ code: "no-group-column" });
  const named = [
    ...settings.categories,
    ...settings.dates,
    ...Object.keys(settings.bases),
    ...[...settings.transforms, ...settings.added].map(({ column }) => column),
  ];
  const known = [parts.outcome, ...chosen.value];
  const stranger = named.find((name) => find(known, name) === undefined);
  if (stranger !== undefined) return failure(unknownHeading(stranger, known));
  const transformOf = (column: string): Transform =>
    settings.transforms.find((entry) => same(entry.column, column))?.transform ?? { kind: "none" };
  return success({
    outcome: { column: parts.outcome, transform: transformOf(parts.outcome) },
    drivers: [
      ...chosen.value.map((column) => driver(column, settings, transformOf(column))),
      ...settings.added.map((entry) => added(find(known, entry.column) ?? entry.column, entry.transform)),
    ],
    calendar: settings.calendar,
    rows,
    constant: settings.constant,
    textNumbers:
      settings.textNumbers === null ? [] : known.map((column) => ({ column, decimal: settings.textNumbers ?? "." })),
  });
}

const same = (a: string, b: string): boolean => a.trim().toLowerCase() === b.trim().toLowerCase();

const find = (known: readonly string[], name: string): string | undefined => known.find((column) => same(column, name));

const unknownHeading = (heading: string, known: readonly string[]) =>
  ({
    code: "unknown-heading",
    heading,
    nearest: nearestName(heading, known),
    where: "the outcome and the drivers",
  }) as const;

/** Columns by heading, or by their number within the drivers, in the order asked for. */
function chooseDrivers(asked: readonly string[], drivers: readonly string[]): Result<readonly string[]> {
  if (asked.length === 0) return success(drivers);
  const found: string[] = [];
  for (const name of asked) {
    const column = find(drivers, name) ?? (/^\d+$/.test(name) ? drivers[Number(name) - 1] : undefined);
    if (column === undefined) return failure(unknownHeading(name, drivers));
    found.push(column);
  }
  return success(found);
}

function driver(column: string, settings: Settings, transform: Transform): DriverChoice {
  const base = Object.entries(settings.bases).find(([name]) => same(name, column))?.[1] ?? null;
  const category = base !== null || find(settings.categories, column) !== undefined;
  const date = find(settings.dates, column) !== undefined;
  return { column, as: category ? "category" : date ? "date" : "number", base, transform };
}

const added = (column: string, transform: Transform): DriverChoice => ({ column, as: "number", base: null, transform });

/** null where rows are to be in groups and no column says which. */
function rowsOf(settings: Settings, { key, keyIs, order }: Parts): RowsAre | null {
  const rows = settings.rows ?? (key === null ? "cases" : keyIs);
  switch (rows) {
    case "cases":
      return { kind: "cases" };
    case "time":
      return { kind: "time", order: key };
    case "groups": {
      const second = settings.secondGroups;
      if (key === null) return null;
      // A column that groups may hold what is no time: it is read as time only where something looks back in it.
      const grouping = second !== null && order !== null && same(second, order) && !looksBack(settings);
      return { kind: "groups", by: key, second, order: grouping ? null : order };
    }
  }
}

const looksBack = ({ transforms, added, calendar, options }: Settings): boolean =>
  calendar.length > 0 ||
  options.fixed?.errors === "newey-west" ||
  [...transforms, ...added].some(({ transform }) => "periods" in transform);
