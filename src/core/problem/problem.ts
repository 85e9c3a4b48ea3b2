/**
 * Faults that the user can mend, as data. Their sentences stand in messages.ts alone.
 * `cells` are addresses as the user knows them ("Months!C14", or "row 13 of the drivers, column 2"
 * for arguments of a worksheet function); lists hold at most ten, `count` holds how many there are.
 */
export type Problem =
  TableProblem | ModelProblem | FitProblem | SettingProblem | StoredProblem | FileProblem | ReviewProblem | HostProblem;

export interface Spots {
  readonly column: string;
  readonly cells: readonly string[];
  readonly values: readonly string[];
  readonly count: number;
}

export type TableProblem =
  | { readonly code: "no-data"; readonly where: string }
  | { readonly code: "no-headings"; readonly where: string }
  | { readonly code: "empty-column"; readonly column: string; readonly where: string }
  | { readonly code: "no-numbers"; readonly column: string; readonly where: string }
  | ({ readonly code: "text-in-number-column" } & Spots)
  | ({ readonly code: "text-numbers" } & Spots)
  | ({ readonly code: "dates-as-text" } & Spots)
  | ({ readonly code: "dates-in-number-column" } & Spots)
  | ({ readonly code: "error-cells" } & Spots)
  | ({ readonly code: "unreadable-time" } & Spots)
  | ({ readonly code: "missing-time" } & Spots)
  | ({ readonly code: "repeated-time" } & Spots)
  | {
      readonly code: "unequal-heights";
      readonly first: string;
      readonly rows: number;
      readonly second: string;
      readonly otherRows: number;
    }
  | { readonly code: "too-many-columns"; readonly where: string; readonly columns: number; readonly most: number }
  | { readonly code: "ranges-apart"; readonly first: string; readonly second: string }
  | { readonly code: "overlapping-ranges"; readonly first: string; readonly second: string };

export type ModelProblem =
  | { readonly code: "no-outcome" }
  | { readonly code: "no-drivers" }
  | {
      readonly code: "ambiguous-heading";
      readonly headings: readonly string[];
      readonly sheets: readonly string[];
    }
  | {
      readonly code: "unknown-heading";
      readonly heading: string;
      readonly nearest: string | null;
      readonly where: string;
    }
  /** A name that no coefficient has, where sums and equations of coefficients are written. */
  | { readonly code: "unknown-coefficient"; readonly name: string; readonly nearest: string | null }
  | { readonly code: "repeated-heading"; readonly heading: string; readonly cells: readonly string[] }
  | { readonly code: "column-used-twice"; readonly column: string; readonly first: string; readonly second: string }
  | { readonly code: "no-time-column" }
  | { readonly code: "no-group-column" }
  | { readonly code: "one-group"; readonly column: string; readonly value: string }
  | { readonly code: "one-category"; readonly column: string; readonly value: string }
  | { readonly code: "unknown-base"; readonly column: string; readonly base: string; readonly nearest: string | null }
  | {
      readonly code: "logarithm-of-nonpositive";
      readonly column: string;
      readonly cells: readonly string[];
      readonly count: number;
    }
  | ({ readonly code: "growth-from-nonpositive" } & Omit<Spots, "values">)
  | {
      readonly code: "too-many-categories";
      readonly column: string;
      readonly categories: number;
      readonly rows: number;
    }
  | { readonly code: "transform-needs-time"; readonly column: string; readonly transform: string }
  | { readonly code: "calendar-needs-dates"; readonly driver: string; readonly column: string | null };

export type FitProblem =
  | { readonly code: "too-few-rows"; readonly rows: number; readonly needed: number; readonly leftOut: number }
  | { readonly code: "constant-column"; readonly column: string }
  | { readonly code: "constant-outcome"; readonly column: string }
  | { readonly code: "dependent-columns"; readonly column: string; readonly madeOf: readonly string[] }
  | { readonly code: "perfect-fit"; readonly column: string }
  /** Or too small, where `value` is below one. */
  | { readonly code: "numbers-too-large"; readonly column: string; readonly cell: string; readonly value: number }
  | { readonly code: "zero-standard-error"; readonly errors: string; readonly term: string }
  | { readonly code: "errors-need-order"; readonly errors: string; readonly rows: string }
  | { readonly code: "too-many-lags"; readonly lags: number; readonly rows: number };

export type SettingProblem =
  | { readonly code: "unknown-setting"; readonly setting: string; readonly nearest: string | null }
  | {
      readonly code: "unknown-value";
      readonly setting: string;
      readonly value: string;
      readonly allowed: readonly string[];
      readonly nearest: string | null;
    }
  | { readonly code: "missing-option"; readonly option: string };

export type FileProblem =
  | { readonly code: "unreadable-file"; readonly file: string; readonly because: string }
  | { readonly code: "unwritable-file"; readonly file: string; readonly because: string }
  /** A file of values alone, which is to be searched for formulas. */
  | { readonly code: "no-formulas"; readonly file: string };

/** What stops a review of someone else's regression. */
export type ReviewProblem =
  /** The cells pointed at report no regression that can be read. */
  | { readonly code: "no-report"; readonly where: string }
  /** `unread`: cells whose formulas look like a regression, with the reason why they could not be read. */
  | { readonly code: "nothing-to-review"; readonly where: string; readonly unread: readonly string[] }
  /** Its data lie across, or on several sheets. */
  | { readonly code: "regression-not-in-columns"; readonly title: string };

/** What is wrong with what Footing keeps in the workbook itself. */
export type StoredProblem =
  | { readonly code: "stored-by-newer"; readonly version: number; readonly own: number }
  | { readonly code: "stored-unreadable"; readonly part: string }
  | { readonly code: "setup-gone"; readonly name: string }
  | { readonly code: "setup-unnamed" }
  | { readonly code: "setup-name-taken"; readonly name: string }
  /** `setup` as words: "the set-up X" or "the sheet X"; `last` is where the data stood when it was stored. */
  | { readonly code: "setup-data-gone"; readonly setup: string; readonly place: string; readonly last: string }
  | {
      readonly code: "cells-of-others";
      readonly sheet: string;
      readonly cells: readonly string[];
      readonly count: number;
    }
  | { readonly code: "sheet-not-known"; readonly sheet: string }
  | { readonly code: "too-few-setups"; readonly setups: number };

/** What the spreadsheet itself refuses; only the office and desk rooms make these. */
export type HostProblem =
  | { readonly code: "cell-being-edited" }
  | { readonly code: "several-areas-selected"; readonly areas: number }
  | { readonly code: "chart-selected" }
  | { readonly code: "other-workbook" }
  | { readonly code: "sheet-protected"; readonly sheet: string }
  | { readonly code: "workbook-protected" }
  | { readonly code: "not-a-result-sheet"; readonly sheet: string }
  /** Cells of a live sheet that show no value: "#BUSY!" or another error; ten at most are named. */
  | {
      readonly code: "values-missing";
      readonly cells: readonly string[];
      readonly values: readonly string[];
      readonly count: number;
    }
  | { readonly code: "unknown-place"; readonly place: string; readonly nearest: string | null }
  | { readonly code: "bad-address"; readonly address: string }
  | { readonly code: "too-much-for-excel"; readonly cells: number; readonly limit: number }
  | { readonly code: "excel-too-old"; readonly missing: string }
  | { readonly code: "read-only" }
  | { readonly code: "excel-busy" }
  | { readonly code: "excel-refused"; readonly detail: string }
  | { readonly code: "time-limit"; readonly seconds: number }
  | { readonly code: "cancelled" };
