import { cellKind } from "../../table/cells.ts";
import type { BookSheet } from "../book.ts";
import type { CellPlace } from "../cellsOfBook.ts";
import type { Shape } from "./inBrackets.ts";
import { levelIn } from "./intervals.ts";
import { type TermWord, termWordIn } from "./reportWords.ts";

/** What numbers in brackets can be said to be. */
export type BracketWord = Extract<TermWord, "standard-error" | "ratio" | "p-value">;

/** What is known of the numbers in brackets of a report. */
export interface Brackets {
  /** What a note says they are; null where none does. */
  readonly note: BracketWord | null;
  /** Whether a second line of them stands below the first. */
  readonly furtherLine: boolean;
}

/** A text that says what stands in brackets. */
export interface BracketNote {
  readonly place: CellPlace;
  readonly word: BracketWord;
  /** Null where it speaks of brackets without saying which. */
  readonly shape: Shape | null;
}

const words: Readonly<Record<BracketWord, RegExp>> = {
  "standard-error": /\b(?:standard errors?|std\.? ?err(?:ors?)?|ses?)\b/,
  ratio: /\b[tz][- ]?(?:ratios?|stats?|statistics?|values?|scores?)\b/,
  "p-value": /\bp[- ]?values?\b/,
};

const shapes: readonly (readonly [RegExp, Shape | null])[] = [
  [/\bsquare\b/, "square"],
  [/\bround\b|\bparenthes[ie]s\b/, "round"],
  [/\bbrackets?\b|\bbracketed\b|\b(?:below|under|underneath|beneath)\b/, null],
];

/** The notes of a sheet. */
export const bracketNotes = (sheet: BookSheet): readonly BracketNote[] => saidOn(sheet, notesIn);

/** What the texts of a sheet say, with their places; each different text of a column is looked at once. */
function saidOn<Said extends object>(
  sheet: BookSheet,
  reading: (text: string) => readonly Said[],
): (Said & { readonly place: CellPlace })[] {
  return sheet.columns.flatMap(({ kinds, numbers, texts }, across) => {
    const said = texts.map(reading);
    if (said.every((one) => one.length === 0)) return [];
    const found: (Said & { readonly place: CellPlace })[] = [];
    for (let row = 0; row < kinds.length; row++) {
      if (kinds[row] !== cellKind.text) continue;
      const place = { sheet, row: sheet.firstRow + row, column: sheet.firstColumn + across };
      found.push(...said[numbers[row]!]!.map((one) => ({ ...one, place })));
    }
    return found;
  });
}

/** Which level intervals have, where a text says it: "95 % confidence intervals in brackets". */
export interface LevelNote {
  readonly place: CellPlace;
  readonly level: number;
}

/** What is low in a text, or high, may be anything. */
const ofIntervals = /\b(?:confidence|intervals?|c\.?i\.?s?)(?![\p{L}\p{N}])/iu;

export const levelNotes = (sheet: BookSheet): readonly LevelNote[] =>
  saidOn(sheet, (text) => {
    const level = ofIntervals.test(text) ? levelIn(text) : null;
    return level === null ? [] : [{ level }];
  });

/** "Standard errors in brackets; * p < 0.05", "Coefficient (t ratio)", "(robust standard errors)". */
export function notesIn(text: string): readonly Omit<BracketNote, "place">[] {
  const plain = text
    .trim()
    .toLowerCase()
    .replaceAll(/\bs\. ?e\.?s?(?= |$|\))/g, "standard error")
    .replaceAll(/\b(?:std|stand)\. /g, "standard ");
  const inHeading = inBracketsOfHeading(plain);
  if (inHeading !== null) return [{ word: inHeading, shape: null }];
  return plain.split(/[;,]|\.\s|\band\b|\bnot\b/).flatMap((clause) => {
    const said = (Object.keys(words) as BracketWord[]).filter((word) => words[word].test(clause));
    const shape = shapes.find(([pattern]) => pattern.test(clause));
    return said.length === 1 && shape !== undefined ? [{ word: said[0]!, shape: shape[1] }] : [];
  });
}

/** What a heading has in brackets behind the word for coefficients, or by itself. */
function inBracketsOfHeading(text: string): BracketWord | null {
  const [, before = "", inside = ""] = /^([^()[\]]*)[([]([^()[\]]+)[)\]]$/.exec(text) ?? [];
  const word = inside.length === 0 ? null : termWordIn(inside);
  if (word !== "standard-error" && word !== "ratio" && word !== "p-value") return null;
  const isSaid = before.trim() === "" ? words[word].test(inside) : termWordIn(before) === "coefficient";
  return isSaid ? word : null;
}
