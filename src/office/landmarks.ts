import { localAddressOf } from "../core/table/address.ts";
import { type Landmark, landmarksOf } from "../sheet/landmarks.ts";
import type { SheetPlan } from "../sheet/plan.ts";
import { isExcelFault } from "./faults.ts";
import { rangeAt } from "./writeCells.ts";

/** Stands beside each name in Excel's list, and tells it from names that someone else gave. */
const about = "A heading on this Footing sheet, for screen readers and for Go To";

/**
 * Gives the sheet's sections and tables names of the sheet, in the place of those it had. Cells know no headings: names are
 * what screen readers go by, `TitleRegion1.A5.K9.3` for a table in A5:K9 of the third sheet with headings above and
 * names of rows on the left. The sheet is whole without them, should Excel refuse one.
 */
export async function nameLandmarks(sheet: Excel.Worksheet, plan: SheetPlan): Promise<void> {
  try {
    sheet.load("position");
    sheet.names.load("items/comment");
    await sheet.context.sync();
    const old = sheet.names.items.filter(({ comment }) => comment === about);
    for (const name of old) name.delete();
    let tables = 0;
    for (const landmark of landmarksOf(plan)) {
      if (landmark.kind === "table") tables += 1;
      const corner = { ...landmark.area, rows: 1, columns: 1 };
      sheet.names.add(nameOf(landmark, { tables, sheet: sheet.position + 1 }), rangeAt(sheet, corner), about);
    }
    await sheet.context.sync();
  } catch (fault) {
    if (!isExcelFault(fault)) throw fault;
  }
}

function nameOf(landmark: Landmark, counted: { readonly tables: number; readonly sheet: number }): string {
  if (landmark.kind === "section") return landmark.name;
  const [corner = "", end = corner] = localAddressOf(landmark.area).split(":");
  return `TitleRegion${counted.tables}.${corner}.${end}.${counted.sheet}`;
}
