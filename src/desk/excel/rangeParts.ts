import { mostColumns, mostRows } from "../../core/table/address.ts";
import { boundsOf, intersectionOf, isInside, type Area } from "../workbook/areas.ts";
import { spillFrom, spillsOf, usedWithin } from "../workbook/cells.ts";
import { tablesIn, areaOfTable } from "../workbook/tables.ts";
import { areaAt } from "./addresses.ts";
import { flagAt, integerAt, stateAt } from "./arguments.ts";
import { fault } from "./fault.ts";
import type { Host } from "./host.ts";
import { hold, type Held } from "./held.ts";
import type { Arguments, Family } from "./model.ts";
import { isRowHidden } from "./rangeShape.ts";
import { surroundingRegion } from "./region.ts";
import { specialCells } from "./specialCells.ts";

const held = (area: Area): Held => {
  if (!isInside(area)) throw fault("InvalidArgument");
  return hold("Range", area);
};

const orNull = (area: Area | null): Held | null => (area === null ? null : held(area));

function orFault(area: Area | null, code: "ItemNotFound" | "InvalidOperation"): Held {
  if (area === null) throw fault(code);
  return held(area);
}

/** The objects reached from a range. */
export const rangeParts: NonNullable<Family<Area>["part"]> = {
  Worksheet: ({ sheet }) => hold("Worksheet", { sheet }),
  Format: (area) => hold("RangeFormat", [area]),
  GetCell: (area, _host, args) => held({ ...shifted(area, args), rows: 1, columns: 1 }),
  GetRow: (area, _host, args) => held(inside({ ...area, row: area.row + integerAt(args, 0), rows: 1 }, area)),
  GetColumn: (area, _host, args) =>
    held(inside({ ...area, column: area.column + integerAt(args, 0), columns: 1 }, area)),
  GetLastRow: (area) => held({ ...area, row: area.row + area.rows - 1, rows: 1 }),
  GetLastColumn: (area) => held({ ...area, column: area.column + area.columns - 1, columns: 1 }),
  GetLastCell: (area) =>
    held({ ...area, row: area.row + area.rows - 1, column: area.column + area.columns - 1, rows: 1, columns: 1 }),
  GetEntireColumn: (area) => held({ ...area, row: 0, rows: mostRows }),
  GetEntireRow: (area) => held({ ...area, column: 0, columns: mostColumns }),
  GetOffsetRange: (area, _host, args) => held(shifted(area, args)),
  GetResizedRange: (area, _host, args) =>
    held({ ...area, rows: area.rows + integerAt(args, 0), columns: area.columns + integerAt(args, 1) }),
  GetAbsoluteResizedRange: (area, _host, args) =>
    held({ ...area, rows: integerAt(args, 0), columns: integerAt(args, 1) }),
  GetRowsAbove: (area, _host, args) => held(beside(area, -integerAt(args, 0, 1), "row")),
  GetRowsBelow: (area, _host, args) => held(beside(area, integerAt(args, 0, 1), "row")),
  GetColumnsBefore: (area, _host, args) => held(beside(area, -integerAt(args, 0, 1), "column")),
  GetColumnsAfter: (area, _host, args) => held(beside(area, integerAt(args, 0, 1), "column")),
  GetBoundingRect: (area, host, args) => held(boundsOf(area, other(host, area, args))),
  GetIntersection: (area, host, args) => orFault(intersectionOf(area, other(host, area, args)), "ItemNotFound"),
  GetIntersectionOrNullObject: (area, host, args) => orNull(intersectionOf(area, other(host, area, args))),
  GetUsedRange: (area, host, args) => held(usedWithin(host.book, area, flagAt(args, 0)) ?? firstCell(area)),
  GetUsedRangeOrNullObject: (area, host, args) => orNull(usedWithin(host.book, area, flagAt(args, 0))),
  GetSurroundingRegion: (area, host) => held(surroundingRegion(host, area)),
  GetSpillingToRange: (area, host) => orFault(spillFrom(host.book, area.sheet, single(area)), "ItemNotFound"),
  GetSpillingToRangeOrNullObject: (area, host) => orNull(spillFrom(host.book, area.sheet, single(area))),
  GetSpillParent: (area, host) => orFault(spillParent(host, area), "ItemNotFound"),
  GetSpillParentOrNullObject: (area, host) => orNull(spillParent(host, area)),
  GetVisibleView: (area, host) => hold("RangeView", { area, rows: visibleRows(host, area) }),
  GetSpecialCells: (area, host, args) => specialCells(host, area, args) ?? missing(),
  GetSpecialCellsOrNullObject: (area, host, args) => specialCells(host, area, args),
  GetTables: (area, host, args) => hold("TableScopedCollection", { ids: tableIds(host, area, flagAt(args, 0)) }),
};

function missing(): never {
  throw fault("ItemNotFound");
}

function shifted(area: Area, args: Arguments): Area {
  return { ...area, row: area.row + integerAt(args, 0), column: area.column + integerAt(args, 1) };
}

function inside(part: Area, whole: Area): Area {
  if (intersectionOf(part, whole) === null) throw fault("InvalidArgument");
  return part;
}

/** Rows above or below, columns before or after: as many as asked for, as wide or high as the area. */
function beside(area: Area, count: number, along: "row" | "column"): Area {
  if (count === 0) throw fault("InvalidArgument");
  const size = along === "row" ? area.rows : area.columns;
  const start = area[along] + (count < 0 ? count : size);
  return along === "row"
    ? { ...area, row: start, rows: Math.abs(count) }
    : { ...area, column: start, columns: Math.abs(count) };
}

/** Another range of the same sheet, given as an object or as an address. */
function other(host: Host, area: Area, args: Arguments): Area {
  const given = args[0];
  const found = typeof given === "string" ? areaAt(host, given, area.sheet) : stateAt(args, 0, "Range");
  if (found.sheet !== area.sheet) throw fault("InvalidArgument");
  return found;
}

const firstCell = (area: Area): Area => ({ ...area, rows: 1, columns: 1 });

function single(area: Area): Area {
  if (area.rows !== 1 || area.columns !== 1) throw fault("InvalidArgument");
  return area;
}

function spillParent(host: Host, area: Area): Area | null {
  const cell = single(area);
  const spill = spillsOf(host.book, area.sheet).find((one) => intersectionOf(one, cell) !== null);
  return spill === undefined ? null : firstCell(spill);
}

function visibleRows(host: Host, area: Area): readonly number[] {
  const rows = Array.from({ length: area.rows }, (_, row) => area.row + row);
  return rows.filter((row) => !isRowHidden(host, area.sheet, row));
}

function tableIds(host: Host, area: Area, fullyContained: boolean): readonly string[] {
  const touching = tablesIn(host.book, area);
  const whole = touching.filter((placed) => {
    const { rows, columns } = areaOfTable(placed);
    const part = intersectionOf(areaOfTable(placed), area);
    return part !== null && part.rows === rows && part.columns === columns;
  });
  return (fullyContained ? whole : touching).map(({ table }) => table.id);
}
