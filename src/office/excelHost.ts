import type { Host } from "../app/host.ts";
import { success } from "../core/problem/result.ts";
import { type ExcelClient, pageClient } from "./client.ts";
import { goTo } from "./goTo.ts";
import { forgetName, nameCells, readParts, resultSheets, tagSheet, writePart } from "./keeping.ts";
import { keepSheet, recalculateSheet } from "./liveSheet.ts";
import { locate } from "./locate.ts";
import { listPlaces } from "./places.ts";
import { readBook } from "./readBook.ts";
import { readCells } from "./read.ts";
import { rewrite } from "./rewrite.ts";
import { inExcel, persist } from "./session.ts";
import { watch } from "./watch.ts";
import { writePlan } from "./write.ts";

/** The workbook in Excel, or in anything that answers Excel's API. */
export function excelHost(client: ExcelClient = pageClient): Host {
  return {
    read: (where, errand) =>
      inExcel(client, async (context) => {
        const place = await persist(() => locate(context, where));
        return place.ok ? readCells(context, place.value, errand) : place;
      }),
    readBook: (errand) => inExcel(client, (context) => readBook(context, errand)),
    listPlaces: () => inExcel(client, async (context) => success(await persist(() => listPlaces(context)))),
    write: (plan, errand) => writePlan(client, plan, errand),
    recalculateSheet: () => inExcel(client, recalculateSheet),
    keepSheet: (errand) => inExcel(client, (context) => keepSheet(context, errand)),
    goTo: (address) => inExcel(client, (context) => goTo(context, address)),
    readParts: (namespace) =>
      inExcel(client, async (context) => success(await persist(() => readParts(context, namespace)))),
    writePart: (id, xml) => inExcel(client, (context) => writePart(context, id, xml)),
    nameCells: (address) => inExcel(client, (context) => nameCells(context, address)),
    forgetName: (name) => inExcel(client, (context) => forgetName(context, name)),
    resultSheets: () => inExcel(client, async (context) => success(await persist(() => resultSheets(context)))),
    tagSheet: (sheet, record) => inExcel(client, (context) => tagSheet(context, sheet, record)),
    rewrite: (plan, over, errand) => inExcel(client, (context) => rewrite(context, plan, { ...over, errand })),
    watch: (addresses, changed) => watch(client, addresses, changed),
  };
}
