import type { Answer } from "../core/answer/answer.ts";
import { askedSection } from "./askedSection.ts";
import { chartsAt, chartsSection } from "./chartsSection.ts";
import { lineHeight, page, pageWidths } from "./columns.ts";
import { driversSection } from "./driversSection.ts";
import { evidenceSection, fitSection } from "./evidenceSection.ts";
import { type Figures, keptFigures, liveFigures } from "./figures.ts";
import { fourCasesSection } from "./fourCasesSection.ts";
import { guardsSection } from "./guardsSection.ts";
import type { SheetFacts } from "./facts.ts";
import { howMadeSection, settingsArea } from "./howMadeSection.ts";
import { type Stretch, pageBreaksOf } from "./pageBreaks.ts";
import type { PlanFormat, SheetPlan } from "./plan.ts";
import { titleSection, verdictSection } from "./plainWordsSection.ts";
import { rectangle, rowsTaken, stack } from "./section.ts";

export type SheetKind = "live" | "kept";

/** The place, in the order of the parts on the page, of those that others look for. */
const part = { charts: 5, evidence: 6, howMade: 9 } as const;

const partings = new Map<number, Stretch["parted"]>([
  [part.charts, "never"],
  [part.evidence, "anywhere"],
]);

/**
 * Lays an answer out on a sheet that someone who was not there can read and redo.
 * @param answer - what is said of the regression.
 * @param facts - where the data stand, when and with which version it was made, the fingerprint of the data.
 * @param kind - live: figures are worksheet functions over the source ranges; kept: figures are values.
 */
export function planAnswer(answer: Answer, facts: SheetFacts, kind: SheetKind): SheetPlan {
  const figures = kind === "kept" ? keptFigures(answer) : liveWithSettings(answer, facts);
  const parts = partsOf(answer, facts, figures);
  const { rows, formats, links, starts } = stack(parts);
  const charts = chartsAt(answer, starts[part.charts]!);
  return {
    name: sheetName(answer.outcome),
    blocks: [
      { row: 0, column: 0, cells: rectangle(rows, page.columns) },
      ...charts.flatMap(({ blocks }) => blocks),
      ...figures.blocks,
    ],
    formats: [evenRows(rows.length), ...formats, ...figures.formats, ...charts.flatMap((chart) => chart.formats)],
    links,
    columnWidths: pageWidths,
    frozenRows: 1,
    charts: charts.map(({ chart }) => chart),
    pageBreaks: pageBreaksOf(
      parts.map((one, index) => ({ rows: rowsTaken(one), parted: partings.get(index) ?? "seldom" })),
      formats,
    ),
    printArea: { row: 0, column: 0, rows: rows.length, columns: page.columns },
  };
}

/** Every row has its height, also those that nothing else says it of. */
const evenRows = (rows: number): PlanFormat => ({
  area: { row: 0, column: 0, rows, columns: page.columns },
  rowHeight: lineHeight,
});

const partsOf = (answer: Answer, facts: SheetFacts, figures: Figures) => [
  titleSection(answer, facts, figures),
  verdictSection(answer, figures),
  fourCasesSection(answer, figures),
  driversSection(answer, figures),
  askedSection(answer),
  chartsSection(answer),
  evidenceSection(answer, figures),
  fitSection(answer, figures),
  guardsSection(answer),
  howMadeSection(answer, facts),
];

/** The functions of a live sheet read the settings that stand on it; where they stand is known once it is laid out. */
function liveWithSettings(answer: Answer, facts: SheetFacts): Figures {
  const figuresWith = (settings: string): Figures =>
    liveFigures(answer, { ...(facts.table?.columns ?? facts.ranges), settings });
  const { starts } = stack(partsOf(answer, facts, figuresWith("$A$1")));
  return figuresWith(settingsArea(answer, facts, starts[part.howMade] ?? 0));
}

const longestName = 31;

/** A name Excel takes: at most 31 characters, none of \ / ? * [ ] : and no apostrophe at either end. */
function sheetName(outcome: string): string {
  const plain = outcome.replaceAll(/[\\/?*[\]:']/g, " ").trim();
  const suffix = " answer";
  return `${plain.slice(0, longestName - suffix.length - 3).trim() || "Regression"}${suffix}`;
}
