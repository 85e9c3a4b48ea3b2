import type { Fit } from "../fit/fit.ts";

/**
 * What one kind of pass over the rows found for a fit, by key. A fit never changes, so neither does what follows from
 * it, and the answer, its firmness and the tests ask for the same passes. It is kept as long as the fit is.
 */
export interface Memory<T> {
  readonly find: (fit: Fit, key: string) => T | null;
  readonly keep: (fit: Fit, key: string, found: T) => T;
}

export function memory<T>(): Memory<T> {
  const known = new WeakMap<Fit, Map<string, T>>();
  return {
    find: (fit, key) => known.get(fit)?.get(key) ?? null,
    keep: (fit, key, found) => {
      known.set(fit, (known.get(fit) ?? new Map<string, T>()).set(key, found));
      return found;
    },
  };
}
