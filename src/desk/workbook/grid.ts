import { ICommandService, type Injector } from "@univerjs/core";
import type { FUniver } from "@univerjs/core/facade";
// The sheet methods of the facade exist only where this package's declarations are in view.
import type {} from "@univerjs/sheets/facade";

/** A started Univer: the browser and Node each start their own and hand it in. */
export interface Grid {
  readonly api: FUniver;
  readonly injector: Injector;
  /** Makes the formula engine of an opened workbook listen, where it would wait until the cells are drawn. */
  readonly awaken: () => void;
  readonly dispose: () => void;
}

/** Commands by their public names: importing them from the package would load its drawing engine in Node. */
export const command = {
  setValues: "sheet.mutation.set-range-values",
  selections: "sheet.operation.set-selections",
  activate: "sheet.operation.set-worksheet-active",
  rowCount: "sheet.mutation.set-worksheet-row-count",
  columnCount: "sheet.mutation.set-worksheet-column-count",
  columnWidth: "sheet.mutation.set-worksheet-col-width",
  rowHeight: "sheet.mutation.set-worksheet-row-height",
  rowFixed: "sheet.mutation.set-worksheet-row-is-auto-height",
  merge: "sheet.mutation.add-worksheet-merge",
  unmerge: "sheet.mutation.remove-worksheet-merge",
  hideRows: "sheet.mutation.set-row-hidden",
  showRows: "sheet.mutation.set-row-visible",
  hideColumns: "sheet.mutation.set-col-hidden",
  showColumns: "sheet.mutation.set-col-visible",
  hideSheet: "sheet.mutation.set-worksheet-hidden",
  order: "sheet.mutation.set-worksheet-order",
  rename: "sheet.mutation.set-worksheet-name",
  gridlines: "sheet.mutation.toggle-gridlines",
  tabColor: "sheet.mutation.set-tab-color",
  freeze: "sheet.mutation.set-frozen",
  insertRows: "sheet.mutation.insert-row",
  removeRows: "sheet.mutation.remove-rows",
  insertColumns: "sheet.mutation.insert-col",
  removeColumns: "sheet.mutation.remove-col",
  insertSheet: "sheet.mutation.insert-sheet",
  removeSheet: "sheet.mutation.remove-sheet",
  /** Those of the user's own commands that also rewrite the formulas which speak of the sheet. */
  renameEverywhere: "sheet.command.set-worksheet-name",
  removeEverywhere: "sheet.command.remove-sheet",
} as const;

/** The sheet command whose formatting leaves values alone, so that nothing is recalculated. */
export const styleTrigger = "sheet.command.set-style";

/** Carries out one of Univer's own changes at once, outside its undo stack. */
export function carryOut(grid: Grid, id: string, params: object): void {
  if (!grid.injector.get(ICommandService).syncExecuteCommand(id, params)) {
    throw new Error(`The grid refused ${id}.`);
  }
}
