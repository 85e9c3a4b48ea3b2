import type { CellColumn } from "../table/cells.ts";

/**
 * What a driver or the outcome is made of before it enters the regression. A position is no cell's: the drivers are
 * 1, 2, 3 and so on along the outcome where a formula names none.
 */
export type ClaimedForm = "as it is" | "logarithm" | "square" | "cube" | "position";

/**
 * One line of cells that a regression uses, with what stands before and after it in the sheet, so that rows left off
 * and rows taken in by mistake can be tried. A line runs down a column, or across a row where the data lie so.
 */
export interface ClaimedLine {
  /** The heading, or where none stands the address of the claimed cells. */
  readonly name: string;
  readonly sheet: string;
  readonly runs: "down" | "across";
  /** The column of a line that runs down, the row of one that runs across; from 0. */
  readonly track: number;
  /** The position (row or column, from 0) of the first of `cells`. */
  readonly first: number;
  /** Every cell of the line inside the sheet's used range. */
  readonly cells: CellColumn;
  /** The position of the first cell the regression says it used, and how many. */
  readonly from: number;
  readonly count: number;
  readonly form: ClaimedForm;
  /** Positions inside the used range that are hidden or filtered away. */
  readonly hidden: readonly number[];
}

/** What a reported number says it is; `term` counts the drivers from 0 in the order they are claimed, null is the constant. */
export type Quantity =
  | {
      readonly kind: "coefficient" | "standard-error" | "ratio" | "p-value" | "low" | "high";
      readonly term: number | null;
    }
  | {
      readonly kind:
        | "r-squared"
        | "adjusted-r-squared"
        | "correlation"
        | "sigma"
        | "f"
        | "f-p-value"
        | "degrees-of-freedom"
        | "observations"
        | "explained-sum-of-squares"
        | "residual-sum-of-squares";
    }
  /** \`at\`: the drivers' values as they enter the regression, logarithms and squares taken. */
  | { readonly kind: "prediction"; readonly at: readonly number[] };

export interface ReportedNumber {
  readonly quantity: Quantity;
  readonly value: number;
  /** What a true value may differ by and still be shown so: half a unit of the last digit shown, in the value's units. */
  readonly halfUnit: number;
  /** "Handover!B4" */
  readonly cell: string;
  /** As the cell shows it: "3.100", "4.2 %". */
  readonly shown: string;
}

/** A regression as someone reported it: which cells went in, and the numbers that came out. */
export interface Claim {
  /** The cell, or the block of cells, that reports it: "Handover!A4:D8". */
  readonly place: string;
  readonly origin:
    | {
        readonly kind: "formula";
        readonly functions: readonly string[];
        readonly formula: string;
      }
    | { readonly kind: "typed" };
  readonly outcome: ClaimedLine;
  readonly drivers: readonly ClaimedLine[];
  readonly constant: boolean;
  readonly reported: readonly ReportedNumber[];
  /** The other columns beside the data: they can be the time or the groups of the rows. */
  readonly others: readonly ClaimedLine[];
  /** Two-sided level of the bounds where the report says it: 0.05 for 95 %. */
  readonly level?: number;
  /** What had to be taken for granted to read a report of typed numbers, as full sentences. */
  readonly assumed?: readonly string[];
}
