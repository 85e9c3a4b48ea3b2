import type { BookData } from "../book/bookData.ts";
import { startDesk, type Desk } from "../client/desk.ts";
import type { FunctionsMetadata } from "../workbook/metadata.ts";
import { startBrowserGrid } from "./browserGrid.ts";
import { drawCharts } from "./charts/drawCharts.ts";
import { lineToFrame } from "./line.ts";
import { tellOfEditing } from "./editing.ts";

/** One open workbook: a grid on the page, the add-in's pane in a frame beside it, and the line between them. */
export interface Session {
  readonly desk: Desk;
  readonly close: () => void;
}

export interface Places {
  readonly grid: HTMLElement;
  readonly pane: HTMLIFrameElement;
}

/** The add-in's own page, where it lies beside this one. */
const panePage = "taskpane.html";

export function openSession(places: Places, book: BookData, functions: FunctionsMetadata): Session {
  const place = document.createElement("div");
  place.className = "grid-place";
  places.grid.replaceChildren(place);
  const grid = startBrowserGrid(place, isDark());
  const line = lineToFrame(places.pane);
  const desk = startDesk(grid, line, { book, functions });
  drawCharts(desk.book);
  tellOfEditing(grid, desk.switches);
  const followLight = followDark((dark) => grid.api.toggleDarkMode(dark));
  places.pane.src = panePage;
  return {
    desk,
    close: () => {
      followLight();
      line.close();
      desk.stop();
      grid.dispose();
    },
  };
}

const darkQuery = "(prefers-color-scheme: dark)";
export const isDark = (): boolean => matchMedia(darkQuery).matches;

function followDark(changed: (dark: boolean) => void): () => void {
  const query = matchMedia(darkQuery);
  const tell = (): void => changed(query.matches);
  query.addEventListener("change", tell);
  return () => query.removeEventListener("change", tell);
}
