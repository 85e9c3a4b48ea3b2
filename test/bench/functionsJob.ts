import { functionTable } from "../../src/functions/functionTable.ts";
import { registerFunctions } from "../../src/functions/register.ts";
import { inlineAnalyst } from "../../src/worker/inlineAnalyst.ts";
import { functionsRuntime } from "../support/functionsRuntime.ts";
import { type Size, questionOf } from "./data.ts";

const calls = 200;
/** The functions over data that need nothing else. */
const overData = functionTable.filter(
  ({ parameters: [outcome, , ...others] }) => outcome?.name === "outcome" && others.every(({ optional }) => optional),
);

/** A sheet with many formulas over one block: each run edits one cell, and all of them are calculated again. */
export function functionsJob(size: Size): () => Promise<void> {
  const { functions, runtime } = functionsRuntime();
  registerFunctions(runtime, inlineAnalyst);
  const { source } = questionOf(size);
  const [outcome, ...drivers] = source.columns.map(({ cells }) => [...cells.numbers]);
  const block = outcome!.map((_, row) => drivers.map((column) => column[row]!));
  let edits = 0;
  return async () => {
    edits++;
    outcome![edits % size.rows]! += 1;
    const results = await Promise.all(
      Array.from({ length: calls }, (_, index) => {
        const { id, parameters } = overData[index % overData.length]!;
        // Excel hands every call its own copy of the cells, null for what was left out, and the invocation last.
        const cells = [outcome!.map((value) => [value]), block.map((row) => [...row])];
        const leftOut = Array<null>(parameters.length - cells.length).fill(null);
        return functions.get(id)!(...cells, ...leftOut, {});
      }),
    );
    if (results.some((rows) => rows.length === 0)) throw new Error("A function gave nothing.");
  };
}
