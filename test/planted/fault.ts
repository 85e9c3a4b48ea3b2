import type { ErrorsChoice } from "../../src/core/covariance/choice.ts";
import type { Random } from "../support/random.ts";
import type { ClaimedForm, ReportedNumber } from "../../src/core/review/claim.ts";
import type { Cell } from "../../src/core/table/cells.ts";
import type { Style } from "./report.ts";
import type { Sheet } from "./sheet.ts";

/** A row as it went into the regression. */
export interface Used {
  /** Its row on the sheet, from 0 below the headings; -1 for a row that stands nowhere. */
  readonly at: number;
  readonly y: number;
  readonly x: readonly number[];
}

/** The regression as it was made, fault and all. */
export interface Made {
  readonly rows: readonly Used[];
  readonly constant: boolean;
  readonly order: readonly (number | null)[];
}

/** What a review must say of a fault. */
export type Expected =
  | { readonly kind: "explanation"; readonly hypothesis: string }
  | { readonly kind: "finding"; readonly code: string }
  | { readonly kind: "errors"; readonly name: string };

/**
 * One thing that goes wrong. Everything here works on plain arrays and knows nothing of the review: what the sheet
 * holds, which of its rows were used, how cells were read, what was then done to the numbers.
 */
export interface Fault {
  readonly name: string;
  readonly expected: Expected;
  /**
   * What must be said where the report is read from a workbook, whose typed results are held against all rows of the data;
   * null where typed results cannot show the fault. As above where it does not say.
   */
  readonly inBook?: Expected | null;
  /** Figures without which too few numbers would speak of it; any will do where it does not say. */
  readonly styles?: readonly Style[];
  readonly sheet?: (sheet: Sheet, random: Random) => Sheet;
  readonly rows?: (sheet: Sheet) => { readonly from: number; readonly to: number };
  readonly read?: (cell: Cell) => number | null;
  readonly made?: (made: Made, planted: Planted) => Made;
  readonly claimedForms?: Readonly<Record<number, ClaimedForm>>;
  readonly claimsConstant?: boolean;
  readonly errors?: ErrorsChoice;
  /** Two-sided level of the bounds, whatever their headings say; 0.05 where it does not say. */
  readonly level?: number;
  readonly typed?: (reported: readonly ReportedNumber[]) => readonly ReportedNumber[];
  /** Data sets that it can be planted in; all where it does not say. */
  readonly only?: readonly string[];
}

export interface Planted {
  readonly sheet: Sheet;
  readonly random: Random;
}
