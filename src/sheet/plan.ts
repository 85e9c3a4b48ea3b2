/** A sheet as data: what stands in which cell, how it looks, which charts stand beside. Rows and columns count from 0. */
export interface SheetPlan {
  /** The wanted name; the host makes it unique ("Repairs answer", "Repairs answer 2"). */
  readonly name: string;
  /**
   * What stands on it where that is no answer: data of the workbook from then on, like any others, or a review, which
   * has no data of its own that it could fall behind.
   */
  readonly holds?: "data" | "review";
  readonly blocks: readonly PlanBlock[];
  readonly formats: readonly PlanFormat[];
  readonly links: readonly PlanLink[];
  /** Width of each column in characters of the normal font, from column 0. */
  readonly columnWidths: readonly number[];
  /** Rows kept in view while scrolling. */
  readonly frozenRows: number;
  readonly charts: readonly ChartPlan[];
  /** What is printed, one page wide and lying; null prints all. */
  readonly printArea: Area | null;
  /** Rows that a new page begins with, so that what belongs together is not parted. */
  readonly pageBreaks?: readonly number[];
}

export interface Area {
  readonly row: number;
  readonly column: number;
  readonly rows: number;
  readonly columns: number;
}

/** Text is never executed: a heading that begins with = stays text. A blank is null. */
export type PlanCell =
  | null
  | { readonly kind: "text"; readonly text: string }
  | { readonly kind: "number"; readonly number: number }
  /** Begins with "=", in the English, comma-separated form that Excel's API takes. */
  | { readonly kind: "formula"; readonly formula: string };

/** A rectangular block, written in one go. */
export interface PlanBlock {
  readonly row: number;
  readonly column: number;
  readonly cells: readonly (readonly PlanCell[])[];
}

export type PlanStyle =
  | "title"
  /** Above several headings: which regression of a review they are about. */
  | "banner"
  | "heading"
  | "table heading"
  | "label"
  | "note"
  | "sentence"
  | "in force"
  | "caution"
  /** A line for someone to write on. */
  | "to fill in";

export interface PlanFormat {
  readonly area: Area;
  readonly style?: PlanStyle;
  readonly numberFormat?: string;
  readonly wrap?: boolean;
  readonly align?: "left" | "right" | "center";
  /** Blank before a text that stands left, in steps of about three characters. */
  readonly indent?: number;
  /** Cells joined into one, for sentences that run over several columns. */
  readonly merge?: boolean;
  /** Height of each row in points, for wrapped sentences. */
  readonly rowHeight?: number;
  /** How many rows below have these cells for the headings of their columns, and their own names in the first column. */
  readonly heads?: number;
}

export interface PlanLink {
  readonly row: number;
  readonly column: number;
  readonly text: string;
  /** An address in this workbook, "Months!C14". */
  readonly target: string;
}

export interface AxisEnds {
  readonly minimum: number;
  readonly maximum: number;
}

/** What a series is on the page: the data, what is in force, what stands beside it, or a line to measure by. */
export type SeriesLook = "data" | "in force" | "beside" | "mark";

export interface ChartPlan {
  readonly title: string;
  readonly kind: "scatter" | "lines";
  readonly place: Area;
  readonly xTitle: string;
  readonly yTitle: string;
  /** Ends of the axes; absent leaves them to the host. */
  readonly xRange?: AxisEnds;
  readonly yRange?: AxisEnds;
  /** Whether the upright axis goes without numbers, because it counts nothing. */
  readonly yHidden?: boolean;
  readonly legend: boolean;
  /** Areas on the same sheet; x and y of a series are columns of equal height. */
  readonly series: readonly {
    readonly name: string;
    readonly x: Area;
    readonly y: Area;
    /** A name is written to the right of each point, in its place. */
    readonly drawn: "points" | "line" | "name";
    readonly look: SeriesLook;
  }[];
}
