import type { IObjectMatrixPrimitiveType, Nullable } from "@univerjs/core";
import { ICalculateFormulaService, type IFormulaData, type IFormulaDataItem } from "@univerjs/engine-formula";
import { nameOf, type Book } from "./book.ts";
import { readPlainBrackets } from "./plainBrackets.ts";
import { spellOut, type SpokenTable } from "./structuredReferences.ts";
import { areaOfTable, headingsOf, tablesOf, type PlacedTable } from "./tables.ts";

/**
 * Hands the formula engine every reference to a table as a reference to cells: of its own it knows the simplest alone,
 * and remembers where a table was. The cells keep their formulas as they were written.
 */
export function spellTables(book: Book): void {
  readPlainBrackets(book.grid);
  const service = book.grid.injector.get(ICalculateFormulaService);
  const execute = service.execute.bind(service);
  service.execute = (config) => execute({ ...config, formulaData: withCells(book, config.formulaData) });
}

function withCells(book: Book, data: IFormulaData): IFormulaData {
  const sheets = data[book.unit];
  const tables = tablesOf(book);
  if (sheets === undefined || sheets === null || tables.length === 0) return data;
  const speaking = mayMention(tables);
  const spoken = new Map(tables.map((placed) => [placed.table.name.toLowerCase(), spokenTable(book, placed)]));
  const spelled = Object.entries(sheets).map(([sheet, rows]) => [
    sheet,
    mapItems(rows ?? {}, (item, row, column) => {
      if (!speaking.test(item.f)) return item;
      const own = tables.find((placed) => holds(placed, { sheet, row, column }));
      const tableCalled = (name: string) =>
        spoken.get((name === "" ? own?.table.name : name)?.toLowerCase() ?? "")?.() ?? null;
      return { ...item, f: spellOut(item.f, { row, tableCalled }) };
    }),
  ]);
  return { ...data, [book.unit]: Object.fromEntries(spelled) as IFormulaData[string] };
}

/** Most formulas speak of no table, and are told apart at once. */
function mayMention(tables: readonly PlacedTable[]): RegExp {
  const names = tables.map(({ table }) => table.name.replaceAll(/[\\.?]/g, String.raw`\$&`));
  return new RegExp(String.raw`\[|${names.join("|")}`, "i");
}

/** Headings are read where a formula asks for them. */
function spokenTable(book: Book, placed: PlacedTable): () => SpokenTable {
  let known: SpokenTable | undefined;
  return () => (known ??= { ...placed.table, sheet: nameOf(book, placed.sheet), headings: headingsOf(book, placed) });
}

function holds(
  placed: PlacedTable,
  at: { readonly sheet: string; readonly row: number; readonly column: number },
): boolean {
  const { sheet, row, column, rows, columns } = areaOfTable(placed);
  return (
    at.sheet === sheet && at.row >= row && at.row < row + rows && at.column >= column && at.column < column + columns
  );
}

type Rows = IObjectMatrixPrimitiveType<Nullable<IFormulaDataItem>>;

function mapItems(rows: Rows, change: (item: IFormulaDataItem, row: number, column: number) => IFormulaDataItem): Rows {
  const mapped: Rows = {};
  for (const [row, cells] of Object.entries(rows)) {
    const line: NonNullable<Rows[number]> = {};
    for (const [column, item] of Object.entries((cells ?? {}) as Record<string, Nullable<IFormulaDataItem>>)) {
      line[Number(column)] = item === null || item === undefined ? item : change(item, Number(row), Number(column));
    }
    mapped[Number(row)] = line;
  }
  return mapped;
}
