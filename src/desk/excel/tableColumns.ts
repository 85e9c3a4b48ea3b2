import { intersectionOf, isInside, type Area } from "../workbook/areas.ts";
import { announceTable, areaOfTable, headingsOf } from "../workbook/tables.ts";
import { writeCells } from "../workbook/write.ts";
import { asText, integerAt } from "./arguments.ts";
import { fault } from "./fault.ts";
import { ensureWritable } from "./guards.ts";
import type { Host } from "./host.ts";
import { hold, type Held, type OnTable, type States } from "./held.ts";
import type { Family } from "./model.ts";
import { setValues, valuesOf } from "./rangeValues.ts";
import { placed } from "./tables.ts";

function missing(): never {
  throw fault("ItemNotFound");
}

export const tableColumns: Family<OnTable> = {
  read: { Count: (state, host) => placed(host, state).table.columns },
  items: (state, host) => headingsOf(host.book, placed(host, state)).map((_, index) => column(state, index)),
  part: {
    "": (state, host, args) => columnBy(host, state, args[0]) ?? missing(),
    GetItemOrNullObject: (state, host, args) => columnBy(host, state, args[0]),
    GetItemAt: (state, host, args) => columnBy(host, state, integerAt(args, 0) + 1) ?? missing(),
  },
  call: { GetCount: (state, host) => placed(host, state).table.columns },
};

const column = ({ id }: OnTable, index: number): Held => hold("TableColumn", { id, index });

/** By heading, or by id: ids count from 1. */
function columnBy(host: Host, state: OnTable, key: unknown): Held | null {
  const headings = headingsOf(host.book, placed(host, state));
  const byName = headings.findIndex((heading) => heading.toLowerCase() === String(key).toLowerCase());
  const index = typeof key === "number" ? key - 1 : byName;
  return index >= 0 && index < headings.length ? column(state, index) : null;
}

type OnColumn = States["TableColumn"];

function columnArea(host: Host, state: OnColumn): Area {
  const area = areaOfTable(placed(host, state));
  const one = { ...area, column: area.column + state.index, columns: 1 };
  if (!isInside(one) || intersectionOf(one, area) === null) throw fault("ItemNotFound");
  return one;
}

export const tableColumn: Family<OnColumn> = {
  id: ({ index }) => index + 1,
  read: {
    Id: ({ index }) => index + 1,
    Index: ({ index }) => index,
    Name: (state, host) => headingsOf(host.book, placed(host, state))[state.index] ?? missing(),
    Values: (state, host) => valuesOf(host, columnArea(host, state)),
  },
  write: {
    Name: (state, host, value) => {
      const name = asText(value);
      ensureWritable(host, placed(host, state).sheet);
      writeCells(host.book, { ...columnArea(host, state), rows: 1 }, () => `'${name}`);
      announceTable(host.book, placed(host, state));
    },
    Values: (state, host, value) => setValues(host, columnArea(host, state), value),
  },
  part: {
    GetRange: (state, host) => hold("Range", columnArea(host, state)),
    GetHeaderRowRange: (state, host) => hold("Range", { ...columnArea(host, state), rows: 1 }),
    GetDataBodyRange: (state, host) => {
      const area = columnArea(host, state);
      return hold("Range", { ...area, row: area.row + 1, rows: area.rows - 1 });
    },
  },
};
