import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { SheetPlan } from "../../src/sheet/plan.ts";
import { isAsWritten, isEmptyValue, writtenBlocks } from "../../src/sheet/written.ts";

const plan: SheetPlan = {
  name: "Answer",
  blocks: [
    {
      row: 2,
      column: 1,
      cells: [
        [{ kind: "text", text: "Price" }, { kind: "number", number: 0.1 + 0.2 }, null],
        [{ kind: "number", number: -0 }, null],
      ],
    },
  ],
  formats: [],
  links: [{ row: 3, column: 2, text: "Months!C14", target: "Months!C14" }],
  columnWidths: [],
  frozenRows: 0,
  charts: [],
  printArea: null,
};
const blocks = writtenBlocks(plan);
const stands = (row: number, column: number, value: unknown): boolean => isAsWritten(blocks, { row, column }, value);

describe("what Footing wrote into cells", () => {
  it("is known again, a number to the 15 digits that a spreadsheet keeps, a link by its text", () => {
    expect(stands(2, 1, "Price")).toBe(true);
    expect(stands(2, 2, 0.3)).toBe(true);
    expect(stands(3, 1, 0)).toBe(true);
    expect(stands(3, 2, "Months!C14")).toBe(true);
  });

  it("is told from what stands there now, or elsewhere", () => {
    expect(stands(2, 1, "price")).toBe(false);
    expect(stands(2, 2, "0.3")).toBe(false);
    expect(stands(2, 2, 0.300000000000001)).toBe(false);
    expect(stands(2, 3, "note")).toBe(false);
    for (const [row, column] of [
      [1, 1],
      [2, 0],
      [2, 4],
      [4, 1],
    ] as const)
      expect(stands(row, column, "Price")).toBe(false);
  });

  it("leaves empty cells to whoever takes them", () => {
    expect(["", null, 0, "0", false].map(isEmptyValue)).toEqual([true, true, false, false, false]);
  });

  it("tells different texts apart", () => {
    const marks = (text: string) => {
      const cells = [[{ kind: "text", text } as const]];
      return writtenBlocks({ ...plan, links: [], blocks: [{ row: 0, column: 0, cells }] })[0]!.marks;
    };
    const pair = fc.tuple(fc.string({ minLength: 1 }), fc.string({ minLength: 1 })).filter(([a, b]) => a !== b);
    fc.assert(
      fc.property(pair, ([a, b]) => marks(a) !== marks(b)),
      { seed: 20_261_201, numRuns: 500 },
    );
  });
});
