import type { Answer } from "../core/answer/answer.ts";
import type { InferenceTable } from "../core/inference/inference.ts";
import { chartColumn, chartColumns, chartDataColumn } from "./columns.ts";
import type { Area, ChartPlan, PlanBlock, PlanCell, PlanFormat } from "./plan.ts";
import { number, text } from "./section.ts";

/** A chart, and the cells it draws from. */
export interface PlacedChart {
  readonly chart: ChartPlan;
  readonly blocks: readonly PlanBlock[];
  readonly formats: readonly PlanFormat[];
}

/** Height of each chart in rows of the sheet. */
export const chartRows = 14;
const dataRow = 3;
const placeAt = (row: number): Area => ({ row, column: chartColumn, rows: chartRows, columns: chartColumns });

/** Residuals over fitted values: a fan says uneven spread, a bend says a missing curve. */
export function residualChart(answer: Answer, row: number): PlacedChart {
  const { fitted, residuals, thinned } = answer.points;
  const column = chartDataColumn;
  const cells = fitted.map((value, index): PlanCell[] => [number(value), number(residuals[index] ?? 0)]);
  const title = thinned
    ? `Residuals over fitted values (${fitted.length} of ${answer.observations} rows)`
    : "Residuals over fitted values";
  const area = (offset: number): Area => ({ row: dataRow, column: column + offset, rows: fitted.length, columns: 1 });
  return {
    chart: {
      title,
      kind: "scatter",
      place: placeAt(row),
      xTitle: `Fitted ${answer.outcome}`,
      yTitle: "Residual",
      series: [{ name: "Residuals", x: area(0), y: area(1), drawn: "points" }],
    },
    blocks: [dataBlock(column, ["Behind the chart of residuals", "Fitted", "Residual"], cells)],
    formats: [noteOver(column, 2)],
  };
}

const kindColumns = 3;

/**
 * The intervals of each driver under every kind of standard errors, in units of the standard error in force, so that
 * drivers of any scale share one axis; a bar that crosses zero is an effect that cannot be shown. Each interval is a
 * line from its low to its high end with a blank row after it: the charts of the host have no error bars of given length.
 */
export function intervalChart(answer: Answer, row: number): PlacedChart {
  const kinds = intervalKinds(answer);
  const terms = answer.terms.flatMap((term, index) => (term === "constant" ? [] : [index]));
  const series = kinds.map(({ name, table, shift }, place) => {
    const column = chartDataColumn + 3 + place * kindColumns;
    const cells = terms.flatMap((term, position) =>
      intervalRows(answer, { table, term, height: terms.length - position + shift }),
    );
    const area = (offset: number): Area => ({ row: dataRow, column: column + offset, rows: cells.length, columns: 1 });
    return { name, column, cells, x: area(0), y: area(1) };
  });
  return {
    chart: {
      title: `Intervals of each driver, from top: ${terms.map((term) => answer.terms[term] ?? "").join(", ")}`,
      kind: "scatter",
      place: placeAt(row),
      xTitle: "Standard errors (in force) from the tested value",
      yTitle: "Driver",
      series: series.map(({ name, x, y }) => ({ name, x, y, drawn: "line" })),
    },
    blocks: series.map(({ name, column, cells }) => dataBlock(column, [name, "From and to", "Height"], cells)),
    formats: series.map(({ column }) => noteOver(column, 2)),
  };
}

const gap = 0.22;

function intervalKinds({ inference }: Answer): { name: string; table: InferenceTable; shift: number }[] {
  const found = [
    { name: "classical", table: inference.classical },
    { name: "White", table: inference.white },
    { name: "Newey-West", table: inference.neweyWest },
    { name: "grouped", table: inference.grouped },
  ];
  return found.flatMap(({ name, table }, index) => (table === null ? [] : [{ name, table, shift: (1 - index) * gap }]));
}

interface IntervalLine {
  readonly table: InferenceTable;
  readonly term: number;
  readonly height: number;
}

function intervalRows({ inference, drivers }: Answer, { table, term, height }: IntervalLine): PlanCell[][] {
  const unit = inference.inForce.standardErrors[term] ?? 1;
  const against = drivers[term]?.against ?? 0;
  const inUnits = (end: number | undefined): PlanCell => number(((end ?? 0) - against) / unit);
  return [
    [inUnits(table.low[term]), number(height)],
    [inUnits(table.high[term]), number(height)],
    [null, null],
  ];
}

/** Numbers behind a chart, under what they are and the headings of the two columns. */
const dataBlock = (
  column: number,
  headings: readonly [string, string, string],
  cells: readonly PlanCell[][],
): PlanBlock => {
  const [about, ...names] = headings;
  return { row: dataRow - 2, column, cells: [[text(about), null], names.map(text), ...cells] };
};

const noteOver = (column: number, columns: number): PlanFormat => ({
  area: { row: dataRow - 2, column, rows: 2, columns },
  style: "note",
});
