import {
  parseRange,
  writeXlsx,
  type Cell,
  type CellValue,
  type ColumnDef,
  type RowDef,
  type TableDefinition,
  type WriteSheet,
} from "hucre";
import type { BookData, BookValue, SheetData, StyledCell } from "../book/bookData.ts";
import { absolute } from "./absolute.ts";
import { isStyled, valueOf } from "./cells.ts";
import { chartParts, toFileChart, finishedChart } from "./charts.ts";
import { withHiddenSpillNames } from "./elements/spillNames.ts";
import { standardFont, withWholeFonts } from "./fonts.ts";
import { keptOf, withKept } from "./keptParts.ts";
import { toFileFooter } from "./footers.ts";
import { inInches } from "./margins.ts";
import { changeParts, pack, unpack, type Parts } from "./parts.ts";
import { toStored } from "./storedFormulas.ts";
import { toFileStyle } from "./styles.ts";

/** Writes a workbook file that Excel and others open, every formula with its last result. */
export async function saveXlsx(book: BookData): Promise<Uint8Array> {
  return pack(withKept(await toParts(book, standardFont), keptOf(book)));
}

/** The parts of the file; texts stand in their cells, so that sheets can be carried into another workbook. */
export async function toParts(book: BookData, usualFont: string): Promise<Parts> {
  const bytes = await writeXlsx({
    sheets: book.sheets.map(toFileSheet),
    namedRanges: book.names.map(({ name, refersTo, sheet, comment }) => ({
      name,
      range: refersTo.replace(/^=/, ""),
      ...(sheet !== undefined && { scope: sheet }),
      ...(comment !== undefined && { comment }),
    })),
    activeSheet: book.active,
    stringMode: "inline",
  });
  return finishes(book, usualFont).reduce((parts, [path, finish]) => changeParts(parts, path, finish), unpack(bytes));
}

/** What each kind of part still needs after the file library has written it. */
const finishes = (book: BookData, usualFont: string): readonly (readonly [RegExp, (part: string) => string])[] => [
  [/^xl\/worksheets\/[^/]+\.xml$/, withErrorResults],
  [chartParts, finishedChart],
  [/^xl\/styles\.xml$/, (part) => withWholeFonts(part, usualFont)],
  [/^xl\/workbook\.xml$/, (part) => withHiddenSpillNames(finishedWorkbook(part, book))],
  [/^docProps\/app\.xml$/, finishedProperties],
];

/** Excel's own mark since 2019: with another it would calculate everything on opening, and show #NAME? where the add-in is missing. */
const calculatedBy = 'calcId="191029"';

/** The workbook part with saved results that stand, and with sheet names quoted in what is to be printed. */
const finishedWorkbook = (part: string, { manualCalculation }: BookData): string =>
  part
    .replace(/<calcPr[^>]*\/>/, `<calcPr ${calculatedBy}${manualCalculation ? ' calcMode="manual"' : ""}/>`)
    .replace(
      /(<definedName name="_xlnm\.Print_Area"[^>]*>)([^'<][^<]*?)(?=![^!<]*<)/g,
      (_, start: string, sheet: string) => `${start}'${sheet.replaceAll("'", "''")}'`,
    );

/** Programs keep saved text results only of files from those they know; as other libraries do, the file names Excel. */
const writtenAs = "<Application>Microsoft Excel</Application>";
const finishedProperties = (part: string): string => part.replace(/<Application>[^<]*<\/Application>/, writtenAs);

/** The file library writes the result of a failed formula as text; spreadsheets must know it for an error. */
function withErrorResults(sheetPart: string): string {
  return sheetPart.replace(
    / t="str">(<f(?: [^>]*)?>[^<]*<\/f><v>#(?:NULL!|DIV\/0!|VALUE!|REF!|NAME\?|NUM!|N\/A|SPILL!|CALC!)<\/v>)/g,
    ' t="e">$1',
  );
}

function toFileSheet(sheet: SheetData): WriteSheet {
  const { printArea } = sheet;
  return {
    name: sheet.name,
    rows: sheet.rows.map((row) => row.map((cell) => plain(valueOf(cell)))),
    cells: detailsOf(sheet),
    columns: columnDefsOf(sheet),
    merges: sheet.merges.map(parseRange),
    rowDefs: rowDefsOf(sheet),
    hidden: sheet.hidden,
    tables: sheet.tables.map((table) => toFileTable(table, sheet)),
    charts: sheet.charts.map(toFileChart),
    ...(sheet.frozenRows > 0 && { freezePane: { rows: sheet.frozenRows } }),
    ...(sheet.protected && { protection: { sheet: true } }),
    ...(sheet.pageBreaks !== undefined && { rowBreaks: sheet.pageBreaks.map(rowBefore) }),
    pageSetup: {
      ...(printArea !== null && { printArea: absolute(printArea) }),
      ...(sheet.landscape === true && { orientation: "landscape" }),
      ...(sheet.onePageWide && { fitToPage: true, fitToWidth: 1, fitToHeight: 0 }),
      ...(sheet.margins !== undefined && { margins: inInches(sheet.margins) }),
    },
    ...(sheet.footer !== undefined && { headerFooter: { oddFooter: toFileFooter(sheet.footer) } }),
  };
}

function columnDefsOf({ columnWidths, hiddenColumns = [] }: SheetData): ColumnDef[] {
  const count = Math.max(columnWidths.length, 1 + Math.max(-1, ...hiddenColumns));
  const hidden = new Set(hiddenColumns);
  return Array.from({ length: count }, (_, column) => {
    const width = columnWidths[column];
    return { ...(width !== undefined && { width }), ...(hidden.has(column) && { hidden: true }) };
  });
}

/** The file library names the last row of a page. */
const rowBefore = (row: number): number => row - 1;

function rowDefsOf({ rowHeights = [], hiddenRows }: SheetData): Map<number, RowDef> {
  const rowDefs = new Map<number, RowDef>();
  rowHeights.forEach((height, row) => {
    if (height !== undefined) rowDefs.set(row, { height });
  });
  hiddenRows.forEach((row) => rowDefs.set(row, { ...rowDefs.get(row), hidden: true }));
  return rowDefs;
}

const plain = (value: BookValue): CellValue => (typeof value === "object" && value !== null ? value.error : value);

/** Whatever a cell is beyond its value, by "row,column". */
function detailsOf(sheet: SheetData): Map<string, Partial<Cell>> {
  const details = new Map<string, Partial<Cell>>();
  sheet.rows.forEach((row, r) =>
    row.forEach((cell, c) => {
      if (typeof cell === "object" && cell !== null)
        details.set(
          `${r},${c}`,
          detailOf(cell, () => tableAt(sheet, r, c)),
        );
    }),
  );
  for (const { cell, target } of sheet.links) {
    const { startRow, startCol } = parseRange(cell);
    const place = `${startRow},${startCol}`;
    details.set(place, { ...details.get(place), hyperlink: linkTo(target) });
  }
  return details;
}

const linkTo = (target: string): NonNullable<Cell["hyperlink"]> =>
  /^[a-z]+:\/\/|^mailto:/i.test(target) ? { target } : { target: "", location: target };

function tableAt({ tables }: SheetData, row: number, column: number): string {
  const holds = tables.find(({ address }) => {
    const { startRow, startCol, endRow, endCol } = parseRange(address);
    return row >= startRow && row <= endRow && column >= startCol && column <= endCol;
  });
  return holds?.name ?? "";
}

function detailOf(cell: StyledCell | { readonly error: string }, inTable: () => string): Partial<Cell> {
  if (!isStyled(cell)) return { value: cell.error, type: "error" };
  const value = plain(cell.value);
  return {
    value,
    ...(cell.style !== undefined && { style: toFileStyle(cell.style) }),
    ...(cell.formula === undefined ? { type: typeOf(cell.value) } : formulaOf(cell, inTable())),
  };
}

function typeOf(value: BookValue): Cell["type"] {
  if (value === null) return "empty";
  if (typeof value === "object") return "error";
  return typeof value === "string" ? "string" : typeof value === "number" ? "number" : "boolean";
}

/** A formula that spills is marked as a dynamic array: without the mark Excel would show one cell of it, with "@". */
function formulaOf({ value, formula = "", spill }: StyledCell, inTable: string): Partial<Cell> {
  const result = plain(value);
  return {
    type: "formula",
    formula: toStored(formula, inTable),
    ...(result !== null && { formulaResult: result }),
    ...(spill !== undefined && { formulaDynamic: true, formulaType: "array", formulaRef: spill }),
  };
}

function toFileTable({ name, address }: SheetData["tables"][number], sheet: SheetData): TableDefinition {
  const { startRow, startCol, endCol } = parseRange(address);
  const headings = sheet.rows[startRow]?.slice(startCol, endCol + 1) ?? [];
  const columns = Array.from({ length: endCol - startCol + 1 }, (_, index) => {
    const heading = plain(valueOf(headings[index] ?? null));
    return { name: heading === null || heading === "" ? `Column${index + 1}` : String(heading) };
  });
  return { name, range: address, columns };
}
