import type { Fit } from "../fit/fit.ts";
import type { Basis } from "../numeric/basis.ts";

/** The orthonormal basis Q = X R^-1 of the fit's terms, in which all meats are formed. */
export const basisOf = ({ design, triangle }: Fit): Basis => ({
  columns: design.terms.map(({ values }) => values),
  triangle,
});
