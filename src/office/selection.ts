import { type Result, failure, success } from "../core/problem/result.ts";
import { whereabouts } from "./areas.ts";
import { hasCode } from "./faults.ts";

/** The one range that is selected, its whereabouts and its sheet's name loaded. */
export async function selectedRange(context: Excel.RequestContext): Promise<Result<Excel.Range>> {
  try {
    const areas = context.workbook.getSelectedRanges().load("areaCount");
    await context.sync();
    if (areas.areaCount > 1) return failure({ code: "several-areas-selected", areas: areas.areaCount });
    const range = context.workbook.getSelectedRange().load(`${whereabouts},worksheet/name`);
    await context.sync();
    return success(range);
  } catch (fault) {
    if (!hasCode("InvalidSelection")(fault)) throw fault;
    return insteadOfCells(context);
  }
}

/** Excel refuses a selection in the same way whether a chart is selected or another workbook is in front. */
async function insteadOfCells(context: Excel.RequestContext): Promise<Result<never>> {
  const chart = context.workbook.getActiveChartOrNullObject().load("name");
  await context.sync();
  return failure(chart.isNullObject ? { code: "other-workbook" } : { code: "chart-selected" });
}
