import type { AxisEnds, ChartPlan } from "../sheet/plan.ts";
import { rangeAt } from "./writeCells.ts";

const kinds = {
  scatter: "XYScatter",
  lines: "XYScatterLinesNoMarkers",
} as const satisfies Record<ChartPlan["kind"], Excel.ChartType | string>;

type Series = ChartPlan["series"][number];

const drawings = {
  points: "XYScatter",
  line: "XYScatterLinesNoMarkers",
  name: "XYScatter",
} as const satisfies Record<Series["drawn"], Excel.ChartType | string>;

/** Colours keep a contrast of 3 to 1 or more with the page; what is in force differs by weight too. */
const looks: Readonly<Record<Series["look"], { readonly color: string; readonly weight: number }>> = {
  data: { color: "#0F4C5C", weight: 1.25 },
  "in force": { color: "#0F4C5C", weight: 3.5 },
  beside: { color: "#6B7280", weight: 1.5 },
  mark: { color: "#9A3412", weight: 1 },
};

/** In points. */
const markerSize = 4;

/** Stands before the number of every chart that Footing draws, so that it knows them again. */
export const chartName = "Footing chart";

/** Draws the charts in two trips: Excel begins each with series of its own, which must be known to be taken away. */
export async function drawCharts(sheet: Excel.Worksheet, plans: readonly ChartPlan[]): Promise<void> {
  const drawable = plans.filter(({ series }) => series.length > 0);
  if (drawable.length === 0) return;
  const charts = drawable.map((plan) => begin(sheet, plan));
  await sheet.context.sync();
  for (const [index, plan] of drawable.entries()) {
    const chart = charts[index]!;
    chart.name = `${chartName} ${index + 1}`;
    for (const series of chart.series.items) series.delete();
    for (const series of plan.series) addSeries(sheet, chart, series);
    finish(chart, plan);
  }
  await sheet.context.sync();
}

function begin(sheet: Excel.Worksheet, { kind, series, place }: ChartPlan): Excel.Chart {
  const chart = sheet.charts.add(kinds[kind], rangeAt(sheet, series[0]!.y), "Columns");
  const corner = { row: place.row, column: place.column, rows: 1, columns: 1 };
  const opposite = { ...corner, row: place.row + place.rows - 1, column: place.column + place.columns - 1 };
  chart.setPosition(rangeAt(sheet, corner), rangeAt(sheet, opposite));
  chart.series.load("items/name");
  return chart;
}

function addSeries(sheet: Excel.Worksheet, chart: Excel.Chart, series: Series): void {
  const added = chart.series.add(series.name);
  added.setXAxisValues(rangeAt(sheet, series.x));
  added.setValues(rangeAt(sheet, series.y));
  added.chartType = drawings[series.drawn];
  const { color, weight } = looks[series.look];
  switch (series.drawn) {
    case "line":
      added.format.line.color = color;
      added.format.line.weight = weight;
      return;
    case "points":
      added.markerSize = markerSize;
      added.markerBackgroundColor = color;
      added.markerForegroundColor = color;
      return;
    case "name":
      showName(added);
  }
}

/** The series' name stands in the place of its point. */
function showName(series: Excel.ChartSeries): void {
  series.markerStyle = "None";
  series.hasDataLabels = true;
  series.dataLabels.showSeriesName = true;
  series.dataLabels.showValue = false;
  series.dataLabels.position = "Right";
}

function finish(chart: Excel.Chart, plan: ChartPlan): void {
  const { title, xTitle, yTitle, xRange, yRange, yHidden, legend } = plan;
  const { categoryAxis, valueAxis } = chart.axes;
  chart.title.text = title;
  categoryAxis.title.text = xTitle;
  if (yTitle !== "") valueAxis.title.text = yTitle;
  if (xRange !== undefined) setEnds(categoryAxis, xRange);
  if (yRange !== undefined) setEnds(valueAxis, yRange);
  if (yHidden === true) valueAxis.visible = false;
  chart.legend.visible = legend;
}

function setEnds(axis: Excel.ChartAxis, { minimum, maximum }: AxisEnds): void {
  axis.minimum = minimum;
  axis.maximum = maximum;
}
