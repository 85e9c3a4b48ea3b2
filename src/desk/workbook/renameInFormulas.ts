import type { ICellData } from "@univerjs/core";
import { FormulaDataModel, ISuperTableService } from "@univerjs/engine-formula";
import type { Book } from "./book.ts";
import { carryOut, command } from "./grid.ts";
import { renamed, type Renaming } from "./structuredReferences.ts";
import { headingsOf, type PlacedTable } from "./tables.ts";

/** Has formulas speak of columns by their new headings, as Excel does; to be called before the engine hears of them. */
export function renameColumns(book: Book, placed: PlacedTable): void {
  const known = book.grid.injector.get(ISuperTableService).getTableMap(book.unit)?.get(placed.table.name);
  const before = [...(known?.titleMap.keys() ?? [])];
  const after = headingsOf(book, placed);
  const changed = before.flatMap((heading, index) => {
    const now = after[index] ?? "";
    return now === "" || now === heading ? [] : [[heading.toLowerCase(), now] as const];
  });
  if (changed.length > 0) renameInFormulas(book, { table: placed.table.name, columns: new Map(changed) });
}

/** The same for a table that takes another name. */
export const renameTable = (book: Book, table: string, to: string): void =>
  renameInFormulas(book, { table, to, columns: new Map() });

function renameInFormulas(book: Book, renaming: Renaming): void {
  const formulas = book.grid.injector.get(FormulaDataModel).getFormulaData()[book.unit] ?? {};
  for (const [sheet, rows] of Object.entries(formulas)) {
    const cellValue: Record<number, Record<number, ICellData>> = {};
    for (const [row, cells] of Object.entries(rows ?? {})) {
      for (const [column, item] of Object.entries((cells ?? {}) as Record<string, { readonly f?: string } | null>)) {
        const before = item?.f ?? "";
        const after = renamed(before, renaming);
        if (after !== before) (cellValue[Number(row)] ??= {})[Number(column)] = { f: after };
      }
    }
    if (Object.keys(cellValue).length === 0) continue;
    carryOut(book.grid, command.setValues, { unitId: book.unit, subUnitId: sheet, cellValue });
  }
}
