import { intersectionOf, localAddress, type Area } from "../workbook/areas.ts";
import { hasSheet, type BookChange } from "../workbook/book.ts";
import { selectedAreas } from "../workbook/selection.ts";
import { areaOfTable, tablesOf } from "../workbook/tables.ts";
import { eventKind, wholeWorkbook } from "./events.ts";
import type { Host } from "./host.ts";

/** Tells an add-in's handlers what happened: those of the sheet and those of the workbook. */
export function raiseChanges(host: Host, change: BookChange): void {
  const worksheetId = change.sheet;
  const raise = (kind: number, details: object): void => {
    for (const target of [worksheetId, wholeWorkbook]) {
      host.events.raise({ kind, target, details: { worksheetId, ...details } });
    }
  };
  switch (change.kind) {
    case "edited":
      raise(eventKind.changed, changedDetails(change, change.shift));
      raiseTables(host, change);
      break;
    case "calculated":
      raise(eventKind.calculated, { address: localAddress(change) });
      break;
    case "selected":
      raise(eventKind.selected, { address: selectedAddress(host) });
      host.events.broadcast({ kind: eventKind.workbookSelected, target: "", details: {} });
      break;
    case "activated":
      raise(eventKind.activated, {});
      raiseDeactivated(host, change.before);
      break;
    case "added":
      raise(eventKind.added, { source: "Local" });
      break;
    case "deleted":
      raise(eventKind.deleted, { source: "Local" });
      break;
    case "renamed":
    case "charts":
      break;
  }
}

const changedDetails = (area: Area, shift = "RangeEdited"): object => ({
  address: localAddress(area),
  changeType: shift,
  source: "Local",
  shiftDirection: "None",
  triggerSource: "Unknown",
  referenceId: `${area.sheet}!${localAddress(area)}`,
});

function raiseTables(host: Host, area: Area): void {
  for (const placed of tablesOf(host.book)) {
    if (intersectionOf(areaOfTable(placed), area) === null) continue;
    const details = { ...changedDetails(area), worksheetId: area.sheet, tableId: placed.table.id };
    host.events.raise({ kind: eventKind.tableChanged, target: placed.table.id, details });
  }
}

function raiseDeactivated(host: Host, worksheetId: string): void {
  if (!hasSheet(host.book, worksheetId)) return;
  for (const target of [worksheetId, wholeWorkbook]) {
    host.events.raise({ kind: eventKind.deactivated, target, details: { worksheetId } });
  }
}

const selectedAddress = ({ book }: Host): string => selectedAreas(book).map(localAddress).join(",");
