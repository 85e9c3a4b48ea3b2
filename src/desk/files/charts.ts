import type { Sheet, SheetChart } from "hucre/xlsx";
import type { AxisRange, BookChart } from "../book/bookData.ts";
import { known } from "./known.ts";

type FileChart = NonNullable<Sheet["charts"]>[number];
type FileSeries = SheetChart["series"][number];

/** In points. */
const usualLineWidth = 2.25;
const markerSize = 5;

/** A chart in the words of the file library; points without a line are finished by `finishedChart`. */
export function toFileChart(chart: BookChart): SheetChart {
  const { row, column, rows, columns } = chart.place;
  return {
    type: fileKind[chart.kind],
    title: chart.title,
    altText: chart.title,
    frameTitle: chart.name,
    series: chart.series.map(toFileSeries),
    anchor: { from: { row, col: column }, to: { row: row + rows, col: column + columns } },
    ...(chart.kind.startsWith("scatter") && { scatterStyle: "lineMarker" }),
    legend: (chart.legend ?? chart.series.length > 1) ? "bottom" : false,
    axes: {
      x: { ...axis, title: chart.xTitle, scale: scaleOf(chart.xRange) },
      y: {
        ...axis,
        title: chart.yTitle,
        scale: scaleOf(chart.yRange),
        ...(chart.yHidden === true ? { hidden: true } : { gridlines: { major: true } }),
      },
    },
  };
}

const scaleOf = (range: AxisRange | undefined): { min?: number; max?: number } =>
  known({ min: range?.minimum ?? undefined, max: range?.maximum ?? undefined });

/** Numbers stand at the edge, where negative values do not run through them; a file that says nothing gets crosses. */
const axis = { majorTickMark: "out", minorTickMark: "none", tickLblPos: "low" } as const;

const fileKind = {
  scatter: "scatter",
  "scatter with lines": "scatter",
  lines: "line",
  columns: "column",
} as const satisfies Record<BookChart["kind"], SheetChart["type"]>;

function toFileSeries(series: BookChart["series"][number]): FileSeries {
  const { name, x, y, line, markers, color, lineWeight, label } = series;
  const fill = color?.replace("#", "").toUpperCase();
  return {
    name,
    ...(x !== "" && { categories: x }),
    values: y,
    ...known({ color: fill }),
    marker: markers ? { symbol: "circle", size: markerSize, ...known({ fill, line: fill }) } : { symbol: "none" },
    ...(label !== undefined && { dataLabels: labelled[label] }),
    ...(line && { stroke: { width: lineWeight ?? usualLineWidth } }),
  };
}

const labelled = {
  value: { showValue: true, position: "r" },
  name: { showSeriesName: true, position: "r" },
} as const;

/** A chart of the file as the desk draws it; null for kinds that the desk does not draw. */
export function toBookChart(chart: FileChart, index: number): BookChart | null {
  const kind = bookKind(chart);
  if (kind === null || chart.anchor === undefined) return null;
  const { frameTitle = `Chart ${index + 1}`, title = "", legend = false, series = [] } = chart;
  return {
    name: frameTitle,
    title,
    kind,
    place: placeOf(chart.anchor),
    ...axesOf(chart.axes),
    legend: legend !== false,
    series: series.flatMap(toBookSeries),
  };
}

type Axes = Pick<BookChart, "xTitle" | "yTitle" | "xRange" | "yRange" | "yHidden">;

const axesOf = ({ x, y }: NonNullable<FileChart["axes"]> = {}): Axes => ({
  xTitle: x?.title ?? "",
  yTitle: y?.title ?? "",
  ...known({ xRange: rangeOf(x?.scale), yRange: rangeOf(y?.scale), yHidden: y?.hidden === true || undefined }),
});

const rangeOf = (scale: { readonly min?: number; readonly max?: number } | undefined): AxisRange | undefined =>
  scale?.min === undefined && scale?.max === undefined
    ? undefined
    : { minimum: scale.min ?? null, maximum: scale.max ?? null };

/** The size of a chart that names no lower right corner, in cells of standard size: 5 by 3 inches. */
const usualRows = 15;
const usualColumns = 8;

function placeOf({ from, to }: NonNullable<FileChart["anchor"]>): BookChart["place"] {
  return {
    row: from.row,
    column: from.col,
    rows: to === undefined ? usualRows : Math.max(1, to.row - from.row),
    columns: to === undefined ? usualColumns : Math.max(1, to.col - from.col),
  };
}

function bookKind({ kinds, series = [] }: FileChart): BookChart["kind"] | null {
  const [kind] = kinds;
  if (kind === "scatter") return series.some(drawsLine) ? "scatter with lines" : "scatter";
  if (kind === "line") return "lines";
  return kind === "bar" ? "columns" : null;
}

type FileSeriesInfo = NonNullable<FileChart["series"]>[number];

/** Programs write a stroke for a line that is drawn, and none or an empty one for points alone. */
const drawsLine = ({ stroke }: FileSeriesInfo): boolean => stroke?.width !== undefined;

function toBookSeries(series: FileSeriesInfo, index: number): BookChart["series"] {
  if (series.valuesRef === undefined) return [];
  const line = series.kind === "line" || drawsLine(series);
  return [
    {
      name: series.name ?? `Series ${index + 1}`,
      x: series.categoriesRef ?? "",
      y: series.valuesRef,
      line,
      markers: series.marker?.symbol === undefined ? !line : series.marker.symbol !== "none",
      ...(typeof series.color === "string" && { color: `#${series.color.toLowerCase()}` }),
      ...(line &&
        series.stroke?.width !== undefined &&
        series.stroke.width !== usualLineWidth && { lineWeight: series.stroke.width }),
      ...known({ label: labelOf(series) }),
    },
  ];
}

function labelOf({ dataLabels }: FileSeriesInfo): "value" | "name" | undefined {
  if (dataLabels?.showSeriesName === true) return "name";
  return dataLabels?.showValue === true ? "value" : undefined;
}

export const chartParts = /^xl\/charts\/[^/]+\.xml$/;

/**
 * The chart part with what the file library has no words for: series that are points alone (spreadsheets join
 * the points of a series that says nothing, and some in curves), and axis and grid lines, which some programs leave out unless told.
 */
export function finishedChart(part: string): string {
  return part
    .replace(/<c:ser>.*?<\/c:ser>/gs, (series) => straight(withoutLine(series)))
    .replaceAll("<c:majorGridlines/>", `<c:majorGridlines>${lineOf("D5DBE1")}</c:majorGridlines>`)
    .replaceAll("<c:crossAx ", `${lineOf("7B8794")}<c:crossAx `);
}

/** Some programs round the corners of a line through points unless told not to. */
const straight = (series: string): string =>
  series.includes("<c:xVal>") && !series.includes("<c:smooth")
    ? series.replace("</c:ser>", '<c:smooth val="0"/></c:ser>')
    : series;

function withoutLine(series: string): string {
  const [before = "", after = ""] = series.split("<c:marker>");
  if (!series.includes("<c:xVal>") || before.includes("<a:ln w=")) return series;
  const noLine = "<a:ln><a:noFill/></a:ln>";
  const looks = before.includes("<c:spPr>")
    ? before.replace(/(?:<a:ln>.*?<\/a:ln>)?<\/c:spPr>/s, `${noLine}</c:spPr>`)
    : `${before}<c:spPr>${noLine}</c:spPr>`;
  return `${looks}<c:marker>${after}`;
}

const lineOf = (color: string): string =>
  `<c:spPr><a:ln w="9525"><a:solidFill><a:srgbClr val="${color}"/></a:solidFill></a:ln></c:spPr>`;

/** The reverse, for reading: a line that is said to be none says nothing, also where it has a width. */
export const withoutEmptyLines = (chartPart: string): string =>
  chartPart.replace(/<a:ln(?: [^>]*)?>\s*<a:noFill\/>(?:(?!<a:ln).)*?<\/a:ln>/gs, "");
