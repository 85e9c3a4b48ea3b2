import type { Answer } from "../core/answer/answer.ts";
import type { PlacedChart } from "./chartData.ts";
import { intervalChart } from "./intervalChart.ts";
import { page } from "./columns.ts";
import type { Area } from "./plan.ts";
import { headingFormat } from "./pageFormats.ts";
import { overFittedChart, overTimeChart } from "./residualCharts.ts";
import { type Section, section, text } from "./section.ts";

/** In rows of the sheet. */
const usualHeight = 13;
const rowsADriver = 1.7;
const axisRows = 5;
/** From here on two charts fit one above the other. */
const tall = 26;

/** Rows that the charts take: the drivers of the intervals stand below one another. */
function heightOf({ drivers }: Answer): number {
  const shown = drivers.filter(({ sentence }) => sentence !== null).length;
  return Math.max(usualHeight, Math.ceil(shown * rowsADriver) + axisRows);
}

/** The heading over the charts and the rows they lie on; the charts themselves are placed by `chartsAt`. */
export function chartsSection(answer: Answer): Section {
  const blank = Array.from({ length: heightOf(answer) }, () => []);
  return section([[text("Pictures, when this sheet was made")], ...blank], [headingFormat(0)]);
}

/** The last columns of the intervals and of the charts beside them. */
const beside = { intervals: 3, middle: 7 } as const;
const alone = { intervals: 4 } as const;

/** The charts of an answer side by side below their heading; beside many drivers the other two stand one above the other. */
export function chartsAt(answer: Answer, headingRow: number): readonly PlacedChart[] {
  const height = heightOf(answer);
  const across = (first: number, last: number): Area => ({
    row: headingRow + 1,
    column: first,
    rows: height,
    columns: last - first + 1,
  });
  const both = answer.rows.kind === "time";
  if (!both || height >= tall) {
    const right = across(alone.intervals + 1, page.last);
    const half = Math.floor(height / 2);
    const upper = both ? { ...right, rows: half } : { ...right, rows: Math.min(height, tall) };
    const lower = { ...right, row: right.row + half, rows: height - half };
    return known(
      intervalChart(answer, across(0, alone.intervals)),
      overFittedChart(answer, upper),
      overTimeChart(answer, lower),
    );
  }
  return known(
    intervalChart(answer, across(0, beside.intervals)),
    overFittedChart(answer, across(beside.intervals + 1, beside.middle)),
    overTimeChart(answer, across(beside.middle + 1, page.last)),
  );
}

const known = (...charts: readonly (PlacedChart | null)[]): PlacedChart[] => charts.filter((chart) => chart !== null);
