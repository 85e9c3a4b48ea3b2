import type { Quantity } from "./claim.ts";

/** What a reported number is called: "coefficient of Price index", "R-squared". */
export function quantityInWords(quantity: Quantity, drivers: readonly string[]): string {
  switch (quantity.kind) {
    case "coefficient":
    case "standard-error":
    case "ratio":
    case "p-value":
    case "low":
    case "high":
      return ofTerm(quantity.kind, quantity.term === null ? null : (drivers[quantity.term] ?? ""));
    case "prediction":
      return quantity.at.length === 0 ? "prediction" : `prediction at ${quantity.at.join(", ")}`;
    default:
      return ofWhole[quantity.kind];
  }
}

type OfTerm = Extract<Quantity, { readonly term: number | null }>["kind"];
type OfWhole = Exclude<Quantity["kind"], OfTerm | "prediction">;

const termWords: Readonly<Record<OfTerm, string>> = {
  coefficient: "coefficient",
  "standard-error": "standard error",
  ratio: "ratio",
  "p-value": "p-value",
  low: "lower bound",
  high: "upper bound",
};

function ofTerm(kind: OfTerm, driver: string | null): string {
  if (driver !== null) return `${termWords[kind]} of ${driver}`;
  return kind === "coefficient" ? "constant" : `${termWords[kind]} of the constant`;
}

const ofWhole: Readonly<Record<OfWhole, string>> = {
  "r-squared": "R-squared",
  "adjusted-r-squared": "adjusted R-squared",
  correlation: "correlation",
  sigma: "standard error of the regression",
  f: "F statistic",
  "f-p-value": "p-value of the F statistic",
  "degrees-of-freedom": "degrees of freedom",
  observations: "observations",
  "explained-sum-of-squares": "explained sum of squares",
  "residual-sum-of-squares": "residual sum of squares",
};
