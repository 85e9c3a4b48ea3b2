import { covarianceOf } from "../../../src/core/covariance/covarianceOf.ts";
import type { Fit } from "../../../src/core/fit/fit.ts";
import { inferenceOf } from "../../../src/core/inference/inferenceOf.ts";
import { designOf, fitOf } from "../../support/referenceFit.ts";
import { type Ranges, type Worksheet, numberIn } from "./worksheet.ts";

/** What a spreadsheet had calculated of some ranges when it stored the workbook. */
export interface Calculated {
  /** The rows that were used: the outcome, then the drivers. */
  readonly rows: readonly (readonly number[])[];
  readonly fit: Fit;
  readonly standardErrors: readonly number[];
  readonly pValues: readonly number[];
}

export interface Calculation {
  readonly ranges: Ranges;
  /** Columns of the sheet, or 1, 2, 3 and so on. */
  readonly drivers: readonly number[] | "positions";
  readonly constant: boolean;
  /** What becomes of rows in which not every cell is a number: LINEST ends in an error, SLOPE passes them over. */
  readonly otherCells: "error" | "passed over";
}

/** Null where the function ends in an error. */
export function calculated(
  sheet: Worksheet,
  { ranges, drivers, constant, otherCells }: Calculation,
): Calculated | null {
  const { outcome, drivers: beside } = ranges;
  if (outcome.to - outcome.from !== beside.to - beside.from) return null;
  const all = Array.from({ length: outcome.to - outcome.from }, (_, index) => [
    numberIn(sheet.rows[outcome.from + index]?.[1]),
    ...(drivers === "positions"
      ? [index + 1]
      : drivers.map((column) => numberIn(sheet.rows[beside.from + index]?.[column]))),
  ]);
  const rows = all.filter((row): row is number[] => row.every((one) => one !== null));
  if (rows.length < all.length && otherCells === "error") return null;
  const columns = (rows[0] ?? []).slice(1).map((_, j) => rows.map((row) => row[j + 1]!));
  const fit = fitOf(
    designOf(
      rows.map(([y]) => y!),
      columns,
      { constant },
    ),
  );
  const covariance = covarianceOf(fit, { kind: "classical" });
  if (!covariance.ok) throw new Error(covariance.problem.code);
  const settings = {
    reference: { law: "t", degreesOfFreedom: fit.degreesOfFreedom },
    against: Array.from(fit.coefficients, () => 0),
    level: 0.05,
  } as const;
  const { standardErrors, pValue } = inferenceOf(fit, covariance.value, settings);
  return { rows, fit, standardErrors, pValues: pValue };
}
