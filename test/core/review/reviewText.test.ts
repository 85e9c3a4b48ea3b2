import { describe, expect, it } from "vitest";
import { gravestRank, reviewLimits, summaryOf, titleOf } from "../../../src/core/review/reviewWords.ts";
import { reviewText } from "../../../src/core/review/reviewText.ts";
import {
  bookReviewFixture,
  claimFixture,
  claimReviewFixture,
  slight,
  smaller,
  soundReviewFixture,
} from "../../support/reviewFixture.ts";

const text = reviewText(bookReviewFixture)
  .map(({ words }) => words)
  .join("\n");

describe("a review as text", () => {
  it("says first how many regressions there are and how they came out", () => {
    expect(text.split("\n")[0]).toBe(
      "2 regressions reviewed: 1 has a finding that changes its conclusion and 1 has nothing that would change it.",
    );
  });

  it("gives each its place, its verdict and its findings, the gravest first", () => {
    expect(text).toContain("Handover!A4:C6: Repairs explained by Price index (typed numbers)");
    expect(text).toContain("Sums!D2: Repairs explained by Price index (a formula with SLOPE)");
    const order = [claimReviewFixture.verdict, "Changes the conclusion:", "Changes a number:", "Worth knowing:"];
    const places = order.map((words) => text.indexOf(words));
    expect(places).not.toContain(-1);
    expect(places).toEqual(places.toSorted((one, other) => one - other));
    expect(text).toContain(
      "Report Newey-West standard errors instead. Reported 0.312, recomputed 0.871. Cells: Handover!C6.",
    );
  });

  it("sets reported and recomputed side by side in the digits of the report, explained ones beside", () => {
    const lines = text.split("\n").map((line) => line.trim().replaceAll(/ {2,}/g, " | "));
    expect(lines).toContain("number | cell | reported | recomputed | as explained");
    expect(lines).toContain("coefficient of Price index | Handover!B6 | -1.234 | -1.312 | differs | -1.234");
    expect(lines).toContain("R-squared | Handover!B8 | 62% | 62% | agrees | 62%");
    expect(lines).toContain("coefficient of Price index | Sums!D2 | 2.50 | 2.50 | agrees");
  });

  it("says what had to be taken for granted", () => {
    expect(text).toContain("Taken for granted:\nThe outcome is taken to be Repairs, which the title names.");
  });

  it("says what explains it, which standard errors were taken, and what follows", () => {
    expect(text).toContain("The last row (Months!B10:C10) was left off.");
    expect(text).toContain("The errors follow on, so these may not be used.");
    expect(text).toContain(
      "Price index: as reported, shown to matter (p = 0.001); as it should be, no effect can be shown (p = 0.21). This changes the conclusion.",
    );
  });

  it("ends with the sheets, what could not be read, and what a review cannot show", () => {
    expect(text).toContain("Worth knowing: A cell of the data holds text.");
    expect(text).toContain("Sums!D9: It reads its range with OFFSET.");
    expect(text.endsWith(reviewLimits)).toBe(true);
  });

  it("lists what was tried where nothing explains the difference", () => {
    const tried = { ...claimReviewFixture, explanation: null, tried: ["Rows left off at the ends."] };
    const words = reviewText({ claims: [tried], unread: [], craft: [] }).map((line) => line.words);
    expect(words).toContain("Tried, and does not explain the difference:");
    expect(words).toContain("Rows left off at the ends.");
    expect(words.join("\n")).not.toContain("as explained");
  });
});

describe("words about a review", () => {
  it("count regressions by their gravest finding", () => {
    const numbers = { findings: [slight, smaller] };
    expect(gravestRank(numbers.findings)).toBe("changes a number");
    expect(summaryOf([soundReviewFixture])).toBe("Nothing was found that changes the conclusion or a number.");
    expect(summaryOf([numbers])).toBe("A finding changes a number.");
    expect(summaryOf([claimReviewFixture])).toBe("A finding changes the conclusion.");
    expect(summaryOf([numbers, numbers, { findings: [slight] }])).toBe(
      "3 regressions reviewed: 2 have some that change numbers and 1 has nothing that would change it.",
    );
  });

  it("name what enters as its logarithm", () => {
    const drivers = claimFixture.drivers.map((line) => ({ ...line, form: "logarithm" as const }));
    expect(titleOf({ ...claimFixture, drivers })).toBe("Repairs explained by the logarithm of Price index");
  });
});
