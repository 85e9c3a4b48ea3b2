import type { ChartPlan } from "../sheet/plan.ts";
import { rangeAt } from "./writeCells.ts";

const kinds = {
  scatter: "XYScatter",
  lines: "XYScatterLinesNoMarkers",
} as const satisfies Record<ChartPlan["kind"], Excel.ChartType | string>;

const drawings = {
  points: "XYScatter",
  line: "XYScatterLinesNoMarkers",
} as const satisfies Record<ChartPlan["series"][number]["drawn"], Excel.ChartType | string>;

/** Draws the charts in two trips: Excel begins each with series of its own, which must be known to be taken away. */
export async function drawCharts(sheet: Excel.Worksheet, plans: readonly ChartPlan[]): Promise<void> {
  const drawable = plans.filter(({ series }) => series.length > 0);
  if (drawable.length === 0) return;
  const charts = drawable.map((plan) => begin(sheet, plan));
  await sheet.context.sync();
  for (const [index, plan] of drawable.entries()) {
    const chart = charts[index]!;
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

function addSeries(sheet: Excel.Worksheet, chart: Excel.Chart, series: ChartPlan["series"][number]): void {
  const added = chart.series.add(series.name);
  added.setXAxisValues(rangeAt(sheet, series.x));
  added.setValues(rangeAt(sheet, series.y));
  added.chartType = drawings[series.drawn];
}

function finish(chart: Excel.Chart, { title, xTitle, yTitle, series }: ChartPlan): void {
  chart.title.text = title;
  chart.axes.categoryAxis.title.text = xTitle;
  chart.axes.valueAxis.title.text = yTitle;
  chart.legend.visible = series.length > 1;
}
