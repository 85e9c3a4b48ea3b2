import type { Errand } from "../app/errand.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import type { Book, BookName, BookSheet } from "../core/review/book.ts";
import { isTelling } from "../core/review/formula/telling.ts";
import type { SheetArea } from "../core/table/address.ts";
import { rectangleOf, whereabouts } from "./areas.ts";
import { hiddenColumnsOf, hiddenRowsOf } from "./hidden.ts";
import { sheetMark } from "./liveSheet.ts";
import { persist } from "./session.ts";
import { withReaders } from "./readers.ts";
import { type SheetCells, readSheetCells } from "./sheetReader.ts";
import { withSpills } from "./spills.ts";
import { type TablePlace, tablesOf } from "./tables.ts";

/** Reads every sheet with what a regression can rest on; the sheets that Footing wrote are nobody's work to review. */
export async function readBook(context: Excel.RequestContext, errand: Errand): Promise<Result<Book>> {
  const frame = await persist(() => frameOf(context));
  const count = frame.sheets.reduce((sum, { area }) => sum + area.rows * area.columns, 0);
  let done = 0;
  const read = (cells: number): void => {
    done += cells;
    errand.progress({ what: "Reading the workbook", share: done / count });
  };
  errand.progress({ what: "Reading the workbook", share: 0 });
  const telling = isTelling(frame.names);
  const sheets: BookSheet[] = [];
  const others: SheetCells["others"][] = [];
  for (const sheet of frame.sheets) {
    const cells = await readSheetCells(context, {
      area: sheet.area,
      isTelling: telling,
      read,
      signal: errand.signal,
    });
    if (!cells.ok) return cells;
    others.push(cells.value.others);
    sheets.push(await persist(() => finish(context, sheet, { ...cells.value, tables: frame.tables })));
  }
  if (errand.signal.aborted) return failure({ code: "cancelled" });
  const { names, calculation } = frame;
  return success({ sheets: await persist(() => withReaders(context, sheets, { others, names })), names, calculation });
}

interface FoundSheet {
  readonly area: SheetArea;
  readonly visible: boolean;
}

interface Frame {
  readonly sheets: readonly FoundSheet[];
  readonly names: readonly BookName[];
  readonly tables: readonly TablePlace[];
  readonly calculation: Book["calculation"];
}

/** What the workbook consists of, in four trips however many sheets it has. */
async function frameOf(context: Excel.RequestContext): Promise<Frame> {
  const { worksheets, names, application } = context.workbook;
  worksheets.load("items/name,items/visibility");
  names.load("items/name,items/formula");
  application.load("calculationMode");
  const tables = await tablesOf(context.workbook);
  const looked = worksheets.items.map((sheet) => ({
    sheet,
    used: sheet.getUsedRangeOrNullObject(true).load(whereabouts),
    mark: sheet.customProperties.getItemOrNullObject(sheetMark.key).load("value"),
    own: sheet.names.load("items/name,items/formula"),
  }));
  await context.sync();
  return {
    sheets: looked
      .filter(({ used, mark }) => !used.isNullObject && mark.isNullObject)
      .map(({ sheet, used }) => ({
        area: { ...rectangleOf(used), sheet: sheet.name },
        visible: sheet.visibility === "Visible",
      })),
    names: [
      namesIn(names, null),
      ...looked.filter(({ mark }) => mark.isNullObject).map(({ sheet, own }) => namesIn(own, sheet.name)),
    ].flat(),
    tables,
    calculation: calculations[application.calculationMode] ?? "automatic",
  };
}

const calculations: Readonly<Record<string, Book["calculation"]>> = {
  Automatic: "automatic",
  AutomaticExceptTables: "automatic except tables",
  Manual: "manual",
};

const namesIn = ({ items }: Excel.NamedItemCollection, sheet: string | null): BookName[] =>
  items.map(({ name, formula }) => ({ name, refersTo: String(formula).replace(/^=/, ""), sheet }));

type Cells = Pick<BookSheet, "columns" | "formulas" | "calculated" | "formats"> & Pick<Frame, "tables">;

async function finish(
  context: Excel.RequestContext,
  { area, visible }: FoundSheet,
  { tables, ...cells }: Cells,
): Promise<BookSheet> {
  return {
    ...cells,
    readers: [],
    sheet: area.sheet,
    firstRow: area.row,
    firstColumn: area.column,
    rowCount: area.rows,
    visible,
    formulas: await withSpills(context, area.sheet, cells.formulas),
    hiddenRows: await hiddenRowsOf(context, area),
    hiddenColumns: await hiddenColumnsOf(context, area),
    tables: tables
      .filter(({ sheet }) => sheet === area.sheet)
      .map(({ name, whole, data, body, sheet }) => ({
        name,
        area: { ...whole, sheet },
        headings: body.row > whole.row,
        totals: data.rows < whole.rows,
      })),
  };
}
