import { registerFunctions } from "../../src/functions/register.ts";
import { inlineAnalyst } from "../../src/worker/inlineAnalyst.ts";
import { functionsRuntime } from "../support/functionsRuntime.ts";
import { type Size, questionOf } from "./data.ts";

/** The rows of a sheet in Excel. */
const wholeColumn = 1_048_576;

/** One function over whole columns, most of them blank, as a version of Excel hands blanks over: null, or zero. */
export const wholeColumnsJob =
  (blank: null | 0) =>
  (size: Size): (() => Promise<void>) => {
    const { functions, runtime } = functionsRuntime();
    registerFunctions(runtime, inlineAnalyst);
    const [outcome, ...drivers] = questionOf(size).source.columns.map(({ name, cells }) => [name, ...cells.numbers]);
    const rowOf = (columns: readonly (readonly (string | number)[])[], row: number): unknown[] =>
      columns.map((column) => column[row] ?? blank);
    const [outcomeCells, driverCells] = [[outcome!], drivers].map((columns) =>
      Array.from({ length: wholeColumn }, (_, row) => rowOf(columns, row)),
    );
    let calls = 0;
    return async () => {
      calls++;
      // Other arrays with other content: nothing that is kept of an earlier call can answer this one.
      const cells = [outcomeCells!.with(calls, [calls]), [...driverCells!]];
      const result = await functions.get("COEFFICIENTS")!(...cells, null, null, {});
      if (result.length !== size.drivers + 1) throw new Error("The function gave something else.");
    };
  };
