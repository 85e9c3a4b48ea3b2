import type { Answer } from "../core/answer/answer.ts";
import { capitalised } from "../core/answer/wording.ts";
import { chartDataColumn } from "./columns.ts";
import { type PlacedChart, columnArea, dataBlock, noteOver } from "./chartData.ts";
import type { Area, PlanCell } from "./plan.ts";
import { number } from "./section.ts";

/** Fitted and residual, then a blank column; then time and residual. */
const overFittedColumn = chartDataColumn;
const overTimeColumn = chartDataColumn + 3;

/** Residuals over fitted values: a fan says uneven spread, a bend says a missing curve. */
export function overFittedChart(answer: Answer, place: Area): PlacedChart {
  const { fitted, residuals } = answer.points;
  return residualChart(
    { x: fitted, residuals, column: overFittedColumn, xName: "Fitted", joined: false },
    { title: `Residuals over fitted values${thinned(answer)}`, xTitle: `Fitted ${answer.outcome}`, place },
  );
}

/** Residuals in the order of time, joined; null where rows do not run through it. Long runs say that errors follow on. */
export function overTimeChart(answer: Answer, place: Area): PlacedChart | null {
  const { rows, points } = answer;
  if (rows.kind !== "time" || points.periods === null) return null;
  const unit = capitalised(rows.period.unit);
  return residualChart(
    { x: points.periods, residuals: points.residuals, column: overTimeColumn, xName: unit, joined: true },
    { title: `Residuals through time${thinned(answer)}`, xTitle: `${unit} (1 is ${rows.first})`, place },
  );
}

const thinned = ({ points, observations }: Answer): string =>
  points.thinned ? ` (${points.fitted.length} of ${observations} rows)` : "";

interface Drawn {
  readonly x: readonly number[];
  readonly residuals: readonly number[];
  readonly column: number;
  readonly xName: string;
  readonly joined: boolean;
}

interface Titled {
  readonly title: string;
  readonly xTitle: string;
  readonly place: Area;
}

function residualChart({ x, residuals, column, xName, joined }: Drawn, titled: Titled): PlacedChart {
  const cells = x.map((value, index): PlanCell[] => [number(value), number(residuals[index]!)]);
  const [across, up] = [columnArea(column, x.length), columnArea(column + 1, x.length)];
  return {
    chart: {
      ...titled,
      kind: joined ? "lines" : "scatter",
      yTitle: "Residual",
      legend: false,
      series: [{ name: "Residuals", x: across, y: up, drawn: joined ? "line" : "points", look: "data" }],
    },
    blocks: [dataBlock(column, ["Behind the chart", xName, "Residual"], cells)],
    formats: [noteOver(column, 2)],
  };
}
