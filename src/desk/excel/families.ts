import { chartAxes, chartAxis, chartAxisTitle, chartGridlines, chartLegend, chartTitle } from "./chartParts.ts";
import { chart, charts } from "./charts.ts";
import {
  chartDataLabels,
  chartFill,
  chartLine,
  chartSeries,
  chartSeriesCollection,
  chartSeriesFormat,
} from "./chartSeries.ts";
import { customFunctions } from "./customFunctions.ts";
import type { States } from "./held.ts";
import type { Family } from "./model.ts";
import { namedItem, names } from "./names.ts";
import { range } from "./range.ts";
import { rangeAreas, rangeCollection, rangeView } from "./rangeAreas.ts";
import { rangeBorder, rangeBorders, rangeFill, rangeFont, rangeFormat } from "./rangeFormat.ts";
import { customXmlPart, customXmlParts, oneSetting, scopedXmlParts, settings } from "./settings.ts";
import { pageBreak, pageBreaks } from "./pageBreaks.ts";
import { headerFooter, headersFooters } from "./pageFooter.ts";
import { customProperties, customProperty, freezePanes, pageLayout } from "./sheetParts.ts";
import { tableColumn, tableColumns } from "./tableColumns.ts";
import { scopedTables, table, tableCollection } from "./tables.ts";
import { application, cultureInfo, numberFormatInfo, runtime, workbook, workbookProtection } from "./workbook.ts";
import { worksheet, worksheetProtection } from "./worksheet.ts";
import { worksheets } from "./worksheets.ts";

/** The object model: every type that the stand-in answers for. */
export const families: { readonly [T in keyof States]: Family<States[T]> } = {
  Workbook: workbook,
  Application: application,
  CultureInfo: cultureInfo,
  NumberFormatInfo: numberFormatInfo,
  Runtime: runtime,
  WorkbookProtection: workbookProtection,
  WorksheetCollection: worksheets,
  Worksheet: worksheet,
  WorksheetProtection: worksheetProtection,
  WorksheetFreezePanes: freezePanes,
  PageLayout: pageLayout,
  HeaderFooterGroup: headersFooters,
  HeaderFooter: headerFooter,
  PageBreakCollection: pageBreaks,
  PageBreak: pageBreak,
  WorksheetCustomPropertyCollection: customProperties,
  WorksheetCustomProperty: customProperty,
  Range: range,
  RangeView: rangeView,
  RangeAreas: rangeAreas,
  RangeCollection: rangeCollection,
  RangeFormat: rangeFormat,
  RangeFill: rangeFill,
  RangeFont: rangeFont,
  RangeBorderCollection: rangeBorders,
  RangeBorder: rangeBorder,
  TableCollection: tableCollection,
  TableScopedCollection: scopedTables,
  Table: table,
  TableColumnCollection: tableColumns,
  TableColumn: tableColumn,
  NamedItemCollection: names,
  NamedItem: namedItem,
  SettingCollection: settings,
  Setting: oneSetting,
  CustomXmlPartCollection: customXmlParts,
  CustomXmlPartScopedCollection: scopedXmlParts,
  CustomXmlPart: customXmlPart,
  ChartCollection: charts,
  Chart: chart,
  ChartTitle: chartTitle,
  ChartLegend: chartLegend,
  ChartAxes: chartAxes,
  ChartAxis: chartAxis,
  ChartAxisTitle: chartAxisTitle,
  ChartGridlines: chartGridlines,
  ChartSeriesCollection: chartSeriesCollection,
  ChartSeries: chartSeries,
  ChartSeriesFormat: chartSeriesFormat,
  ChartDataLabels: chartDataLabels,
  ChartLineFormat: chartLine,
  ChartFill: chartFill,
  CustomFunctions: customFunctions,
};
