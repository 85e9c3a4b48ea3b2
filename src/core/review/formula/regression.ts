import { addressOf, type SheetArea } from "../../table/address.ts";
import { type Ingredient, areaInWords, constantOf, ingredientsOf } from "./ingredients.ts";
import type { Scope } from "./places.ts";
import { type Reading, read, unread } from "./reading.ts";
import type { RegressionFunction } from "./telling.ts";
import type { Formula } from "./tree.ts";
import { whyUnread } from "./whyUnread.ts";
import type { Regression, UsedLine } from "./foundRegression.ts";

/** Where each function has its arguments. */
const positions = {
  LINEST: { outcome: 0, drivers: 1, constant: 2 },
  LOGEST: { outcome: 0, drivers: 1, constant: 2 },
  TREND: { outcome: 0, drivers: 1, constant: 3 },
  GROWTH: { outcome: 0, drivers: 1, constant: 3 },
  SLOPE: { outcome: 0, drivers: 1, constant: null },
  INTERCEPT: { outcome: 0, drivers: 1, constant: null },
  RSQ: { outcome: 0, drivers: 1, constant: null },
  STEYX: { outcome: 0, drivers: 1, constant: null },
  CORREL: { outcome: 0, drivers: 1, constant: null },
  PEARSON: { outcome: 0, drivers: 1, constant: null },
  FORECAST: { outcome: 1, drivers: 2, constant: null },
  "FORECAST.LINEAR": { outcome: 1, drivers: 2, constant: null },
} as const satisfies Record<RegressionFunction, object>;

export function regressionOf(name: RegressionFunction, given: readonly Formula[], scope: Scope): Reading<Regression> {
  const at = positions[name];
  const data = dataOf(given[at.outcome], given[at.drivers], { name, scope });
  if (!data.ok) return data;
  const passesOver = at.constant === null;
  if (passesOver && data.value.drivers.length > 1) {
    return unread(whyUnread.oneDriver(name, areaInWords(data.value.drivers)));
  }
  const constant = constantIn(at.constant === null ? undefined : given[at.constant]);
  if (constant === null) return unread(whyUnread.computedConstant);
  const plain = { ...data.value, constant, passesOver };
  return name === "LOGEST" || name === "GROWTH" ? exponential(plain) : read({ ...plain, exponential: false });
}

interface Call {
  readonly name: RegressionFunction;
  readonly scope: Scope;
}

function dataOf(
  y: Formula | undefined,
  x: Formula | undefined,
  { name, scope }: Call,
): Reading<Pick<Regression, "outcome" | "drivers">> {
  if (y === undefined || y.kind === "missing") return unread(whyUnread.fewArguments(name));
  const outcome = outcomeOf(ingredientsOf(y, scope));
  if (!outcome.ok) return outcome;
  if (x === undefined || x.kind === "missing") {
    if (positions[name].constant === null) return unread(whyUnread.fewArguments(name));
    return read({ outcome: outcome.value, drivers: [{ area: outcome.value.area, form: "position", factor: 1 }] });
  }
  const parts = ingredientsOf(x, scope);
  if (!parts.ok) return parts;
  const drivers = driversOf(parts.value, outcome.value.area);
  return drivers.ok ? read({ outcome: outcome.value, drivers: drivers.value }) : drivers;
}

function exponential(plain: Omit<Regression, "exponential">): Reading<Regression> {
  const { outcome } = plain;
  if (outcome.form !== "as it is" || outcome.factor !== 1) return unread(whyUnread.arithmetic);
  return read({ ...plain, outcome: { ...outcome, form: "logarithm" }, exponential: true });
}

const constantIn = (given: Formula | undefined): boolean | null =>
  given === undefined || given.kind === "missing" ? true : truthOf(given);

/** Whether an argument says yes or no; null where it is worked out at calculation. */
export function truthOf(given: Formula): boolean | null {
  if (given.kind === "boolean") return given.value;
  if (given.kind === "call" && /^(?:TRUE|FALSE)$/.test(given.name)) return given.name === "TRUE";
  const number = constantOf(given);
  return number === null ? null : number !== 0;
}

function outcomeOf(parts: Reading<readonly Ingredient[]>): Reading<UsedLine> {
  if (!parts.ok) return parts;
  const [one] = parts.value;
  const single = one !== undefined && parts.value.length === 1 && Math.min(one.area.rows, one.area.columns) === 1;
  return single ? read(one) : unread(whyUnread.wideOutcome(areaInWords(parts.value)));
}

const lengthOf = ({ rows, columns }: SheetArea): number => Math.max(rows, columns);

/** Blocks taken apart into lines that run as the outcome does; a single line may also run across it. */
function driversOf(parts: readonly Ingredient[], outcome: SheetArea): Reading<readonly UsedLine[]> {
  const down = outcome.columns === 1;
  const count = lengthOf(outcome);
  const lines: UsedLine[] = [];
  for (const { area, ...rest } of parts) {
    const turned = parts.length === 1 && Math.min(area.rows, area.columns) === 1 && lengthOf(area) === count;
    if (turned) lines.push({ area, ...rest });
    else if ((down ? area.rows : area.columns) !== count) {
      return unread(whyUnread.unequal(ranged(outcome, count), ranged(area, down ? area.rows : area.columns)));
    } else lines.push(...linesIn(area, down).map((line) => ({ area: line, ...rest })));
  }
  return read(lines);
}

const ranged = (area: SheetArea, count: number) => ({ cells: addressOf(area), count });

/** The lines of a block, each one cell wide or one cell high. */
export const linesIn = (area: SheetArea, down: boolean): SheetArea[] =>
  Array.from({ length: down ? area.columns : area.rows }, (_, index) =>
    down ? { ...area, column: area.column + index, columns: 1 } : { ...area, row: area.row + index, rows: 1 },
  );
