import { type SheetArea, addressOf, localAddressOf } from "../../../core/table/address.ts";
import type { BookCell, BookData, BookValue, SheetData } from "../../book/bookData.ts";
import { cellIn, formulaOf, type Rows, valueOf, withFormula, withValue } from "../cells.ts";
import { type Element, elementFormula, readElement, readStandIn } from "./elementFormulas.ts";
import { isSpillName, spillOf } from "./spillNames.ts";

/**
 * The workbook with the results put together again that were saved cell by cell, and without the names that told of
 * them. A result of which another program has changed a cell, or moved one against the others, is left as it is there:
 * each cell has its own formula and goes on being right, and what was typed into one stays. Such results are told.
 */
export function putTogether(book: BookData): BookData {
  const spills = book.names.filter(isSpillName).map(spillOf);
  if (!book.names.some(isSpillName)) return book;
  const loosened: string[] = [];
  const sheets = book.sheets.map((sheet) => {
    const own = spills.filter((area) => area?.sheet === sheet.name).filter((area) => area !== null);
    return own.length === 0 ? sheet : together(sheet, own, loosened);
  });
  return {
    ...book,
    sheets,
    names: book.names.filter((name) => !isSpillName(name)),
    ...(loosened.length > 0 && { loosened }),
  };
}

function together(sheet: SheetData, areas: readonly SheetArea[], loosened: string[]): SheetData {
  const rows = sheet.rows.map((row) => [...row]);
  for (const area of areas) {
    const result = { area, parts: partsOf(rows, area) };
    if (isWhole(result)) layTogether(rows, result);
    else if (result.parts.length > 0) {
      layLoose(rows, result);
      loosened.push(addressOf(area));
    }
  }
  return { ...sheet, rows };
}

/** A cell's part of the result, with its value. */
interface Part extends Element {
  readonly value: BookValue;
}

/** What the cells of an area say of themselves; null for one that is no part of a result. */
type Parts = readonly (readonly (Part | null)[])[];

interface Result {
  readonly area: SheetArea;
  readonly parts: Parts;
}

function partsOf(rows: Rows, area: SheetArea): Parts {
  const cells = rows
    .slice(area.row, area.row + area.rows)
    .map((row) => row.slice(area.column, area.column + area.columns));
  const whole = commonest(cells.flatMap((line) => line.flatMap((cell) => elementIn(cell)?.whole ?? [])));
  return whole === null ? [] : cells.map((line) => line.map((cell) => partIn(cell, whole)));
}

const elementIn = (cell: BookCell): Element | null => readElement(formulaOf(cell) ?? "");

/** The formula that most cells are parts of: the others were changed. */
function commonest(formulas: readonly string[]): string | null {
  const tally = new Map<string, number>();
  for (const formula of formulas) tally.set(formula, (tally.get(formula) ?? 0) + 1);
  const [most] = [...tally].sort(([, first], [, second]) => second - first);
  return most?.[0] ?? null;
}

function partIn(cell: BookCell, whole: string): Part | null {
  const element = elementIn(cell);
  if (element !== null) return element.whole === whole ? { ...element, value: valueOf(cell) } : null;
  const standIn = readStandIn(formulaOf(cell) ?? "");
  return standIn === null ? null : { ...standIn, whole };
}

/** Whether every cell of the area is the part of the result that belongs there. */
const isWhole = ({ area, parts }: Result): boolean =>
  parts.length === area.rows &&
  parts.every(
    (line, row) =>
      line.length === area.columns && line.every((part, column) => part?.row === row + 1 && part.column === column + 1),
  );

/** What a function shows where it is not known; a result with such a part is calculated anew when it is opened. */
const unknown = "#NAME?";
const isUnknown = (value: BookValue): boolean => typeof value === "object" && value !== null && value.error === unknown;

function layTogether(rows: BookCell[][], result: Result): void {
  const { area, parts } = result;
  const saved = rows
    .slice(area.row, area.row + area.rows)
    .flatMap((row) => row.slice(area.column, area.column + area.columns));
  overlay(rows, result, (cell, { value }) => withValue(cell, value));
  const first = cellIn(rows, area.row, area.column);
  rows[area.row]![area.column] = {
    ...withFormula(first, parts[0]?.[0]?.whole ?? ""),
    ...(saved.map(valueOf).some(isUnknown) && { value: { error: unknown } }),
    spill: localAddressOf(area),
  };
}

/** Gives every part its own formula, also those that stood in for their value. */
const layLoose = (rows: BookCell[][], result: Result): void =>
  overlay(rows, result, (cell, part) =>
    withFormula(isUnknown(valueOf(cell)) ? cell : withValue(cell, part.value), elementFormula(part)),
  );

function overlay(rows: BookCell[][], { area, parts }: Result, laid: (cell: BookCell, part: Part) => BookCell): void {
  parts.forEach((line, row) =>
    line.forEach((part, column) => {
      const at = { row: area.row + row, column: area.column + column };
      if (part !== null) rows[at.row]![at.column] = laid(cellIn(rows, at.row, at.column), part);
    }),
  );
}
