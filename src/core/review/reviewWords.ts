import { listInWords } from "../answer/wording.ts";
import { addressOf } from "../table/address.ts";
import type { Claim, ClaimedForm, ClaimedLine } from "./claim.ts";
import type { BookReview, ClaimReview } from "./claimReview.ts";
import { type Finding, type Rank, ranks } from "./finding.ts";

/** What a review can and cannot show; it stands wherever a review does. */
export const reviewLimits =
  "A review finds what reproduces the reported numbers. It does not show why the work was done so, nor that anything was meant: ask its author.";

/** "Repairs explained by Price index and the logarithm of Advertising" */
export const titleOf = ({ outcome, drivers }: Claim): string =>
  `${lineInWords(outcome)} explained by ${listInWords(drivers.map(lineInWords))}`;

/** What a driver is called that counts 1, 2, 3 and so on along the outcome. */
export const positionName = "Position in the range";

const forms: Readonly<Record<ClaimedForm, string>> = {
  "as it is": "",
  logarithm: "the logarithm of ",
  square: "the square of ",
  cube: "the cube of ",
  position: "",
};

/** "Price index", "the logarithm of Advertising" */
export const lineInWords = ({ name, form }: ClaimedLine): string => `${forms[form]}${name}`;

/** Where the reported numbers come from: "typed numbers", "a formula with LINEST". */
export const originInWords = ({ origin }: Claim): string =>
  origin.kind === "typed" ? "typed numbers" : `a formula with ${listInWords(origin.functions)}`;

/** The cells of a line that the regression says it used: "Months!B5:B99". */
export function rangeOfLine({ sheet, runs, track, from, count }: ClaimedLine): string {
  const along = Math.max(1, count);
  return runs === "down"
    ? addressOf({ sheet, row: from, column: track, rows: along, columns: 1 })
    : addressOf({ sheet, row: track, column: from, rows: 1, columns: along });
}

/** Findings in the order in which they matter, as they came within a rank. */
export const gravestFirst = (findings: readonly Finding[]): readonly Finding[] =>
  ranks.flatMap((rank) => findings.filter((finding) => finding.rank === rank));

/** The gravest rank among findings; null where there are none. */
export const gravestRank = (findings: readonly Finding[]): Rank | null => gravestFirst(findings)[0]?.rank ?? null;

/** Whether a finding anywhere in the review changes a conclusion: a run over many workbooks stops on it. */
export const changesConclusion = ({ claims, craft }: BookReview): boolean =>
  [...claims.flatMap(({ findings }) => findings), ...craft].some(({ rank }) => rank === "changes the conclusion");

/** How many regressions were reviewed, and how they came out, in a sentence. */
export function summaryOf(claims: readonly Pick<ClaimReview, "findings">[]): string {
  const [only] = claims;
  if (only !== undefined && claims.length === 1) return singleSummary(gravestRank(only.findings));
  const having = (rank: Rank): number => claims.filter(({ findings }) => gravestRank(findings) === rank).length;
  const [conclusions, numbers] = [having("changes the conclusion"), having("changes a number")];
  const rest = claims.length - conclusions - numbers;
  const parts = [
    [conclusions, conclusions === 1 ? "has a finding that changes its conclusion" : "have findings that change theirs"],
    [numbers, numbers === 1 ? "has one that changes a number" : "have some that change numbers"],
    [rest, rest === 1 ? "has nothing that would change it" : "have nothing that would change them"],
  ] as const;
  const said = parts.filter(([count]) => count > 0).map(([count, words]) => `${count} ${words}`);
  return `${claims.length} ${claims.length === 1 ? "regression" : "regressions"} reviewed: ${listInWords(said)}.`;
}

const singleSummary = (rank: Rank | null): string =>
  rank === "changes the conclusion" || rank === "changes a number"
    ? `A finding ${rank}.`
    : "Nothing was found that changes the conclusion or a number.";

/** What explains the difference, then what would explain it as well. */
export const explanationsOf = ({ explanation, alternatives }: ClaimReview): readonly string[] => [
  ...(explanation === null ? [] : [explanation.sentence]),
  ...alternatives.map(({ sentence }) => `Or, which the reported digits cannot tell apart: ${sentence}`),
];
