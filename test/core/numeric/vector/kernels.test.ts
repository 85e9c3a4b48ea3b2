import { afterEach, describe, expect, it, vi } from "vitest";
import { compiledKernels } from "../../../../.config/vectorKernels.ts";
import { randomFrom } from "../../../support/random.ts";
import { arena } from "../../../../src/core/numeric/vector/arena.ts";
import type { Arena, Kernels } from "../../../../src/core/numeric/vector/kernels.ts";
import { place } from "../../../../src/core/numeric/vector/place.ts";
import { scalarArena } from "../../../../src/core/numeric/vector/scalar.ts";
import { vectorModule } from "../../../../src/core/numeric/vector/vectorModule.ts";
import { vectorArena } from "../../../../src/core/numeric/vector/webAssembly.ts";

const random = randomFrom(13);
const column = (n: number): Float64Array => Float64Array.from({ length: n }, () => random.normal());

/** Runs a kernel on both arenas from the same numbers and gives what stands in them after. */
function both(start: Float64Array, run: (kernels: Kernels) => void): [Float64Array, Float64Array] {
  const after = (on: Arena): Float64Array => {
    const values = on.numbers(start.length);
    values.set(start);
    run(on.kernels);
    return values.slice(0, start.length);
  };
  return [after(vectorArena()!), after(scalarArena())];
}

/** Sums of up to some hundred terms of the size of one, rounded in another order. */
function expectTwins([vector, scalar]: [Float64Array, Float64Array], tolerance = 1e-12): void {
  const worst = scalar.reduce(
    (most, value, i) => Math.max(most, Math.abs(vector[i]! - value) / (1 + Math.abs(value))),
    0,
  );
  expect(worst).toBeLessThan(tolerance);
  expect(scalar.every(Number.isFinite)).toBe(true);
}

/** Columns of `rows` numbers a stride apart, each with its zero where `rows` is odd. */
function block(columns: number, rows: number, stride: number): Float64Array {
  const values = new Float64Array(columns * stride);
  for (let j = 0; j < columns; j++) place(column(rows), values, j * stride);
  return values;
}

const joined = (...parts: Float64Array[]): Float64Array => Float64Array.from(parts.flatMap((part) => [...part]));

const shapes = [
  { size: 1, rows: 1 },
  { size: 3, rows: 7 },
  { size: 6, rows: 12 },
  { size: 9, rows: 63 },
];

describe.each(shapes)("kernels on $rows rows of $size columns", ({ size, rows }) => {
  const stride = 64;
  const triangle = column(size * size + (size % 2)).map((value, index) =>
    index % size < Math.floor(index / size) ? 0 : value + 3,
  );
  const at = { triangle: 0, block: triangle.length, size, rows, stride };

  it("reflect rows into the triangle alike", () => {
    const results = both(joined(triangle, block(size, rows, stride)), (kernels) => kernels.reflectRows(at));
    expectTwins(results.map((values) => values.subarray(0, triangle.length)) as [Float64Array, Float64Array]);
    expect(results[0].subarray(0, size)).not.toEqual(triangle.subarray(0, size));
  });

  it("start from a triangle of zeros", () => {
    const zeros = new Float64Array(triangle.length);
    const results = both(joined(zeros, block(size, rows, stride)), (kernels) => kernels.reflectRows(at));
    const [length] = results.map((values) => Math.abs(values[0]!));
    expect(length).toBeGreaterThan(0);
    expectTwins(results.map((values) => values.subarray(0, size)) as [Float64Array, Float64Array]);
  });

  it("substitute alike", () => {
    expectTwins(both(joined(triangle, block(size, rows, stride)), (kernels) => kernels.substitute(at)));
  });

  it("add products alike, for an odd and an even number on the left and one or two on the right", () => {
    const sums = size * stride;
    const start = joined(block(size, rows, stride), column(2 * size));
    for (const count of [size, Math.max(1, size - 1)]) {
      for (const next of [0, (size - 1) * stride]) {
        const where = { left: 0, count, right: 0, next, rows, stride, sums, nextSums: sums + size };
        const results = both(start, (kernels) => kernels.addProducts(where));
        expectTwins(results);
        // What was not asked for stays as it was.
        expect(results[0][sums + size]).toBe(next === 0 ? start[sums + size] : results[0][sums + size]);
        expect([...results[0].subarray(sums + count, sums + size)]).toEqual([
          ...start.subarray(sums + count, sums + size),
        ]);
      }
    }
  });

  it("multiply alike", () => {
    const start = block(size + 1, rows, stride);
    expectTwins(
      both(start, (kernels) => kernels.multiply({ x: 0, y: (size - 1) * stride, product: size * stride, rows })),
      1e-300,
    );
  });

  it("add squares alike", () => {
    const start = joined(block(size, rows, stride), column(rows + (rows % 2)));
    const results = both(start, (kernels) => kernels.addSquares({ block: 0, size, rows, stride, sums: size * stride }));
    expectTwins(results);
    expect(results[1][size * stride]).toBeGreaterThan(start[size * stride]!);
  });

  it("rotate rows alike, a direction that comes late and one that never comes among them", () => {
    const width = size + 1;
    const [triangleAt, floors] = [0, size * width];
    const at = { triangle: triangleAt, floors, block: floors + size, size, rows, raised: floors + size + rows * width };
    const numbers = Array.from({ length: rows * width }, (_, index) => {
      const [i, j] = [Math.floor(index / width), index % width];
      if (j === 1 && i < rows / 2) return 0;
      return j === 2 && size > 2 ? 0 : random.normal();
    });
    const start = joined(
      new Float64Array(floors),
      new Float64Array(size).fill(1e-11),
      Float64Array.from(numbers),
      column(rows),
    );
    const results = both(start, (kernels) => kernels.rotateRows(at));
    expectTwins(results);
    const raised = results[0].subarray(at.raised, at.raised + rows).reduce((sum, value) => sum + value, 0);
    expect(raised).toBe(Math.min(rows, size > 2 ? size - 1 : size));
  });

  it("carry two words alike, to the last digits of the low one", () => {
    const start = joined(block(1, rows, stride), new Float64Array(stride), block(1, rows, stride), new Float64Array(2));
    const [high, low, x, sum] = [0, stride, 2 * stride, 3 * stride];
    const steps = (kernels: Kernels): void => {
      kernels.subtractMultiple({ high, low, x, rows, factor: Math.PI, factorLow: 1.2e-16 });
      kernels.subtractMultiple({ high, low, x, rows, factor: -1 / 3, factorLow: -2e-17 });
      kernels.addInnerProduct({ sum, x, high, low, rows });
    };
    const [vector, scalar] = both(start, steps);
    expect(vector.subarray(0, sum)).toEqual(scalar.subarray(0, sum));
    // Both sums are right to some thirty digits: their differences are seen in the low words.
    const difference = vector[sum]! - scalar[sum]! + (vector[sum + 1]! - scalar[sum + 1]!);
    expect(Math.abs(difference)).toBeLessThan(1e-28 * rows);
    expect(Math.abs(scalar[sum + 1]!)).toBeGreaterThan(0);
  });
});

describe("the module", () => {
  it("is what the source compiles to", async () => {
    expect(vectorModule).toBe(await compiledKernels());
  });

  it("is in use here", () => {
    expect(vectorArena()).not.toBeNull();
  });

  it("grows its memory without losing what it is given next", () => {
    const own = vectorArena()!;
    own.numbers(10).set([1, 2, 3, 4]);
    const more = own.numbers(200_000);
    expect(more.length).toBeGreaterThanOrEqual(200_000);
    more.set([5, 6], 199_990);
    own.kernels.multiply({ x: 199_990, y: 0, product: 199_992, rows: 2 });
    expect([...more.subarray(199_992, 199_994)]).toEqual([5, 12]);
    expect(own.numbers(5)).toBe(more);
  });
});

describe("machines without it", () => {
  afterEach(() => vi.unstubAllGlobals());

  it("have no WebAssembly", () => {
    vi.stubGlobal("WebAssembly", undefined);
    expect(vectorArena()).toBeNull();
  });

  it("do not know its vectors", () => {
    vi.stubGlobal("WebAssembly", { ...WebAssembly, validate: () => false });
    expect(vectorArena()).toBeNull();
  });

  it("forbid it by a content security policy", () => {
    const refused = vi.fn(() => {
      throw new Error("Refused to compile");
    });
    vi.stubGlobal("WebAssembly", { validate: () => true, Memory: WebAssembly.Memory, Module: refused });
    expect(vectorArena()).toBeNull();
  });

  it("work on the twin, whose array grows too", () => {
    const own = scalarArena();
    expect(own.numbers(4).length).toBe(4);
    const more = own.numbers(9);
    more.set([2, 3, 0, 0, 7, 5]);
    own.kernels.multiply({ x: 0, y: 4, product: 6, rows: 2 });
    expect([...more.subarray(6, 8)]).toEqual([14, 15]);
    expect(arena.numbers(1).length).toBeGreaterThan(0);
  });
});
