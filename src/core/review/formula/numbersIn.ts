import type { SheetArea } from "../../table/address.ts";
import { type CellPlace, isTextAt, numberAt, sheetNamed, wordsAt } from "../cellsOfBook.ts";
import { type Scope, placeOf } from "./places.ts";
import type { Formula } from "./tree.ts";

/**
 * A number that a formula comes to by what stands in the sheet now: typed, in a cell, counted, or looked up among
 * headings.
 * @returns null for anything else.
 */
export function numberIn(formula: Formula, scope: Scope): number | null {
  switch (formula.kind) {
    case "number":
      return formula.value;
    case "prefix": {
      const of = numberIn(formula.of, scope);
      return of !== null && formula.sign === "-" ? -of : of;
    }
    case "percent": {
      const of = numberIn(formula.of, scope);
      return of === null ? null : of / 100;
    }
    case "operation":
      return counted(formula, scope);
    case "call":
      return called[formula.name]?.(formula.arguments, scope) ?? null;
    default: {
      const place = cellOf(formula, scope);
      return place === null ? null : numberAt(place);
    }
  }
}

function counted({ sign, left, right }: Extract<Formula, { kind: "operation" }>, scope: Scope): number | null {
  const [one, other] = [numberIn(left, scope), numberIn(right, scope)];
  if (one === null || other === null) return null;
  if (sign === "+") return one + other;
  if (sign === "-") return one - other;
  return sign === "*" ? one * other : null;
}

type Call = (given: readonly Formula[], scope: Scope) => number | null;

/** The functions that count cells, or find one among them. */
const called: Readonly<Record<string, Call>> = {
  ROWS: ([of], scope) => areaOf(of, scope)?.rows ?? null,
  COLUMNS: ([of], scope) => areaOf(of, scope)?.columns ?? null,
  // Without a word MATCH takes the largest that is not beyond what is sought, which needs the order of the cells.
  MATCH: ([sought, among, how], scope) =>
    how !== undefined && numberIn(how, scope) === 0 ? placeAmong(sought, among, scope) : null,
  XMATCH: ([sought, among, how], scope) =>
    how === undefined || how.kind === "missing" || numberIn(how, scope) === 0 ? placeAmong(sought, among, scope) : null,
};

/** Whether a formula calls one of them. */
export const isCounting = (name: string): boolean => Object.hasOwn(called, name);

/** More cells than these are no headings. */
const mostCells = 20_000;

/** Where something stands in a line of cells, or in a list that is typed in, from 1; null where it does not. */
export function placeAmong(sought: Formula | undefined, among: Formula | undefined, scope: Scope): number | null {
  const wanted = sought === undefined ? null : keyOf(sought, scope);
  const at = wanted === null ? -1 : keysAmong(among, scope).indexOf(wanted);
  return at < 0 ? null : at + 1;
}

function keysAmong(among: Formula | undefined, scope: Scope): readonly (string | null)[] {
  if (among?.kind === "array") return among.rows.flat().map((one) => keyOf(one, scope));
  const area = areaOf(among, scope);
  const sheet = area === null ? null : sheetNamed(scope.book, area.sheet);
  if (area === null || sheet === null || Math.min(area.rows, area.columns) !== 1) return [];
  const across = area.rows === 1;
  return Array.from({ length: Math.min(mostCells, area.rows * area.columns) }, (_, index) =>
    keyAt({ sheet, row: area.row + (across ? 0 : index), column: area.column + (across ? index : 0) }),
  );
}

/** Text that is the same but for small and large letters, and equal numbers; patterns are left to the spreadsheet. */
function keyOf(formula: Formula, scope: Scope): string | null {
  if (formula.kind === "text") return /[*?~]/.test(formula.value) ? null : textKey(formula.value);
  const place = cellOf(formula, scope);
  if (place !== null && isTextAt(place)) return keyAt(place);
  const number = numberIn(formula, scope);
  return number === null ? null : String(number);
}

function keyAt(place: CellPlace): string | null {
  if (isTextAt(place)) return textKey(wordsAt(place));
  const number = numberAt(place);
  return number === null ? null : String(number);
}

const textKey = (text: string): string => `"${text.toLowerCase()}`;

function areaOf(formula: Formula | undefined, scope: Scope): SheetArea | null {
  const place = formula === undefined ? null : placeOf(formula, scope);
  return place?.ok === true ? place.value : null;
}

/** The one cell that a formula names; null where it names none, or several. */
export function cellOf(formula: Formula, scope: Scope): CellPlace | null {
  const area = areaOf(formula, scope);
  const sheet = area === null ? null : sheetNamed(scope.book, area.sheet);
  if (area === null || sheet === null || area.rows * area.columns !== 1) return null;
  return { sheet, row: area.row, column: area.column };
}
