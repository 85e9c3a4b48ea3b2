import { ICalculateFormulaService, type IFormulaData, type IFormulaDataItem } from "@univerjs/engine-formula";
import type { Book } from "./book.ts";
import { namesOf } from "./names.ts";

/**
 * Hands the formula engine LET with names of its own where a name in it is also a name of the workbook: the engine would
 * put the workbook's meaning in its place and end in a fault. The cells keep their formulas as they were written.
 */
export function tellLetNamesApart(book: Book): void {
  const service = book.grid.injector.get(ICalculateFormulaService);
  const execute = service.execute.bind(service);
  service.execute = (config) => {
    const taken = new Set(namesOf(book).map(({ name }) => name.toLowerCase()));
    return execute(taken.size === 0 ? config : { ...config, formulaData: toldApart(config.formulaData, taken) });
  };
}

function toldApart(data: IFormulaData, taken: ReadonlySet<string>): IFormulaData {
  const text = (item: IFormulaDataItem | null): IFormulaDataItem | null =>
    item !== null && /\bLET\s*\(/i.test(item.f) ? { ...item, f: withOwnNames(item.f, taken) } : item;
  const cells = (row: object | null): object => mapped(row, text);
  const rows = (sheet: object | null): object => mapped(sheet, cells);
  return mapped(data, (sheets: object | null) => mapped(sheets, rows)) as IFormulaData;
}

/** Formulas come as workbooks of sheets of rows of cells, each a plain record. */
const mapped = (record: object | null, change: (value: never) => unknown): object =>
  Object.fromEntries(Object.entries(record ?? {}).map(([key, value]) => [key, change(value as never)]));

/** Texts and sheet names in quotes are stepped over. */
const word = /"(?:[^"]|"")*"|'(?:[^']|'')*'|(?<![\p{L}\p{N}_.!$])[\p{L}_\\][\p{L}\p{N}_.\\]*(?![\p{L}\p{N}_.(!])/gu;

/** LET(rate,0.07,2*rate) where the workbook has a name "Rate" becomes LET(rate_in_let,0.07,2*rate_in_let). */
export function withOwnNames(formula: string, taken: ReadonlySet<string>): string {
  const own = new Set(letNamesIn(formula).filter((name) => taken.has(name)));
  if (own.size === 0) return formula;
  return formula.replaceAll(word, (found) => (own.has(found.toLowerCase()) ? `${found}_in_let` : found));
}

/** The names that LET gives, in small letters: every other argument but the last. */
function letNamesIn(formula: string): string[] {
  return [...formula.matchAll(/(?<![\p{L}\p{N}_.])LET\s*\(/giu)].flatMap(({ index, 0: opened }) => {
    const given = argumentsFrom(formula, index + opened.length);
    return given
      .filter((_, place) => place % 2 === 0 && place < given.length - 1)
      .map((name) => name.trim().toLowerCase());
  });
}

/** The arguments of a call from behind its bracket on, those of calls within left together. */
function argumentsFrom(formula: string, start: number): string[] {
  const found = [""];
  let depth = 0;
  for (const part of formula.slice(start).match(/"(?:[^"]|"")*"|'(?:[^']|'')*'|[^]/g) ?? []) {
    if (part === ")" && depth === 0) return found;
    if ("({[".includes(part)) depth++;
    if (")}]".includes(part)) depth--;
    if (part === "," && depth === 0) found.push("");
    else found.push((found.pop() ?? "") + part);
  }
  return found;
}
