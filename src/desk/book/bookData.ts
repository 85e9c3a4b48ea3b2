/** A workbook as plain data: what files hold, what the grid opens, what the demo script writes. */
export interface BookData {
  readonly sheets: readonly SheetData[];
  readonly names: readonly BookName[];
  /** Index of the sheet shown first. */
  readonly active: number;
  /** Set where formulas are calculated only when someone asks: their values may be older than the cells they read. */
  readonly manualCalculation?: true;
  /** Results that a file held cell by cell and of which another program has changed a cell: "Months!B2:C9". */
  readonly loosened?: readonly string[];
  /** What add-ins keep in the workbook; their parts and settings travel with the file. */
  readonly customXml?: readonly { readonly id: string; readonly xml: string }[];
  readonly settings?: Readonly<Record<string, unknown>>;
}

export interface BookName {
  readonly name: string;
  readonly refersTo: string;
  /** The sheet whose own name it is; absent for a name of the workbook. */
  readonly sheet?: string;
  readonly comment?: string;
}

/** Sheets on their way into another workbook, with the names that are their own. */
export interface CarriedSheets {
  readonly sheets: readonly SheetData[];
  /** Names of sheets that are not among them stay behind. */
  readonly names: BookData["names"];
}

export interface SheetData {
  readonly name: string;
  /** Row by row from A1; rows may be shorter than the sheet is wide. */
  readonly rows: readonly (readonly BookCell[])[];
  /** Width in characters of the normal font by column, undefined for the standard width. */
  readonly columnWidths: readonly (number | undefined)[];
  /** Height in points by row, undefined for the standard height. */
  readonly rowHeights?: readonly (number | undefined)[];
  readonly merges: readonly string[];
  readonly frozenRows: number;
  readonly hidden: boolean;
  readonly hiddenRows: readonly number[];
  readonly hiddenColumns?: readonly number[];
  readonly protected: boolean;
  readonly tables: readonly { readonly name: string; readonly address: string }[];
  readonly charts: readonly BookChart[];
  readonly printArea: string | null;
  readonly onePageWide: boolean;
  readonly landscape?: boolean;
  /** Rows, counted from 0, that a new page begins with. */
  readonly pageBreaks?: readonly number[];
  /** In points; absent leaves the usual ones. */
  readonly margins?: PageMargins;
  readonly footer?: PageFooter;
  readonly links: readonly { readonly cell: string; readonly target: string }[];
  /** Marks that add-ins set on a sheet. */
  readonly customProperties?: Readonly<Record<string, string>>;
}

/** Blank paper around the print, in points. */
export interface PageMargins {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
  /** From the edge of the paper to what stands below each page. */
  readonly footer: number;
}

/** What stands below each page, with Excel's codes: &A the sheet's name, &P the page's number, &N how many there are. */
export interface PageFooter {
  readonly left: string;
  readonly center: string;
  readonly right: string;
}

export type BookValue = number | string | boolean | null | { readonly error: string };

/** A bare value, or a value with the formula behind it and its looks. Dates are serial numbers with a date format. */
export type BookCell = BookValue | StyledCell;

export interface StyledCell {
  readonly value: BookValue;
  /** With its "=", in English with commas; add-in functions by their own names, FOOTING.ANSWER(...). */
  readonly formula?: string;
  /** The range that the formula's result spills into, "A1:C9". */
  readonly spill?: string;
  readonly style?: CellStyle;
}

export interface CellStyle {
  readonly numberFormat?: string;
  readonly bold?: boolean;
  readonly italic?: boolean;
  /** In points. */
  readonly size?: number;
  /** "#1f2937" */
  readonly color?: string;
  readonly fill?: string;
  readonly wrap?: boolean;
  readonly horizontal?: "left" | "right" | "center";
  readonly vertical?: "top" | "middle" | "bottom";
  /** In steps of about three characters. */
  readonly indent?: number;
  readonly lineAbove?: string;
  readonly lineBelow?: string;
}

export interface BookChart {
  readonly name: string;
  readonly title: string;
  readonly kind: "scatter" | "scatter with lines" | "lines" | "columns";
  readonly place: { readonly row: number; readonly column: number; readonly rows: number; readonly columns: number };
  readonly xTitle: string;
  readonly yTitle: string;
  /** Ends of the axes; null or absent leaves the end to the program that draws. */
  readonly xRange?: AxisRange;
  readonly yRange?: AxisRange;
  /** Whether the numbers of the upright axis are left out. */
  readonly yHidden?: boolean;
  readonly legend?: boolean;
  /** Ranges as formulas write them: "'Repairs answer'!$H$4:$H$99". */
  readonly series: readonly {
    readonly name: string;
    readonly x: string;
    readonly y: string;
    readonly line: boolean;
    readonly markers: boolean;
    /** "#1f2937"; absent takes the next colour of the theme. */
    readonly color?: string;
    /** In points. */
    readonly lineWeight?: number;
    /** What stands to the right of each point: its value, or the name of the series. */
    readonly label?: "value" | "name";
  }[];
}

export interface AxisRange {
  readonly minimum: number | null;
  readonly maximum: number | null;
}
