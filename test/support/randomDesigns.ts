import fc from "fast-check";
import { randomFrom, type Random } from "./random.ts";

/** A regression's plain numbers. */
export interface Numbers {
  readonly y: number[];
  readonly columns: number[][];
}

const makers: readonly ((random: Random) => (i: number) => number)[] = [
  (random) => () => random.normal(),
  (random) => () => 500 + 20 * random.normal(),
  (random) => () => Math.exp(random.normal()),
  (random) => () => (random.uniform() < 0.4 ? 1 : 0),
  (random) => (i) => i + 0.3 * random.normal(),
  (random) => followOn(random, 0.8),
];

function followOn(random: Random, rho: number): () => number {
  let value = 0;
  return () => (value = rho * value + random.normal());
}

/** Designs of every kind of column, uneven and correlated errors among them; n from 15 to 70 rows, one to four drivers. */
export const designs: fc.Arbitrary<Numbers> = fc
  .record({
    n: fc.integer({ min: 15, max: 70 }),
    kinds: fc.array(fc.nat(makers.length - 1), { minLength: 1, maxLength: 4 }),
    seed: fc.integer(),
  })
  .map(({ n, kinds, seed }) => {
    const random = randomFrom(seed);
    const rows = Array.from({ length: n }, (_, i) => i);
    const columns = kinds.map((kind) => rows.map(makers[kind]!(random)));
    const error = followOn(random, 0.5);
    const y = rows.map(
      (i) => columns.reduce((sum, x, j) => sum + (j + 1) * x[i]!, 3) + error() * (1 + Math.abs(columns[0]![i]!) / 10),
    );
    // Two rows of a dummy at the least, so that no row fits itself.
    columns.forEach((x) => {
      if (x.every((value) => value === 0 || value === 1)) [x[0], x[1], x[2], x[3]] = [0, 1, 0, 1];
    });
    return { y, columns };
  });

/** A rearrangement of 0..n-1. */
export function shuffled(n: number, seed: number): number[] {
  const random = randomFrom(seed);
  const order = Array.from({ length: n }, (_, i) => i);
  for (let i = n - 1; i > 0; i--) {
    const j = random.below(i + 1);
    [order[i], order[j]] = [order[j]!, order[i]!];
  }
  return order;
}
