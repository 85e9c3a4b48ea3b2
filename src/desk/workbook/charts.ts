import type { AxisRange, BookChart, SheetData } from "../book/bookData.ts";
import type { ChartAxisRecord, ChartRecord, SeriesRecord } from "./records.ts";
import { pixelsOf, pointsPerPixel, standardHeight, standardWidth } from "./sizes.ts";

/** Points of a line and of a marker where none are given, as Excel draws them. */
export const standardLine = 2.25;
export const standardMarker = 5;

/** Where columns and rows begin, in points; the same measure serves files, the API and the page. */
export interface Rulers {
  readonly columnWidth: (column: number) => number;
  readonly rowHeight: (row: number) => number;
}

export const rulersOf = (sheet: Pick<SheetData, "columnWidths" | "rowHeights">): Rulers => ({
  columnWidth: (column) => {
    const width = sheet.columnWidths[column];
    return (width === undefined ? standardWidth : pixelsOf(width)) * pointsPerPixel;
  },
  rowHeight: (row) => sheet.rowHeights?.[row] ?? standardHeight * pointsPerPixel,
});

/** Length of the first `count` columns or rows. */
export function lengthOf(count: number, size: (index: number) => number): number {
  let sum = 0;
  for (let index = 0; index < count; index++) sum += size(index);
  return sum;
}

/** The column or row in which a length ends, and the share of it that is passed. */
export function positionAt(length: number, size: (index: number) => number): number {
  let rest = Math.max(0, length);
  let index = 0;
  while (rest > 0 && rest >= size(index)) rest -= size(index++);
  return index + rest / size(index);
}

export function toChartRecord(chart: BookChart, { sheet, index }: { sheet: SheetData; index: number }): ChartRecord {
  const { columnWidth, rowHeight } = rulersOf(sheet);
  const { place } = chart;
  const [left, top] = [lengthOf(place.column, columnWidth), lengthOf(place.row, rowHeight)];
  return {
    id: `{chart-${index + 1}}`,
    name: chart.name,
    kind: chart.kind,
    title: { text: chart.title, visible: chart.title !== "" },
    left,
    top,
    width: lengthOf(place.column + place.columns, columnWidth) - left,
    height: lengthOf(place.row + place.rows, rowHeight) - top,
    legend: chart.legend ?? chart.series.length > 1,
    x: axisRecord(chart.xTitle, chart.xRange),
    y: { ...axisRecord(chart.yTitle, chart.yRange), visible: chart.yHidden !== true },
    series: chart.series.map(toSeriesRecord),
  };
}

export function axisRecord(title: string, range: AxisRange = { minimum: null, maximum: null }): ChartAxisRecord {
  return {
    title: { text: title, visible: title !== "" },
    ...range,
    gridlines: false,
    numberFormat: "General",
    visible: true,
  };
}

function toSeriesRecord(series: BookChart["series"][number]): SeriesRecord {
  return {
    name: series.name,
    x: series.x,
    y: series.y,
    line: series.line,
    markers: series.markers,
    color: series.color ?? "",
    lineWeight: series.lineWeight ?? standardLine,
    markerSize: standardMarker,
    label: series.label ?? "none",
  };
}

/** The chart in the form that files carry, its place in whole cells. */
export function toBookChart(chart: ChartRecord, { columnWidth, rowHeight }: Rulers): BookChart {
  const [column, row] = [Math.round(positionAt(chart.left, columnWidth)), Math.round(positionAt(chart.top, rowHeight))];
  const right = Math.round(positionAt(chart.left + chart.width, columnWidth));
  const bottom = Math.round(positionAt(chart.top + chart.height, rowHeight));
  return {
    name: chart.name,
    title: chart.title.visible ? chart.title.text : "",
    kind: chart.kind,
    place: { row, column, rows: Math.max(1, bottom - row), columns: Math.max(1, right - column) },
    xTitle: chart.x.title.visible ? chart.x.title.text : "",
    yTitle: chart.y.title.visible ? chart.y.title.text : "",
    ...(hasEnds(chart.x) ? { xRange: endsOf(chart.x) } : {}),
    ...(hasEnds(chart.y) ? { yRange: endsOf(chart.y) } : {}),
    ...(chart.y.visible ? {} : { yHidden: true }),
    legend: chart.legend,
    series: chart.series.map(toBookSeries),
  };
}

const hasEnds = (axis: ChartAxisRecord): boolean => axis.minimum !== null || axis.maximum !== null;
const endsOf = ({ minimum, maximum }: ChartAxisRecord): AxisRange => ({ minimum, maximum });

function toBookSeries(series: SeriesRecord): BookChart["series"][number] {
  return {
    name: series.name,
    x: series.x,
    y: series.y,
    line: series.line,
    markers: series.markers,
    ...(series.color === "" ? {} : { color: series.color }),
    ...(series.lineWeight === standardLine ? {} : { lineWeight: series.lineWeight }),
    ...(series.label === "none" ? {} : { label: series.label }),
  };
}
