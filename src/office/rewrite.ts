import type { Errand } from "../app/errand.ts";
import type { Over } from "../app/keeper.ts";
import { type Result, failure } from "../core/problem/result.ts";
import { addressOf } from "../core/table/address.ts";
import type { SheetPlan } from "../sheet/plan.ts";
import { type WrittenBlock, isAsWritten, isEmptyValue } from "../sheet/written.ts";
import { type Rectangle, intersection, rectangleOf, whereabouts } from "./areas.ts";
import { chartName } from "./charts.ts";
import { sheetNamed, unknownSheet } from "./locate.ts";
import { persist } from "./session.ts";
import { fill } from "./write.ts";
import { rangeAt } from "./writeCells.ts";

type Rewritten = Result<{ readonly sheet: string }>;

/**
 * Writes a plan in the place of what Footing wrote on a sheet before. Where a cell of the old result or of the new one
 * holds anything else, nothing is changed at all; cells outside of both stay as they are.
 */
export async function rewrite(
  context: Excel.RequestContext,
  plan: SheetPlan,
  { sheet: name, written, errand }: Over & { readonly errand: Errand },
): Promise<Rewritten> {
  const sheet = sheetNamed(context, name).load("name");
  sheet.protection.load("protected");
  await context.sync();
  if (sheet.isNullObject) return unknownSheet(context, name);
  if (sheet.protection.protected) return failure({ code: "sheet-protected", sheet: name });
  const foreign = await cellsOfOthers(sheet, [...written, ...plan.blocks.map(areaOf)], written);
  if (foreign.length > 0) return failure(foreignCells(name, foreign));
  if (errand.signal.aborted) return failure({ code: "cancelled" });
  await clear(sheet, written);
  // A sheet half old and half new would be neither: from here on it is not cancelled.
  return fill(sheet, plan, { name, errand: { ...errand, signal: new AbortController().signal } });
}

const areaOf = ({ row, column, cells }: SheetPlan["blocks"][number]): Rectangle => ({
  row,
  column,
  rows: cells.length,
  columns: Math.max(0, ...cells.map(({ length }) => length)),
});

/** So many values stay below the 5 MB that Excel on the web hands over at once. */
const cellsAtOnce = 40_000;

interface At {
  readonly row: number;
  readonly column: number;
}

async function cellsOfOthers(
  sheet: Excel.Worksheet,
  areas: readonly Rectangle[],
  written: readonly WrittenBlock[],
): Promise<At[]> {
  const used = sheet.getUsedRangeOrNullObject(true).load(whereabouts);
  await sheet.context.sync();
  if (used.isNullObject) return [];
  const reach = rectangleOf(used);
  const found = new Map<string, At>();
  for (const area of areas) {
    const cells = intersection(area, reach);
    for (const strip of cells === null ? [] : strips(cells)) {
      for (const at of await foreignIn(sheet, strip, written)) found.set(`${at.row},${at.column}`, at);
    }
  }
  return [...found.values()];
}

function strips({ row, column, rows, columns }: Rectangle): Rectangle[] {
  const height = Math.max(1, Math.floor(cellsAtOnce / columns));
  return Array.from({ length: Math.ceil(rows / height) }, (_, index) => ({
    row: row + index * height,
    column,
    rows: Math.min(height, rows - index * height),
    columns,
  }));
}

async function foreignIn(
  sheet: Excel.Worksheet,
  strip: Rectangle,
  written: readonly WrittenBlock[],
): Promise<readonly At[]> {
  const values = await persist(async () => {
    const range = rangeAt(sheet, strip).load("values");
    await sheet.context.sync();
    return range.values as readonly (readonly unknown[])[];
  });
  return values.flatMap((line, r) =>
    line.flatMap((value, c) => {
      const at = { row: strip.row + r, column: strip.column + c };
      return isEmptyValue(value) || isAsWritten(written, at, value) ? [] : [at];
    }),
  );
}

const mostNamed = 10;

const foreignCells = (sheet: string, foreign: readonly At[]) =>
  ({
    code: "cells-of-others",
    sheet,
    cells: foreign.slice(0, mostNamed).map((at) => addressOf({ sheet, ...at, rows: 1, columns: 1 })),
    count: foreign.length,
  }) as const;

/** Takes away what was written, its looks and its charts; a chart of the user's own keeps its place. */
async function clear(sheet: Excel.Worksheet, written: readonly WrittenBlock[]): Promise<void> {
  sheet.charts.load("items/name");
  await sheet.context.sync();
  const own = sheet.charts.items.filter(({ name }) => name.startsWith(chartName));
  for (const chart of own) chart.delete();
  for (const block of written) {
    if (block.rows * block.columns === 0) continue;
    const range = rangeAt(sheet, block);
    range.unmerge();
    range.clear("All");
    range.format.useStandardHeight = true;
  }
  await sheet.context.sync();
}
