import type { Host } from "../app/host.ts";
import { success } from "../core/problem/result.ts";
import { type ExcelClient, pageClient } from "./client.ts";
import { goTo } from "./goTo.ts";
import { keepSheet, recalculateSheet } from "./liveSheet.ts";
import { locate } from "./locate.ts";
import { listPlaces } from "./places.ts";
import { readCells } from "./read.ts";
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
    listPlaces: () => inExcel(client, async (context) => success(await persist(() => listPlaces(context)))),
    write: (plan, errand) => writePlan(client, plan, errand),
    recalculateSheet: () => inExcel(client, recalculateSheet),
    keepSheet: (errand) => inExcel(client, (context) => keepSheet(context, errand)),
    goTo: (address) => inExcel(client, (context) => goTo(context, address)),
    watch: (addresses, changed) => watch(client, addresses, changed),
  };
}
