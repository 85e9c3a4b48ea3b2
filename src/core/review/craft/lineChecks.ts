import { cellKind } from "../../table/cells.ts";
import { sense, sensesOf } from "../../table/senses.ts";
import { rowsOf } from "../../table/locate.ts";
import { cellInWords } from "../../table/spots.ts";
import type { ClaimedLine } from "../claim.ts";
import type { Finding, Rank } from "../finding.ts";
import type { Stretch } from "../found/claimedLines.ts";
import { addressesAlong, craftFinding } from "./craftFinding.ts";
import { found } from "./craftWords.ts";

/** A claimed line with the sheet it stands on. */
export interface CheckedLine {
  readonly line: ClaimedLine;
  readonly stretch: Stretch;
}

/** What stands among the claimed cells of a line that no regression can use. Text that is a number is the refit's to tell. */
export function unusableCells({ line, stretch }: CheckedLine): Finding[] {
  const start = line.from - line.first;
  const cells = rowsOf(line.cells, start, start + line.count);
  const senses = sensesOf(cells);
  return unusable.flatMap(({ code, rank, is, says }) => {
    const rows: number[] = [];
    for (let row = 0; row < senses.length; row++) if (is(senses[row]!, cells.kinds[row]!)) rows.push(row);
    if (rows.length === 0) return [];
    const addresses = addressesAlong(
      stretch,
      rows.map((row) => line.from + row),
    );
    return [
      craftFinding(code, { rank, cells: addresses, what: says(line.name, rows.length, cellInWords(cells, rows[0]!)) }),
    ];
  });
}

interface Unusable {
  readonly code: "textInRange" | "errorsInRange" | "blanksInRange";
  readonly rank: Rank;
  readonly is: (sense: number, kind: number) => boolean;
  readonly says: (line: string, count: number, example: string) => string;
}

const isFault = (one: number, kind: number): boolean => one === sense.error || kind === cellKind.error;

const unusable: readonly Unusable[] = [
  {
    code: "textInRange",
    rank: "changes a number",
    is: (one, kind) => (one === sense.text || one === sense.mark) && !isFault(one, kind),
    says: found.textInRange,
  },
  { code: "errorsInRange", rank: "changes a number", is: isFault, says: found.errorsInRange },
  { code: "blanksInRange", rank: "worth knowing", is: (one) => one === sense.blank, says: found.blanksInRange },
];

/** A line in a hidden column or row. */
export function hiddenLine({ line, stretch }: CheckedLine): Finding[] {
  const { sheet, runs, track } = stretch;
  const hidden = runs === "down" ? sheet.hiddenColumns : sheet.hiddenRows;
  if (!hidden.includes(track)) return [];
  const cells = addressesAlong(stretch, [stretch.from]);
  return [craftFinding("hiddenLine", { rank: "worth knowing", cells, what: found.hiddenLine(line.name, runs) })];
}

/** So many formulas make a column of formulas, and so large a share of its cells. */
const fewestFormulas = 3;
const shareOfFormulas = 0.75;

/** Numbers typed into a line of formulas. */
export function typedOverFormulas({ line, stretch }: CheckedLine): Finding[] {
  const { sheet, runs, track, from, count } = stretch;
  if (runs !== "down") return [];
  const calculated = sheet.calculated[track - sheet.firstColumn] ?? null;
  if (calculated === null) return [];
  const typed: number[] = [];
  let formulas = 0;
  for (let row = from; row < from + count; row++) {
    if (calculated[row - sheet.firstRow] === 1) formulas++;
    else if (sheet.columns[track - sheet.firstColumn]!.kinds[row - sheet.firstRow] === cellKind.number) typed.push(row);
  }
  if (typed.length === 0 || formulas < fewestFormulas || formulas < shareOfFormulas * count) return [];
  const cells = addressesAlong(stretch, typed);
  const what = found.overFormula(line.name, typed.length, formulas);
  return [craftFinding("overFormula", { rank: "changes a number", cells, what })];
}
