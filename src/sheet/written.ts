import type { Area, PlanBlock, PlanCell, SheetPlan } from "./plan.ts";

/**
 * A rectangle of cells that Footing wrote, each told by a short mark of what it held: so that it can be seen later
 * whether a cell still holds what was written there, or something of its user's.
 */
export interface WrittenBlock extends Area {
  /** Row by row, `markLength` letters a cell. */
  readonly marks: string;
}

const markLength = 4;
const empty = ".".repeat(markLength);
const letters = "ABCDEFGHIJKLMNOPQRSTUVWXYZabcdefghijklmnopqrstuvwxyz0123456789-_";

/** What a plan puts into cells; a link's text stands in its cell. */
export function writtenBlocks({ blocks, links }: SheetPlan): WrittenBlock[] {
  const texts = new Map(links.map(({ row, column, text }) => [`${row},${column}`, text]));
  return blocks.map((block) => {
    const columns = Math.max(0, ...block.cells.map(({ length }) => length));
    const marks = block.cells.map((line, r) =>
      Array.from({ length: columns }, (_, c) =>
        markOf(texts.get(`${block.row + r},${block.column + c}`) ?? heldBy(line[c] ?? null)),
      ).join(""),
    );
    return { ...cornerOf(block), rows: block.cells.length, columns, marks: marks.join("") };
  });
}

const cornerOf = ({ row, column }: PlanBlock) => ({ row, column });

function heldBy(cell: PlanCell): string | number {
  if (cell === null) return "";
  switch (cell.kind) {
    case "text":
      return cell.text;
    case "number":
      return cell.number;
    case "formula":
      return cell.formula;
  }
}

/** Cells that hold nothing belong to no one: whoever emptied a cell has given it up. */
export const isEmptyValue = (value: unknown): boolean => value === "" || value === null;

/** Whether a cell holds what one of the blocks says was written there. */
export function isAsWritten(
  blocks: readonly WrittenBlock[],
  at: Pick<Area, "row" | "column">,
  value: unknown,
): boolean {
  const mark = markOf(value as string | number);
  return blocks.some(({ row, column, rows, columns, marks }) => {
    const [r, c] = [at.row - row, at.column - column];
    if (r < 0 || c < 0 || r >= rows || c >= columns) return false;
    const start = (r * columns + c) * markLength;
    return marks.slice(start, start + markLength) === mark;
  });
}

/** A spreadsheet shows and keeps 15 digits of a number; those behind them may differ from one reading to the next. */
const digits = 15;

/** 24 bits of a hash: a cell that was changed is mistaken for one that was not once in 16 million. */
function markOf(value: string | number | boolean): string {
  if (isEmptyValue(value)) return empty;
  const hash = hashOf(typeof value === "number" ? `#${Number(value.toPrecision(digits)) + 0}` : `"${String(value)}`);
  return [18, 12, 6, 0].map((shift) => letters[(hash >>> shift) & 63]).join("");
}

/** The 32-bit FNV-1a hash (Fowler, Noll and Vo 1991) over UTF-16 units, its upper bits folded in. */
function hashOf(text: string): number {
  let hash = 0x811c9dc5;
  for (let index = 0; index < text.length; index++) hash = Math.imul(hash ^ text.charCodeAt(index), 0x01000193);
  return (hash ^ (hash >>> 24)) >>> 0;
}
