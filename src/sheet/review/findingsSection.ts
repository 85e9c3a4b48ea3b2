import { capitalised } from "../../core/answer/wording.ts";
import type { Finding } from "../../core/review/finding.ts";
import { gravestFirst } from "../../core/review/reviewWords.ts";
import type { PlanCell, PlanFormat, PlanLink } from "../plan.ts";
import { type Section, section, text } from "../section.ts";
import { type LabelledLine, acrossReview, labelledCells, labelledFormats, linkTo } from "./reviewPage.ts";

/** Links stand in these columns, so that a long address has room to its right. */
const linkColumns = [1, 4] as const;

interface Block {
  readonly rows: readonly (readonly PlanCell[])[];
  readonly formats: (row: number) => readonly PlanFormat[];
  readonly links: (row: number) => readonly PlanLink[];
}

/** Findings, the gravest first: what, what to do, the figures, the cells to jump to. */
export function findingsSection(heading: string, findings: readonly Finding[], none: string): Section {
  const blocks = findings.length === 0 ? [noneBlock(none)] : gravestFirst(findings).map(findingBlock);
  const rows: (readonly PlanCell[])[] = [[text(heading)]];
  const formats: PlanFormat[] = [acrossReview(0, "heading")];
  const links: PlanLink[] = [];
  for (const block of blocks) {
    formats.push(...block.formats(rows.length));
    links.push(...block.links(rows.length));
    rows.push(...block.rows);
  }
  return section(rows, formats, links);
}

const noneBlock = (words: string): Block => ({
  rows: [[text(words)]],
  formats: (row) => [acrossReview(row, "sentence")],
  links: () => [],
});

function findingBlock(finding: Finding): Block {
  const lines = linesOf(finding);
  const linkRows = Math.ceil(finding.cells.length / linkColumns.length);
  const cellRows = Array.from({ length: linkRows }, (_, row): PlanCell[] => [text(row === 0 ? "Cells" : "")]);
  return {
    rows: [...lines.map(labelledCells), ...cellRows],
    formats: (row) => [
      ...lines.flatMap((line, index) => labelledFormats(row + index, line)),
      ...cellRows.map((_, index): PlanFormat => ({
        area: { row: row + lines.length + index, column: 0, rows: 1, columns: 1 },
        style: "label",
      })),
    ],
    links: (row) =>
      finding.cells.flatMap((cell, index) =>
        linkTo(row + lines.length + placeOf(index).row, placeOf(index).column, cell),
      ),
  };
}

const placeOf = (index: number): { readonly row: number; readonly column: number } => ({
  row: Math.floor(index / linkColumns.length),
  column: linkColumns[index % linkColumns.length]!,
});

function linesOf({ rank, what, toDo, reported, recomputed }: Finding): LabelledLine[] {
  const figures: LabelledLine[] =
    reported === null && recomputed === null
      ? []
      : [
          {
            label: "Figures",
            words: `Reported ${reported ?? "-"}, recomputed ${recomputed ?? "-"}.`,
            style: "sentence",
          },
        ];
  return [
    { label: capitalised(rank), words: what, style: "table heading" },
    { label: "What to do", words: toDo, style: "sentence" },
    ...figures,
  ];
}
