import { addressOf, type SheetArea } from "../../table/address.ts";
import type { ClaimedForm } from "../claim.ts";
import { numberIn } from "./numbersIn.ts";
import { type Scope, placeOf, standsFor } from "./places.ts";
import { type Reading, read, unread } from "./reading.ts";
import { contains, type Formula } from "./tree.ts";
import { whyUnread } from "./whyUnread.ts";

/** Cells on their way into a regression: a block of them, the form they take, and what they are multiplied with then. */
export interface Ingredient {
  readonly area: SheetArea;
  readonly form: ClaimedForm;
  readonly factor: number;
}

/** The cells that an argument of a regression uses, blocks side by side or one above the other. */
export function ingredientsOf(formula: Formula, scope: Scope): Reading<readonly Ingredient[]> {
  const place = placeOf(formula, scope);
  if (place !== null) return place.ok ? read([{ area: place.value, form: "as it is", factor: 1 }]) : place;
  switch (formula.kind) {
    case "name": {
      const meant = standsFor(formula, scope);
      return meant.ok ? ingredientsOf(meant.value.formula, meant.value.scope) : meant;
    }
    case "prefix":
      return multiplied(ingredientsOf(formula.of, scope), -1);
    case "operation":
      return operated(formula, scope);
    case "call":
      return called(formula, scope);
    case "array":
    case "number":
      return unread(whyUnread.typedData);
    default:
      return unread(whyUnread.arithmetic);
  }
}

const multiplied = (reading: Reading<readonly Ingredient[]>, by: number): Reading<readonly Ingredient[]> =>
  reading.ok ? read(reading.value.map((one) => ({ ...one, factor: one.factor * by }))) : reading;

type Operation = Extract<Formula, { kind: "operation" }>;

function operated({ sign, left, right }: Operation, scope: Scope): Reading<readonly Ingredient[]> {
  if (sign === "^") return raised(ingredientsOf(left, scope), right);
  const [one, other] = [constantOf(left), constantOf(right)];
  if (sign === "*" && one !== null) return multiplied(ingredientsOf(right, scope), one);
  if (sign === "*" && other !== null) return multiplied(ingredientsOf(left, scope), other);
  if (sign === "/" && other !== null && other !== 0) return multiplied(ingredientsOf(left, scope), 1 / other);
  if (sign !== "*") return unread(whyUnread.arithmetic);
  return timesItself(ingredientsOf(left, scope), ingredientsOf(right, scope));
}

/** A range times itself is its square; of two different ranges no single line of cells is left. */
function timesItself(
  left: Reading<readonly Ingredient[]>,
  right: Reading<readonly Ingredient[]>,
): Reading<readonly Ingredient[]> {
  if (!left.ok) return left;
  if (!right.ok) return right;
  const same = JSON.stringify(left.value) === JSON.stringify(right.value);
  return same ? powers(left.value, [2]) : unread(whyUnread.product);
}

/** A number that stands in the formula. */
export function constantOf(formula: Formula): number | null {
  switch (formula.kind) {
    case "number":
      return formula.value;
    case "percent": {
      const of = constantOf(formula.of);
      return of === null ? null : of / 100;
    }
    case "prefix": {
      const of = constantOf(formula.of);
      return of !== null && formula.sign === "-" ? -of : of;
    }
    default:
      return null;
  }
}

/** "range^2", "range^{1,2}" */
function raised(reading: Reading<readonly Ingredient[]>, power: Formula): Reading<readonly Ingredient[]> {
  if (!reading.ok) return reading;
  const exponents = power.kind === "array" ? power.rows.flat().map(constantOf) : [constantOf(power)];
  if (power.kind === "array" && Math.min(power.rows.length, power.rows[0]!.length) > 1) {
    return unread(whyUnread.arithmetic);
  }
  const known = exponents.filter((exponent) => exponent !== null);
  return known.length === exponents.length ? powers(reading.value, known) : unread(whyUnread.arithmetic);
}

const formOfPower: Readonly<Record<number, ClaimedForm>> = { 1: "as it is", 2: "square", 3: "cube" };

function powers(parts: readonly Ingredient[], exponents: readonly number[]): Reading<readonly Ingredient[]> {
  const raised = parts.flatMap(({ area, form, factor }) =>
    exponents.map((exponent) => ({ area, form: formIn(form, exponent), factor: factor ** exponent })),
  );
  const fits = exponents.length === 1 || parts.every(({ area }) => Math.min(area.rows, area.columns) === 1);
  const known = raised.flatMap(({ form, ...rest }) => (form === null ? [] : [{ ...rest, form }]));
  return fits && known.length === raised.length ? read(known) : unread(whyUnread.arithmetic);
}

function formIn(form: ClaimedForm, exponent: number): ClaimedForm | null {
  if (exponent === 1) return form;
  return form === "as it is" ? (formOfPower[exponent] ?? null) : null;
}

type Call = Extract<Formula, { kind: "call" }>;

type Parts = Reading<readonly Ingredient[]>;
type Reader = (given: readonly [Formula, ...Formula[]], scope: Scope) => Parts;

function called({ name, arguments: given }: Call, scope: Scope): Parts {
  const [first, ...others] = given;
  if (first === undefined) return unread(whyUnread.fewArguments(name));
  const reader = readers[name];
  return reader === undefined ? unread(whyUnread.computedData(name)) : reader([first, ...others], scope);
}

/** The functions that leave every value in the cell it came from, or set ranges side by side. */
const readers: Readonly<Record<string, Reader>> = {
  LN: ([of], scope) => logarithm(ingredientsOf(of, scope), 1),
  LOG10: ([of], scope) => logarithm(ingredientsOf(of, scope), 1 / Math.LN10),
  LOG: ([of, to], scope) => {
    const base = to === undefined || to.kind === "missing" ? 10 : constantOf(to);
    const known = base !== null && base > 0 && base !== 1;
    return known ? logarithm(ingredientsOf(of, scope), 1 / Math.log(base)) : unread(whyUnread.computedData("LOG"));
  },
  POWER: ([of, power], scope) =>
    power === undefined ? unread(whyUnread.fewArguments("POWER")) : raised(ingredientsOf(of, scope), power),
  N: ([of], scope) => ingredientsOf(of, scope),
  VALUE: ([of], scope) => ingredientsOf(of, scope),
  CHOOSECOLS: ([of, ...which], scope) => linesChosen(of, which, { along: "columns", scope }),
  CHOOSEROWS: ([of, ...which], scope) => linesChosen(of, which, { along: "rows", scope }),
  HSTACK: joined,
  VSTACK: joined,
  CHOOSE: ([which, ...from], scope) =>
    which.kind === "array" ? chosen(which, from, scope) : unread(whyUnread.computedPlace("CHOOSE")),
};

function logarithm(reading: Reading<readonly Ingredient[]>, factor: number): Reading<readonly Ingredient[]> {
  if (!reading.ok) return reading;
  const plain = reading.value.every((part) => part.form === "as it is" && part.factor === 1);
  if (!plain) return unread(whyUnread.arithmetic);
  return read(reading.value.map(({ area }): Ingredient => ({ area, form: "logarithm", factor })));
}

function joined(parts: readonly Formula[], scope: Scope): Reading<readonly Ingredient[]> {
  const found: Ingredient[] = [];
  for (const part of parts) {
    const reading = ingredientsOf(part, scope);
    if (!reading.ok) return reading;
    found.push(...reading.value);
  }
  return read(found);
}

interface Choosing {
  readonly along: "rows" | "columns";
  readonly scope: Scope;
}

/** CHOOSECOLS(range,2,{1,3}): some columns of a range, or rows; they count from the end where they are negative. */
function linesChosen(of: Formula, which: readonly Formula[], { along, scope }: Choosing): Parts {
  const place = placeOf(of, scope);
  const name = along === "columns" ? "CHOOSECOLS" : "CHOOSEROWS";
  if (place?.ok !== true) return place ?? unread(whyUnread.computedData(name));
  const area = place.value;
  const positions = which.flatMap((one) => (one.kind === "array" ? one.rows.flat() : [one]));
  const numbers = positions.map((one) => numberIn(one, scope) ?? NaN);
  if (numbers.some(Number.isNaN)) return unread(whyUnread.computedPlace(name));
  const chosen = numbers.map((position) => (position < 0 ? area[along] + position : position - 1));
  if (chosen.some((at) => at < 0 || at >= area[along]))
    return unread(whyUnread.noCells(`${name} of ${addressOf(area)}`));
  const line = (at: number): SheetArea =>
    along === "columns" ? { ...area, column: area.column + at, columns: 1 } : { ...area, row: area.row + at, rows: 1 };
  return read(chosen.map((at) => ({ area: line(at), form: "as it is", factor: 1 })));
}

/** CHOOSE({1,2},first,second) sets ranges side by side. */
function chosen(
  { rows }: Extract<Formula, { kind: "array" }>,
  from: readonly Formula[],
  scope: Scope,
): Reading<readonly Ingredient[]> {
  const parts = rows.flat().map((which) => (which.kind === "number" ? from[which.value - 1] : undefined));
  const known = parts.filter((part) => part !== undefined);
  return known.length === parts.length ? joined(known, scope) : unread(whyUnread.computedPlace("CHOOSE"));
}

/** Whether a formula speaks of any cells. */
export const speaksOfCells = (formula: Formula): boolean =>
  contains(formula, ({ kind }) => kind === "cells" || kind === "name" || kind === "structured");

/** "Months!B5:B100" */
export const areaInWords = (parts: readonly Ingredient[]): string =>
  parts.map(({ area }) => addressOf(area)).join(", ");
