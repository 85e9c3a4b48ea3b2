import { symmetricFunction } from "./smallMatrix.ts";

/** Room for the work on one matrix after another. */
export interface RootRoom {
  /** The result. */
  readonly root: Float64Array;
  readonly spare: Float64Array;
}

export const rootRoom = (most: number): RootRoom => ({
  root: new Float64Array(most * most),
  spare: new Float64Array(most * most),
});

/** Up to this trace the series is shorter than the work on eigenvalues. */
const smallTrace = 0.05;

/**
 * (I - M)^(-1/2) of a symmetric M with eigenvalues from 0 to 1, into `room.root`; zero along directions in which the
 * eigenvalue is 1. The trace bounds the largest eigenvalue; where it is small the binomial series reaches the last digit
 * after a few terms. Matrices that add up to a projection of rank k have at most k / 0.05 larger traces among them,
 * so that eigenvalues are sought for few of them however many there are.
 */
export function inverseRootOfRest(room: RootRoom, matrix: Float64Array, size: number): void {
  let trace = 0;
  for (let i = 0; i < size; i++) trace += matrix[i * size + i]!;
  if (trace > smallTrace) {
    room.root.set(symmetricFunction({ size, values: matrix.slice(0, size * size) }, rootOf).values);
    return;
  }
  let terms = 1;
  for (let power = trace * trace; power > Number.EPSILON / 16; power *= trace) terms++;
  series(room, matrix, [size, terms]);
}

/** A direction that is all M's leaves nothing. */
const rootOf = (eigenvalue: number): number => (1 - eigenvalue < 1e-10 ? 0 : 1 / Math.sqrt(1 - eigenvalue));

/** 1 + x/2 + 3/8 x^2 + ..., by Horner's rule; the factors commute, so every product is symmetric. */
function series(
  { root, spare }: RootRoom,
  matrix: Float64Array,
  [size, terms]: readonly [size: number, terms: number],
): void {
  root.fill(0, 0, size * size);
  addToDiagonal(root, binomial[terms]!, size);
  for (let term = terms - 1; term >= 0; term--) {
    spare.set(root.subarray(0, size * size));
    for (let i = 0; i < size; i++) {
      for (let j = 0; j <= i; j++) {
        let sum = 0;
        for (let m = 0; m < size; m++) sum += matrix[i * size + m]! * spare[j * size + m]!;
        root[i * size + j] = root[j * size + i] = sum;
      }
    }
    addToDiagonal(root, binomial[term]!, size);
  }
}

function addToDiagonal(matrix: Float64Array, value: number, size: number): void {
  for (let i = 0; i < size; i++) matrix[i * size + i]! += value;
}

const mostTerms = 16;

/** The coefficients of (1 - x)^(-1/2); at the largest trace taken 13 of them are used. */
const binomial = Float64Array.from({ length: mostTerms }, (_, term) => {
  let coefficient = 1;
  for (let j = 1; j <= term; j++) coefficient *= (2 * j - 1) / (2 * j);
  return coefficient;
});
