import type { Answer } from "../core/answer/answer.ts";
import { page, wrappedHeight } from "./columns.ts";
import type { Figures } from "./figures.ts";
import { pValueFormat } from "./numberFormats.ts";
import { headingFormat } from "./pageFormats.ts";
import type { PlanCell, PlanFormat } from "./plan.ts";
import { type Section, section, text } from "./section.ts";

const heading = "Which standard errors, and why";

/** Where the evidence table holds what the tests say of the two questions: their rows, the p-value and its level. */
const question = { spread: 1, followOn: 2, level: 1, pValue: 4 } as const;

/**
 * The four cases with the one that the tests point at marked in words, and the p-values that put it there; policies that ask no
 * tests say so by leaving them out.
 */
export function fourCasesSection(answer: Answer, figures: Figures): Section {
  const { fourCase } = answer.decision;
  const decided = [
    ...(fourCase.spread === "not asked" ? [] : [decidedRow("p-value for uneven spread", question.spread, figures)]),
    ...(fourCase.followOn === "not asked" ? [] : [decidedRow("p-value for follow-on", question.followOn, figures)]),
  ];
  const table = decided.length === 0 ? [] : caseTable(answer, figures);
  const inForce: PlanCell[] = [text("In force"), figures.choice()];
  const override = answer.decision.override;
  const rows = [
    ...table,
    ...decided,
    inForce,
    [text("Policy"), text(answer.decision.policy)],
    ...overrideRow(override),
  ];
  return section(
    [[text(heading)], ...rows],
    [
      headingFormat(0),
      ...(table.length === 0 ? [] : [tableHeading]),
      { area: { row: table.length === 0 ? 1 : 2, column: 0, rows: rows.length, columns: 1 }, style: "label" },
      {
        area: { row: table.length + 1, column: 1, rows: Math.max(decided.length, 1), columns: 1 },
        numberFormat: pValueFormat,
        align: "left",
      },
      ...(override === null ? [] : [reasonFormat(rows.length, override)]),
    ],
  );
}

const reasonFormat = (row: number, reason: string): PlanFormat => ({
  area: { row, column: 1, rows: 1, columns: page.columns - 1 },
  merge: true,
  wrap: true,
  align: "left",
  rowHeight: wrappedHeight(reason, 1),
});

const tableHeading: PlanFormat = {
  area: { row: 1, column: 0, rows: 1, columns: 7 },
  style: "table heading",
  heads: 2,
};

function caseTable(answer: Answer, { mark }: Figures): PlanCell[][] {
  const asked = answer.decision.fourCase.followOn !== "not asked";
  const right = asked ? "errors follow on" : "errors follow on (not asked)";
  return [
    [text("Spread of the errors"), text("errors do not follow on"), null, null, text(right)],
    [text("even"), mark("even", "none", "classical"), null, null, mark("even", "some", "Newey-West")],
    [text("uneven"), mark("uneven", "none", "White"), null, null, mark("uneven", "some", "Newey-West")],
  ];
}

const decidedRow = (label: string, row: number, figures: Figures): PlanCell[] => [
  text(label),
  figures.evidence(row, question.pValue),
  null,
  null,
  figures.evidence(row, question.level),
];

const overrideRow = (reason: string | null): PlanCell[][] =>
  reason === null ? [] : [[text("Fixed by hand, reason"), text(reason)]];
