import type { Area, ChartPlan, PlanBlock, PlanCell, PlanFormat } from "./plan.ts";
import { text } from "./section.ts";

/** A chart, and the cells it draws from. */
export interface PlacedChart {
  readonly chart: ChartPlan;
  readonly blocks: readonly PlanBlock[];
  readonly formats: readonly PlanFormat[];
}

/** The first row of the numbers behind charts; what they are and their headings stand above. */
const dataRow = 3;

export const columnArea = (column: number, rows: number, skip = 0): Area => ({
  row: dataRow + skip,
  column,
  rows,
  columns: 1,
});

/** Numbers behind a chart, under what they are and the headings of the two columns. */
export function dataBlock(
  column: number,
  [about, ...names]: readonly [string, string, string],
  cells: readonly PlanCell[][],
): PlanBlock {
  return { row: dataRow - 2, column, cells: [[text(about), null], names.map(text), ...cells] };
}

export const noteOver = (column: number, columns: number): PlanFormat => ({
  area: { row: dataRow - 2, column, rows: 2, columns },
  style: "note",
});
