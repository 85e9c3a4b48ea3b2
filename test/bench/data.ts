import type { Question } from "../../src/core/answer/question.ts";
import { defaultOptions } from "../../src/core/answer/options.ts";
import { buildDesign } from "../../src/core/design/buildDesign.ts";
import type { Fit } from "../../src/core/fit/fit.ts";
import { fitLeastSquares } from "../../src/core/fit/fitLeastSquares.ts";
import { randomFrom } from "../support/random.ts";
import { cellKind } from "../../src/core/table/cells.ts";
import type { Column } from "../../src/core/table/source.ts";

export interface Size {
  readonly rows: number;
  readonly drivers: number;
}

/** An outcome and its drivers through time: drivers that follow on, errors with an uneven spread that follow on too. */
export function questionOf({ rows, drivers }: Size): Question {
  const random = randomFrom(20240501);
  const series = (rho: number): Float64Array<ArrayBuffer> => {
    let value = 0;
    return Float64Array.from({ length: rows }, () => (value = rho * value + random.normal()));
  };
  const columns = Array.from({ length: drivers }, (_, j) => series(j % 2 === 0 ? 0 : 0.5));
  const outcome = series(0.3).map((error, i) => {
    const explained = columns.reduce((sum, x, j) => sum + (j + 1) * x[i]!, 0);
    return 100 + explained + error * (1 + 0.2 * Math.abs(columns[0]![i]!));
  });
  const named = [outcome, ...columns].map((values, column): Column => ({
    name: column === 0 ? "Outcome" : `Driver ${column}`,
    place: { kind: "sheet", sheet: "Bench", column, firstRow: 1 },
    cells: { kinds: new Uint8Array(rows).fill(cellKind.number), numbers: values, texts: [] },
  }));
  return {
    source: { columns: named, rowCount: rows },
    model: {
      outcome: { column: "Outcome", transform: { kind: "none" } },
      drivers: named
        .slice(1)
        .map(({ name }) => ({ column: name, as: "number", base: null, transform: { kind: "none" } })),
      calendar: [],
      rows: { kind: "time", order: null },
      constant: true,
      textNumbers: [],
    },
    options: defaultOptions,
  };
}

export function fitOf(size: Size): Fit {
  const { source, model } = questionOf(size);
  const design = buildDesign(source, model);
  if (!design.ok) throw new Error(design.problem.code);
  const fitted = fitLeastSquares(design.value);
  if (!fitted.ok) throw new Error(fitted.problem.code);
  return fitted.value;
}
