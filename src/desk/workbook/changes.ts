import { ICommandService, type ICommandInfo, type IExecutionOptions, type IRange } from "@univerjs/core";
import { boundsOf, fromRange, type Area } from "./areas.ts";
import { activeSheet, announce, nameOf, sheetIds, type Book } from "./book.ts";
import { command, styleTrigger } from "./grid.ts";

interface Params {
  readonly unitId?: string;
  readonly subUnitId?: string;
  readonly trigger?: string;
  readonly type?: number;
  readonly range?: IRange;
  readonly sheet?: { readonly id: string };
  readonly cellValue?: Readonly<Record<number, Readonly<Record<number, unknown>> | undefined>>;
}

const shifts = {
  [command.insertRows]: "RowInserted",
  [command.removeRows]: "RowDeleted",
  [command.insertColumns]: "ColumnInserted",
  [command.removeColumns]: "ColumnDeleted",
} as const;

/** The grid's commands that move cells. */
const movingCommand = /\.(?:insert|remove|delete|move)-/;

/** A selection still being dragged is none yet. */
const dragging = [0, 1];

interface Seen {
  shown: string;
  readonly names: Map<string, string>;
}

/** Tells the book's listeners what happens in the grid, whoever does it: a person, an add-in, a formula. */
export function watchChanges(book: Book): () => void {
  const names = new Map(sheetIds(book).map((sheet) => [sheet, nameOf(book, sheet)]));
  const seen: Seen = { shown: activeSheet(book), names };
  const watch = book.grid.injector.get(ICommandService).onCommandExecuted((info, options) => {
    const params = (info.params ?? {}) as Params;
    if (params.unitId !== book.unit) return;
    if (info.id === command.setValues) announceValues(book, params, options);
    else if (info.id === command.selections) announceSelection(book, params, seen);
    else if (info.id in shifts) announceShift(book, info, params);
    else announceSheet(book, info, { params, seen });
  });
  return () => watch.dispose();
}

function announceSelection(book: Book, { type = -1, subUnitId }: Params, { shown }: Seen): void {
  if (!dragging.includes(type)) announce(book, { kind: "selected", sheet: subUnitId ?? shown });
}

/** Sheets that are shown, named, added and removed. */
function announceSheet(
  book: Book,
  { id }: Readonly<ICommandInfo>,
  { params, seen }: { params: Params; seen: Seen },
): void {
  const sheet = params.subUnitId ?? params.sheet?.id ?? "";
  if (id === command.activate) queueMicrotask(() => announceShown(book, seen));
  else if (id === command.rename) {
    const before = seen.names.get(sheet) ?? "";
    seen.names.set(sheet, nameOf(book, sheet));
    announce(book, { kind: "renamed", sheet, before });
  } else if (id === command.insertSheet) {
    seen.names.set(sheet, nameOf(book, sheet));
    announce(book, { kind: "added", sheet });
  } else if (id === command.removeSheet) announce(book, { kind: "deleted", sheet });
}

/** The grid shows a new sheet for a moment even where it is told to stay: only what is shown in the end counts. */
function announceShown(book: Book, seen: Seen): void {
  const [sheet, before] = [activeSheet(book), seen.shown];
  if (sheet === before) return;
  seen.shown = sheet;
  announce(book, { kind: "activated", sheet, before });
}

function announceValues(book: Book, params: Params, options?: IExecutionOptions): void {
  if (params.trigger === styleTrigger || params.cellValue === undefined) return;
  const area = writtenArea(params.subUnitId ?? "", params.cellValue);
  if (area === null) return;
  const byFormula = (options as { readonly fromFormula?: boolean } | undefined)?.fromFormula === true;
  const moved = movingCommand.test(params.trigger ?? "") ? ({ moved: true } as const) : {};
  announce(book, { kind: byFormula ? "calculated" : "edited", ...area, ...moved });
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
