import type { ICellData } from "@univerjs/core";
import type { PageFooter, PageMargins } from "../book/bookData.ts";

/** What a workbook holds beside its cells. The grid knows nothing of these: they are ours to keep. */
export interface SheetRecord {
  readonly tables: TableRecord[];
  readonly charts: ChartRecord[];
  /** By "row,column". */
  readonly links: Map<string, LinkRecord>;
  readonly customProperties: Map<string, string>;
  protected: boolean;
  /** A local address, or null for the whole sheet. */
  printArea: string | null;
  onePageWide: boolean;
  landscape: boolean;
  margins: PageMargins | null;
  footer: PageFooter | null;
  /** Rows, counted from 0, that a new page begins with. */
  readonly pageBreaks: number[];
}

export interface TableRecord {
  readonly id: string;
  name: string;
  row: number;
  column: number;
  rows: number;
  columns: number;
  style: string;
}

export interface LinkRecord {
  /** "Months!C14" */
  readonly target: string;
  readonly screenTip: string;
}

export type ChartKind = "scatter" | "scatter with lines" | "lines" | "columns";

export interface ChartRecord {
  readonly id: string;
  name: string;
  title: ChartText;
  kind: ChartKind;
  /** In points from the sheet's top left corner, as Excel's API counts. */
  left: number;
  top: number;
  width: number;
  height: number;
  legend: boolean;
  readonly x: ChartAxisRecord;
  readonly y: ChartAxisRecord;
  readonly series: SeriesRecord[];
}

export interface ChartText {
  text: string;
  visible: boolean;
}

export interface ChartAxisRecord {
  readonly title: ChartText;
  minimum: number | null;
  maximum: number | null;
  gridlines: boolean;
  numberFormat: string;
  visible: boolean;
}

export type SeriesLabel = "none" | "value" | "name";

export interface SeriesRecord {
  name: string;
  /** Ranges as formulas write them, "'My data'!$A$2:$A$9"; empty where none is given. */
  x: string;
  y: string;
  line: boolean;
  markers: boolean;
  /** "#1f2937", or empty for the next colour of the theme. */
  color: string;
  /** In points. */
  lineWeight: number;
  markerSize: number;
  /** What stands beside each point. */
  label: SeriesLabel;
}

export interface CustomXmlRecord {
  readonly id: string;
  xml: string;
}

export type DraftCells = Record<number, Record<number, ICellData>>;

/**
 * Changes that are gathered before they go to the grid, which looks through a sheet's every cell at each change:
 * the client cuts large blocks into hundreds of small ones.
 */
export interface Draft {
  /** Cells whose content changes, perhaps with their looks. */
  readonly contents: DraftCells;
  /** Cells whose looks alone change: sent as contents, they would lose the formula behind them. */
  readonly looks: DraftCells;
}

export function emptySheetRecord(): SheetRecord {
  return {
    tables: [],
    charts: [],
    links: new Map(),
    customProperties: new Map(),
    protected: false,
    printArea: null,
    onePageWide: false,
    landscape: false,
    margins: null,
    footer: null,
    pageBreaks: [],
  };
}
