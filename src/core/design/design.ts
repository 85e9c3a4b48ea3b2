import type { Period } from "../table/periodNames.ts";
import type { Transform } from "./model.ts";

export type { Period };

/** A row that was not used, named as the user knows it (sheet rows count from 1). */
export interface LeftOut {
  readonly row: number;
  readonly cell: string;
  readonly because: string;
}

/** One column of the design and what it means in words. */
export interface Term {
  /** "constant", or a heading, or a heading with its transform or level: "Price", "logarithm of Price", "Region: North". */
  readonly name: string;
  readonly meaning: TermMeaning;
  /** The values in design order, n of them. */
  readonly values: Float64Array<ArrayBuffer>;
}

export type TermMeaning =
  | { readonly kind: "constant" }
  | { readonly kind: "number"; readonly column: string; readonly transform: Transform }
  | { readonly kind: "level"; readonly column: string; readonly level: string; readonly base: string }
  | { readonly kind: "date"; readonly column: string; readonly unit: string }
  | { readonly kind: "trend"; readonly unit: string }
  | { readonly kind: "season"; readonly level: string; readonly base: string };

/**
 * What rows are to each other, in design order. `positions` are whole period numbers that count from 0
 * and ascend (within each group where rows are groups); a missing period leaves a gap in them.
 * `groups` holds group numbers 0..labels.length-1; rows of one group stand together.
 */
export type RowOrder =
  | { readonly kind: "cases" }
  | {
      readonly kind: "time";
      readonly positions: Int32Array<ArrayBuffer>;
      readonly period: Period;
      readonly labels: { readonly first: string; readonly last: string };
      /** How many periods between first and last have no row used. */
      readonly gaps: number;
      /** The first few of them in words. */
      readonly gapLabels: readonly string[];
    }
  | {
      readonly kind: "groups";
      readonly groups: Int32Array<ArrayBuffer>;
      readonly labels: readonly string[];
      /** The second way of grouping, for two-way clustering. */
      readonly second: {
        readonly groups: Int32Array<ArrayBuffer>;
        readonly labels: readonly string[];
        readonly by: string;
      } | null;
      readonly positions: Int32Array<ArrayBuffer> | null;
      readonly by: string;
    };

/** The regression as numbers: outcome y (n), terms X (n by k, column by column), what rows are. */
export interface Design {
  readonly outcome: {
    readonly name: string;
    readonly column: string;
    readonly transform: Transform;
    readonly values: Float64Array<ArrayBuffer>;
  };
  readonly terms: readonly Term[];
  readonly hasConstant: boolean;
  readonly rowCount: number;
  readonly order: RowOrder;
  /** For each design row its index in the source's rows. */
  readonly sourceRows: Int32Array<ArrayBuffer>;
  readonly leftOut: readonly LeftOut[];
  /** leftOut lists at most 1,000 rows; this counts them all. */
  readonly leftOutCount: number;
  /** Sentences about what was done to the data: sorted by time, texts read as numbers, rows not in order. */
  readonly notes: readonly string[];
}
