/**
 * Seeded random numbers: the same seed gives the same draws on every machine. The generator is xoshiro128** of
 * Blackman and Vigna (2021, ACM Trans. Math. Software 47, article 36), seeded by splitmix32.
 */
export interface Random {
  /** Uniform on the open interval (0, 1), 53 bits. */
  readonly uniform: () => number;
  /** Standard normal, by the polar method of Marsaglia and Bray (1964, SIAM Review 6, 260-264). */
  readonly normal: () => number;
  /** A whole number from 0 to count - 1, each equally likely. */
  readonly below: (count: number) => number;
}

export function randomFrom(seed: number): Random {
  const next = generator(seed);
  const uniform = (): number => ((next() >>> 5) * 67108864 + (next() >>> 6) + 0.5) / 9007199254740992;
  return { uniform, normal: normalFrom(uniform), below: (count) => Math.floor(uniform() * count) };
}

function generator(seed: number): () => number {
  const state = seedState(seed);
  return () => {
    const result = Math.imul(rotate(Math.imul(state[1]!, 5), 7), 9);
    const shifted = state[1]! << 9;
    state[2]! ^= state[0]!;
    state[3]! ^= state[1]!;
    state[1]! ^= state[2]!;
    state[0]! ^= state[3]!;
    state[2]! ^= shifted;
    state[3] = rotate(state[3]!, 11);
    return result;
  };
}

const rotate = (value: number, bits: number): number => (value << bits) | (value >>> (32 - bits));

function seedState(seed: number): Int32Array {
  let counter = seed | 0;
  return Int32Array.from({ length: 4 }, () => {
    counter = (counter + 0x9e3779b9) | 0;
    const first = Math.imul(counter ^ (counter >>> 16), 0x21f0aaad);
    const second = Math.imul(first ^ (first >>> 15), 0x735a2d97);
    return second ^ (second >>> 15);
  });
}

function normalFrom(uniform: () => number): () => number {
  let spare: number | null = null;
  return () => {
    if (spare !== null) {
      const value = spare;
      spare = null;
      return value;
    }
    for (;;) {
      const x = 2 * uniform() - 1;
      const y = 2 * uniform() - 1;
      const square = x * x + y * y;
      if (square >= 1 || square === 0) continue;
      const factor = Math.sqrt((-2 * Math.log(square)) / square);
      spare = y * factor;
      return x * factor;
    }
  };
}
