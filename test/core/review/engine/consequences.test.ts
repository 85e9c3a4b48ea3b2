import { describe, expect, it } from "vitest";
import type { ClaimReview } from "../../../../src/core/review/claimReview.ts";
import type { Claim, ReportedNumber } from "../../../../src/core/review/claim.ts";
import { reviewClaim } from "../../../../src/core/review/reviewClaim.ts";
import type { Cell } from "../../../../src/core/table/cells.ts";
import { dataSets } from "../../../planted/dataSets.ts";
import { type Sheet, claimOf, sheetOf } from "../../../planted/sheet.ts";
import { pairs, singles, soundBooks } from "../../../planted/books.ts";

const review = (claim: Claim): ClaimReview => reviewClaim(claim, () => undefined);

const planted = (name: string) =>
  [...singles(), ...pairs(), ...soundBooks()].find((book) => book.name.startsWith(name))!;

const codes = ({ findings }: ClaimReview): string[] => findings.map(({ code }) => code);

/** The months of the demo, as a sheet of its own, and a report of nothing but some coefficients. */
const months = sheetOf(dataSets.find(({ id }) => id === "months")!);

const coefficient = (term: number, value: number, halfUnit: number): ReportedNumber => ({
  quantity: { kind: "coefficient", term },
  value,
  halfUnit,
  cell: `Report!B${term + 2}`,
  shown: String(value),
});

/** What R gives for the months would serve as well; here the review's own comparison says that they agree. */
function claimOfMonths(sheet: Sheet): Claim {
  const claim = claimOf(sheet, { constant: true, forms: {} }, []);
  const answer = review(claim).answer!;
  const reported = [0, 1, 2].map((term) => coefficient(term, answer.coefficients[term + 1]!, 1e-6));
  return { ...claim, reported };
}

describe("the conclusions of a reviewed regression", () => {
  it("stand where the report is sound, and no finding says otherwise", () => {
    const sound = review(planted("parts: no fault").claim);
    expect(sound.consequences.map(({ changes }) => changes)).toEqual([false, false]);
    expect(codes(sound)).toEqual([]);
    expect(sound.verdict).toMatch(/^All \d+ reported numbers come out of the cells\. No conclusion/);
  });

  it("fall with standard errors that the evidence does not allow, and only where they fall", () => {
    const wrong = review(planted("months: classical standard errors that are not allowed").claim);
    expect(wrong.errors).toMatchObject({ allowed: false });
    expect(wrong.errors?.kinds[0]).toBe("classical");
    expect(wrong.consequences.map(({ driver, changes }) => [driver, changes])).toEqual([
      ["Price index", true],
      ["Advertising", false],
      ["Rainy days", false],
    ]);
    expect(wrong.findings[0]).toMatchObject({ rank: "changes the conclusion", code: "errors-not-allowed" });
    expect(wrong.answer?.decision.called.errors.kind).toBe("newey-west");
  });

  it("are not made more of than was said: coefficients alone claim no certainty", () => {
    const bare = review(claimOfMonths(months));
    expect(bare.errors).toBeNull();
    expect(bare.consequences.map(({ changes }) => changes)).toEqual([false, false, false]);
    expect(bare.consequences[0]?.asReported).toMatch(/nothing said of how sure/);
    expect(bare.consequences[0]?.asItShouldBe).toMatch(/^no effect can be shown/);
  });
});

describe("the rows that the conclusions rest on", () => {
  const total: Cell[] = months.headings.map((_, track) =>
    track === 0 ? "Total" : months.rows.reduce((sum, row) => sum + Number(row[track]), 0),
  );

  it("are all rows of the data, a total below them left out", () => {
    const cut = { ...months, rows: [...months.rows, total], claimed: { from: 0, to: 90 } };
    const found = review(claimOfMonths(cut));
    expect(found.answer?.observations).toBe(96);
    expect(found.answer?.rows.kind).toBe("time");
    expect(codes(found)).toContain("range-stops-early");
    expect(found.findings.find(({ code }) => code === "range-stops-early")?.cells).toEqual(["Data!B92:E97"]);
  });

  it("leave a total inside the range out, and say so", () => {
    const inside = { ...months, rows: [...months.rows, total], claimed: { from: 0, to: 97 } };
    const found = review(claimOfMonths(inside));
    expect(found.answer?.observations).toBe(96);
    expect(found.findings.find(({ code }) => code === "total-row-in-range")?.cells).toEqual(["Data!B98:E98"]);
  });

  it("take in numbers kept as text, and say so", () => {
    const rows = months.rows.map((row, index) =>
      index === 20 ? row.map((cell, track) => (track === 2 ? `${Number(cell)}` : cell)) : row,
    );
    const found = review(claimOfMonths({ ...months, rows }));
    expect(found.answer?.observations).toBe(96);
    expect(found.findings.find(({ code }) => code === "text-numbers-left-out")?.cells).toEqual(["Data!C22"]);
  });

  it("do not stretch over a note below the data", () => {
    const note: Cell[] = ["Mean", 300, 100, 6, 12, 5];
    const found = review(claimOfMonths({ ...months, rows: [...months.rows, note] }));
    expect(found.answer?.observations).toBe(96);
    expect(codes(found)).not.toContain("range-stops-early");
  });
});

describe("a regression that cannot be made", () => {
  it("is said to be so, without a conclusion", () => {
    const rows = months.rows.map((row) => row.map((cell, track) => (track === 2 ? 7 : cell)));
    const claim = claimOf({ ...months, rows }, { constant: true, forms: {} }, [
      coefficient(0, 1.5, 0.05),
      coefficient(1, 2.5, 0.05),
    ]);
    const found = review(claim);
    expect(found.answer).toBeNull();
    expect(found.consequences).toEqual([]);
    expect(found.compared.map(({ recomputed, agrees }) => [recomputed, agrees])).toEqual([
      [null, false],
      [null, false],
    ]);
    expect(codes(found)).toContain("no-answer");
    expect(found.findings.find(({ code }) => code === "no-answer")?.what).toMatch(/Price index/);
  });
});
