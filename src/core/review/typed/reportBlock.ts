import type { SheetArea } from "../../table/address.ts";
import type { BookSheet } from "../book.ts";
import type { CellPlace } from "../cellsOfBook.ts";
import type { ShownNumber } from "../found/shownNumber.ts";
import type { Brackets } from "./bracketNotes.ts";
import type { InBrackets } from "./inBrackets.ts";
import type { Tracks } from "./labels.ts";
import type { SummaryWord } from "./reportWords.ts";
import type { TermNumber } from "./termNumbers.ts";

/** The numbers of one driver, or of the constant. */
export interface ReportedTerm {
  readonly name: string;
  readonly isConstant: boolean;
  /** The coefficient first. */
  readonly numbers: readonly TermNumber[];
  /** The number that stands in brackets under the coefficient, or beside it. */
  readonly inBrackets: InBrackets | null;
}

/** A model among others whose coefficients stand in columns over the same names. */
export interface ModelColumn {
  readonly brackets: Brackets;
  /** What stands over its coefficients, the nearest first: "(1)", "Repairs". */
  readonly headings: readonly string[];
  /** Names of the drivers that are not in this model. */
  readonly absent: readonly string[];
  /** Where the other models stand. */
  readonly beside: Tracks;
}

/** A block of cells that says by its headings, or by brackets under its coefficients, what its numbers are. */
export interface ReportBlock {
  readonly sheet: BookSheet;
  /** Headings and names included. */
  readonly area: SheetArea;
  readonly terms: readonly ReportedTerm[];
  readonly summaries: readonly SummaryNumber[];
  /** Two-sided level of its bounds: 0.05 for 95 %; null where it says none. */
  readonly level: number | null;
  /** Null for a block under headings. */
  readonly model: ModelColumn | null;
}

export function areaBetween(sheet: BookSheet, places: readonly CellPlace[]): SheetArea {
  const [rows, columns] = [places.map(({ row }) => row), places.map(({ column }) => column)];
  const [row, column] = [Math.min(...rows), Math.min(...columns)];
  return {
    sheet: sheet.sheet,
    row,
    column,
    rows: Math.max(...rows) - row + 1,
    columns: Math.max(...columns) - column + 1,
  };
}

/** A number of the whole regression beside its word. */
export interface SummaryNumber {
  readonly word: SummaryWord;
  readonly place: CellPlace;
  readonly shown: ShownNumber;
}
