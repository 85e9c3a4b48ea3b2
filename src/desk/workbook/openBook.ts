import { IDefinedNamesService } from "@univerjs/engine-formula";
import { parseAddress } from "../../core/table/address.ts";
import type { BookData, SheetData } from "../book/bookData.ts";
import type { Book } from "./book.ts";
import { recalculate } from "./calculation.ts";
import { toChartRecord } from "./charts.ts";
import type { Grid } from "./grid.ts";
import { nameId, wholeWorkbook } from "./names.ts";
import { emptySheetRecord, type SheetRecord } from "./records.ts";
import { seedSpills, unsavedFormulas } from "./savedResults.ts";
import { registerTable } from "./tables.ts";
import { isStyled, toGrid } from "./toGrid.ts";

let opened = 0;

/** Opens a workbook in the grid with the values it was saved with; nothing is calculated yet. */
export function openBook(grid: Grid, data: BookData): Book {
  opened += 1;
  const ids = data.sheets.map((_, index) => `sheet-${index + 1}`);
  const book: Book = {
    grid,
    unit: `book-${opened}`,
    sheets: new Map(data.sheets.map((sheet, index) => [ids[index]!, toRecord(sheet)])),
    customXml: (data.customXml ?? []).map((part) => ({ ...part })),
    settings: new Map(Object.entries(data.settings ?? {})),
    manualCalculation: data.manualCalculation ?? false,
    drafts: new Map(),
    listeners: new Set(),
  };
  // Told before the formula engine reads a formula: told later, they would count as changes.
  registerNames(book, data, ids);
  data.sheets.forEach((sheet, index) => registerTables(book, sheet, ids[index]!));
  const workbook = grid.api.createWorkbook(toGrid(book.unit, data, ids));
  data.sheets.forEach((sheet, index) => seedSpills(book, sheet, ids[index]!));
  workbook.setActiveSheet(ids[data.active] ?? ids[0]!);
  return book;
}

/** Calculates the formulas that were saved without a value, once an add-in's functions are known. */
export function calculateUnsaved(book: Book, data: BookData): void {
  const ids = [...book.sheets.keys()];
  const unsaved = data.sheets.flatMap((sheet, index) => unsavedFormulas(sheet, ids[index]!));
  // Awake before the first edit: what changes while the engine sleeps is never calculated.
  book.grid.awaken();
  if (unsaved.length > 0) recalculate(book, unsaved);
}

/** The grid gives a name the meaning that it learnt last: a name of the workbook, where a sheet has one called the same. */
function registerNames(book: Book, data: BookData, ids: readonly string[]): void {
  const names = book.grid.injector.get(IDefinedNamesService);
  const ofSheetsFirst = data.names.toSorted((one, other) => Number(!one.sheet) - Number(!other.sheet));
  for (const { name, refersTo, sheet, comment } of ofSheetsFirst) {
    const owner = ids[data.sheets.findIndex((one) => one.name === sheet)] ?? null;
    names.registerDefinedName(book.unit, {
      id: nameId(name, owner),
      name,
      formulaOrRefString: refersTo.replace(/^=/, ""),
      localSheetId: owner ?? wholeWorkbook,
      ...(comment !== undefined && { comment }),
    });
  }
}

function toRecord(sheet: SheetData): SheetRecord {
  const links = sheet.links.flatMap(({ cell, target }) => {
    const at = parseAddress(cell);
    return at === null ? [] : [[`${at.row},${at.column}`, { target, screenTip: "" }] as const];
  });
  return {
    ...emptySheetRecord(),
    charts: sheet.charts.map((chart, index) => toChartRecord(chart, { sheet, index })),
    links: new Map(links),
    customProperties: new Map(Object.entries(sheet.customProperties ?? {})),
    protected: sheet.protected,
    printArea: sheet.printArea,
    onePageWide: sheet.onePageWide,
    landscape: sheet.landscape ?? false,
    margins: sheet.margins ?? null,
    footer: sheet.footer ?? null,
    pageBreaks: [...(sheet.pageBreaks ?? [])],
  };
}

function registerTables(book: Book, data: SheetData, sheet: string): void {
  data.tables.forEach(({ name, address }, index) => {
    const area = parseAddress(address);
    if (area === null) return;
    const { row, column, rows, columns } = area;
    const table = { id: `{${sheet}-table-${index + 1}}`, name, row, column, rows, columns, style: "TableStyleMedium2" };
    const headings = Array.from({ length: columns }, (_, offset) => headingAt(data, row, column + offset));
    registerTable(book, { sheet, table }, headings);
    book.sheets.get(sheet)?.tables.push(table);
  });
}

function headingAt(sheet: SheetData, row: number, column: number): string {
  const cell = sheet.rows[row]?.[column] ?? null;
  const value = isStyled(cell) ? cell.value : cell;
  return value === null || typeof value === "object" ? "" : String(value);
}
