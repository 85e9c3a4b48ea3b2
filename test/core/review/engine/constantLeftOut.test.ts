import { beforeAll, describe, expect, it } from "vitest";
import type { Claim } from "../../../../src/core/review/claim.ts";
import type { ClaimReview } from "../../../../src/core/review/claimReview.ts";
import type { Finding } from "../../../../src/core/review/finding.ts";
import { reviewClaim } from "../../../../src/core/review/reviewClaim.ts";
import type { BookCell, SheetData } from "../../../../src/desk/book/bookData.ts";
import cars from "../../../reference/cars.json" with { type: "json" };
import mtcars from "../../../reference/mtcars.json" with { type: "json" };
import { bookOf, sheetOf } from "../../../support/deskBook.ts";
import { claimsIn, readOnDesk } from "../../../support/readBook.ts";

type Rows = readonly (readonly [number, number])[];

/** The outcome in column A, a driver in B, and LINEST without a constant beside them. */
function fitted(name: string, rows: Rows, linest: readonly (readonly (number | null)[])[]): SheetData {
  const last = rows.length + 1;
  const formula = `=LINEST(A2:A${last},B2:B${last},FALSE,TRUE)`;
  const results = linest.map((line, row) =>
    line.map((value, column): BookCell =>
      row + column === 0 ? { value, formula, spill: `D2:E${linest.length + 1}` } : value,
    ),
  );
  return sheetOf(name, [["Outcome", "Driver"], ...rows.map((row, at) => [...row, null, ...(results[at] ?? [])])]);
}

/** Twice the driver and errors that sum to zero, alone and against the driver: the constant is zero by arithmetic. */
const errors = [1, -1, -1, 1, 1, -1, -1, 1, 1, -1, -1, 1, 1, -1, -1, 1];
const through: Rows = errors.map((error, at) => [2 * (at + 1) + error, at + 1]);

const book = bookOf(
  // R 4.2.2: lm(mpg ~ 0 + wt, mtcars); with a constant the weight has -5.344, and the constant 37.285 (p 8e-19).
  fitted(
    "Turned",
    mtcars.y.map((miles, row) => [miles, mtcars.X[0]![row]!] as const),
    [
      [5.291624101, 0],
      [0.5931801344, null],
    ],
  ),
  // R 4.2.2: lm(dist ~ 0 + speed, cars); with a constant the speed has 3.932, and the constant -17.579 (p 0.0123).
  fitted(
    "Moved",
    cars.y.map((distance, row) => [distance, cars.X[0]![row]!] as const),
    [
      [2.909132144, 0],
      [0.1413686375, null],
      [0.8962893058, null],
    ],
  ),
  fitted("Same", through, [[2, 0]]),
);

describe("a constant that a formula leaves out", () => {
  let claims: readonly Claim[];
  beforeAll(async () => {
    claims = claimsIn(await readOnDesk(book)).claims;
  });
  const reviewOf = (sheet: string): ClaimReview =>
    reviewClaim(
      claims.find(({ place }) => place.startsWith(sheet))!,
      () => undefined,
    );
  const toldOf = ({ findings }: ClaimReview): Finding => findings.find(({ code }) => code === "no-constant")!;

  it("changes the conclusion where a driver's turns with it", () => {
    const review = reviewOf("Turned");
    expect(toldOf(review)).toMatchObject({
      rank: "changes the conclusion",
      reported: "5.291624101",
      recomputed: "-5.344471573",
    });
    expect(toldOf(review).what).toContain("with one the conclusion on Driver is another one");
    expect(review.consequences[0]!).toMatchObject({ changes: true });
    expect(review.consequences[0]!.asItShouldBe).toContain("with a constant, shown to go with less");
    expect(review.verdict).toContain("as long as there is no constant. With a constant the conclusion on Driver");
  });

  it("changes a number where the constant is shown to differ from zero, and no conclusion turns", () => {
    const review = reviewOf("Moved");
    expect(toldOf(review)).toMatchObject({ rank: "changes a number", recomputed: "3.932408759" });
    expect(toldOf(review).what).toMatch(
      /A constant is shown to differ from zero \(p = 0\.0\d+\); with one no conclusion/,
    );
    expect(review.consequences[0]!.changes).toBe(false);
  });

  it("is worth knowing where it does neither", () => {
    const review = reviewOf("Same");
    expect(toldOf(review)).toMatchObject({ rank: "worth knowing", reported: null });
    expect(toldOf(review).what).toContain("A constant is not shown to differ from zero (p = 1.00)");
    expect(review.findings.filter(({ rank }) => rank !== "worth knowing")).toEqual([]);
  });

  it("is not blamed for what the report says wrongly either way", () => {
    const claim = claims.find(({ place }) => place.startsWith("Moved"))!;
    const coarser = claim.reported.map((one) => (one.quantity.kind === "standard-error" ? { ...one, value: 3 } : one));
    const review = reviewClaim({ ...claim, reported: coarser }, () => undefined);
    expect(review.consequences[0]!.asReported).toContain("no effect shown");
    expect(toldOf(review)).toMatchObject({ rank: "changes a number" });
  });

  it("is not spoken of where there is one", () => {
    const claim = { ...claims[0]!, constant: true };
    const { findings } = reviewClaim(claim, () => undefined);
    expect(findings.map(({ what }) => what).join(" ")).not.toContain("The formula leaves the constant out");
  });
});
