import type { SheetArea } from "../../table/address.ts";
import type { BookFormula, BookName, BookSheet } from "../book.ts";
import { type Filled, filledCells } from "./filledCells.ts";
import { parseFormula } from "./parse.ts";
import { mentions, showsRegression } from "./telling.ts";
import { type Formula, contains } from "./tree.ts";

/** A sheet, and its formulas that call no regression function themselves. */
export interface Candidates {
  readonly sheet: Pick<BookSheet, "sheet" | "formulas">;
  readonly others: readonly BookFormula[];
}

/** Copies of copies of copies: more than these are nobody's work. */
const mostRounds = 12;

/** So many formulas are looked at in some ten milliseconds. */
const formulasAtOnce = 1_000;

/**
 * The formulas among others that read cells filled by a regression, or by one another: for each sheet, in row order. It
 * stops again and again on the way, so that a page can answer meanwhile; whoever runs it takes it up until it returns.
 */
export function* readersAmong(
  sheets: readonly Candidates[],
  names: readonly BookName[],
): Generator<void, readonly (readonly BookFormula[])[]> {
  const filled = filledCells();
  const isTold = showsRegression(names);
  for (const { sheet } of sheets) {
    for (const one of sheet.formulas) if (isTold(one.formula)) filled.add(sheet.sheet, one);
  }
  const found = sheets.map(() => new Set<BookFormula>());
  if (filled.isEmpty()) return found.map(() => []);
  const isReader = readerTest(filled, names);
  for (let round = 0, more = true; more && round < mostRounds; round++) {
    more = false;
    for (const [index, { sheet, others }] of sheets.entries()) {
      const left = others.filter((one) => !found[index]!.has(one));
      const fresh = yield* chosen(left, ({ formula }) => isReader(formula, sheet.sheet));
      for (const one of fresh) {
        found[index]!.add(one);
        filled.add(sheet.sheet, one);
      }
      more ||= fresh.length > 0;
    }
  }
  return sheets.map(({ others }, index) => others.filter((one) => found[index]!.has(one)));
}

function* chosen(
  formulas: readonly BookFormula[],
  is: (one: BookFormula) => boolean,
): Generator<void, readonly BookFormula[]> {
  const found: BookFormula[] = [];
  for (const [index, one] of formulas.entries()) {
    if (index % formulasAtOnce === formulasAtOnce - 1) yield;
    if (is(one)) found.push(one);
  }
  return found;
}

/** Tells whether a formula on a sheet reads cells that are filled by then. */
function readerTest(filled: Filled, names: readonly BookName[]): (formula: string, home: string) => boolean {
  const standing = names.flatMap(({ name, refersTo }): Standing[] => {
    const meant = parseFormula(refersTo);
    return meant?.kind === "cells" ? [{ name: name.toLowerCase(), area: meant.area }] : [];
  });
  const isNamed = mentions(standing.map(({ name }) => name));
  return (formula, home) =>
    (isNamed(formula) || mayRead(formula, filled)) && reads(formula, home, { filled, standing });
}

/** A quick look, without taking the formula apart. */
function mayRead(formula: string, { anywhere, mayReach }: Filled): boolean {
  for (const [cells, letters = "", digits = "", end = ""] of formula.matchAll(references)) {
    if (end === "" ? anywhere(`${letters.toUpperCase()}${digits}`) : mayReach(cells)) return true;
  }
  return false;
}

const references = /\$?([A-Za-z]{1,3})\$?(\d{1,7})(:\$?[A-Za-z]{1,3}\$?\d{1,7})?/g;

interface Reading {
  readonly filled: Filled;
  readonly standing: readonly Standing[];
}

/** A name that stands for cells. */
interface Standing {
  readonly name: string;
  readonly area: SheetArea;
}

function reads(text: string, home: string, { filled, standing }: Reading): boolean {
  const isFilled = (part: Formula): boolean => {
    if (part.kind === "cells") return filled.within({ ...part.area, sheet: part.area.sheet || home });
    if (part.kind !== "name") return false;
    const named = standing.find(({ name }) => name === part.name.toLowerCase());
    return named !== undefined && filled.within(named.area);
  };
  const formula = parseFormula(text);
  return formula !== null && contains(formula, isFilled);
}
