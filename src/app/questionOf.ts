import type { Question } from "../core/answer/question.ts";
import type { DriverChoice, Model, RowsAre } from "../core/design/model.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import { withoutHidden } from "../core/table/hiddenRows.ts";
import type { Source } from "../core/table/source.ts";
import { type ColumnSetup, type Setup, columnWithRole } from "./setup.ts";

/**
 * The question that a set-up asks of the data.
 * @returns Problem "no-outcome", "no-drivers" or "no-group-column" where a role is missing.
 */
export function questionOf(source: Source, setup: Setup): Result<Question> {
  const outcome = setup.columns.find(({ role }) => role === "outcome");
  if (outcome === undefined) return failure({ code: "no-outcome" });
  const drivers = setup.columns.filter(({ role }) => role === "driver");
  if (drivers.length === 0 && setup.calendar.length === 0) return failure({ code: "no-drivers" });
  const rows = rowsOf(setup);
  if (rows === null) return failure({ code: "no-group-column" });
  const model: Model = {
    outcome: { column: outcome.column, transform: outcome.transform },
    drivers: [...drivers.flatMap(driverChoices), ...(outcome.also.kind === "lag" ? alsoOf(outcome) : [])],
    calendar: setup.calendar,
    rows,
    constant: setup.constant,
    textNumbers: textNumbersOf([outcome, ...drivers]),
  };
  const asked = setup.visibleOnly ? withoutHidden(source) : source;
  return success({
    source: asked,
    model,
    options: { ...setup.options, units: unitsOf(setup), against: againstOf(drivers) },
  });
}

/** null where rows stand in groups and no column says which. */
function rowsOf(setup: Setup): RowsAre | null {
  const order = columnWithRole(setup, "time");
  switch (setup.rows) {
    case "cases":
      return { kind: "cases" };
    case "time":
      return { kind: "time", order };
    case "groups": {
      const by = columnWithRole(setup, "group");
      return by === null ? null : { kind: "groups", by, second: columnWithRole(setup, "second group"), order };
    }
  }
}

const driverChoices = (setup: ColumnSetup): DriverChoice[] => {
  const { column, as, base, transform } = setup;
  return [{ column, as, base, transform }, ...(as === "number" ? alsoOf(setup) : [])];
};

/** What else enters of a column; nothing where that is not asked for. */
const alsoOf = ({ column, also }: ColumnSetup): DriverChoice[] =>
  also.kind === "none" ? [] : [{ column, as: "number", base: null, transform: also }];

const textNumbersOf = (columns: readonly ColumnSetup[]): Model["textNumbers"] =>
  columns.flatMap(({ column, textNumbers }) => (textNumbers === null ? [] : [{ column, decimal: textNumbers }]));

const unitsOf = ({ columns }: Setup): Record<string, string> =>
  Object.fromEntries(columns.flatMap(({ column, unit }) => (unit.trim() === "" ? [] : [[column, unit.trim()]])));

/** A value is for one coefficient: where a column enters in two forms it would be for neither. */
const againstOf = (drivers: readonly ColumnSetup[]): Record<string, number> =>
  Object.fromEntries(
    drivers.flatMap(({ column, against, also }) => (against === 0 || also.kind !== "none" ? [] : [[column, against]])),
  );
