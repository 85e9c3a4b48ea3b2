import { fullAddress, isEntireColumn, isEntireRow, intersectionOf, type Area } from "../workbook/areas.ts";
import { usedWithin } from "../workbook/cells.ts";
import { tablesIn } from "../workbook/tables.ts";
import { recalculate } from "../workbook/calculation.ts";
import { flagAt, integerAt } from "./arguments.ts";
import { fault } from "./fault.ts";
import type { Host } from "./host.ts";
import { hold, type Held, type States } from "./held.ts";
import type { Family } from "./model.ts";
import { clearRange } from "./rangeClear.ts";
import { countOf } from "./rangeShape.ts";
import { blockOf, formatsOf, formulasOf, kindsOf, textsOf, valuesOf } from "./rangeValues.ts";

type Areas = readonly Area[];

const addressOf = (areas: Areas, host: Host): string => areas.map((area) => fullAddress(host.book, area)).join(",");

const sheetOf = (areas: Areas): string => {
  const sheet = areas[0]?.sheet;
  if (sheet === undefined) throw fault("ItemNotFound");
  return sheet;
};

const orNull = (areas: Areas): Held | null => (areas.length === 0 ? null : hold("RangeAreas", areas));

export const rangeAreas: Family<Areas> = {
  read: {
    Address: addressOf,
    AddressLocal: addressOf,
    AreaCount: (areas) => areas.length,
    CellCount: (areas) => countOf(areas.reduce((sum, { rows, columns }) => sum + rows * columns, 0)),
    IsEntireColumn: (areas) => areas.every(isEntireColumn),
    IsEntireRow: (areas) => areas.every(isEntireRow),
  },
  part: {
    Areas: (areas) => hold("RangeCollection", areas),
    Format: (areas) => hold("RangeFormat", areas),
    Worksheet: (areas) => hold("Worksheet", { sheet: sheetOf(areas) }),
    GetUsedRangeAreasOrNullObject: (areas, host, args) => orNull(usedParts(host, areas, flagAt(args, 0))),
    GetIntersectionOrNullObject: (areas, host, args) => orNull(crossings(areas, args[0])),
    GetTables: (areas, host) =>
      hold("TableScopedCollection", {
        ids: areas.flatMap((area) => tablesIn(host.book, area).map(({ table }) => table.id)),
      }),
  },
  call: {
    Clear: (areas, host, args) => {
      for (const area of areas) clearRange(host, area, args[0]);
    },
    Calculate: (areas, host) => recalculate(host.book, areas),
  },
  lacks: ["Style"],
};

const usedParts = (host: Host, areas: Areas, valuesOnly: boolean): Areas =>
  areas.flatMap((area) => usedWithin(host.book, area, valuesOnly) ?? []);

function crossings(areas: Areas, given: unknown): Areas {
  const held = given as Held;
  const others = held.type === "Range" ? [held.state] : held.type === "RangeAreas" ? held.state : [];
  return areas.flatMap((area) => others.flatMap((other) => intersectionOf(area, other) ?? []));
}

export const rangeCollection: Family<Areas> = {
  items: (areas) => areas.map((area) => hold("Range", area)),
  part: {
    GetItemAt: (areas, _host, args) => {
      const area = areas[integerAt(args, 0)];
      if (area === undefined) throw fault("InvalidArgument");
      return hold("Range", area);
    },
  },
  call: { GetCount: (areas) => areas.length },
};

/** The visible rows of a range, one below another. */
export const rangeView: Family<States["RangeView"]> = {
  read: {
    RowCount: ({ rows }) => rows.length,
    ColumnCount: ({ area }) => area.columns,
    Values: (view, host) => visible(view, valuesOf(host, view.area)),
    ValueTypes: (view, host) => visible(view, kindsOf(host, view.area)),
    Formulas: (view, host) => visible(view, formulasOf(host, view.area)),
    Text: (view, host) => visible(view, textsOf(host, view.area)),
    NumberFormat: (view, host) => visible(view, formatsOf(host, view.area)),
    CellAddresses: (view, host) =>
      visible(
        view,
        blockOf(host, view.area, (_, at) => cellAddress(host, view.area, at)),
      ),
  },
  part: { GetRange: ({ area }) => hold("Range", area) },
  lacks: ["FormulasLocal", "FormulasR1C1", "Index"],
};

function visible({ area, rows }: States["RangeView"], block: readonly (readonly unknown[])[] | null): unknown {
  return block === null ? null : rows.map((row) => block[row - area.row]);
}

const cellAddress = (host: Host, { sheet }: Area, { row, column }: { row: number; column: number }): string =>
  fullAddress(host.book, { sheet, row, column, rows: 1, columns: 1 });
