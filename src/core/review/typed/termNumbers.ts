import type { BookSheet } from "../book.ts";
import type { CellPlace } from "../cellsOfBook.ts";
import { type ShownNumber, shownNumberAt } from "../found/shownNumber.ts";
import { inBracketsAt } from "./inBrackets.ts";
import { type ShownInterval, intervalAt } from "./intervals.ts";
import type { Label } from "./labels.ts";
import type { TermWord } from "./reportWords.ts";

/** A number under its heading. */
export interface TermNumber {
  readonly word: TermWord;
  readonly place: CellPlace;
  readonly shown: ShownNumber;
}

/** Whether drivers stand one below the other, or side by side. */
export type Lie = "down" | "across";

/** A cell by the line that the headings or names stand in, and the position of a driver. */
export const cellAt = (sheet: BookSheet, lie: Lie, [line, position]: readonly [number, number]): CellPlace =>
  lie === "down" ? { sheet, row: position, column: line } : { sheet, row: line, column: position };

interface Laid {
  readonly sheet: BookSheet;
  readonly lie: Lie;
  /** Whether no heading stands further on. */
  readonly isLast: boolean;
  /** What stands under the first heading. */
  readonly coefficient: number | null;
}

/** What stands under a heading: a number, or both ends of an interval, in one cell or in two. */
export function numbersUnder(
  word: NonNullable<Label["term"]>,
  [line, at]: readonly [number, number],
  { sheet, lie, isLast, coefficient }: Laid,
): TermNumber[] {
  const place = cellAt(sheet, lie, [line, at]);
  const shown = shownNumberAt(place);
  if (word !== "interval") return shown === null ? [] : [{ word, place, shown }];
  const both = intervalAt(place, coefficient);
  if (both !== null) return endsOf(both, place);
  const next = cellAt(sheet, lie, [line + 1, at]);
  const end = isLast ? shownNumberAt(next) : null;
  if (shown === null || end === null || !(shown.value < end.value)) return [];
  return [
    { word: "low", place, shown },
    { word: "high", place: next, shown: end },
  ];
}

/** Brackets around a figure that is never negative are no minus; a ratio has the sign of its coefficient then. */
export function withSign(one: TermNumber, { shown: coefficient }: TermNumber): TermNumber {
  if (one.word !== "standard-error" && one.word !== "p-value" && one.word !== "ratio") return one;
  const inBrackets = inBracketsAt(one.place);
  if (inBrackets === null) return one;
  const { size, minus } = inBrackets;
  const isNegative = minus || (one.word === "ratio" && coefficient.value < 0);
  return { ...one, shown: isNegative ? { ...size, value: -size.value, shown: `-${size.shown}` } : size };
}

export const endsOf = ({ low, high }: ShownInterval, place: CellPlace): TermNumber[] => [
  { word: "low", place, shown: low },
  { word: "high", place, shown: high },
];

/** One text for a cell of a sheet. */
export const spotOf = ({ row, column }: Pick<CellPlace, "row" | "column">): string => `${row},${column}`;
