import type { DataPlace, WhereToRead } from "../app/host.ts";
import { nearestName } from "../core/problem/nearestName.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import { type SheetArea, addressOf, mostColumns, mostRows, parseAddress } from "../core/table/address.ts";
import { type Rectangle, intersection, rectangleOf, sameArea, whereabouts } from "./areas.ts";
import { listPlaces } from "./places.ts";
import { selectedRange } from "./selection.ts";
import { type TablePlace, tablesOf } from "./tables.ts";

/** Where data stand, and the table they are, if they are one. */
export interface Located extends SheetArea {
  readonly table: string | null;
}

/** Finds the cells that are meant, and stops whole columns at the last cell in use. */
export async function locate(context: Excel.RequestContext, where: WhereToRead): Promise<Result<Located>> {
  switch (where.kind) {
    case "selection": {
      const range = await selectedRange(context);
      return range.ok ? settle(context, await widened(range.value)) : range;
    }
    case "address":
      return locateText(context, where.address);
    case "place":
      return locatePlace(context, where.place);
  }
}

async function locateText(context: Excel.RequestContext, text: string): Promise<Result<Located>> {
  const area = parseAddress(text);
  if (area === null) return locateName(context, text);
  const sheet = area.sheet === "" ? context.workbook.worksheets.getActiveWorksheet() : sheetNamed(context, area.sheet);
  sheet.load("name");
  await context.sync();
  if (sheet.isNullObject) return unknownSheet(context, area.sheet);
  if (area.rows * area.columns > 1) return settle(context, { ...area, sheet: sheet.name });
  const cell = sheet.getRangeByIndexes(area.row, area.column, 1, 1).load(`${whereabouts},worksheet/name`);
  await context.sync();
  return settle(context, await widened(cell));
}

export const sheetNamed = (context: Excel.RequestContext, name: string): Excel.Worksheet =>
  context.workbook.worksheets.getItemOrNullObject(name);

/** The problem of a sheet that is not there, with the one that may have been meant. */
export async function unknownSheet(context: Excel.RequestContext, sheet: string): Promise<Result<never>> {
  const { worksheets } = context.workbook;
  worksheets.load("items/name");
  await context.sync();
  const names = worksheets.items.map(({ name }) => name);
  return failure({ code: "unknown-place", place: sheet, nearest: nearestName(sheet, names) });
}

async function locateName(context: Excel.RequestContext, text: string): Promise<Result<Located>> {
  const wanted = text.trim().toLowerCase();
  const places = await listPlaces(context);
  const place = places.find(({ kind, name }) => kind !== "sheet" && name.toLowerCase() === wanted);
  if (place !== undefined) return locatePlace(context, place);
  if (/[:!$]/.test(text) || wanted === "") return failure({ code: "bad-address", address: text });
  const names = places.filter(({ kind }) => kind !== "sheet").map(({ name }) => name);
  return failure({ code: "unknown-place", place: text, nearest: nearestName(text, names) });
}

/** A place is found again by its name, since it may have moved since it was listed. */
async function locatePlace(context: Excel.RequestContext, place: DataPlace): Promise<Result<Located>> {
  const places = await listPlaces(context);
  const found = places.find(({ kind, name }) => kind === place.kind && name === place.name);
  if (found === undefined) {
    const names = places.map(({ name }) => name);
    return failure({ code: "unknown-place", place: place.name, nearest: nearestName(place.name, names) });
  }
  const area = parseAddress(found.address);
  if (area === null) throw new Error(`A place was listed with the address ${found.address}.`);
  return settle(context, area);
}

/**
 * One cell, selected or typed, stands for the data around it: its table, or the cells that adjoin it. Where those are one column,
 * as with a title or a note, nothing could be explained by anything: the cells in use on the sheet are meant.
 */
async function widened(range: Excel.Range): Promise<SheetArea> {
  const selected = { ...rectangleOf(range), sheet: range.worksheet.name };
  if (selected.rows * selected.columns > 1) return selected;
  const table = (await tablesOf(range.worksheet)).find(({ whole }) => intersection(whole, selected) !== null);
  if (table !== undefined) return { ...table.data, sheet: selected.sheet };
  const region = range.getSurroundingRegion().load(whereabouts);
  await range.context.sync();
  const adjoining = rectangleOf(region);
  return { ...(adjoining.columns > 1 ? adjoining : wholeSheet), sheet: selected.sheet };
}

const wholeSheet: Rectangle = { row: 0, column: 0, rows: mostRows, columns: mostColumns };

async function settle(context: Excel.RequestContext, area: SheetArea): Promise<Result<Located>> {
  const sheet = context.workbook.worksheets.getItem(area.sheet);
  const used = sheet.getUsedRangeOrNullObject(true).load(whereabouts);
  const tables = await tablesOf(sheet);
  const cells = used.isNullObject ? null : intersection(area, rectangleOf(used));
  if (cells === null) return failure({ code: "no-data", where: addressOf(area) });
  const table = tables.find((candidate) => isTable(cells, candidate));
  return success({ ...(table?.data ?? cells), sheet: area.sheet, table: table?.name ?? null });
}

/** A selection of a table's rows alone, or of its total row too, means the table with its headings. */
const isTable = (cells: Rectangle, { whole, data, body }: TablePlace): boolean =>
  [whole, data, body].some((area) => sameArea(cells, area));
