import { activeSheet, hasSheet, sheetIds, sheetNamed } from "../workbook/book.ts";
import { addSheet, freeSheetName, isHidden, moveSheet } from "../workbook/sheets.ts";
import { flagAt, optionalText, textAt } from "./arguments.ts";
import { eventKind, wholeWorkbook } from "./events.ts";
import { fault } from "./fault.ts";
import { ensureInFront, ensureStructure } from "./guards.ts";
import type { Host } from "./host.ts";
import { hold, type Held } from "./held.ts";
import type { Family } from "./model.ts";

const held = (sheet: string): Held => hold("Worksheet", { sheet });
const orNull = (sheet: string | null): Held | null => (sheet === null ? null : held(sheet));

function orFault(sheet: string | null): Held {
  if (sheet === null) throw fault("ItemNotFound");
  return held(sheet);
}

export const worksheets: Family<null> = {
  items: (_state, { book }) => sheetIds(book).map(held),
  part: {
    "": (_state, host, args) => orFault(sheetBy(host, textAt(args, 0))),
    GetItemOrNullObject: (_state, host, args) => orNull(sheetBy(host, textAt(args, 0))),
    GetActiveWorksheet: (_state, { book }) => held(activeSheet(book)),
    GetFirst: (_state, host, args) => orFault(shown(host, flagAt(args, 0))[0] ?? null),
    GetLast: (_state, host, args) => orFault(shown(host, flagAt(args, 0)).at(-1) ?? null),
    Add: (_state, host, args) => held(add(host, optionalText(args, 0))),
  },
  call: {
    GetCount: (_state, host, args) => shown(host, flagAt(args, 0)).length,
    ...registrations({
      DataChanged: eventKind.changed,
      Activated: eventKind.activated,
      Deactivated: eventKind.deactivated,
      Added: eventKind.added,
      SelectionChanged: eventKind.selected,
      Deleted: eventKind.deleted,
      Calculated: eventKind.calculated,
    }),
  },
};

function registrations(kinds: Readonly<Record<string, number>>): NonNullable<Family<null>["call"]> {
  const calls = Object.entries(kinds).flatMap(([name, kind]) => [
    [`_Register${name}Event`, (_: null, { events }: Host) => events.register(kind, wholeWorkbook)] as const,
    [`_Unregister${name}Event`, (_: null, { events }: Host) => events.unregister(kind, wholeWorkbook)] as const,
  ]);
  return Object.fromEntries(calls);
}

/** The API finds a sheet by its name or by its id. */
const sheetBy = ({ book }: Host, key: string): string | null =>
  sheetNamed(book, key) ?? (hasSheet(book, key) ? key : null);

const shown = ({ book }: Host, visibleOnly: boolean): readonly string[] =>
  sheetIds(book).filter((sheet) => !visibleOnly || !isHidden(book, sheet));

function add(host: Host, name: string | null): string {
  ensureStructure(host);
  ensureInFront(host);
  if (name !== null) ensureName(host, name, null);
  return addSheet(host.book, name ?? freeSheetName(host.book));
}

const longestName = 31;

/** Excel's rules for sheet names; "History" is taken by its list of changes. */
export function ensureName({ book }: Host, name: string, own: string | null): void {
  const wrong = name === "" || name.length > longestName || /[\\/?*[\]:]/.test(name) || /^'|'$/.test(name);
  if (wrong || name.toLowerCase() === "history") throw fault("InvalidArgument", name);
  const known = sheetNamed(book, name);
  if (known !== null && known !== own) throw fault("ItemAlreadyExists");
}

export function place(host: Host, sheet: string, position: number): void {
  if (!Number.isInteger(position) || position < 0 || position >= sheetIds(host.book).length)
    throw fault("InvalidArgument");
  moveSheet(host.book, sheet, position);
}
