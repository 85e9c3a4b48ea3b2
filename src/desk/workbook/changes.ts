import { ICommandService, type ICommandInfo, type IExecutionOptions, type IRange } from "@univerjs/core";
import { boundsOf, fromRange, type Area } from "./areas.ts";
import { activeSheet, announce, type Book } from "./book.ts";
import { command, styleTrigger } from "./grid.ts";

interface Params {
  readonly unitId?: string;
  readonly subUnitId?: string;
  readonly trigger?: string;
  readonly type?: number;
  readonly range?: IRange;
  readonly cellValue?: Readonly<Record<number, Readonly<Record<number, unknown>> | undefined>>;
}

const shifts = {
  [command.insertRows]: "RowInserted",
  [command.removeRows]: "RowDeleted",
  [command.insertColumns]: "ColumnInserted",
  [command.removeColumns]: "ColumnDeleted",
} as const;

/** A selection still being dragged is none yet. */
const dragging = [0, 1];

/** Tells the book's listeners what happens in the grid, whoever does it: a person, an add-in, a formula. */
export function watchChanges(book: Book): () => void {
  let shown = activeSheet(book);
  const watch = book.grid.injector.get(ICommandService).onCommandExecuted((info, options) => {
    const params = (info.params ?? {}) as Params;
    if (params.unitId !== book.unit) return;
    const sheet = params.subUnitId ?? shown;
    if (info.id === command.activate) {
      if (sheet !== shown) announce(book, { kind: "activated", sheet, before: shown });
      shown = sheet;
    } else if (info.id === command.selections) {
      if (!dragging.includes(params.type ?? -1)) announce(book, { kind: "selected", sheet });
    } else if (info.id === command.setValues) announceValues(book, params, options);
    else announceShift(book, info, params);
  });
  return () => watch.dispose();
}

function announceValues(book: Book, params: Params, options?: IExecutionOptions): void {
  if (params.trigger === styleTrigger || params.cellValue === undefined) return;
  const area = writtenArea(params.subUnitId ?? "", params.cellValue);
  if (area === null) return;
  const byFormula = (options as { readonly fromFormula?: boolean } | undefined)?.fromFormula === true;
  announce(book, { kind: byFormula ? "calculated" : "edited", ...area });
}

function writtenArea(sheet: string, cells: NonNullable<Params["cellValue"]>): Area | null {
  let written: Area | null = null;
  for (const key of Object.keys(cells)) {
    const columns = Object.keys(cells[Number(key)] ?? {}).map(Number);
    if (columns.length === 0) continue;
    const [first, last] = [Math.min(...columns), Math.max(...columns)];
    const line = { sheet, row: Number(key), column: first, rows: 1, columns: last - first + 1 };
    written = written === null ? line : boundsOf(written, line);
  }
  return written;
}

function announceShift(book: Book, { id }: Readonly<ICommandInfo>, { range, subUnitId = "" }: Params): void {
  const shift = shifts[id as keyof typeof shifts] as (typeof shifts)[keyof typeof shifts] | undefined;
  if (shift === undefined || range === undefined) return;
  announce(book, { kind: "edited", ...fromRange(subUnitId, range), shift });
}
