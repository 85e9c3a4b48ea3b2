import type { Kernel } from "./choice.ts";

/** The weight of a covariance between periods that are x bandwidths apart, x >= 0. */
const kernelWeight: Readonly<Record<Kernel, (x: number) => number>> = {
  bartlett: (x) => Math.max(0, 1 - x),
  parzen: (x) => (x <= 0.5 ? 1 - 6 * x ** 2 + 6 * x ** 3 : 2 * Math.max(0, 1 - x) ** 3),
  "quadratic spectral": (x) => {
    const z = (6 * Math.PI * x) / 5;
    // Near zero the closed form loses its digits; two terms of the series have them all.
    return z < 0.01 ? 1 - z ** 2 / 10 + z ** 4 / 280 : (3 / z ** 2) * (Math.sin(z) / z - Math.cos(z));
  },
};

/**
 * The weights of the lags 0, 1, ... under a kernel and a bandwidth, as far as they are not zero and there are periods.
 * @param bandwidth - in periods, >= 0; zero leaves the lag 0 alone.
 * @param periods - how many periods the rows span, at least 1.
 * @see Andrews (1991), Econometrica 59, 817-858, equation 2.7.
 */
export function lagWeights(kernel: Kernel, bandwidth: number, periods: number): Float64Array<ArrayBuffer> {
  const reach = kernel === "quadratic spectral" ? periods : Math.min(periods, Math.ceil(bandwidth));
  return Float64Array.from({ length: bandwidth === 0 ? 1 : Math.max(1, reach) }, (_, lag) =>
    lag === 0 ? 1 : kernelWeight[kernel](lag / bandwidth),
  );
}
