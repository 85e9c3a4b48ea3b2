import type { Fit } from "../../fit/fit.ts";
import { columnLengths } from "../../numeric/triangle.ts";
import { type SingularValues, diagonal, singularValues } from "../../numeric/smallMatrix.ts";
import { mean, sumOfSquares } from "../../numeric/sums.ts";

/** How far the terms carry the same information. */
export interface Collinearity {
  /** One entry a term, the constant left out. */
  readonly terms: readonly TermInflation[];
  /** Largest over smallest singular value of the terms, each scaled to length one. */
  readonly conditionNumber: number;
  /** Near dependencies, the closest first. */
  readonly dependencies: readonly NearDependency[];
}

export interface TermInflation {
  readonly term: string;
  /** How many times the coefficient's variance is what it would be if the others were not there. */
  readonly inflation: number;
  /** The terms that make it up, those that matter most first: what share of its variation a unit of theirs carries. */
  readonly madeOf: readonly string[];
}

export interface NearDependency {
  /** Condition index: the largest singular value over this one. */
  readonly index: number;
  /** For each term the share of its coefficient's variance that comes from this dependency. */
  readonly shares: readonly { readonly term: string; readonly share: number }[];
}

/** Condition index from which a dependency harms, and the share of two variances that it must carry (source: chapter 3). */
const harmfulIndex = 30;
const harmfulShare = 0.5;
/** A term belongs to what makes another up if its own part is at least this share of the other's deviation. */
const partThatMatters = 0.3;

/**
 * Variance inflation factors, scaled condition number and variance-decomposition proportions.
 * VIF_j = ((X'X)^-1)_jj times the sum of squares of x_j about its mean (about zero without a constant), which is
 * 1 / (1 - R_j^2) of its regression on the other terms.
 * @see Belsley, Kuh and Welsch (1980), Regression Diagnostics, Wiley, chapter 3; Marquardt (1970), Technometrics 12, 591-612.
 */
export function collinearity(fit: Fit): Collinearity {
  const lengths = columnLengths(fit.triangle);
  const { size, values } = fit.triangle;
  const scaled = { size, values: values.map((value, index) => value / lengths[index % size]!) };
  const found = singularValues(scaled);
  return {
    terms: inflations(fit),
    conditionNumber: found.values[0]! / found.values.at(-1)!,
    dependencies: dependenciesIn(
      found,
      fit.design.terms.map(({ name }) => name),
    ),
  };
}

function inflations({ design, bread }: Fit): TermInflation[] {
  const deviations = design.terms.map(({ values }) =>
    Math.sqrt(sumOfSquares(values, design.hasConstant ? mean(values) : 0)),
  );
  const variances = diagonal(bread);
  return design.terms.flatMap(({ name, meaning }, j) => {
    if (meaning.kind === "constant") return [];
    const parts = design.terms
      .map((other, i) => ({
        name: other.name,
        part:
          i === j
            ? 0
            : (Math.abs(bread.values[j * bread.size + i]!) / variances[j]!) * (deviations[i]! / deviations[j]!),
      }))
      .filter(({ part }) => part >= partThatMatters)
      .sort((one, other) => other.part - one.part);
    return [{ term: name, inflation: variances[j]! * deviations[j]! ** 2, madeOf: parts.map((part) => part.name) }];
  });
}

/** phi_kj = v_kj^2 / mu_j^2 is the part of coefficient k's variance that belongs to singular value mu_j. */
function dependenciesIn({ values, right }: SingularValues, names: readonly string[]): NearDependency[] {
  const { size } = right;
  const phi = (k: number, j: number): number => (right.values[k * size + j]! / values[j]!) ** 2;
  const total = names.map((_, k) => names.reduce((sum, __, j) => sum + phi(k, j), 0));
  return names
    .map((_, j) => ({
      index: values[0]! / values[j]!,
      shares: names.map((term, k) => ({ term, share: phi(k, j) / total[k]! })),
    }))
    .filter(
      ({ index, shares }) => index > harmfulIndex && shares.filter(({ share }) => share > harmfulShare).length > 1,
    )
    .sort((one, other) => other.index - one.index);
}
