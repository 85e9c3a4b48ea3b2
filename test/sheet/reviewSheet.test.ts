import { describe, expect, it } from "vitest";
import { planReview } from "../../src/sheet/reviewSheet.ts";
import type { SheetPlan } from "../../src/sheet/plan.ts";
import { reviewLimits } from "../../src/core/review/reviewWords.ts";
import {
  bookReviewFixture,
  claimFixture,
  claimReviewFixture,
  gravest,
  soundReviewFixture,
} from "../support/reviewFixture.ts";

const facts = { date: "1 December 2026", version: "0.0.0", fingerprints: ["ab".repeat(32), "cd".repeat(32)] };
const whole = planReview(bookReviewFixture, facts);
const single = planReview({ claims: [claimReviewFixture], unread: [], craft: [] }, facts);

const cellsOf = (plan: SheetPlan) => plan.blocks[0]!.cells;
const firstColumn = (plan: SheetPlan): string[] =>
  cellsOf(plan).map(([cell]) => (cell?.kind === "text" ? cell.text : ""));
const textsOf = (plan: SheetPlan): string[] =>
  cellsOf(plan)
    .flat()
    .flatMap((cell) => (cell?.kind === "text" ? [cell.text] : []));
const rowOf = (plan: SheetPlan, label: string): number => firstColumn(plan).indexOf(label);

describe("a sheet of one review", () => {
  it("has its parts in the order in which they matter", () => {
    const texts = firstColumn(single);
    const parts = [
      "Review: Repairs explained by Price index",
      "Verdict on the work",
      "Taken for granted",
      "Findings",
      "Reported and recomputed",
      "What explains the difference",
      "Which standard errors were reported",
      "What follows for each driver",
      "Sheet craft",
      "How this was made",
      "Sign-off",
    ];
    const places = parts.map((part) => texts.indexOf(part));
    expect(places).not.toContain(-1);
    expect(places).toEqual(places.toSorted((one, other) => one - other));
    expect(texts).not.toContain("Could not be read");
  });

  it("ranks findings and links them to their cells", () => {
    const texts = firstColumn(single);
    const ranks = ["Changes the conclusion", "Changes a number", "Worth knowing"].map((rank) => texts.indexOf(rank));
    expect(ranks).toEqual(ranks.toSorted((one, other) => one - other));
    const targets = single.links.map(({ target }) => target);
    expect(targets).toEqual(expect.arrayContaining(["Handover!A4:C6", "Months!B10", "Months!C10", "Handover!B8"]));
    const [row] = [rowOf(single, "Changes a number") + 2];
    expect(single.links.filter((link) => link.row === row).map(({ target }) => target)).toEqual([
      "Months!B10",
      "Months!C10",
    ]);
  });

  it("sets the numbers side by side, each in the digits of the report", () => {
    const row = rowOf(single, "coefficient of Price index");
    const values = cellsOf(single)[row]!.map((cell) =>
      cell?.kind === "number" ? cell.number : cell?.kind === "text" ? cell.text : null,
    );
    expect(values).toEqual(["coefficient of Price index", null, -1.234, -1.3119, -1.2341, "differs"]);
    const formats = (label: string): (string | undefined)[] =>
      single.formats
        .filter(({ area, numberFormat }) => area.row === rowOf(single, label) && numberFormat !== undefined)
        .map(({ numberFormat }) => numberFormat);
    expect(formats("coefficient of Price index")).toEqual(["0.000_)", "0.000_)", "0.000_)"]);
    expect(formats("R-squared")).toEqual(["0%_)", "0%_)", "0%_)"]);
  });

  it("carries the caution, the date, the version, the ranges and the fingerprint", () => {
    const texts = textsOf(single);
    expect(texts.some((words) => words.startsWith("A statistical check, not financial, legal or audit advice"))).toBe(
      true,
    );
    expect(texts).toEqual(
      expect.arrayContaining(["1 December 2026", "0.0.0", "Months!B5:B9", "Months!C5:C9", facts.fingerprints[0]!]),
    );
    expect(texts).toContain(reviewLimits);
  });

  it("leaves the lines of the sign-off to the user", () => {
    for (const label of ["Reviewed by", "Signature"]) {
      const row = rowOf(single, label);
      expect(cellsOf(single)[row]!.slice(1)).toEqual([null, null, null, null, null]);
      expect(single.formats.some(({ area, style }) => area.row === row && style === "to fill in")).toBe(true);
    }
  });

  it("is one rectangle without formulas, whatever the headings and the reported formula say", () => {
    const heading = '=HYPERLINK("x")';
    const claim = {
      ...soundReviewFixture.claim,
      outcome: { ...claimFixture.outcome, name: heading },
      drivers: [{ ...claimFixture.drivers[0]!, name: "+cmd" }],
    };
    const plan = planReview({ claims: [{ ...soundReviewFixture, claim }], unread: [], craft: [] }, facts);
    expect(plan.blocks).toHaveLength(1);
    expect(new Set(cellsOf(plan).map(({ length }) => length)).size).toBe(1);
    expect(
      cellsOf(plan)
        .flat()
        .some((cell) => cell?.kind === "formula"),
    ).toBe(false);
    expect(textsOf(plan)).toContain("=SLOPE(Months!B5:B10,Months!C5:C10)");
  });

  it("merges no two areas into one another", () => {
    const merged = single.formats.filter(({ merge }) => merge === true).map(({ area }) => area);
    const cells = merged.flatMap(({ row, column, columns }) =>
      Array.from({ length: columns }, (_, index) => `${row},${column + index}`),
    );
    expect(new Set(cells).size).toBe(cells.length);
    const hidden = merged.flatMap(({ row, column, columns }) =>
      cellsOf(single)[row]!.slice(column + 1, column + columns),
    );
    expect(hidden.filter((cell) => cell !== null)).toEqual([]);
  });

  it("says it where nothing was found", () => {
    const plan = planReview({ claims: [soundReviewFixture], unread: [], craft: [] }, facts);
    expect(firstColumn(plan)).toContain("Nothing was found against the work.");
    expect(firstColumn(plan)).toContain("Nothing was found against the sheets.");
  });

  it("leaves a figure with more digits than the column has room for to the host", () => {
    const compared = [
      {
        ...claimReviewFixture.compared[0]!,
        reported: { ...claimReviewFixture.compared[0]!.reported, shown: "-1.23400000000001", halfUnit: 5e-15 },
      },
    ];
    const plan = planReview({ claims: [{ ...claimReviewFixture, compared }], unread: [], craft: [] }, facts);
    const row = rowOf(plan, "coefficient of Price index");
    const formats = plan.formats.filter(({ area, numberFormat }) => area.row === row && numberFormat !== undefined);
    expect(formats.map(({ numberFormat }) => numberFormat)).toEqual(["General", "General", "0.000_)"]);
  });
});

describe("a sheet of several reviews", () => {
  it("says how they came out, then each in turn, then the sheets once", () => {
    const texts = firstColumn(whole);
    expect(texts[0]).toBe("Review of 2 regressions");
    expect(texts.filter((words) => words === "Verdict on the work")).toHaveLength(2);
    expect(texts.filter((words) => words === "Sheet craft")).toHaveLength(1);
    expect(textsOf(whole)).toEqual(expect.arrayContaining([...facts.fingerprints, gravest.what]));
  });

  it("lists what could not be read with a link", () => {
    const row = rowOf(whole, "Could not be read") + 1;
    expect(cellsOf(whole)[row]![1]).toEqual({ kind: "text", text: "It reads its range with OFFSET." });
    expect(whole.links).toContainEqual({ row, column: 0, text: "Sums!D9", target: "Sums!D9" });
  });

  it("has a name that leaves room for a number behind it", () => {
    expect(whole.name).toBe("Repairs review");
    const outcome = { ...claimFixture.outcome, name: "A heading of very many letters indeed" };
    const long = planReview(
      { claims: [{ ...claimReviewFixture, claim: { ...claimFixture, outcome } }], unread: [], craft: [] },
      facts,
    );
    expect(long.name.length).toBeLessThanOrEqual(28);
  });
});
