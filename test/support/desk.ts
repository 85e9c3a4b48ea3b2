import { expect } from "vitest";
import { openDesk, type NodeDesk } from "../../src/desk/client/openDesk.ts";
import type { DeskOptions } from "../../src/desk/client/desk.ts";
import { bookOf, sheetOf } from "./deskBook.ts";

/** A desk over one empty sheet, "Sheet1", unless a book is given. */
export const testDesk = (options: Partial<DeskOptions> = {}): Promise<NodeDesk> =>
  openDesk({ book: bookOf(sheetOf("Sheet1", [])), ...options });

/** Runs a batch and answers with the code of the error that it ends in; "none" where it ends well. */
export async function codeOf(work: () => Promise<unknown>): Promise<string> {
  try {
    await work();
    return "none";
  } catch (error) {
    expect(error).toBeInstanceOf(Error);
    return (error as { readonly code?: string }).code ?? String(error);
  }
}

/** A property of a range after one load and sync. */
export async function load<K extends keyof Excel.Range>(
  desk: NodeDesk,
  address: string,
  property: K,
): Promise<Excel.Range[K]> {
  return desk.Excel.run(async (context) => {
    const split = address.lastIndexOf("!");
    const sheet = context.workbook.worksheets.getItem(address.slice(0, split).replaceAll("'", ""));
    const range = sheet.getRange(address.slice(split + 1));
    range.load(property);
    await context.sync();
    return range[property];
  });
}

/** Sets properties of a range in a batch of its own. */
export async function set(
  desk: NodeDesk,
  address: string,
  values: Partial<Pick<Excel.Range, "values" | "formulas" | "numberFormat">>,
): Promise<void> {
  await desk.Excel.run(async (context) => {
    const [sheet = "", cells = ""] = address.split("!");
    const range = context.workbook.worksheets.getItem(sheet).getRange(cells);
    Object.assign(range, values);
    await context.sync();
  });
}
