import { cellRef, dateToSerial, rangeRef, readXlsx, type Cell, type CellValue, type Sheet, type Workbook } from "hucre";
import type { BookCell, BookData, BookValue, SheetData, StyledCell } from "../book/bookData.ts";
import { chartParts, toBookChart, withoutEmptyLines } from "./charts.ts";
import { putTogether } from "./elements/putTogether.ts";
import { asBeforeLibreOffice, isFromLibreOffice } from "./fromLibreOffice.ts";
import { readKept, type Kept } from "./keptParts.ts";
import { toBookFooter } from "./footers.ts";
import { inPoints } from "./margins.ts";
import { changeParts, pack, partsMatching, textOf, unpack } from "./parts.ts";
import { readable, unreadable, whyNoXlsx, type Reading } from "./reading.ts";
import { toShown } from "./storedFormulas.ts";
import { toBookStyle, type UsualLooks } from "./styles.ts";

/** Excel's own standard, for files that name none. */
const standardSize = 11;

/**
 * Reads a workbook file. Dates come as serial numbers of the 1900 system with their date format,
 * whatever the file counts from; cells inside a spill keep the value that the file remembers.
 */
export async function openXlsx(bytes: Uint8Array): Promise<Reading<BookData>> {
  const because = whyNoXlsx(bytes);
  if (because !== null) return unreadable(because);
  const parsed = await parse(bytes);
  if (parsed === null) return unreadable("it is damaged, or no Excel workbook (.xlsx)");
  const read = toBook(parsed.workbook);
  const found = isFromLibreOffice(bytes) ? asBeforeLibreOffice(read) : read;
  const book = withKept(putTogether(found), parsed.kept);
  return readable(isCalculatedByHand(bytes) ? { ...book, manualCalculation: true } : book);
}

/** Whatever the library trips over in a file is the file's fault. */
async function parse(bytes: Uint8Array): Promise<{ readonly workbook: Workbook; readonly kept: Kept } | null> {
  try {
    return { workbook: await readXlsx(withPlainCharts(bytes), { readStyles: true }), kept: readKept(bytes) };
  } catch {
    return null;
  }
}

function isCalculatedByHand(bytes: Uint8Array): boolean {
  const [part] = Object.values(partsMatching(bytes, /^xl\/workbook\.xml$/));
  return part !== undefined && /<(?:\w+:)?calcPr\b[^>]*\bcalcMode="manual"/.test(textOf(part));
}

/** The file library reads the width of a line that is not drawn: such lines are taken out before it looks. */
function withPlainCharts(bytes: Uint8Array): Uint8Array {
  const charts = partsMatching(bytes, chartParts);
  return Object.keys(charts).length === 0 ? bytes : pack(changeParts(unpack(bytes), chartParts, withoutEmptyLines));
}

/** Names that Excel keeps for itself: what is printed, filtered, or taken for a criterion. */
const ownToExcel = "_xlnm.";

function toBook(workbook: Workbook): BookData {
  const usual = { theme: workbook.themeColors ?? [], size: workbook.defaultFont?.size ?? standardSize };
  return {
    sheets: workbook.sheets.map((sheet) => toSheet(sheet, usual)),
    names: (workbook.namedRanges ?? [])
      .filter(({ name }) => !name.startsWith(ownToExcel))
      .map(({ name, range, scope, comment }) => ({
        name,
        refersTo: range,
        ...(scope !== undefined && { sheet: scope }),
        ...(comment !== undefined && { comment }),
      })),
    active: workbook.activeSheet ?? 0,
  };
}

/** The book with what add-ins kept in it. */
function withKept(book: BookData, { customXml, settings, customProperties }: Kept): BookData {
  const sheets = book.sheets.map((sheet) => ({ ...sheet, customProperties: customProperties[sheet.name] ?? {} }));
  return { ...book, sheets, customXml, settings };
}

function toSheet(sheet: Sheet, usual: UsualLooks): SheetData {
  const { name, columns = [], merges = [], tables = [], charts = [] } = sheet;
  return {
    name,
    rows: sheet.rows.map((row, r) => row.map((value, c) => toCell(value, sheet.cells?.get(`${r},${c}`), usual))),
    columnWidths: columns.map(({ width }) => width),
    rowHeights: heightsOf(sheet),
    merges: merges.map((area) => rangeRef(area.startRow, area.startCol, area.endRow, area.endCol)),
    frozenRows: sheet.freezePane?.rows ?? 0,
    hidden: sheet.hidden === true || sheet.veryHidden === true,
    hiddenRows: [...(sheet.rowDefs ?? [])].filter(([, { hidden }]) => hidden === true).map(([row]) => row),
    ...hiddenColumnsOf(columns),
    protected: sheet.protection?.sheet === true,
    tables: tables.flatMap(({ name: table, range }) => (range === undefined ? [] : [{ name: table, address: range }])),
    charts: charts.map(toBookChart).filter((chart) => chart !== null),
    ...printingOf(sheet),
    ...((sheet.rowBreaks ?? []).length > 0 && { pageBreaks: sheet.rowBreaks!.map((last) => last + 1) }),
    links: linksOf(sheet),
  };
}

type Printing = Pick<SheetData, "printArea" | "onePageWide" | "landscape" | "margins" | "footer">;

function hiddenColumnsOf(columns: NonNullable<Sheet["columns"]>): Pick<SheetData, "hiddenColumns"> {
  const hidden = columns.flatMap((column, index) => (column.hidden === true ? [index] : []));
  return hidden.length === 0 ? {} : { hiddenColumns: hidden };
}

function printingOf({ pageSetup: setup, headerFooter }: Sheet): Printing {
  const footer = toBookFooter(headerFooter?.oddFooter ?? "");
  return {
    printArea: setup?.printArea?.replaceAll("$", "") ?? null,
    onePageWide: setup?.fitToPage === true && setup.fitToWidth !== 0,
    landscape: setup?.orientation === "landscape",
    ...(setup?.margins !== undefined && { margins: inPoints(setup.margins) }),
    ...(footer !== null && { footer }),
  };
}

/** In points; programs write it for every row, whether anyone asked for it or not. */
const standardHeight = 15;

function heightsOf({ rowDefs }: Sheet): readonly (number | undefined)[] {
  const heights: (number | undefined)[] = [];
  rowDefs?.forEach(({ height }, row) => {
    if (height !== undefined && height !== standardHeight) heights[row] = height;
  });
  return Array.from(heights);
}

function toCell(plain: CellValue, cell: Cell | undefined, usual: UsualLooks): BookCell {
  const value = toValue(plain, cell);
  if (cell === undefined) return value;
  const style = cell.style && toBookStyle(cell.style, usual);
  if (cell.formula === undefined && style === undefined) return value;
  return { value, ...formulaOf(cell), ...(style !== undefined && { style }) };
}

function formulaOf({ formula, formulaType, formulaRef }: Cell): Pick<StyledCell, "formula" | "spill"> {
  if (formula === undefined || formula === "") return {};
  const spills = formulaType === "array" && formulaRef?.includes(":") === true;
  return { formula: toShown(formula), ...(spills && { spill: formulaRef }) };
}

const errorSign = /^#(?:NULL!|DIV\/0!|VALUE!|REF!|NAME\?|NUM!|N\/A|SPILL!|CALC!|BUSY!|GETTING_DATA)$/;

/** The result of a formula that failed may stand in a file as text; typed text of that look is an error in Excel too. */
function toValue(plain: CellValue, cell: Cell | undefined): BookValue {
  if (plain instanceof Date) return serialOf(plain);
  const isError = cell?.type === "error" || (cell?.formula !== undefined && errorSign.test(String(plain)));
  return isError ? { error: String(plain) } : plain;
}

/** A number that no calendar reaches is shown as a row of # signs in a date cell: an error to whoever computes with it. */
function serialOf(date: Date): BookValue {
  const serial = dateToSerial(date);
  return Number.isFinite(serial) ? serial : { error: "#NUM!" };
}

function linksOf(sheet: Sheet): SheetData["links"] {
  return [...(sheet.cells ?? [])].flatMap(([place, { hyperlink }]) => {
    if (hyperlink === undefined) return [];
    const [row, column] = place.split(",").map(Number);
    return [{ cell: cellRef(row!, column!), target: hyperlink.location ?? hyperlink.target }];
  });
}
