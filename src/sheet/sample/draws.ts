/** A stream of invented numbers, the same for the same seed. */
export interface Draws {
  /** From 0 to 1. */
  readonly uniform: () => number;
  /** Standard normal. */
  readonly normal: () => number;
}

/**
 * A counter put through two rounds of mixing: good enough for figures that only have to look like a firm's.
 * @param seed - any whole number.
 */
export function drawsFrom(seed: number): Draws {
  let state = seed >>> 0;
  const uniform = (): number => {
    state = (state + 0x6d2b79f5) >>> 0;
    const once = Math.imul(state ^ (state >>> 15), state | 1);
    const twice = once ^ (once + Math.imul(once ^ (once >>> 7), once | 61));
    return ((twice ^ (twice >>> 14)) >>> 0) / 2 ** 32;
  };
  /** Box and Muller (1958), Ann. Math. Statist. 29, 610-611. */
  const normal = (): number => Math.sqrt(-2 * Math.log(1 - uniform())) * Math.cos(2 * Math.PI * uniform());
  return { uniform, normal };
}

/** A series in which a share of each value carries over into the next, with variance 1. */
export function carriedOver(draws: Draws, length: number, share: number): readonly number[] {
  const fresh = Math.sqrt(1 - share ** 2);
  const series: number[] = [];
  for (let t = 0; t < length; t++) {
    const before = series[t - 1];
    series.push(before === undefined ? draws.normal() : share * before + fresh * draws.normal());
  }
  return series;
}

export function roundTo(value: number, digits: number): number {
  const factor = 10 ** digits;
  return Math.round(value * factor) / factor;
}
