import { absoluteAddress, type Area } from "../workbook/areas.ts";
import { announce, recordOf } from "../workbook/book.ts";
import { axisRecord, standardLine, standardMarker } from "../workbook/charts.ts";
import { cellAt, cellsOf, kindOf, valueOf } from "../workbook/cells.ts";
import type { ChartKind, ChartRecord, SeriesRecord } from "../workbook/records.ts";
import { areaAt } from "./addresses.ts";
import { asNumber, asText, integerAt, stateAt, textAt } from "./arguments.ts";
import { fault } from "./fault.ts";
import { ensureSheet, ensureWritable } from "./guards.ts";
import type { Host } from "./host.ts";
import { hold, type Held, type OnChart, type OnSheet } from "./held.ts";
import type { Arguments, Family } from "./model.ts";
import { placeOf } from "./rangeShape.ts";

/** The API's chart types that the stand-in draws, as the kinds of its records. */
export const chartTypes = {
  XYScatter: { kind: "scatter", line: false, markers: true },
  XYScatterLines: { kind: "scatter with lines", line: true, markers: true },
  XYScatterLinesNoMarkers: { kind: "scatter with lines", line: true, markers: false },
  Line: { kind: "lines", line: true, markers: false },
  LineMarkers: { kind: "lines", line: true, markers: true },
  ColumnClustered: { kind: "columns", line: false, markers: false },
} as const satisfies Readonly<Record<string, { kind: ChartKind; line: boolean; markers: boolean }>>;

export type ChartType = keyof typeof chartTypes;

const held = ({ sheet }: OnSheet, chart: ChartRecord): Held => hold("Chart", { sheet, chart });

const on = (host: Host, { sheet }: OnSheet): readonly ChartRecord[] => {
  ensureSheet(host, sheet);
  return recordOf(host.book, sheet).charts;
};

function missing(): never {
  throw fault("ItemNotFound");
}

function called(host: Host, state: OnSheet, key: string): Held | null {
  const wanted = key.toLowerCase();
  const found = on(host, state).find(({ id, name }) => id === key || name.toLowerCase() === wanted);
  return found === undefined ? null : held(state, found);
}

export const charts: Family<OnSheet> = {
  read: { Count: (state, host) => on(host, state).length },
  items: (state, host) => on(host, state).map((chart) => held(state, chart)),
  part: {
    "": (state, host, args) => called(host, state, textAt(args, 0)) ?? missing(),
    GetItem: (state, host, args) => called(host, state, textAt(args, 0)) ?? missing(),
    GetItemOrNullObject: (state, host, args) => called(host, state, textAt(args, 0)),
    GetItemAt: (state, host, args) => {
      const chart = on(host, state)[integerAt(args, 0)];
      return chart === undefined ? missing() : held(state, chart);
    },
    Add: (state, host, args) => held(state, add(host, state, args)),
  },
  call: { GetCount: (state, host) => on(host, state).length },
};

const standardPlace = { left: 300, top: 100, width: 360, height: 216 };

function add(host: Host, { sheet }: OnSheet, args: Arguments): ChartRecord {
  ensureWritable(host, sheet);
  const type = chartTypeOf(args[0]);
  const { charts: known } = recordOf(host.book, sheet);
  const number = known.length + 1;
  const chart: ChartRecord = {
    id: `{chart-${sheet}-${number}-${Date.now()}}`,
    name: `Chart ${number}`,
    title: { text: "Chart Title", visible: true },
    kind: chartTypes[type].kind,
    ...standardPlace,
    legend: true,
    x: axisRecord(""),
    y: axisRecord(""),
    series: [...seriesFrom(host, stateAt(args, 1, "Range"), type)],
  };
  known.push(chart);
  drawn(host, sheet);
  return chart;
}

export function chartTypeOf(value: unknown): ChartType {
  const wanted = typeof value === "string" ? value.toLowerCase() : "";
  const type = (Object.keys(chartTypes) as ChartType[]).find((key) => key.toLowerCase() === wanted);
  if (type === undefined) throw fault("ApiNotFound", `The stand-in draws no chart of type ${String(value)}.`);
  return type;
}

/** Tells the page that a sheet's charts are to be drawn anew. */
export const drawn = (host: Host, sheet: string): void => announce(host.book, { kind: "charts", sheet });

/** Series as Excel guesses them: one a column, the first column along the horizontal axis, a text row as names. */
function* seriesFrom(host: Host, area: Area, type: ChartType): Generator<SeriesRecord> {
  const cells = cellsOf(host.book, area.sheet);
  const heading = area.rows > 1 && kindOf(cellAt(cells, area.row, area.column + area.columns - 1)) === "String" ? 1 : 0;
  const body = { ...area, row: area.row + heading, rows: area.rows - heading, columns: 1 };
  const first = area.columns > 1 ? 1 : 0;
  for (let index = first; index < area.columns; index++) {
    const name = String(valueOf(cellAt(cells, area.row, area.column + index)));
    yield {
      ...newSeries(type),
      name: heading === 1 ? name : `Series${index + 1 - first}`,
      x: first === 1 ? absoluteAddress(host.book, body) : "",
      y: absoluteAddress(host.book, { ...body, column: area.column + index }),
    };
  }
}

export function newSeries(type: ChartType): SeriesRecord {
  const { line, markers } = chartTypes[type];
  return {
    name: "",
    x: "",
    y: "",
    line,
    markers,
    color: "",
    lineWeight: standardLine,
    markerSize: standardMarker,
    label: "none",
  };
}

/** Changes a chart and has it drawn; on a protected sheet Excel changes none. */
export function change(host: Host, { sheet, chart }: OnChart, how: (chart: ChartRecord) => void): void {
  ensureWritable(host, sheet);
  if (!recordOf(host.book, sheet).charts.includes(chart)) throw fault("ItemNotFound");
  how(chart);
  drawn(host, sheet);
}

const size = (key: "left" | "top" | "width" | "height") => (state: OnChart, host: Host, value: unknown) =>
  change(host, state, (chart) => (chart[key] = asNumber(value)));

export const chart: Family<OnChart> = {
  id: ({ chart: { id } }) => id,
  read: {
    Id: ({ chart: { id } }) => id,
    Name: ({ chart: { name } }) => name,
    Left: ({ chart: { left } }) => left,
    Top: ({ chart: { top } }) => top,
    Width: ({ chart: { width } }) => width,
    Height: ({ chart: { height } }) => height,
    ChartType: ({ chart: { kind, series } }) => typeName(kind, series),
  },
  write: {
    Name: (state, host, value) => change(host, state, (one) => (one.name = asText(value))),
    Left: size("left"),
    Top: size("top"),
    Width: size("width"),
    Height: size("height"),
    ChartType: (state, host, value) => change(host, state, (one) => retype(one, chartTypeOf(value))),
  },
  part: {
    Worksheet: ({ sheet }) => hold("Worksheet", { sheet }),
    Title: (state) => hold("ChartTitle", state),
    Legend: (state) => hold("ChartLegend", state),
    Axes: (state) => hold("ChartAxes", state),
    Series: (state) => hold("ChartSeriesCollection", state),
  },
  call: {
    Activate: () => null,
    Delete: (state, host) => {
      ensureWritable(host, state.sheet);
      const { charts: known } = recordOf(host.book, state.sheet);
      if (!known.includes(state.chart)) throw fault("ItemNotFound");
      known.splice(known.indexOf(state.chart), 1);
      drawn(host, state.sheet);
    },
    SetPosition: (state, host, args) => setPosition(host, state, args),
    SetData: (state, host, args) =>
      change(host, state, ({ kind, series }) => {
        const type = typeName(kind, series);
        series.splice(0, series.length, ...seriesFrom(host, stateAt(args, 0, "Range"), type));
      }),
  },
  lacks: [
    "ShowAllFieldButtons",
    "ShowDataLabelsOverMaximum",
    "CategoryLabelLevel",
    "Style",
    "DisplayBlanksAs",
    "PlotBy",
    "PlotVisibleOnly",
    "SeriesNameLevel",
  ],
};

export function typeName(kind: ChartKind, series: readonly SeriesRecord[]): ChartType {
  const markers = series.some((one) => one.markers);
  const fits = (Object.keys(chartTypes) as ChartType[]).filter((type) => chartTypes[type].kind === kind);
  return fits.find((type) => chartTypes[type].markers === markers) ?? fits[0] ?? "XYScatter";
}

function retype(record: ChartRecord, type: ChartType): void {
  const { kind, line, markers } = chartTypes[type];
  record.kind = kind;
  for (const series of record.series) Object.assign(series, { line, markers });
}

/** From the top left corner of one cell to the bottom right corner of another. */
function setPosition(host: Host, state: OnChart, args: Arguments): void {
  const cell = (index: number): Area =>
    typeof args[index] === "string" ? areaAt(host, textAt(args, index), state.sheet) : stateAt(args, index, "Range");
  const start = placeOf(host, cell(0));
  const end = args[1] === undefined || args[1] === null ? null : placeOf(host, cell(1));
  const right = end === null ? start.left + state.chart.width : end.left + end.width;
  const bottom = end === null ? start.top + state.chart.height : end.top + end.height;
  const place = { left: start.left, top: start.top, width: right - start.left, height: bottom - start.top };
  change(host, state, (one) => Object.assign(one, place));
}
