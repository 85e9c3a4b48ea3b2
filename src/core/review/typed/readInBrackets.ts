import { classicalCovariance } from "../../covariance/classical.ts";
import type { Claim, ReportedNumber } from "../claim.ts";
import { addressAt } from "../cellsOfBook.ts";
import { frameOf } from "../engine/frame.ts";
import { placeOf } from "../engine/quantities.ts";
import { claimedRecipe } from "../engine/recipe.ts";
import { refit } from "../engine/refit.ts";
import type { BracketWord, Brackets } from "./bracketNotes.ts";
import type { InBrackets } from "./inBrackets.ts";
import { assumptions } from "./typedWords.ts";

/** The number in brackets under the coefficient of a driver; null is the constant. */
export interface CountedBrackets {
  readonly term: number | null;
  readonly inBrackets: InBrackets;
}

/**
 * A claim with the numbers in brackets under its coefficients, as what the note says they are; without a note as
 * standard errors or as t ratios, whichever lies nearer to what the claimed cells give.
 */
export function withBrackets(claim: Claim, counted: readonly CountedBrackets[], brackets: Brackets): Claim {
  const known = new Set(claim.reported.map(({ cell }) => cell));
  const under = counted.flatMap(({ term, inBrackets }): Under[] => {
    const coefficient = claim.reported.find(
      ({ quantity }) => quantity.kind === "coefficient" && quantity.term === term,
    );
    const isNew = coefficient !== undefined && !known.has(addressAt(inBrackets.place));
    return isNew ? [{ term, inBrackets, coefficient }] : [];
  });
  if (under.length === 0) return claim;
  const { word, why } = brackets.note === null ? guessed(claim, under) : { word: brackets.note, why: [] };
  const givenSigns = under.some(({ coefficient, inBrackets }) => coefficient.value < 0 && !inBrackets.minus);
  const assumed = [
    ...why,
    ...(word === "ratio" && givenSigns ? [assumptions.signs] : []),
    ...(brackets.furtherLine ? [assumptions.furtherLine] : []),
  ];
  return {
    ...claim,
    reported: claim.reported.flatMap((number) => [
      number,
      ...under.filter(({ coefficient }) => coefficient === number).map((one) => numberOf(one, word)),
    ]),
    ...(assumed.length === 0 ? {} : { assumed: [...(claim.assumed ?? []), ...assumed] }),
  };
}

interface Under extends CountedBrackets {
  readonly coefficient: ReportedNumber;
}

/** Ratios whose sign is not written have that of their coefficient. */
function numberOf({ term, inBrackets, coefficient }: Under, word: BracketWord): ReportedNumber {
  const { size, minus, place } = inBrackets;
  const isNegative = minus || (word === "ratio" && coefficient.value < 0);
  const signed = isNegative ? { ...size, value: -size.value, shown: `-${size.shown}` } : size;
  return { quantity: { kind: word, term }, ...signed, cell: addressAt(place) };
}

interface Guess {
  readonly word: BracketWord;
  readonly why: readonly string[];
}

/** Readings whose distances differ by less, as shares of the standard errors, are hardly told apart by them. */
const hardlyApart = 0.2;

function guessed(claim: Claim, under: readonly Under[]): Guess {
  if (under.some(({ inBrackets }) => inBrackets.minus)) return { word: "ratio", why: [assumptions.negativeBrackets] };
  const distances = distancesOf(claim, under);
  if (distances === null) return { word: "standard-error", why: [assumptions.usualBrackets] };
  const word = distances.ratio < distances.error ? "ratio" : "standard-error";
  const isClear = Math.abs(distances.ratio - distances.error) >= hardlyApart;
  return { word, why: [isClear ? assumptions.nearerBrackets(word) : assumptions.unclearBrackets(word)] };
}

interface Distances {
  readonly error: number;
  readonly ratio: number;
}

/**
 * How far the standard errors under either reading lie from the classical ones of the cells as claimed: the mean of
 * the logarithms of their shares. Other kinds of standard errors lie nearer to these than ratios do, as a rule.
 * @returns null where the cells give no standard errors.
 */
function distancesOf(claim: Claim, under: readonly Under[]): Distances | null {
  const frame = frameOf(claim);
  const recipe = claimedRecipe(frame, claim.constant);
  const fitted = frame.count > 0 ? refit(frame, recipe, { kind: "cases" }) : null;
  if (fitted?.ok !== true) return null;
  const { standardErrors } = classicalCovariance(fitted.value);
  const each = under.flatMap(({ term, inBrackets: { size }, coefficient }): Distances[] => {
    const place = placeOf(term, recipe.model);
    const error = place === null ? 0 : standardErrors[place]!;
    if (!(error > 0)) return [];
    const given = Math.max(size.value, size.halfUnit);
    const implied = Math.max(Math.abs(coefficient.value), coefficient.halfUnit) / given;
    return [{ error: Math.abs(Math.log(given / error)), ratio: Math.abs(Math.log(implied / error)) }];
  });
  const mean = (of: keyof Distances): number => each.reduce((sum, one) => sum + one[of], 0) / each.length;
  return each.length === 0 ? null : { error: mean("error"), ratio: mean("ratio") };
}
