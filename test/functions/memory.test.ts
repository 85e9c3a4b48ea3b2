import { setFlagsFromString } from "node:v8";
import { runInNewContext } from "node:vm";
import { describe, expect, it } from "vitest";
import { registerFunctions } from "../../src/functions/register.ts";
import { success } from "../../src/core/problem/result.ts";
import { answerOverCases } from "../support/answersOfMonths.ts";
import { functionsRuntime } from "../support/functionsRuntime.ts";

setFlagsFromString("--expose_gc");
const collectGarbage = runInNewContext("gc") as () => void;

/** What is no longer needed goes in the rounds after the one in which it was last used. */
async function rest(): Promise<void> {
  for (let round = 0; round < 4; round++) {
    await new Promise((resolve) => setTimeout(resolve, 0));
    collectGarbage();
  }
}

const column = (heading: string, start: number): unknown[][] => [
  [heading],
  ...Array.from({ length: 50 }, (_, row) => [start + ((row * 7) % 11)]),
];

describe("cells that functions were called over", () => {
  it("are let go when the call is over, although the runtime keeps every invocation for ever", async () => {
    const { runtime, functions } = functionsRuntime();
    let asked = 0;
    registerFunctions(runtime, {
      analyse: () => {
        asked += 1;
        return Promise.resolve(success(answerOverCases));
      },
      inquire: () => Promise.reject(new Error("not asked for")),
    });
    const kept: object[] = [];
    const cells: WeakRef<object>[] = [];
    const callOver = async (start: number): Promise<void> => {
      const [outcome, drivers, invocation] = [column("y", start), column("x", start), {}];
      kept.push(invocation);
      cells.push(new WeakRef(outcome), new WeakRef(drivers));
      await functions.get("COEFFICIENTS")!(outcome, drivers, null, null, invocation);
    };
    for (let edit = 0; edit < 10; edit++) await callOver(edit);
    await rest();
    expect(asked).toBe(10);
    expect(kept).toHaveLength(10);
    expect(cells.filter((cell) => cell.deref() !== undefined)).toEqual([]);
  });

  it("are read once where one array serves many calls, and anew where they are other arrays", async () => {
    const { runtime, functions } = functionsRuntime();
    registerFunctions(runtime, {
      analyse: () => Promise.resolve(success(answerOverCases)),
      inquire: () => Promise.reject(new Error("not asked for")),
    });
    let reads = 0;
    const counted = (rows: unknown[][]): unknown[][] =>
      new Proxy(rows, {
        get: (target, key) => {
          if (key === "7") reads += 1;
          return Reflect.get(target, key) as unknown;
        },
      });
    const [outcome, drivers] = [counted(column("y", 1)), column("x", 1)];
    const call = (y: unknown[][], x: unknown[][]) => functions.get("CHOICE")!(y, x, null, null, {});
    await call(outcome, drivers);
    const once = reads;
    expect(once).toBeGreaterThan(0);
    await call(outcome, drivers);
    expect(reads).toBe(once);
    await call(outcome, column("x", 2));
    expect(reads).toBeGreaterThan(once);
  });
});
