import type {
  Arena,
  Factors,
  InnerProduct,
  Kernels,
  LeftAndRight,
  Multiple,
  Rotation,
  RowSums,
  TriangleAndBlock,
} from "./kernels.ts";

/** The kernels in plain JavaScript, for machines without vectors and to check the others by. */
export function scalarArena(): Arena {
  let values = new Float64Array(0);
  const numbers = (length: number): Float64Array => {
    if (values.length < length) values = new Float64Array(length);
    return values;
  };
  return { numbers, kernels: scalarKernels(() => values) };
}

const scalarKernels = (arena: () => Float64Array): Kernels => ({
  reflectRows: (at) => {
    for (let j = 0; j < at.size; j++) reflect(arena(), at, j);
  },
  substitute: (at) => substitute(arena(), at),
  addProducts: (at) => addProducts(arena(), at),
  multiply: (at) => multiply(arena(), at),
  addSquares: (at) => addSquares(arena(), at),
  rotateRows: (at) => {
    for (let i = 0; i < at.rows; i++) arena()[at.raised + i] = rotateRow(arena(), at, i) ? 1 : 0;
  },
  subtractMultiple: (at) => subtractMultiple(arena(), at),
  addInnerProduct: (at) => addInnerProduct(arena(), at),
});

/** Reflection j clears column j of the block into the triangle's diagonal and carries the later columns along. */
function reflect(values: Float64Array, { triangle, block, size, rows, stride }: TriangleAndBlock, j: number): void {
  const v = block + j * stride;
  let square = 0;
  for (let i = v; i < v + rows; i++) square += values[i]! * values[i]!;
  if (square === 0) return;
  const at = triangle + j * size + j;
  const diagonal = values[at]!;
  const norm = Math.sqrt(square + diagonal * diagonal);
  const image = diagonal > 0 ? -norm : norm;
  // The reflection's vector is (head, the block's column); head has no cancellation by the choice of sign.
  const head = diagonal - image;
  values[at] = image;
  for (let c = 1; j + c < size; c++) {
    const x = v + c * stride;
    let dot = head * values[at + c]!;
    for (let i = 0; i < rows; i++) dot += values[v + i]! * values[x + i]!;
    dot /= image * head;
    values[at + c]! += dot * head;
    for (let i = 0; i < rows; i++) values[x + i]! += dot * values[v + i]!;
  }
}

function substitute(values: Float64Array, { triangle, block, size, rows, stride }: TriangleAndBlock): void {
  for (let j = 0; j < size; j++) {
    const to = block + j * stride;
    for (let i = 0; i < j; i++) {
      const from = block + i * stride;
      const factor = values[triangle + i * size + j]!;
      for (let t = 0; t < rows; t++) values[to + t]! -= factor * values[from + t]!;
    }
    const divisor = values[triangle + j * size + j]!;
    for (let t = 0; t < rows; t++) values[to + t]! /= divisor;
  }
}

function addProducts(values: Float64Array, at: LeftAndRight): void {
  const { left, count, right, next, rows, stride, sums, nextSums } = at;
  for (let l = 0; l < count; l++) {
    const x = left + l * stride;
    let sum = 0;
    let nextSum = 0;
    for (let i = 0; i < rows; i++) {
      sum += values[x + i]! * values[right + i]!;
      nextSum += values[x + i]! * values[next + i]!;
    }
    values[sums + l]! += sum;
    if (next !== right) values[nextSums + l]! += nextSum;
  }
}

function multiply(values: Float64Array, { x, y, product, rows }: Factors): void {
  for (let i = 0; i < rows; i++) values[product + i] = values[x + i]! * values[y + i]!;
}

function addSquares(values: Float64Array, { block, size, rows, stride, sums }: RowSums): void {
  for (let j = 0; j < size; j++) {
    const x = block + j * stride;
    for (let i = 0; i < rows; i++) values[sums + i]! += values[x + i]! ** 2;
  }
}

/** Whether row i raised the rank; else its residual is left in its last place. */
function rotateRow(values: Float64Array, { triangle, floors, block, size }: Rotation, i: number): boolean {
  const width = size + 1;
  const row = block + i * width;
  for (let j = 0; j < size; j++) {
    const x = values[row + j]!;
    const above = triangle + j * width;
    const pivot = values[above + j]!;
    if (pivot === 0) {
      if (Math.abs(x) <= values[floors + j]!) continue;
      // A positive pivot keeps every cosine positive, and with them the sign of the residuals.
      for (let l = j; l < width; l++) values[above + l] = Math.sign(x) * values[row + l]!;
      return true;
    }
    if (x === 0) continue;
    const length = Math.sqrt(pivot * pivot + x * x);
    values[above + j] = length;
    for (let l = j + 1; l < width; l++) {
      const [upper, lower] = [values[above + l]!, values[row + l]!];
      values[above + l] = (pivot / length) * upper + (x / length) * lower;
      values[row + l] = (pivot / length) * lower - (x / length) * upper;
    }
  }
  return false;
}

/** 2^27 + 1 splits a double into two halves of 26 bits (Veltkamp; Dekker 1971, Numer. Math. 18, 224-242). */
const split = 134217729;

function headOf(value: number): number {
  const scaled = split * value;
  return scaled - (scaled - value);
}

/** TwoProduct and TwoSum, row by row. */
function subtractMultiple(values: Float64Array, { high, low, x, rows, factor, factorLow }: Multiple): void {
  const factorHead = headOf(factor);
  const factorTail = factor - factorHead;
  for (let i = 0; i < rows; i++) {
    const value = values[x + i]!;
    const product = value * factor;
    const head = headOf(value);
    const tail = value - head;
    const lost = head * factorHead - product + head * factorTail + tail * factorHead + tail * factorTail;
    const before = values[high + i]!;
    const after = before - product;
    const back = after - before;
    values[low + i]! += before - (after - back) - (product + back) - lost - value * factorLow;
    values[high + i] = after;
  }
}

function addInnerProduct(values: Float64Array, { sum: at, x, high, low, rows }: InnerProduct): void {
  let sum = values[at]!;
  let rest = values[at + 1]!;
  for (let i = 0; i < rows; i++) {
    const a = values[x + i]!;
    const b = values[high + i]!;
    const product = a * b;
    const aHead = headOf(a);
    const bHead = headOf(b);
    const [aTail, bTail] = [a - aHead, b - bHead];
    const lost = aHead * bHead - product + aHead * bTail + aTail * bHead + aTail * bTail;
    const after = sum + product;
    const back = after - sum;
    rest += sum - (after - back) + (product - back) + lost + a * values[low + i]!;
    sum = after;
  }
  values[at] = sum;
  values[at + 1] = rest;
}
