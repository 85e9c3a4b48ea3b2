import { breaksGuard } from "../diagnostics/guards/breaks.ts";
import { type Collinearity, collinearity } from "../diagnostics/guards/collinearity.ts";
import { collinearityGuard } from "../diagnostics/guards/collinearityGuard.ts";
import type { Guard } from "../diagnostics/guards/guard.ts";
import { type InfluentialRow, influence, mostInfluential } from "../diagnostics/guards/influence.ts";
import { influenceGuard } from "../diagnostics/guards/influenceGuard.ts";
import { rowsGuard } from "../diagnostics/guards/rows.ts";
import { type Trending, trending, trendingGuard } from "../diagnostics/guards/trending.ts";
import type { TestOutcome } from "../diagnostics/outcome.ts";
import type { Fit } from "../fit/fit.ts";
import type { RowPlaces } from "./rowPlaces.ts";

/** An influential row as the reader knows it. */
export interface PlacedRow extends Omit<InfluentialRow, "row"> {
  /** Sheet row, from 1. */
  readonly row: number;
  /** The cell of the outcome in it. */
  readonly cell: string;
}

/** What to know beside the tests: sentences first, the figures behind them after. */
export interface Guards {
  readonly found: readonly Guard[];
  readonly collinearity: Collinearity;
  readonly trending: Trending | null;
  /** The most influential first, by Cook's distance. */
  readonly rows: readonly PlacedRow[];
}

const mostRows = 10;

export interface GuardSettings {
  readonly tests: readonly TestOutcome[];
  readonly level: number;
  /** Whether the errors were found to follow on. */
  readonly followsOn: boolean;
  readonly places: RowPlaces;
}

/** Every guard that applies: collinearity, single rows, wandering series, breaks, gaps or groups. */
export function guardsOf(fit: Fit, { tests, level, followsOn, places }: GuardSettings): Guards {
  const near = collinearity(fit);
  const measures = influence(fit);
  const rows = measures === null ? [] : mostInfluential(fit, measures, mostRows);
  const watson = tests.find(({ test }) => test === "durbin-watson");
  const wandering = watson === undefined ? null : trending(fit, watson);
  const found = [
    collinearityGuard(near),
    measures === null ? null : influenceGuard({ fit, measures, rows }, places.name),
    wandering === null ? null : trendingGuard(wandering),
    breaksGuard(tests, { level, followsOn }, places.name),
    rowsGuard(fit.design.order),
  ];
  return {
    found: found.filter((guard) => guard !== null),
    collinearity: near,
    trending: wandering,
    rows: rows.map((row) => ({ ...row, row: places.number(row.row), cell: places.cell(row.row) })),
  };
}
