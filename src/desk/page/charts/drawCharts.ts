import { createElement, useSyncExternalStore, type ReactNode } from "react";
import { activeSheet, recordOf, type Book } from "../../workbook/book.ts";
import type { ChartRecord } from "../../workbook/records.ts";
import { ChartPicture } from "./ChartPicture.tsx";
import { pictureOf, type Picture } from "./pictureOf.ts";

const component = "footing-desk-chart";
const pixelsPerPoint = 4 / 3;

interface Floating {
  readonly dispose: () => void;
  /** Where it was put: a chart that has moved is put up anew. */
  readonly place: string;
}

/** Keeps the charts of the sheet in view drawn over its cells, and up to date with them. */
export function drawCharts(book: Book): void {
  const pictures = new Map<string, Picture>();
  const floating = new Map<string, Floating>();
  const listeners = new Set<() => void>();
  const { api } = book.grid;
  api.registerComponent(component, ({ data }: { readonly data: { readonly id: string } }): ReactNode => {
    const picture = useSyncExternalStore(subscribe(listeners), () => pictures.get(data.id));
    return picture === undefined ? null : createElement(ChartPicture, { picture });
  });
  const draw = (): void => {
    const sheet = activeSheet(book);
    const charts = recordOf(book, sheet).charts;
    const keys = new Set(charts.map((chart) => keyOf(sheet, chart)));
    for (const [key, { dispose }] of floating) if (!keys.has(key)) remove(floating, key, dispose);
    for (const chart of charts) {
      pictures.set(keyOf(sheet, chart), pictureOf(book, sheet, chart));
      putUp(book, floating, { key: keyOf(sheet, chart), chart });
    }
    for (const listener of listeners) listener();
  };
  book.listeners.add(oncePerFrame(draw));
  oncePerFrame(draw)();
}

const keyOf = (sheet: string, { id }: ChartRecord): string => `${sheet} ${id}`;

const subscribe =
  (listeners: Set<() => void>) =>
  (listener: () => void): (() => void) => {
    listeners.add(listener);
    return () => listeners.delete(listener);
  };

function remove(floating: Map<string, Floating>, key: string, dispose: () => void): void {
  dispose();
  floating.delete(key);
}

interface Wanted {
  readonly key: string;
  readonly chart: ChartRecord;
}

function putUp(book: Book, floating: Map<string, Floating>, { key, chart }: Wanted): void {
  const { left, top, width, height } = chart;
  const place = [left, top, width, height].join(" ");
  const before = floating.get(key);
  if (before?.place === place) return;
  before?.dispose();
  const sheet = book.grid.api.getActiveWorkbook()?.getActiveSheet();
  if (!sheet) return;
  // The grid counts from the corner of its headers, Excel from the corner of cell A1.
  const { rowHeader, columnHeader } = sheet.getSheet().getConfig();
  const [startX, endX] = [left, left + width].map((points) => rowHeader.width + points * pixelsPerPoint);
  const [startY, endY] = [top, top + height].map((points) => columnHeader.height + points * pixelsPerPoint);
  const put = sheet.addFloatDomToPosition({
    componentKey: component,
    allowTransform: false,
    initPosition: { startX: startX!, endX: endX!, startY: startY!, endY: endY! },
    data: { id: key },
  });
  if (put) floating.set(key, { dispose: put.dispose, place });
}

/** Many changes at once are drawn once. */
function oncePerFrame(work: () => void): () => void {
  let asked = false;
  return () => {
    if (asked) return;
    asked = true;
    requestAnimationFrame(() => {
      asked = false;
      work();
    });
  };
}
