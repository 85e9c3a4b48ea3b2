import type { Area, PlanBlock, PlanCell, PlanFormat, PlanLink, SheetPlan } from "../sheet/plan.ts";
import { dress } from "./styles.ts";

/** Excel on the web refuses requests above 5 MB; a cell takes some 25 bytes, a sentence a few hundred. */
const cellsAtOnce = 20_000;

export const rangeAt = (sheet: Excel.Worksheet, { row, column, rows, columns }: Area): Excel.Range =>
  sheet.getRangeByIndexes(row, column, rows, columns);

/** Writes all blocks, a bounded number of cells a trip. */
export async function writeBlocks(sheet: Excel.Worksheet, blocks: readonly PlanBlock[]): Promise<void> {
  let unsent = 0;
  for (const piece of blocks.flatMap(pieces)) {
    const cells = piece.cells.length * width(piece);
    if (cells === 0) continue;
    if (unsent > 0 && unsent + cells > cellsAtOnce) {
      await sheet.context.sync();
      unsent = 0;
    }
    writePiece(sheet, piece);
    unsent += cells;
  }
  await sheet.context.sync();
}

const width = ({ cells }: PlanBlock): number => Math.max(0, ...cells.map(({ length }) => length));

function pieces(block: PlanBlock): PlanBlock[] {
  const height = Math.max(1, Math.floor(cellsAtOnce / Math.max(1, width(block))));
  return Array.from({ length: Math.ceil(block.cells.length / height) }, (_, piece) => ({
    row: block.row + piece * height,
    column: block.column,
    cells: block.cells.slice(piece * height, (piece + 1) * height),
  }));
}

function writePiece(sheet: Excel.Worksheet, { row, column, cells }: PlanBlock): void {
  const columns = width({ row, column, cells });
  const range = rangeAt(sheet, { row, column, rows: cells.length, columns });
  range.formulas = cells.map((line) => Array.from({ length: columns }, (_, index) => entered(line[index] ?? null)));
}

/** A text is entered behind an apostrophe, which Excel takes off: so it is never read as a formula, a date or a number. */
function entered(cell: PlanCell): string | number | null {
  if (cell === null) return null;
  switch (cell.kind) {
    case "text":
      return cell.text === "" ? null : `'${cell.text}`;
    case "number":
      return cell.number;
    case "formula":
      return cell.formula;
  }
}

export function applyFormats(sheet: Excel.Worksheet, formats: readonly PlanFormat[]): void {
  for (const { area, style, numberFormat, wrap, align, merge, rowHeight } of formats) {
    const range = rangeAt(sheet, area);
    // One format for all cells is given bare, which the library's types do not say.
    if (numberFormat !== undefined) Object.assign(range, { numberFormat });
    if (style !== undefined) dress(range, style);
    if (wrap !== undefined) range.format.wrapText = wrap;
    if (align !== undefined) range.format.horizontalAlignment = alignments[align];
    if (merge === true) range.merge(false);
    if (rowHeight !== undefined) range.format.rowHeight = rowHeight;
  }
}

const alignments = { left: "Left", right: "Right", center: "Center" } as const;

/** A character of the normal font is 7 pixels wide, with 5 around the text; Excel's API counts in points of 4/3 pixels. */
const pointsOf = (characters: number): number => (characters * 7 + 5) * 0.75;

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
