import { criticalValue, pValueOf } from "../../inference/ratioLaw.ts";
import type { Claim, ReportedNumber } from "../claim.ts";
import { agrees } from "./agreement.ts";
import type { ErrorKind, NamedLaw } from "./errorKinds.ts";
import { type ErrorQuantity, placeOf } from "./quantities.ts";
import type { ModelRecipe } from "./recipe.ts";

/** A reported number that rests on standard errors. */
export type ReportedError = ReportedNumber & { readonly quantity: ErrorQuantity };

/** How the figures that rest on standard errors are made: which kind, which law, which confidence of the bounds. */
export interface ErrorsUsed {
  readonly kind: ErrorKind;
  readonly law: NamedLaw;
  /** Two-sided level of the bounds. */
  readonly level: number;
}

export interface Fitted {
  readonly coefficients: ArrayLike<number>;
  readonly model: ModelRecipe;
}

/** What is tried where a report does not say which level its bounds have, the usual one first. */
const usualLevels = [0.05, 0.1, 0.01] as const;

/** The levels that the bounds of a report can have. */
export const levelsOf = ({ level }: Pick<Claim, "level">): readonly number[] =>
  level === undefined ? usualLevels : [level];

/** The figures under one kind; null where the regression has no such term. */
export function errorValue(
  { kind: what, term }: ErrorQuantity,
  { coefficients, model }: Fitted,
  { kind, law, level }: ErrorsUsed,
): number | null {
  const place = placeOf(term, model);
  if (place === null) return null;
  const [coefficient, error] = [coefficients[place]!, kind.standardErrors[place]!];
  if (!(error > 0)) return null;
  const reference = law.references[place]!;
  const reach = (): number => criticalValue(level, reference) * error;
  switch (what) {
    case "standard-error":
      return error;
    case "ratio":
      return coefficient / error;
    case "p-value":
      return pValueOf(coefficient / error, reference);
    case "low":
      return coefficient - reach();
    case "high":
      return coefficient + reach();
  }
}

/** The figures of a report that rest on standard errors, and the levels that its bounds can have. */
export interface ErrorReport {
  readonly reported: readonly ReportedError[];
  readonly levels: readonly number[];
}

/** Every law and level of the bounds under which one kind gives all the reported figures; empty where none does. */
export function matchesOf(kind: ErrorKind, { reported, levels }: ErrorReport, fitted: Fitted): ErrorsUsed[] {
  const isReached = ({ quantity: { kind: what } }: ReportedError): boolean => what === "low" || what === "high";
  const lawless = reported.filter(({ quantity: { kind: what } }) => what === "standard-error" || what === "ratio");
  const usual = { kind, law: kind.laws[0]!, level: levels[0]! };
  if (!allAgree(lawless, fitted, usual)) return [];
  const pValues = reported.filter(({ quantity: { kind: what } }) => what === "p-value");
  const bounds = reported.filter(isReached);
  const laws = kind.laws.filter((law) => allAgree(pValues, fitted, { ...usual, law }));
  return laws.flatMap((law) =>
    levels
      .filter((level) => bounds.length > 0 || level === levels[0])
      .map((level) => ({ kind, law, level }))
      .filter((used) => allAgree(bounds, fitted, used)),
  );
}

const allAgree = (reported: readonly ReportedError[], fitted: Fitted, used: ErrorsUsed): boolean =>
  reported.every((number) => {
    const found = errorValue(number.quantity, fitted, used);
    return found !== null && agrees(number, found);
  });
