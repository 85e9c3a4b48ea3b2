import type { Answer } from "../core/answer/answer.ts";
import { type Grid, answerTable, choiceText, evidenceTable, verdictLines } from "../core/answer/tables.ts";
import { columnLetters } from "../core/table/address.ts";
import { liveColumn } from "./columns.ts";
import type { SourceRanges } from "./facts.ts";
import type { PlanBlock, PlanCell, PlanFormat } from "./plan.ts";
import { cellOf, formula, text } from "./section.ts";

/**
 * Where a result sheet takes its figures from: the same layout serves a kept sheet (values) and a live one
 * (references into the spilled results of a few large worksheet functions).
 */
export interface Figures {
  readonly answer: (row: number, column: number) => PlanCell;
  readonly evidence: (row: number, column: number) => PlanCell;
  readonly verdict: (line: number) => PlanCell;
  readonly choice: () => PlanCell;
  /** The text put where a condition on the evidence holds: the mark of the case that the tests point at. */
  readonly mark: (spread: string, followOn: string, words: string) => PlanCell;
  /** Words where a spreadsheet shows the first cell of a result alone, so that figures are missing; null on a kept sheet. */
  readonly notSpilled: PlanCell;
  readonly blocks: readonly PlanBlock[];
  readonly formats: readonly PlanFormat[];
}

/** The case that the tests point at is in force unless a kind was fixed by hand. */
const markOf = ({ override }: Answer["decision"], words: string): string =>
  `▶ ${words} (${override === null ? "in force" : "the tests point here"})`;

/** Figures as values. */
export function keptFigures(answer: Answer): Figures {
  const [answers, evidence, lines] = [answerTable(answer), evidenceTable(answer), verdictLines(answer)];
  const { decision } = answer;
  const { fourCase } = decision;
  return {
    answer: (row, column) => valueAt(answers, row, column),
    evidence: (row, column) => valueAt(evidence, row, column),
    verdict: (line) => text(lines[line] ?? ""),
    choice: () => text(choiceText(answer)),
    mark: (spread, followOn, words) => {
      const pointsHere = spread === fourCase.spread && matchesFollowOn(followOn, fourCase.followOn);
      return text(pointsHere ? markOf(decision, words) : words);
    },
    notSpilled: null,
    blocks: [],
    formats: [],
  };
}

/** Where follow-on was not asked, the column "none" is the one that holds. */
const matchesFollowOn = (column: string, found: string): boolean => column === (found === "some" ? "some" : "none");

const valueAt = (grid: Grid, row: number, column: number): PlanCell => {
  const value = grid[row]?.[column];
  return value === undefined ? null : cellOf(value);
};

/** The ranges and the settings range that a live sheet's functions read. */
export interface LiveSources extends SourceRanges {
  readonly settings: string;
}

const liveRow = 3;

/** Figures as references into spilled results; `answer` gives the sizes that the spills have now. */
export function liveFigures(answer: Answer, sources: LiveSources): Figures {
  const [answers, evidence] = [answerTable(answer), evidenceTable(answer)];
  const { outcome, drivers, key, settings } = sources;
  const data = `${outcome},${drivers}`;
  const tail = `${settings}${key === null ? "" : `,${key}`}`;
  const evidenceColumn = liveColumn + (answers[0]?.length ?? 0) + 1;
  const verdictColumn = evidenceColumn + (evidence[0]?.length ?? 0) + 1;
  const choiceColumn = verdictColumn + 2;
  const [spread, followOn] = [
    at(1, evidenceColumn + readingColumn(evidence)),
    at(2, evidenceColumn + readingColumn(evidence)),
  ];
  // A figure that does not apply by its nature stays blank: a formula there would have nothing to show.
  const liveFrom =
    (grid: Grid, first: number) =>
    (row: number, column: number): PlanCell =>
      grid[row]?.[column] === "" ? null : reference(at(row, first + column));
  return {
    answer: liveFrom(answers, liveColumn),
    evidence: liveFrom(evidence, evidenceColumn),
    verdict: (line) => reference(at(line, verdictColumn)),
    choice: () => reference(at(0, choiceColumn)),
    mark: (spreadIs, followOnIs, words) =>
      formula(
        `=IF(AND(${spread}="${spreadIs}",(${followOn}="some")=${followOnIs === "some" ? "TRUE" : "FALSE"}),"${markOf(answer.decision, words)}","${words}")`,
      ),
    notSpilled: unlessSpilled(at(0, liveColumn), at(0, liveColumn + 1)),
    blocks: [
      spill(liveColumn, "Live figures", `=FOOTING.ANSWER(${data},${tail})`),
      spill(evidenceColumn, "Live evidence", `=FOOTING.EVIDENCE(${data},,${tail})`),
      spill(verdictColumn, "Live verdict", `=FOOTING.VERDICT(${data},,${tail})`),
      spill(choiceColumn, "Live choice", `=FOOTING.CHOICE(${data},${tail})`),
    ],
    formats: [
      {
        area: { row: liveRow - 1, column: liveColumn, rows: 1, columns: choiceColumn - liveColumn + 1 },
        style: "note",
      },
    ],
  };
}

/** A text in a formula has room for 255 characters. */
const notSpilledWords =
  "This spreadsheet shows the first cell of each function's result and not the rest, so figures are missing here. Open the workbook in a version of Excel that spills results; for other readers, turn the sheet into a kept one there.";

const unlessSpilled = (first: string, second: string): PlanCell =>
  formula(`=IF(ISERROR(${first}),"",IF(AND(${first}<>"",${second}=""),"${notSpilledWords}",""))`);

/** The reading is the last column of the evidence table. */
const readingColumn = (evidence: Grid): number => (evidence[0]?.length ?? 1) - 1;

const at = (row: number, column: number): string => `$${columnLetters(column)}$${liveRow + row + 1}`;

/** A blank cell of a spill, or one beyond its end, shows as a blank and not as a zero. */
const reference = (address: string): PlanCell => formula(`=IF(${address}="","",${address})`);

const spill = (column: number, heading: string, call: string): PlanBlock => ({
  row: liveRow - 1,
  column,
  cells: [[text(`${heading} (these cells feed the page; leave the space below free)`)], [formula(call)]],
});
