import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { leave } from "../../src/functions/leave.ts";
import { functionsRuntime, throughExcel } from "../support/functionsRuntime.ts";

const { runtime } = functionsRuntime();
const through = (rows: readonly (readonly unknown[])[]) => throughExcel(leave(runtime, rows));

describe("the way out to the cells", () => {
  it("keeps numbers and texts to the last bit", () => {
    expect(through([["Price", 0.1 + 0.2, -1e-300, 0]])).toEqual([["Price", 0.1 + 0.2, -1e-300, 0]]);
  });

  it("lets nothing out that Excel would show as a zero", () => {
    const noNumber = { error: "#NUM!", message: "" };
    expect(through([[NaN, Infinity, -Infinity]])).toEqual([[noNumber, noNumber, noNumber]]);
    expect(through([[null, undefined, true, {}]])).toEqual([["", "", "", ""]]);
    expect(Object.is(leave(runtime, [[-0]])[0]?.[0], 0)).toBe(true);
  });

  it("makes rows equally long and never leaves without a cell", () => {
    expect(through([["a"], ["b", 2, 3], []])).toEqual([
      ["a", "", ""],
      ["b", 2, 3],
      ["", "", ""],
    ]);
    expect(through([])).toEqual([[""]]);
    expect(through([[]])).toEqual([[""]]);
  });

  it("sends errors as errors, and texts that look like errors as texts", () => {
    const error = new runtime.Error(runtime.ErrorCode.notAvailable, "why");
    expect(through([[error, "#N/A", " #value! ", "#Orders", "# 1"]])).toEqual([
      [{ error: "#N/A", message: "why" }, '"#N/A"', '"#value!"', "#Orders", "# 1"],
    ]);
  });

  it("cuts texts that Excel would refuse", () => {
    expect((through([["x".repeat(40_000)]])[0]?.[0] as string).length).toBe(32_767);
  });

  it("keeps its rules for any rows at all", () => {
    fc.assert(
      fc.property(fc.array(fc.array(fc.anything(), { maxLength: 5 }), { maxLength: 6 }), (rows) => {
        const left = leave(runtime, rows);
        expect(new Set(left.map(({ length }) => length)).size).toBe(1);
        for (const cell of left.flat()) {
          if (typeof cell === "number") expect(Number.isFinite(cell) && !Object.is(cell, -0)).toBe(true);
          else if (typeof cell === "string") expect(cell).not.toMatch(/^\s*#(N\/A|[A-Z0-9/]+[!?])\s*$/i);
          else expect(cell).toBeInstanceOf(runtime.Error);
        }
      }),
      { seed: 20261203, numRuns: 1000 },
    );
  });
});
