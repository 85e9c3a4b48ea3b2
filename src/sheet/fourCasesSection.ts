import type { Answer } from "../core/answer/answer.ts";
import { page, sentenceHeight } from "./columns.ts";
import type { Figures } from "./figures.ts";
import { headingFormat } from "./plainWordsSection.ts";
import type { PlanCell, PlanFormat } from "./plan.ts";
import { type Section, section, text } from "./section.ts";

const heading = "Which standard errors, and why";

/** The table of the four cases with the one in force marked in words; policies that ask no tests say so instead. */
export function fourCasesSection(answer: Answer, figures: Figures): Section {
  const { decision } = answer;
  const inForce: PlanCell[] = [text("In force:"), figures.choice()];
  const because: PlanCell[] = [text(becauseLine(answer))];
  const asked = decision.fourCase.spread !== "not asked" || decision.fourCase.followOn !== "not asked";
  const table = asked ? caseTable(answer, figures) : [];
  const becauseRow = table.length + 2;
  const formats: PlanFormat[] = [
    headingFormat(0),
    ...(asked ? caseFormats : []),
    { area: { row: becauseRow - 1, column: 0, rows: 1, columns: 1 }, style: "label" },
    {
      area: { row: becauseRow, column: 0, rows: 1, columns: page.columns },
      style: "sentence",
      merge: true,
      wrap: true,
      rowHeight: sentenceHeight(becauseLine(answer)),
    },
  ];
  return section([[text(heading)], ...table, inForce, because], formats);
}

const caseFormats: readonly PlanFormat[] = [
  { area: { row: 1, column: 0, rows: 1, columns: 7 }, style: "table heading" },
  { area: { row: 2, column: 0, rows: 2, columns: 1 }, style: "label" },
];

function caseTable(answer: Answer, { mark }: Figures): PlanCell[][] {
  const asked = answer.decision.fourCase.followOn !== "not asked";
  const right = asked ? "errors follow on" : "errors follow on (not asked)";
  return [
    [text("Spread of the errors"), text("errors do not follow on"), null, null, text(right)],
    [text("even"), mark("even", "none", "classical"), null, null, mark("even", "some", "Newey-West")],
    [text("uneven"), mark("uneven", "none", "White"), null, null, mark("uneven", "some", "Newey-West")],
  ];
}

function becauseLine({ decision }: Answer): string {
  const policy = `Policy: ${decision.policy}.`;
  const because = `Called for because ${decision.because}.`;
  const override = decision.override === null ? "" : ` Fixed by hand; reason: ${decision.override}.`;
  return `${policy} ${because}${override}`;
}
