import { pointsOf } from "../sheet/columns.ts";
import type { Area, PlanBlock, PlanCell, PlanFormat, PlanLink, SheetPlan } from "../sheet/plan.ts";
import { dress } from "./styles.ts";

/** Excel on the web refuses requests above 5 MB; a character takes up to three bytes. */
const charactersAtOnce = 1_200_000;

export const rangeAt = (sheet: Excel.Worksheet, { row, column, rows, columns }: Area): Excel.Range =>
  sheet.getRangeByIndexes(row, column, rows, columns);

/** Writes all blocks, a bounded amount a trip. */
export async function writeBlocks(sheet: Excel.Worksheet, blocks: readonly PlanBlock[]): Promise<void> {
  let unsent = 0;
  for (const piece of blocks.flatMap(pieces)) {
    const characters = piece.cells.reduce((sum, line) => sum + charactersIn(line), 0);
    if (unsent > 0 && unsent + characters > charactersAtOnce) {
      await sheet.context.sync();
      unsent = 0;
    }
    writePiece(sheet, piece);
    unsent += characters;
  }
  await sheet.context.sync();
}

/** Numbers have up to 24 characters, and a comma. */
const charactersIn = (line: readonly PlanCell[]): number =>
  line.reduce((sum, cell) => sum + (cell === null ? 5 : entered(cell).toString().length + 3), 0);

/** A block in as few pieces of whole rows as one trip each allows. */
function pieces({ row, column, cells }: PlanBlock): PlanBlock[] {
  const columns = Math.max(0, ...cells.map(({ length }) => length));
  if (columns === 0) return [];
  const found: PlanCell[][][] = [];
  let room = 0;
  for (const line of cells) {
    const whole = Array.from({ length: columns }, (_, index) => line[index] ?? null);
    const characters = charactersIn(whole);
    if (characters > room) {
      found.push([]);
      room = charactersAtOnce;
    }
    found.at(-1)?.push(whole);
    room -= characters;
  }
  let next = row;
  return found.map((lines) => ({ row: (next += lines.length) - lines.length, column, cells: lines }));
}

function writePiece(sheet: Excel.Worksheet, { row, column, cells }: PlanBlock): void {
  const range = rangeAt(sheet, { row, column, rows: cells.length, columns: cells[0]?.length ?? 0 });
  // A null leaves its cell as it is: empty, on a new sheet.
  range.formulas = cells.map((line) => line.map((cell) => (cell === null ? null : entered(cell))));
}

/** A text is entered behind an apostrophe, which Excel takes off: so it is never read as a formula, a date or a number. */
function entered(cell: NonNullable<PlanCell>): string | number {
  switch (cell.kind) {
    case "text":
      return cell.text === "" ? "" : `'${cell.text}`;
    case "number":
      return cell.number;
    case "formula":
      return cell.formula;
  }
}

export function applyFormats(sheet: Excel.Worksheet, formats: readonly PlanFormat[]): void {
  for (const { area, style, numberFormat, wrap, align, indent, merge, rowHeight } of formats) {
    const range = rangeAt(sheet, area);
    // One format for all cells is given bare, which the library's types do not say.
    if (numberFormat !== undefined) Object.assign(range, { numberFormat });
    if (style !== undefined) dress(range, style);
    if (wrap !== undefined) range.format.wrapText = wrap;
    if (align !== undefined) range.format.horizontalAlignment = alignments[align];
    if (indent !== undefined) range.format.indentLevel = indent;
    if (merge === true) range.merge(false);
    if (rowHeight !== undefined) range.format.rowHeight = rowHeight;
  }
}

const alignments = { left: "Left", right: "Right", center: "Center" } as const;

export function setWidths(sheet: Excel.Worksheet, widths: SheetPlan["columnWidths"]): void {
  for (const [column, characters] of widths.entries()) {
    rangeAt(sheet, { row: 0, column, rows: 1, columns: 1 }).format.columnWidth = pointsOf(characters);
  }
}

export function addLinks(sheet: Excel.Worksheet, links: readonly PlanLink[]): void {
  for (const { row, column, text, target } of links) {
    rangeAt(sheet, { row, column, rows: 1, columns: 1 }).hyperlink = {
      documentReference: target,
      textToDisplay: text,
      screenTip: `Go to ${target}`,
    };
  }
}
