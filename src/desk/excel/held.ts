import type { Area } from "../workbook/areas.ts";
import type { ChartRecord, CustomXmlRecord, SeriesRecord } from "../workbook/records.ts";

/** What the host remembers of an object while a request runs, by the object's type in Excel's model. */
export interface States {
  Workbook: null;
  Application: null;
  CultureInfo: null;
  NumberFormatInfo: null;
  Runtime: null;
  WorkbookProtection: null;
  WorksheetCollection: null;
  Worksheet: OnSheet;
  WorksheetProtection: OnSheet;
  WorksheetFreezePanes: OnSheet;
  PageLayout: OnSheet;
  HeaderFooterGroup: OnSheet;
  HeaderFooter: OnSheet;
  PageBreakCollection: OnSheet;
  PageBreak: OnBreak;
  WorksheetCustomPropertyCollection: OnSheet;
  WorksheetCustomProperty: OnSheet & { readonly key: string };
  Range: Area;
  RangeView: { readonly area: Area; readonly rows: readonly number[] };
  RangeAreas: readonly Area[];
  RangeCollection: readonly Area[];
  RangeFormat: readonly Area[];
  RangeFill: readonly Area[];
  RangeFont: readonly Area[];
  RangeBorderCollection: readonly Area[];
  RangeBorder: { readonly areas: readonly Area[]; readonly side: string };
  TableCollection: { readonly sheet: string | null };
  TableScopedCollection: { readonly ids: readonly string[] };
  Table: OnTable;
  TableColumnCollection: OnTable;
  TableColumn: OnTable & { readonly index: number };
  NamedItemCollection: { readonly sheet: string | null };
  NamedItem: { readonly id: string };
  SettingCollection: null;
  Setting: { readonly key: string };
  CustomXmlPartCollection: null;
  CustomXmlPartScopedCollection: { readonly namespace: string };
  CustomXmlPart: CustomXmlRecord;
  ChartCollection: OnSheet;
  Chart: OnChart;
  ChartTitle: OnChart;
  ChartLegend: OnChart;
  ChartAxes: OnChart;
  ChartAxis: OnAxis;
  ChartAxisTitle: OnAxis;
  ChartGridlines: OnAxis;
  ChartSeriesCollection: OnChart;
  ChartSeries: OnSeries;
  ChartSeriesFormat: OnSeries;
  ChartDataLabels: OnSeries;
  ChartLineFormat: OnSeries;
  ChartFill: OnSeries;
  CustomFunctions: null;
}

export interface OnSheet {
  readonly sheet: string;
}
export interface OnBreak extends OnSheet {
  readonly row: number;
}
export interface OnTable {
  readonly id: string;
}
export interface OnChart extends OnSheet {
  readonly chart: ChartRecord;
}
export interface OnAxis extends OnChart {
  readonly axis: "x" | "y";
}
export interface OnSeries extends OnChart {
  readonly series: SeriesRecord;
}

export type TypeName = keyof States;

/** An object of the model: its type and what the host needs to find it. */
export type Held = { [T in TypeName]: { readonly type: T; readonly state: States[T] } }[TypeName];

export const hold = <T extends TypeName>(type: T, state: States[T]): Held => ({ type, state }) as Held;
