import { ILayoutService } from "@univerjs/preset-sheets-core";
import { useEffect, useMemo, useRef, type RefObject } from "react";
import type { Grid } from "../workbook/grid.ts";
import { wishes } from "./passKey.ts";

/** The three parts of the page and the ways between them. */
export interface Parts {
  readonly bar: RefObject<HTMLElement | null>;
  readonly grid: RefObject<HTMLElement | null>;
  readonly pane: RefObject<HTMLIFrameElement | null>;
  /** Tells which grid is on the page. */
  readonly attend: (grid: Grid) => void;
  readonly goToGrid: () => void;
  readonly goToPane: () => void;
}

/** F6 goes on from part to part, with Shift back, as in the suite this page stands for; the pane passes the key on. */
export function useParts(): Parts {
  const bar = useRef<HTMLElement>(null);
  const grid = useRef<HTMLElement>(null);
  const pane = useRef<HTMLIFrameElement>(null);
  const attended = useRef<Grid>(null);
  const parts = useMemo((): Parts => {
    const goToGrid = (): void => attended.current?.injector.get(ILayoutService).focus();
    return {
      bar,
      grid,
      pane,
      attend: (now) => {
        attended.current = now;
      },
      goToGrid,
      goToPane: () => pane.current?.focus(),
    };
  }, []);
  useEffect(() => followKey(parts), [parts]);
  return parts;
}

function followKey({ bar, grid, pane, goToGrid, goToPane }: Parts): () => void {
  const ways = [() => bar.current?.querySelector("button")?.focus(), goToGrid, goToPane];
  const current = (): number =>
    [bar.current, grid.current, pane.current].findIndex((part) => part?.contains(document.activeElement) === true);
  const go = (by: number): void => ways[(Math.max(0, current()) + by + ways.length) % ways.length]!();
  const pressed = (event: KeyboardEvent): void => {
    if (event.key !== "F6") return;
    event.preventDefault();
    go(event.shiftKey ? -1 : 1);
  };
  const told = ({ data, source }: MessageEvent): void => {
    if (source !== pane.current?.contentWindow) return;
    if (data === wishes.onward) go(1);
    if (data === wishes.back) go(-1);
  };
  window.addEventListener("keydown", pressed, true);
  window.addEventListener("message", told);
  return () => {
    window.removeEventListener("keydown", pressed, true);
    window.removeEventListener("message", told);
  };
}
