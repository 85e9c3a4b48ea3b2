import { describe, expect, it } from "vitest";
import type { Claim, ReportedNumber } from "../../../../src/core/review/claim.ts";
import { reviewClaim } from "../../../../src/core/review/reviewClaim.ts";
import { soundBooks } from "../../../planted/books.ts";
import { randomFrom } from "../../../support/random.ts";

const review = (claim: Claim) => reviewClaim(claim, () => undefined);

/** A number moved by so many units of its last digit. */
const moved = (number: ReportedNumber, units: number): ReportedNumber => ({
  ...number,
  value: number.value + 2 * units * number.halfUnit,
});

/** The same number shown with so many digits fewer. */
function coarser(number: ReportedNumber, digits: number): ReportedNumber {
  const half = number.halfUnit * 10 ** digits;
  const value = Math.round(number.value / (2 * half)) * 2 * half;
  return { ...number, halfUnit: half, value };
}

const books = soundBooks().filter(({ claim }) => claim.outcome.count < 120);

describe("reports that no change explains", () => {
  it("are not explained: every number a few digits off", () => {
    const random = randomFrom(71);
    const explained = books.flatMap(({ name, claim }) => {
      const reported = claim.reported.map((number) =>
        number.quantity.kind === "observations" ? number : moved(number, 3 + random.below(40)),
      );
      const { explanation, tried, compared } = review({ ...claim, reported });
      expect(compared.some(({ agrees }) => !agrees)).toBe(true);
      expect(tried.length).toBeGreaterThan(5);
      return explanation === null ? [] : [`${name}: ${explanation.sentence}`];
    });
    expect(explained).toEqual([]);
  });

  it("are not explained by chance where two numbers are shown in a digit or two", () => {
    const random = randomFrom(72);
    let untelling = 0;
    const explained = books.flatMap(({ name, claim }) => {
      const two = claim.reported.filter(({ quantity }) => quantity.kind === "coefficient").slice(0, 2);
      const reported = two.map((number) => moved(coarser(number, 3), random.below(4)));
      const { explanation, tried } = review({ ...claim, reported });
      if (tried.some((words) => /with so few digits/.test(words))) untelling++;
      return explanation === null ? [] : [`${name}: ${explanation.sentence}`];
    });
    expect(explained).toEqual([]);
    expect(untelling).toBeGreaterThan(5);
  });

  it("are not explained by one number alone", () => {
    const { claim } = books[0]!;
    const slope = claim.reported.find(({ quantity }) => quantity.kind === "coefficient" && quantity.term === 0)!;
    const { explanation, tried } = review({
      ...claim,
      reported: [{ ...slope, value: 10 * slope.value, halfUnit: 10 * slope.halfUnit }],
    });
    expect(explanation).toBeNull();
    expect(tried.at(-1)).toMatch(/with so few digits/);
  });
});
