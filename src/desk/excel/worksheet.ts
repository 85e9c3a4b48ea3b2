import { BooleanNumber } from "@univerjs/core";
import { isInside, wholeSheet, type Area } from "../workbook/areas.ts";
import { nameOf, recordOf, sheetIds, worksheetOf } from "../workbook/book.ts";
import { recalculate } from "../workbook/calculation.ts";
import { usedWithin } from "../workbook/cells.ts";
import { carryOut, command } from "../workbook/grid.ts";
import { removeNamesOfSheet } from "../workbook/names.ts";
import { flag } from "../workbook/styleTables.ts";
import { pointsPerPixel, standardHeight } from "../workbook/sizes.ts";
import { hideSheet, isHidden, removeSheet, renameSheet, showSheet } from "../workbook/sheets.ts";
import { areaAt, areasAt } from "./addresses.ts";
import { asFlag, asNumber, asText, flagAt, integerAt, oneOf, optionalText, textAt } from "./arguments.ts";
import { eventKind } from "./events.ts";
import { fault } from "./fault.ts";
import { ensureInFront, ensureNotLast, ensureSheet, ensureStructure } from "./guards.ts";
import type { Host } from "./host.ts";
import { hold, type Held, type OnSheet } from "./held.ts";
import type { Arguments, Family } from "./model.ts";
import { ensureName, place } from "./worksheets.ts";

const visibilities = { Visible: false, Hidden: true, VeryHidden: true } as const;

export const worksheet: Family<OnSheet> = {
  id: ({ sheet }) => sheet,
  read: {
    Id: ({ sheet }) => sheet,
    Name: ({ sheet }, host) => nameOf(host.book, present(host, sheet)),
    Position: ({ sheet }, host) => sheetIds(host.book).indexOf(sheet),
    Visibility: ({ sheet }, host) => (isHidden(host.book, present(host, sheet)) ? "Hidden" : "Visible"),
    TabColor: ({ sheet }, host) => (worksheetOf(host.book, sheet).getTabColor() ?? "").toUpperCase(),
    ShowGridlines: ({ sheet }, host) => worksheetOf(host.book, sheet).getConfig().showGridlines !== BooleanNumber.FALSE,
    StandardHeight: () => standardHeight * pointsPerPixel,
  },
  write: {
    Name: ({ sheet }, host, value) => rename(host, sheet, asText(value)),
    Position: ({ sheet }, host, value) => place(host, sheet, asNumber(value)),
    Visibility: ({ sheet }, host, value) => setVisibility(host, sheet, visibilities[oneOf(value, visibilities)]),
    TabColor: ({ sheet }, host, value) => mark(host, command.tabColor, { sheet, color: asText(value) }),
    // So the client calls the setter of showGridlines.
    Gridlines: ({ sheet }, host, value) => mark(host, command.gridlines, { sheet, showGridlines: flag(asFlag(value)) }),
  },
  part: {
    GetRange: ({ sheet }, host, args) => hold("Range", rangeOf(host, sheet, optionalText(args, 0))),
    GetRanges: ({ sheet }, host, args) => hold("RangeAreas", areasAt(host, textAt(args, 0), sheet)),
    GetRangeByIndexes: (state, host, args) => byIndexes(host, state, args),
    GetCell: (state, host, args) => byIndexes(host, state, [args[0], args[1], 1, 1]),
    GetUsedRange: ({ sheet }, host, args) => hold("Range", used(host, sheet, flagAt(args, 0)) ?? firstCell(sheet)),
    GetUsedRangeOrNullObject: ({ sheet }, host, args) => {
      const area = used(host, sheet, flagAt(args, 0));
      return area === null ? null : hold("Range", area);
    },
    GetNext: (state, host) => neighbour(host, state, 1) ?? missing(),
    GetNextOrNullObject: (state, host) => neighbour(host, state, 1),
    GetPrevious: (state, host) => neighbour(host, state, -1) ?? missing(),
    GetPreviousOrNullObject: (state, host) => neighbour(host, state, -1),
    _GetSheetById: (_state, host, args) => hold("Worksheet", { sheet: present(host, textAt(args, 0)) }),
    Charts: (state) => hold("ChartCollection", state),
    Tables: ({ sheet }) => hold("TableCollection", { sheet }),
    Names: ({ sheet }) => hold("NamedItemCollection", { sheet }),
    Protection: (state) => hold("WorksheetProtection", state),
    FreezePanes: (state) => hold("WorksheetFreezePanes", state),
    PageLayout: (state) => hold("PageLayout", state),
    HorizontalPageBreaks: (state) => hold("PageBreakCollection", state),
    CustomProperties: (state) => hold("WorksheetCustomPropertyCollection", state),
  },
  call: {
    Activate: ({ sheet }, host) => activate(host, sheet),
    Delete: ({ sheet }, host) => remove(host, sheet),
    Calculate: ({ sheet }, host) => recalculate(host.book, [wholeSheet(sheet)]),
    ...registrations({
      DataChanged: eventKind.changed,
      Activated: eventKind.activated,
      Deactivated: eventKind.deactivated,
      SelectionChanged: eventKind.selected,
      Calculated: eventKind.calculated,
    }),
  },
  lacks: ["StandardWidth", "ShowHeadings", "EnableCalculation", "TabId"],
};

function registrations(kinds: Readonly<Record<string, number>>): NonNullable<Family<OnSheet>["call"]> {
  const calls = Object.entries(kinds).flatMap(([name, kind]) => [
    [`_Register${name}Event`, ({ sheet }: OnSheet, { events }: Host) => events.register(kind, sheet)] as const,
    [`_Unregister${name}Event`, ({ sheet }: OnSheet, { events }: Host) => events.unregister(kind, sheet)] as const,
  ]);
  return Object.fromEntries(calls);
}

function present(host: Host, sheet: string): string {
  ensureSheet(host, sheet);
  return sheet;
}

function missing(): never {
  throw fault("ItemNotFound");
}

const firstCell = (sheet: string): Area => ({ sheet, row: 0, column: 0, rows: 1, columns: 1 });
const used = (host: Host, sheet: string, valuesOnly: boolean): Area | null =>
  usedWithin(host.book, wholeSheet(present(host, sheet)), valuesOnly);

function rangeOf(host: Host, sheet: string, address: string | null): Area {
  ensureSheet(host, sheet);
  if (address === null || address === "") return wholeSheet(sheet);
  const area = areaAt(host, address, sheet);
  if (area.sheet !== sheet) throw fault("InvalidArgument", address);
  return area;
}

function byIndexes(host: Host, { sheet }: OnSheet, args: Arguments): Held {
  ensureSheet(host, sheet);
  const [row, column] = [integerAt(args, 0), integerAt(args, 1)];
  const area = { sheet, row, column, rows: integerAt(args, 2), columns: integerAt(args, 3) };
  if (!isInside(area)) throw fault("InvalidArgument");
  return hold("Range", area);
}

function neighbour({ book }: Host, { sheet }: OnSheet, step: number): Held | null {
  const ids = sheetIds(book);
  const next = ids[ids.indexOf(sheet) + step];
  return next === undefined ? null : hold("Worksheet", { sheet: next });
}

function rename(host: Host, sheet: string, name: string): void {
  ensureStructure(host);
  ensureName(host, name, present(host, sheet));
  renameSheet(host.book, sheet, name);
}

function setVisibility(host: Host, sheet: string, hide: boolean): void {
  ensureStructure(host);
  if (hide) ensureNotLast(host, (one) => !isHidden(host.book, one), present(host, sheet));
  hideSheet(host.book, sheet, hide);
}

function mark(host: Host, name: string, params: OnSheet & Readonly<Record<string, unknown>>): void {
  const { sheet, ...what } = params;
  ensureSheet(host, sheet);
  carryOut(host.book.grid, name, { unitId: host.book.unit, subUnitId: sheet, ...what });
}

function activate(host: Host, sheet: string): void {
  ensureInFront(host);
  if (isHidden(host.book, present(host, sheet))) throw fault("InvalidOperation");
  showSheet(host.book, sheet);
}

function remove(host: Host, sheet: string): void {
  ensureStructure(host);
  ensureNotLast(host, (one) => !isHidden(host.book, one), present(host, sheet));
  removeNamesOfSheet(host.book, sheet);
  removeSheet(host.book, sheet);
}

export const worksheetProtection: Family<OnSheet> = {
  read: { Protected: ({ sheet }, host) => recordOf(host.book, sheet).protected },
  call: {
    Protect: ({ sheet }, host) => {
      const record = recordOf(host.book, sheet);
      if (record.protected) throw fault("AccessDenied");
      record.protected = true;
    },
    Unprotect: ({ sheet }, host) => {
      recordOf(host.book, sheet).protected = false;
    },
  },
  lacks: ["Options"],
};
