import type { Errand } from "../app/errand.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import type { SheetPlan } from "../sheet/plan.ts";
import { drawCharts } from "./charts.ts";
import type { ExcelClient } from "./client.ts";
import { isExcelFault } from "./faults.ts";
import { nameLandmarks } from "./landmarks.ts";
import { markOf, sheetMark } from "./liveSheet.ts";
import { inExcel, inFront } from "./session.ts";
import { freeSheetName } from "./sheetName.ts";
import { addLinks, applyFormats, rangeAt, setWidths, writeBlocks } from "./writeCells.ts";

type Written = Result<{ readonly sheet: string }>;

/** Writes a plan to a new sheet and shows it; a sheet that could not be finished is taken away again. */
export function writePlan(client: ExcelClient, plan: SheetPlan, errand: Errand): Promise<Written> {
  return inExcel(client, async (context): Promise<Written> => {
    const { protection, worksheets } = context.workbook;
    protection.load("protected");
    worksheets.load("items/name");
    await context.sync();
    if (protection.protected) return failure({ code: "workbook-protected" });
    if (errand.signal.aborted) return failure({ code: "cancelled" });
    const taken = worksheets.items.map((sheet) => sheet.name);
    const name = freeSheetName(plan.name, taken);
    const sheet = worksheets.add(name);
    if (plan.holds !== "data") sheet.customProperties.add(sheetMark.key, markOf(plan));
    await inFront(() => context.sync());
    return finishOrTakeAway(sheet, () => fill(sheet, plan, { name, errand }));
  });
}

async function finishOrTakeAway(sheet: Excel.Worksheet, finish: () => Promise<Written>): Promise<Written> {
  let whole = false;
  try {
    const written = await finish();
    whole = written.ok;
    return written;
  } finally {
    if (!whole) await takeAway(sheet);
  }
}

/** What stopped the writing is what the user must hear of, not that its remains could not be taken away. */
async function takeAway(sheet: Excel.Worksheet): Promise<void> {
  try {
    sheet.delete();
    await sheet.context.sync();
  } catch (fault) {
    if (!isExcelFault(fault)) throw fault;
  }
}

interface Filling {
  readonly name: string;
  readonly errand: Errand;
}

export async function fill(sheet: Excel.Worksheet, plan: SheetPlan, { name, errand }: Filling): Promise<Written> {
  const { context } = sheet;
  const steps = [
    () => writeBlocks(sheet, plan.blocks),
    () => {
      context.application.suspendScreenUpdatingUntilNextSync();
      applyFormats(sheet, plan.formats);
      setWidths(sheet, plan.columnWidths);
      addLinks(sheet, plan.links);
      if (plan.frozenRows > 0) sheet.freezePanes.freezeRows(plan.frozenRows);
      return inFront(() => context.sync());
    },
    () => drawCharts(sheet, plan.charts),
    () => layOutPage(sheet, plan),
    () => nameLandmarks(sheet, plan),
  ];
  for (const [index, step] of steps.entries()) {
    if (errand.signal.aborted) return failure({ code: "cancelled" });
    errand.progress({ what: "Writing the sheet", share: index / steps.length });
    await step();
  }
  sheet.activate();
  rangeAt(sheet, { row: 0, column: 0, rows: 1, columns: 1 }).select();
  await inFront(() => context.sync());
  return success({ sheet: name });
}

/** Blank paper around the print, in points, which every printer can leave: the footer stands within that below. */
const margin = { side: 36, top: 28.8, bottom: 36, footer: 18 } as const;

/** In Excel's codes: the sheet's name, the page's number, how many there are. */
const footer = { left: "&A", right: "Page &P of &N" } as const;

/** Excel refuses page settings on machines without a printer; the sheet is whole without them. */
async function layOutPage(sheet: Excel.Worksheet, { printArea, pageBreaks = [] }: SheetPlan): Promise<void> {
  try {
    if (printArea !== null) sheet.pageLayout.setPrintArea(rangeAt(sheet, printArea));
    sheet.pageLayout.orientation = "Landscape";
    sheet.pageLayout.zoom = { horizontalFitToPages: 1 };
    sheet.pageLayout.leftMargin = margin.side;
    sheet.pageLayout.rightMargin = margin.side;
    sheet.pageLayout.topMargin = margin.top;
    sheet.pageLayout.bottomMargin = margin.bottom;
    sheet.pageLayout.footerMargin = margin.footer;
    const { defaultForAllPages } = sheet.pageLayout.headersFooters;
    defaultForAllPages.leftFooter = footer.left;
    defaultForAllPages.rightFooter = footer.right;
    sheet.horizontalPageBreaks.removePageBreaks();
    for (const row of pageBreaks) {
      sheet.horizontalPageBreaks.add(rangeAt(sheet, { row, column: 0, rows: 1, columns: 1 }));
    }
    await sheet.context.sync();
  } catch (fault) {
    if (!isExcelFault(fault)) throw fault;
  }
}
