import { cellKind } from "../../table/cells.ts";
import type { Book } from "../book.ts";
import { type CellPlace, kindAt, sheetNamed } from "../cellsOfBook.ts";
import type { Regression, UsedLine } from "../formula/foundRegression.ts";

/** Beyond so many cells of a line nobody is helped by the first that is no number. */
const farthest = 100_000;

/** The first cell of a regression that is no number, for which LINEST ends in an error; null where there is none. */
export function firstUnusable({ outcome, drivers }: Regression, book: Book): CellPlace | null {
  for (const line of [outcome, ...drivers]) {
    const place = firstIn(line, book);
    if (place !== null) return place;
  }
  return null;
}

function firstIn({ area }: UsedLine, book: Book): CellPlace | null {
  const sheet = sheetNamed(book, area.sheet);
  if (sheet === null) return null;
  const cells = Math.min(area.rows * area.columns, farthest);
  const down = area.columns === 1;
  for (let index = 0; index < cells; index++) {
    const place = { sheet, row: area.row + (down ? index : 0), column: area.column + (down ? 0 : index) };
    const kind = kindAt(place);
    if (kind !== cellKind.number && kind !== cellKind.date) return place;
  }
  return null;
}
