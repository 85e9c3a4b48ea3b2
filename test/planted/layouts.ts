import { blankSheet } from "../../src/desk/book/blankSheet.ts";
import type { BookCell, SheetData } from "../../src/desk/book/bookData.ts";
import type { ReportedNumber } from "../../src/core/review/claim.ts";
import { type PlantedBook, pairs, singles, soundBooks } from "./books.ts";

/** How a report with brackets lies on its sheet. */
export const layouts = ["beside", "lying beside", "lying under", "intervals under", "intervals beside"] as const;
export type Layout = (typeof layouts)[number];

/** The typed reports, fault or none, with their standard errors in brackets, or their bounds as intervals. */
export function laidOut(): PlantedBook[] {
  const books = [...singles(), ...pairs(), ...soundBooks()].filter(({ expectedInBook }) => expectedInBook !== null);
  return books.flatMap((planted, index) => {
    const possible = layouts.filter((layout) => fits(planted, layout));
    if (possible.length === 0) return [];
    const layout = possible[index % possible.length]!;
    const [data] = planted.book.sheets;
    const book = { ...planted.book, sheets: [data!, sheetOf(planted, layout)] };
    return [{ ...planted, name: `${planted.name}, ${layout}`, book }];
  });
}

type Reported = readonly ReportedNumber[];

const has = ({ claim }: PlantedBook, kind: string): boolean =>
  claim.reported.some(({ quantity }) => quantity.kind === kind);

/** Brackets hold one sort of figure: reports that give more would lose them. */
function fits(planted: PlantedBook, layout: Layout): boolean {
  const isInterval = layout.startsWith("intervals");
  if (isInterval) return has(planted, "low");
  return has(planted, "standard-error") && !has(planted, "ratio") && !has(planted, "low");
}

interface Term {
  readonly name: string;
  readonly coefficient: string;
  /** One cell or two. */
  readonly brackets: readonly string[];
}

function termsOf({ claim }: PlantedBook): Term[] {
  const terms = [...new Set(claim.reported.flatMap(({ quantity }) => ("term" in quantity ? [quantity.term] : [])))];
  return terms.flatMap((term): Term[] => {
    const shown = (kind: string): string | null =>
      claim.reported.find(({ quantity }) => quantity.kind === kind && "term" in quantity && quantity.term === term)
        ?.shown ?? null;
    const coefficient = shown("coefficient");
    if (coefficient === null) return [];
    const [error, low, high] = [shown("standard-error"), shown("low"), shown("high")];
    const name = term === null ? "Constant" : claim.drivers[term]!.name;
    const interval = low === null || high === null ? [] : [`[${low}; ${high}]`];
    return [{ name, coefficient, brackets: [...(error === null ? [] : [`(${error})`]), ...interval] }];
  });
}

const wholes: Readonly<Record<string, string>> = {
  "r-squared": "R squared",
  observations: "Observations",
  sigma: "Standard error of the regression",
};

const summariesIn = (reported: Reported): (readonly [string, string])[] =>
  reported.flatMap(({ quantity, shown }) => {
    const word = wholes[quantity.kind];
    return word === undefined ? [] : [[word, shown] as const];
  });

const notes: Readonly<Record<Layout, string>> = {
  beside: "Standard errors in brackets.",
  "lying beside": "Standard errors in brackets.",
  "lying under": "Standard errors in brackets.",
  "intervals under": "Standard errors in round brackets, 95 % confidence intervals in square ones.",
  "intervals beside": "Standard errors in round brackets, 95 % confidence intervals in square ones.",
};

function sheetOf(planted: PlantedBook, layout: Layout): SheetData {
  const { claim } = planted;
  const [terms, whole] = [termsOf(planted), summariesIn(claim.reported)];
  const title: BookCell[] = [`What explains ${claim.outcome.name}?`];
  return blankSheet("Report", [title, [], ...rowsIn[layout](terms, whole), [], [notes[layout]]]);
}

type Rows = (terms: readonly Term[], whole: readonly (readonly [string, string])[]) => BookCell[][];

const beside: Rows = (terms, whole) => [
  ...terms.map(({ name, coefficient, brackets }) => [name, coefficient, ...brackets]),
  [],
  ...whole.map((line) => [...line]),
];

const under: Rows = (terms, whole) => [
  ...terms.flatMap(({ name, coefficient, brackets }) => [[name, coefficient], ...brackets.map((one) => ["", one])]),
  [],
  ...whole.map((line) => [...line]),
];

/** Turned on its side. */
const lying =
  (rows: Rows): Rows =>
  (terms, whole) => {
    const standing = rows(terms, whole);
    const width = Math.max(...standing.map(({ length }) => length));
    return Array.from({ length: width }, (_, column) => standing.map((row) => row[column] ?? null));
  };

const rowsIn: Readonly<Record<Layout, Rows>> = {
  beside,
  // Names above: what stood under a coefficient then stands beside it.
  "lying beside": lying(under),
  "lying under": lying(beside),
  "intervals under": under,
  "intervals beside": beside,
};
