import { type Result, failure, success } from "../core/problem/result.ts";
import { parseAddress } from "../core/table/address.ts";
import { sheetNamed, unknownSheet } from "./locate.ts";
import { inFront } from "./session.ts";
import { rangeAt } from "./writeCells.ts";

/** Shows a sheet and selects a cell or range of it. */
export async function goTo(context: Excel.RequestContext, address: string): Promise<Result<null>> {
  const area = parseAddress(address);
  if (area === null) return failure({ code: "bad-address", address });
  const sheet = area.sheet === "" ? context.workbook.worksheets.getActiveWorksheet() : sheetNamed(context, area.sheet);
  sheet.load("name");
  await context.sync();
  if (sheet.isNullObject) return unknownSheet(context, area.sheet);
  sheet.activate();
  rangeAt(sheet, area).select();
  await inFront(() => context.sync());
  return success(null);
}
