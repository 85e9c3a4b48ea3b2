import { recordOf } from "../workbook/book.ts";
import { areaAt } from "./addresses.ts";
import { integerAt, stateAt } from "./arguments.ts";
import { fault } from "./fault.ts";
import type { Host } from "./host.ts";
import { hold, type OnBreak, type OnSheet } from "./held.ts";
import type { Arguments, Family } from "./model.ts";

const rowsOf = ({ book }: Host, { sheet }: OnSheet): number[] => recordOf(book, sheet).pageBreaks;

/** Rows that a page begins with; upright breaks are not known. */
export const pageBreaks: Family<OnSheet> = {
  items: (state, host) => rowsOf(host, state).map((row) => hold("PageBreak", { sheet: state.sheet, row })),
  part: {
    Add: (state, host, args) => {
      const row = rowAt(host, state, args);
      if (row === 0) throw fault("InvalidArgument");
      const rows = rowsOf(host, state);
      if (!rows.includes(row)) rows.splice(0, rows.length, ...[...rows, row].sort((one, other) => one - other));
      return hold("PageBreak", { sheet: state.sheet, row });
    },
    GetItem: (state, host, args) => {
      const row = rowsOf(host, state)[integerAt(args, 0)];
      if (row === undefined) throw fault("ItemNotFound");
      return hold("PageBreak", { sheet: state.sheet, row });
    },
  },
  call: {
    GetCount: (state, host) => rowsOf(host, state).length,
    RemovePageBreaks: (state, host) => {
      rowsOf(host, state).length = 0;
    },
  },
};

const rowAt = (host: Host, { sheet }: OnSheet, args: Arguments): number =>
  typeof args[0] === "string" ? areaAt(host, args[0], sheet).row : stateAt(args, 0, "Range").row;

export const pageBreak: Family<OnBreak> = {
  read: { RowIndex: ({ row }) => row, ColumnIndex: () => 0 },
  part: {
    GetCellAfterBreak: ({ sheet, row }) => hold("Range", { sheet, row, column: 0, rows: 1, columns: 1 }),
  },
  call: {
    Delete: ({ sheet, row }, host) => {
      const rows = rowsOf(host, { sheet });
      if (!rows.includes(row)) throw fault("ItemNotFound");
      rows.splice(rows.indexOf(row), 1);
    },
  },
};
