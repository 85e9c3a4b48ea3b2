import type { SheetArea } from "../../table/address.ts";
import { type CellPlace, numberAt, sheetNamed } from "../cellsOfBook.ts";
import { combined, quantityIn, scaled } from "./arithmetic.ts";
import { type Meant, type Scope, placeOf, standsFor } from "./places.ts";
import { cellOf, isCounting, numberIn } from "./numbersIn.ts";
import { regressionOf } from "./regression.ts";
import type { CellResult } from "./results.ts";
import { valuesOfCalls } from "./regressionValues.ts";
import { type RegressionFunction, regressionFunctions } from "./telling.ts";
import type { Formula } from "./tree.ts";
import { type Value, cornerOf, each, known, unknown } from "./values.ts";
import { valueFunctions } from "./valueFunctions.ts";
import { whyUnread } from "./whyUnread.ts";
import type { Met } from "./met.ts";

/** What a formula shows, in terms of the regressions in it. */
export function evaluate(formula: Formula, scope: Scope, met: Met): Value {
  switch (formula.kind) {
    case "number":
      return known(formula.value);
    case "percent":
      return scaled(evaluate(formula.of, scope, met), 0.01);
    case "prefix": {
      const of = evaluate(formula.of, scope, met);
      if (formula.sign === "@") return cornerOf(of);
      return formula.sign === "-" ? each(of, (one) => scaled(one, -1)) : of;
    }
    case "operation":
      return operated(formula, scope, met);
    case "array":
      return { kind: "block", rows: formula.rows.map((row) => row.map((one) => evaluate(one, scope, met))) };
    case "call":
      return called(formula, scope, met);
    default:
      return atPlace(formula, scope, met);
  }
}

function operated({ sign, left, right }: Extract<Formula, { kind: "operation" }>, scope: Scope, met: Met): Value {
  return combined(sign, evaluate(left, scope, met), evaluate(right, scope, met));
}

/** A name may stand for a formula; cells stand for the number in them; words stand for nothing. */
function atPlace(formula: Formula, scope: Scope, met: Met): Value {
  if (formula.kind === "spill") return spilled(formula.of, scope, met);
  const place = placeOf(formula, scope);
  if (place === null || !place.ok) {
    const meant = formula.kind === "name" ? standsFor(formula, scope) : null;
    return meant?.ok === true
      ? evaluate(meant.value.formula, meant.value.scope, met)
      : unknown(whyUnread.goesIntoArithmetic);
  }
  return inCells(place.value, scope, met);
}

/** More cells than these are data, not results. */
const mostCells = 1000;

/** What stands in cells: the results of regressions as such, other numbers as they are. */
function inCells(area: SheetArea, { book, results }: Scope, met: Met): Value {
  const sheet = sheetNamed(book, area.sheet);
  const { row, column, rows, columns } = area;
  if (sheet === null || rows * columns > mostCells) return unknown(whyUnread.goesIntoArithmetic);
  const valueAt = (place: CellPlace): Value => {
    const result = results(place);
    if (result !== null) return meeting(met, result).value;
    const number = numberAt(place);
    return number === null ? unknown(whyUnread.goesIntoArithmetic) : known(number);
  };
  if (rows * columns === 1) return valueAt({ sheet, row, column });
  const all = Array.from({ length: rows }, (_, down) =>
    Array.from({ length: columns }, (_, across) => valueAt({ sheet, row: row + down, column: column + across })),
  );
  return { kind: "block", rows: all };
}

/** "A1#": all that the formula of a cell shows. */
function spilled(of: Formula, scope: Scope, met: Met): Value {
  const place = cellOf(of, scope);
  const result = place === null ? null : scope.results(place);
  return result?.isCorner === true ? meeting(met, result).whole : unknown(whyUnread.goesIntoArithmetic);
}

function meeting(met: Met, result: CellResult): CellResult {
  met.regressions.push(...result.met.regressions);
  return result;
}

type Call = Extract<Formula, { kind: "call" }>;

const isRegressionFunction = (name: string): name is RegressionFunction => Object.hasOwn(regressionFunctions, name);

function called(call: Call, scope: Scope, met: Met): Value {
  const { name, arguments: given } = call;
  if (isRegressionFunction(name)) return regressed(name, given, { scope, met });
  if (name === "LET") return letIn(given, scope, met);
  if (isCounting(name)) {
    const number = numberIn(call, scope);
    return number === null ? unknown(whyUnread.computedPlace(name)) : known(number);
  }
  const values = given.map((one) => (one.kind === "missing" ? undefined : evaluate(one, scope, met)));
  const value = valueFunctions[name]?.(values);
  return value ?? unknown(whyUnread.goesInto(name));
}

interface Way {
  readonly scope: Scope;
  readonly met: Met;
}

function regressed(name: RegressionFunction, given: readonly Formula[], { scope, met }: Way): Value {
  const regression = regressionOf(name, given, scope);
  if (!regression.ok) {
    met.unread.push(regression.why);
    return unknown(regression.why);
  }
  met.regressions.push({ name, regression: regression.value });
  return valuesOfCalls[name](regression.value, { given, scope });
}

/** LET(name, meaning, ..., result): each name may speak of those before it. */
function letIn(given: readonly Formula[], scope: Scope, met: Met): Value {
  const names = new Map<string, Meant>(scope.given);
  for (let index = 0; index + 1 < given.length; index += 2) {
    const [name, meaning] = [given[index]!, given[index + 1]!];
    if (name.kind !== "name") return unknown(whyUnread.notAFormula);
    names.set(name.name.toLowerCase(), { formula: meaning, scope: { ...scope, given: new Map(names) } });
  }
  const result = given.at(-1);
  return result === undefined ? unknown(whyUnread.notAFormula) : evaluate(result, { ...scope, given: names }, met);
}

/** The quantity in each cell of a result, as far as it is one; a result that fills one cell shows its corner. */
export const quantitiesIn = (value: Value) =>
  (value.kind === "block" ? value.rows : [[value]]).map((row) => row.map(quantityIn));
