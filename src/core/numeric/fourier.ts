/**
 * Two-sided filters of long columns by the fast Fourier transform: out_t = sum over l of weight_|l| x_(t - l), with
 * zeros beyond the ends. The cost does not depend on how many weights there are.
 * @param columns - columns of equal length n.
 * @param weights - weight_0, weight_1, ...; at most n of them.
 * @see Cooley and Tukey (1965), Math. Comput. 19, 297-301.
 */
export function filterColumns(columns: readonly Float64Array[], weights: Float64Array): Float64Array<ArrayBuffer>[] {
  const n = columns[0]?.length ?? 0;
  const length = 2 ** Math.ceil(Math.log2(Math.max(2, n + weights.length)));
  const transform = transformOf(length);
  const gains = gainsOf(weights, transform);
  const filtered: Float64Array<ArrayBuffer>[] = [];
  // Two real columns at a time, as the real and the imaginary part: the gains are real.
  for (let j = 0; j < columns.length; j += 2) {
    const real = padded(columns[j]!, length);
    const imaginary = padded(columns[j + 1] ?? new Float64Array(0), length);
    transform.apply(real, imaginary);
    multiplyBoth(real, imaginary, gains);
    // With the parts exchanged the same transform runs backwards.
    transform.apply(imaginary, real);
    filtered.push(real.slice(0, n));
    if (j + 1 < columns.length) filtered.push(imaginary.slice(0, n));
  }
  return filtered;
}

function padded(values: Float64Array, length: number): Float64Array<ArrayBuffer> {
  const longer = new Float64Array(length);
  longer.set(values);
  return longer;
}

/** The filter at each frequency, divided by the length for the way back. */
function gainsOf(weights: Float64Array, { length, apply }: Transform): Float64Array {
  const real = new Float64Array(length);
  weights.forEach((weight, lag) => {
    real[lag] = weight / length;
    real[(length - lag) % length] = weight / length;
  });
  apply(real, new Float64Array(length));
  return real;
}

function multiplyBoth(real: Float64Array, imaginary: Float64Array, gains: Float64Array): void {
  for (let i = 0; i < gains.length; i++) {
    real[i]! *= gains[i]!;
    imaginary[i]! *= gains[i]!;
  }
}

interface Transform {
  readonly length: number;
  readonly apply: (real: Float64Array, imaginary: Float64Array) => void;
}

/** The transform of one length, a power of two; cosines and sines are computed once. */
function transformOf(length: number): Transform {
  const half = length / 2;
  const cosines = Float64Array.from({ length: half }, (_, i) => Math.cos((2 * Math.PI * i) / length));
  const sines = Float64Array.from({ length: half }, (_, i) => Math.sin((2 * Math.PI * i) / length));
  const apply = (real: Float64Array, imaginary: Float64Array): void => {
    reverseBits(real, imaginary);
    for (let span = 1; span < length; span *= 2) butterflies({ real, imaginary }, { cosines, sines }, span);
  };
  return { length, apply };
}

function reverseBits(real: Float64Array, imaginary: Float64Array): void {
  const length = real.length;
  for (let i = 1, j = 0; i < length; i++) {
    let bit = length >> 1;
    for (; j & bit; bit >>= 1) j ^= bit;
    j ^= bit;
    if (i >= j) continue;
    [real[i], real[j]] = [real[j]!, real[i]!];
    [imaginary[i], imaginary[j]] = [imaginary[j]!, imaginary[i]!];
  }
}

interface Complex {
  readonly real: Float64Array;
  readonly imaginary: Float64Array;
}

function butterflies(
  { real, imaginary }: Complex,
  { cosines, sines }: { cosines: Float64Array; sines: Float64Array },
  span: number,
): void {
  const step = real.length / (2 * span);
  for (let start = 0; start < real.length; start += 2 * span) {
    for (let i = 0; i < span; i++) {
      const c = cosines[i * step]!;
      const s = sines[i * step]!;
      const upper = start + i;
      const lower = upper + span;
      const x = real[lower]! * c + imaginary[lower]! * s;
      const y = imaginary[lower]! * c - real[lower]! * s;
      real[lower] = real[upper]! - x;
      imaginary[lower] = imaginary[upper]! - y;
      real[upper]! += x;
      imaginary[upper]! += y;
    }
  }
}
