/** A sum of squares below this share of the one it is part of is rounding: twelve digits of its root cancelled. */
const roundingShare = 1e-24;

/** Whether what a regression leaves of `total` is nothing but rounding. */
export const isPerfect = (residual: number, total: number): boolean => residual <= roundingShare * total;
