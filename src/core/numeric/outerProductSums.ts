import { basisBlockRows } from "./basis.ts";
import { addCrossProducts } from "./crossProducts.ts";
import type { SquareMatrix } from "./matrix.ts";

/** sum of x x' over many vectors x, for several sequences of vectors at once; vectors are gathered into blocks. */
export interface OuterProductSums {
  /** @param vectors - the next vector of each sequence, one after another. */
  readonly add: (vectors: Float64Array) => void;
  readonly sums: () => SquareMatrix[];
}

/** @param size - how long each vector is. */
export function outerProductSums(sequences: number, size: number): OuterProductSums {
  const blocks = Array.from({ length: sequences }, () => new Float64Array(size * basisBlockRows));
  const sums = Array.from({ length: sequences }, () => new Float64Array(size * size));
  let rows = 0;
  const empty = (): void => {
    blocks.forEach((values, l) => {
      addCrossProducts(sums[l]!, { values, rows, size });
    });
    rows = 0;
  };
  return {
    add: (vectors) => {
      for (let l = 0; l < sequences; l++) {
        const block = blocks[l]!;
        for (let j = 0; j < size; j++) block[j * basisBlockRows + rows] = vectors[l * size + j]!;
      }
      rows++;
      if (rows === basisBlockRows) empty();
    },
    sums: () => {
      empty();
      return sums.map((values) => ({ size, values }));
    },
  };
}
