import type { Fit } from "../../fit/fit.ts";
import { rowsAbove } from "../../numeric/ordering.ts";
import type { Influence, InfluentialRow } from "./influence.ts";
import { type Guard, namesInWords } from "./guard.ts";

/** A coefficient that one row moves by more than its own standard error leans on that row. */
const oneStandardError = 1;
/** Level at which the row farthest out among n is called an outlier. */
const outlierLevel = 0.05;
const mostRows = 5;
const highLeverage = 0.5;

/**
 * Which rows matter more than a row should, in words.
 * @param rows - the most influential rows, the first ones first.
 * @param rowName - how the reader knows a row, from its number in design order.
 */
export function influenceGuard(
  {
    fit,
    measures,
    rows,
  }: { readonly fit: Fit; readonly measures: Influence; readonly rows: readonly InfluentialRow[] },
  rowName: (row: number) => string,
): Guard {
  const farOff = outliers(rows, rowName);
  const sentences = [
    ...selfFitting(measures, rowName),
    ...rows.slice(0, mostRows).flatMap((row) => movedBy(fit, row, rowName)),
    ...farOut(fit, measures, rowName),
    ...farOff,
  ];
  if (sentences.length === 0) {
    return {
      guard: "influence",
      finding: "nothing found",
      sentences: ["No single row moves a coefficient by as much as its standard error."],
    };
  }
  return { guard: "influence", finding: farOff.length > 0 ? "look into it" : "worth knowing", sentences };
}

function selfFitting({ selfFitting: rows }: Influence, rowName: (row: number) => string): string[] {
  if (rows.length === 0) return [];
  const shown = namesInWords(rows.slice(0, mostRows).map(rowName));
  const more = rows.length > mostRows ? ` and ${rows.length - mostRows} more` : "";
  return [
    `The fit passes through ${shown}${more} whatever the outcome there: a driver of its own gives the row no say about the others.`,
  ];
}

/**
 * A row that makes up more than half of its own fitted value (Huber 1981, Robust Statistics, 7.2, from memory, would
 * avoid such rows): there White's standard errors are themselves uncertain, and small degrees of freedom say so.
 */
function farOut(fit: Fit, { selfFitting: alone }: Influence, rowName: (row: number) => string): string[] {
  const rows = rowsAbove(fit.leverages, highLeverage).filter((row) => !alone.includes(row));
  if (rows.length === 0 || fit.design.order.kind !== "cases") return [];
  const most = Math.max(...rows.map((row) => fit.leverages[row]!));
  const shown = namesInWords(rows.slice(0, mostRows).map(rowName));
  return [
    `The drivers of ${shown}${rows.length > mostRows ? ` and ${rows.length - mostRows} more` : ""} lie so far out that a row there makes up to ${Math.floor(100 * most)} % of its own fitted value. White's standard errors are uncertain then; the white version "HC2 bell-mccaffrey" allows for it.`,
  ];
}

function movedBy({ design }: Fit, { row, dfbetas }: InfluentialRow, rowName: (row: number) => string): string[] {
  const moved = design.terms
    .map(({ name, meaning }, j) => ({
      what: meaning.kind === "constant" ? "the constant" : `the coefficient of ${name}`,
      by: Math.abs(dfbetas[j]!),
    }))
    .filter(({ by }) => by > oneStandardError)
    .sort((one, other) => other.by - one.by);
  if (moved.length === 0) return [];
  const changes = namesInWords(moved.map(({ what, by }) => `${what} by ${by.toFixed(1)}`));
  return [`Leaving out ${rowName(row)} changes ${changes} standard errors.`];
}

function outliers(rows: readonly InfluentialRow[], rowName: (row: number) => string): string[] {
  return rows
    .filter(({ outlierPValue }) => outlierPValue < outlierLevel)
    .slice(0, mostRows)
    .map(
      ({ row, outside }) =>
        `${rowName(row)} lies ${Math.abs(outside).toFixed(1)} standard deviations off the fit of the other rows.`,
    );
}
