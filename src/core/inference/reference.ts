/** The law that the ratio of a coefficient to its standard error is compared with. */
export type Reference =
  | { readonly law: "t"; readonly degreesOfFreedom: number }
  | { readonly law: "normal" }
  /** Kiefer and Vogelsang (2005), Bartlett kernel, b = (L + 1) / n, times t(n - k) / normal. */
  | { readonly law: "fixed-b"; readonly b: number; readonly degreesOfFreedom: number };
