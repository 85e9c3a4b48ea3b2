import type { Area } from "../workbook/areas.ts";
import { activeSheet, recordOf } from "../workbook/book.ts";
import { cellAt, cellsOf, valueOf } from "../workbook/cells.ts";
import { nameCalled } from "../workbook/names.ts";
import {
  announceTable,
  areaOfTable,
  forgetTable,
  headingsOf,
  tableNamed,
  tablesIn,
  tablesOf,
  type PlacedTable,
} from "../workbook/tables.ts";
import { renameTable } from "../workbook/renameInFormulas.ts";
import { writeCells } from "../workbook/write.ts";
import { areaAt } from "./addresses.ts";
import { asText, integerAt, stateAt, textAt } from "./arguments.ts";
import { eventKind } from "./events.ts";
import { fault } from "./fault.ts";
import { ensureWritable, isUnbounded } from "./guards.ts";
import type { Host } from "./host.ts";
import { hold, type Held, type OnTable, type States } from "./held.ts";
import type { Arguments, Family } from "./model.ts";

export function placed({ book }: Host, { id }: OnTable): PlacedTable {
  const found = tablesOf(book).find(({ table }) => table.id === id);
  if (found === undefined) throw fault("ItemNotFound");
  return found;
}

const held = ({ table }: PlacedTable): Held => hold("Table", { id: table.id });

function orFault(table: PlacedTable | null): Held {
  if (table === null) throw fault("ItemNotFound");
  return held(table);
}

const on = ({ book }: Host, sheet: string | null): readonly PlacedTable[] =>
  tablesOf(book).filter((one) => sheet === null || one.sheet === sheet);

function called(host: Host, sheet: string | null, key: string): PlacedTable | null {
  const found = tableNamed(host.book, key);
  return found !== null && (sheet === null || found.sheet === sheet) ? found : null;
}

export const tableCollection: Family<States["TableCollection"]> = {
  read: { Count: ({ sheet }, host) => on(host, sheet).length },
  items: ({ sheet }, host) => on(host, sheet).map(held),
  part: {
    "": ({ sheet }, host, args) => orFault(called(host, sheet, textAt(args, 0))),
    GetItemOrNullObject: ({ sheet }, host, args) => {
      const found = called(host, sheet, textAt(args, 0));
      return found === null ? null : held(found);
    },
    GetItemAt: ({ sheet }, host, args) => orFault(on(host, sheet)[integerAt(args, 0)] ?? null),
    Add: ({ sheet }, host, args) => held(add(host, placeAt(host, sheet, args), args[1] === true)),
  },
  call: { GetCount: ({ sheet }, host) => on(host, sheet).length },
};

const placeAt = (host: Host, sheet: string | null, args: Arguments): Area =>
  typeof args[0] === "string" ? areaAt(host, args[0], sheet ?? activeSheet(host.book)) : stateAt(args, 0, "Range");

/** @param hasHeaders - without, Excel puts a row of headings above and moves the data down. */
function add(host: Host, area: Area, hasHeaders: boolean): PlacedTable {
  ensureWritable(host, area.sheet);
  if (isUnbounded(area) || tablesIn(host.book, area).length > 0) throw fault("InvalidArgument");
  if (!hasHeaders) throw fault("ApiNotFound", "A table without a row of headings.");
  const { tables } = recordOf(host.book, area.sheet);
  const { row, column, columns } = area;
  const table = {
    id: `{${area.sheet}-table-${tables.length + 1}-${Date.now()}}`,
    name: freeName(host),
    row,
    column,
    // A heading alone gets one empty row of data.
    rows: Math.max(2, area.rows),
    columns,
    style: "TableStyleMedium2",
  };
  tables.push(table);
  nameHeadings(host, { sheet: area.sheet, table });
  announceTable(host.book, { sheet: area.sheet, table });
  return { sheet: area.sheet, table };
}

function freeName({ book }: Host): string {
  let number = tablesOf(book).length + 1;
  while (tableNamed(book, `Table${number}`) !== null) number += 1;
  return `Table${number}`;
}

/** Headings are text, none is empty, none stands twice. */
function nameHeadings(host: Host, { sheet, table }: PlacedTable): void {
  const taken = new Set<string>();
  const headings = headingsOf(host.book, { sheet, table }).map((heading, column) => {
    const wanted = heading === "" ? `Column${column + 1}` : heading;
    let free = wanted;
    for (let number = 2; taken.has(free.toLowerCase()); number++) free = `${wanted}${number}`;
    taken.add(free.toLowerCase());
    return free;
  });
  const area = { sheet, row: table.row, column: table.column, rows: 1, columns: table.columns };
  const cells = cellsOf(host.book, sheet);
  writeCells(host.book, area, (_, column) => {
    const value = valueOf(cellAt(cells, area.row, area.column + column));
    return value === headings[column] ? null : `'${headings[column] ?? ""}`;
  });
}

export const scopedTables: Family<States["TableScopedCollection"]> = {
  items: ({ ids }) => ids.map((id) => hold("Table", { id })),
  part: {
    "": ({ ids }, host, args) => orFault(within(host, ids, textAt(args, 0))),
    GetItemOrNullObject: ({ ids }, host, args) => {
      const found = within(host, ids, textAt(args, 0));
      return found === null ? null : held(found);
    },
    GetFirst: ({ ids }) => (ids[0] === undefined ? missing() : hold("Table", { id: ids[0] })),
  },
  call: { GetCount: ({ ids }) => ids.length },
};

function within(host: Host, ids: readonly string[], key: string): PlacedTable | null {
  const found = tableNamed(host.book, key);
  return found !== null && ids.includes(found.table.id) ? found : null;
}

function missing(): never {
  throw fault("ItemNotFound");
}

export const table: Family<OnTable> = {
  id: ({ id }) => id,
  read: {
    Id: ({ id }) => id,
    Name: (state, host) => placed(host, state).table.name,
    ShowHeaders: () => true,
    ShowTotals: () => false,
    Style: (state, host) => placed(host, state).table.style,
  },
  write: {
    Name: (state, host, value) => rename(host, placed(host, state), asText(value)),
    Style: (state, host, value) => {
      placed(host, state).table.style = asText(value);
    },
  },
  part: {
    Worksheet: (state, host) => hold("Worksheet", { sheet: placed(host, state).sheet }),
    Columns: (state) => hold("TableColumnCollection", state),
    GetRange: (state, host) => hold("Range", areaOfTable(placed(host, state))),
    GetHeaderRowRange: (state, host) => hold("Range", { ...areaOfTable(placed(host, state)), rows: 1 }),
    GetDataBodyRange: (state, host) => hold("Range", bodyOf(placed(host, state))),
    ConvertToRange: (state, host) => {
      const area = areaOfTable(placed(host, state));
      remove(host, placed(host, state));
      return hold("Range", area);
    },
  },
  call: {
    Delete: (state, host) => {
      const found = placed(host, state);
      ensureWritable(host, found.sheet);
      writeCells(host.book, areaOfTable(found), () => "");
      remove(host, found);
    },
    _RegisterDataChangedEvent: ({ id }, { events }) => events.register(eventKind.tableChanged, id),
    _UnregisterDataChangedEvent: ({ id }, { events }) => events.unregister(eventKind.tableChanged, id),
  },
  lacks: [
    "HighlightFirstColumn",
    "HighlightLastColumn",
    "ShowBandedRows",
    "ShowBandedColumns",
    "ShowFilterButton",
    "LegacyId",
  ],
};

function bodyOf(found: PlacedTable): Area {
  const area = areaOfTable(found);
  return { ...area, row: area.row + 1, rows: area.rows - 1 };
}

function rename(host: Host, found: PlacedTable, name: string): void {
  const fits = /^[\p{L}_\\][\p{L}\p{N}_.]{0,254}$/u.test(name) && !/^[A-Za-z]{1,3}\d+$/.test(name);
  if (!fits) throw fault("InvalidArgument", name);
  const other = tableNamed(host.book, name);
  const taken = (other !== null && other.table !== found.table) || nameCalled(host.book, name, null) !== null;
  if (taken) throw fault("ItemAlreadyExists");
  renameTable(host.book, found.table.name, name);
  forgetTable(host.book, found.table.name);
  found.table.name = name;
  announceTable(host.book, found);
}

function remove(host: Host, { sheet, table: gone }: PlacedTable): void {
  const { tables } = recordOf(host.book, sheet);
  tables.splice(tables.indexOf(gone), 1);
  forgetTable(host.book, gone.name);
}
