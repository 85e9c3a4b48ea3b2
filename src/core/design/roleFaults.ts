import type { Problem } from "../problem/problem.ts";
import { sameColumn } from "./columns.ts";
import type { DriverChoice, Model } from "./model.ts";

/** What is wrong with the roles themselves, before any cell is looked at; null where nothing is. */
export function roleFault(model: Model): Problem | null {
  const { outcome, drivers, calendar, rows } = model;
  if (outcome.column.trim() === "") return { code: "no-outcome" };
  if (drivers.length === 0 && calendar.length === 0) return { code: "no-drivers" };
  if (rows.kind === "groups" && rows.by.trim() === "") return { code: "no-group-column" };
  return outcomeAgain(model) ?? driverAgain(drivers);
}

const usedTwice = (column: string, first: string, second: string): Problem => ({
  code: "column-used-twice",
  column,
  first,
  second,
});

/** The outcome may come again as a driver only in its earlier values, since all else would explain it by itself. */
function outcomeAgain({ outcome, drivers, rows }: Model): Problem | null {
  const { column } = outcome;
  const again = drivers.some((driver) => sameColumn(driver.column, column) && driver.transform.kind !== "lag");
  if (again) return usedTwice(column, "the outcome", "a driver");
  if (rows.kind !== "cases" && rows.order !== null && sameColumn(rows.order, column)) {
    return usedTwice(column, "the outcome", "the time column");
  }
  return rows.kind === "groups" && sameColumn(rows.by, column)
    ? usedTwice(column, "the outcome", "the group column")
    : null;
}

function driverAgain(drivers: readonly DriverChoice[]): Problem | null {
  const repeated = drivers.find((driver, i) => drivers.slice(0, i).some((earlier) => sameDriver(earlier, driver)));
  return repeated === undefined ? null : usedTwice(repeated.column, "a driver", "the same driver");
}

const sameDriver = (a: DriverChoice, b: DriverChoice): boolean =>
  sameColumn(a.column, b.column) &&
  a.as === b.as &&
  a.transform.kind === b.transform.kind &&
  periodsOf(a) === periodsOf(b);

const periodsOf = ({ transform }: DriverChoice): number => ("periods" in transform ? transform.periods : 0);
