import { addressOf, type SheetArea } from "../../table/address.ts";
import type { Book, BookSheet } from "../book.ts";
import { sheetNamed, usedPart } from "../cellsOfBook.ts";
import { parseFormula } from "./parse.ts";
import { numberIn, placeAmong } from "./numbersIn.ts";
import { type Reading, read, unread } from "./reading.ts";
import type { Results } from "./results.ts";
import { isTable, tableArea } from "./tableParts.ts";
import type { Formula } from "./tree.ts";
import { whyUnread } from "./whyUnread.ts";

/** Where a formula stands, and what its names stand for. */
export interface Scope {
  readonly book: Book;
  readonly sheet: BookSheet;
  readonly row: number;
  readonly column: number;
  /** Names given inside the formula itself, in small letters. */
  readonly given: ReadonlyMap<string, Meant>;
  /** How many names have been followed on the way here. */
  readonly followed: number;
  /** What other cells show of regressions. */
  readonly results: Results;
}

/** A formula, and where it is at home. */
export interface Meant {
  readonly formula: Formula;
  readonly scope: Scope;
}

/** Names that stand for names for names: more than these are a circle. */
const mostFollowed = 12;

/** What a name stands for. */
export function standsFor({ name, sheet }: Named, scope: Scope): Reading<Meant> {
  if (scope.followed >= mostFollowed) return unread(whyUnread.tooDeep);
  const followed = scope.followed + 1;
  const given = sheet === null ? scope.given.get(name.toLowerCase()) : undefined;
  if (given !== undefined) return read({ ...given, scope: { ...given.scope, followed } });
  const refersTo = definitionOf({ name, sheet }, scope);
  if (refersTo === null) return unread(whyUnread.unknownName(name));
  const formula = parseFormula(refersTo);
  if (formula === null) return unread(whyUnread.notAFormula);
  return read({ formula, scope: { ...scope, given: new Map(), followed } });
}

interface Named {
  readonly name: string;
  readonly sheet: string | null;
}

/** A sheet's own name comes before one of the whole workbook. */
function definitionOf({ name, sheet }: Named, scope: Scope): string | null {
  const called = scope.book.names.filter((one) => one.name.toLowerCase() === name.toLowerCase());
  const home = (sheet ?? scope.sheet.sheet).toLowerCase();
  const own = called.find((one) => one.sheet?.toLowerCase() === home);
  return (own ?? called.find((one) => one.sheet === null))?.refersTo ?? null;
}

/**
 * The cells that a formula names, as it names them: whole columns reach to the end of the sheet.
 * @returns null where it names no cells but calculates something.
 */
export function placeOf(formula: Formula, scope: Scope): Reading<SheetArea> | null {
  switch (formula.kind) {
    case "cells":
      return cellsIn(formula.area, scope);
    case "structured":
      return tableArea(scope, formula);
    case "name":
      return named(formula, scope);
    case "spill":
      return unread(whyUnread.spilledPlace);
    case "operation":
      return /^[:,]$/.test(formula.sign) ? unread(whyUnread.joinedPlace) : null;
    case "prefix":
      return formula.sign === "-" ? null : placeOf(formula.of, scope);
    case "call":
      return calledPlace(formula, scope);
    default:
      return null;
  }
}

function named(formula: Extract<Formula, { kind: "name" }>, scope: Scope): Reading<SheetArea> | null {
  const meant = standsFor(formula, scope);
  if (meant.ok) return placeOf(meant.value.formula, meant.value.scope);
  return isTable(scope.book, formula.name) ? tableArea(scope, { table: formula.name, inside: "" }) : meant;
}

function cellsIn(area: SheetArea, scope: Scope): Reading<SheetArea> {
  if (area.sheet.includes("[")) return unread(whyUnread.otherWorkbook(area.sheet));
  if (area.sheet.includes(":")) return unread(whyUnread.severalSheets(area.sheet));
  const sheet = area.sheet === "" ? scope.sheet : sheetNamed(scope.book, area.sheet);
  if (sheet === null) return unread(whyUnread.unknownSheet(area.sheet));
  const named = { ...area, sheet: sheet.sheet };
  return usedPart(sheet, named) === null ? unread(whyUnread.noCells(addressOf(named))) : read(named);
}

type Call = Extract<Formula, { kind: "call" }>;

/** Functions that give cells, not values: those whose choice stands in the formula can be followed. */
function calledPlace({ name, arguments: given }: Call, scope: Scope): Reading<SheetArea> | null {
  switch (name) {
    case "INDEX":
      return indexed(given, scope);
    case "CHOOSE": {
      const [which, ...from] = given;
      const chosen = which?.kind === "number" ? from[which.value - 1] : undefined;
      if (which?.kind === "array") return null;
      return chosen === undefined ? unread(whyUnread.computedPlace(name)) : placeOf(chosen, scope);
    }
    case "XLOOKUP":
      return lookedUp(given, scope);
    case "OFFSET":
    case "INDIRECT":
      return unread(whyUnread.computedPlace(name));
    default:
      return null;
  }
}

/** A whole row or column of a range, or one cell of it; null where what is indexed is no range. */
function indexed([from, ...at]: readonly Formula[], scope: Scope): Reading<SheetArea> | null {
  const range = from === undefined ? null : placeOf(from, scope);
  if (range === null || !range.ok) return range;
  const area = range.value;
  const [first, second] = at.map((one) => positionOf(one, scope));
  if (first === undefined || Number.isNaN(first) || Number.isNaN(second)) {
    return unread(whyUnread.computedPlace("INDEX"));
  }
  const alongRow = second === undefined && area.rows === 1;
  const part = partOf(area, alongRow ? 0 : first, alongRow ? first : (second ?? 0));
  return part === null ? unread(whyUnread.noCells(`INDEX of ${addressOf(area)}`)) : read(part);
}

/** 0 stands for all; no number where it is worked out in a way that cannot be followed. */
const positionOf = (given: Formula, scope: Scope): number =>
  given.kind === "missing" ? 0 : Math.trunc(numberIn(given, scope) ?? NaN);

/** XLOOKUP(heading, headings, block): the column below a heading, or the row beside a name. */
function lookedUp([sought, among, from]: readonly Formula[], scope: Scope): Reading<SheetArea> {
  const lines = among === undefined ? null : placeOf(among, scope);
  const range = from === undefined ? null : placeOf(from, scope);
  const at = placeAmong(sought, among, scope);
  if (lines?.ok !== true || range?.ok !== true || at === null) return unread(whyUnread.computedPlace("XLOOKUP"));
  const across = lines.value.rows === 1;
  const part = across ? partOf(range.value, 0, at) : partOf(range.value, at, 0);
  return part === null ? unread(whyUnread.computedPlace("XLOOKUP")) : read(part);
}

function partOf(area: SheetArea, row: number, column: number): SheetArea | null {
  if (row < 0 || column < 0 || row > area.rows || column > area.columns) return null;
  const rows = row === 0 ? {} : { row: area.row + row - 1, rows: 1 };
  const columns = column === 0 ? {} : { column: area.column + column - 1, columns: 1 };
  return { ...area, ...rows, ...columns };
}
