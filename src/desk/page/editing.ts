import type { Switches } from "../excel/host.ts";
import type { Grid } from "../workbook/grid.ts";

/** While a cell's editor is open, the host refuses as Excel does. */
export function tellOfEditing({ api }: Grid, switches: Switches): void {
  api.addEvent(api.Event.SheetEditStarted, () => {
    switches.editing = true;
  });
  api.addEvent(api.Event.SheetEditEnded, () => {
    switches.editing = false;
  });
}
