import type { Claim, ClaimedLine, ReportedNumber } from "../../src/core/review/claim.ts";
import type { BookReview, ClaimReview, Comparison } from "../../src/core/review/claimReview.ts";
import type { Finding } from "../../src/core/review/finding.ts";
import { toCellColumn } from "./cellColumns.ts";

/** A review whose words and figures are made up, all different, so that one in the wrong place is seen. */
const line = (name: string, track: number, start: number): ClaimedLine => ({
  name,
  sheet: "Months",
  runs: "down",
  track,
  first: 0,
  cells: toCellColumn([null, null, null, name, ...[0, 1, 2, 3, 4, 5].map((row) => start + row * row)]),
  from: 4,
  count: 5,
  form: "as it is",
  hidden: [],
});

const reported = (
  quantity: ReportedNumber["quantity"],
  cell: string,
  [value, shown, halfUnit]: readonly [number, string, number],
): ReportedNumber => ({ quantity, value, shown, halfUnit, cell: `Handover!${cell}` });

const price = { kind: "coefficient", term: 0 } as const;

export const claimFixture: Claim = {
  place: "Handover!A4:C6",
  origin: { kind: "typed" },
  outcome: line("Repairs", 1, 410),
  drivers: [line("Price index", 2, 97)],
  constant: true,
  reported: [
    reported(price, "B6", [-1.234, "-1.234", 0.0005]),
    reported({ kind: "standard-error", term: 0 }, "C6", [0.312, "0.312", 0.0005]),
    reported({ kind: "r-squared" }, "B8", [0.62, "62%", 0.005]),
    reported({ kind: "observations" }, "B9", [5, "5", 0.5]),
  ],
  others: [line("Month", 0, 44_000)],
  assumed: ["The outcome is taken to be Repairs, which the title names."],
};

const recomputed = [-1.3119, 0.3317, 0.6177, 6];
const explained = [-1.2341, 0.3118, 0.6244, 5];

const comparisons = (values: readonly number[], agreeing: readonly boolean[]): Comparison[] =>
  claimFixture.reported.map((number, index) => ({
    reported: number,
    recomputed: values[index]!,
    agrees: agreeing[index]!,
  }));

export const gravest: Finding = {
  rank: "changes the conclusion",
  code: "errors-not-allowed",
  cells: ["Handover!C6"],
  reported: "0.312",
  recomputed: "0.871",
  what: "The standard errors are classical, which these rows do not allow.",
  toDo: "Report Newey-West standard errors instead.",
};

export const smaller: Finding = {
  rank: "changes a number",
  code: "row-left-off",
  cells: ["Months!B10", "Months!C10"],
  reported: null,
  recomputed: null,
  what: "The last row was left off.",
  toDo: "Take it in, or say why it is out.",
};

export const slight: Finding = {
  rank: "worth knowing",
  code: "typed-results",
  cells: ["Handover!B6:C6"],
  reported: null,
  recomputed: null,
  what: "The results are typed in: no formula supports them.",
  toDo: "Keep the formulas beside the report.",
};

export const claimReviewFixture: ClaimReview = {
  claim: claimFixture,
  compared: comparisons(recomputed, [false, false, true, false]),
  explanation: {
    hypotheses: ["rows-left-off-at-end"],
    sentence: "The last row (Months!B10:C10) was left off.",
    cells: ["Months!B10:C10"],
    compared: comparisons(explained, [true, true, true, true]),
  },
  alternatives: [],
  tried: [],
  errors: {
    kinds: ["classical", "White (HC1)"],
    sentence: "The reported standard errors are classical. The errors follow on, so these may not be used.",
    allowed: false,
  },
  consequences: [
    {
      driver: "Price index",
      asReported: "shown to matter (p = 0.001)",
      asItShouldBe: "no effect can be shown (p = 0.21)",
      changes: true,
    },
  ],
  answer: null,
  findings: [slight, gravest, smaller],
  verdict: "The numbers come from the data with a row missing, and the conclusion on Price index does not hold.",
};

/** A second one that has nothing against it, from a formula. */
export const soundReviewFixture: ClaimReview = {
  ...claimReviewFixture,
  claim: {
    ...claimFixture,
    place: "Sums!D2",
    origin: { kind: "formula", functions: ["SLOPE"], formula: "=SLOPE(Months!B5:B10,Months!C5:C10)" },
    reported: [{ ...reported(price, "B6", [2.5, "2.50", 0.005]), cell: "Sums!D2" }],
  },
  compared: [
    {
      reported: { ...reported(price, "B6", [2.5, "2.50", 0.005]), cell: "Sums!D2" },
      recomputed: 2.5013,
      agrees: true,
    },
  ],
  explanation: null,
  errors: null,
  consequences: [],
  findings: [],
  verdict: "Every number comes out of the cells as claimed.",
};

export const bookReviewFixture: BookReview = {
  claims: [claimReviewFixture, soundReviewFixture],
  unread: [{ cell: "Sums!D9", why: "It reads its range with OFFSET." }],
  craft: [
    {
      rank: "worth knowing",
      code: "text-in-range",
      cells: ["Months!C7"],
      reported: null,
      recomputed: null,
      what: "A cell of the data holds text.",
      toDo: "Turn it into a number.",
    },
  ],
};
