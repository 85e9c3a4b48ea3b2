import { absoluteAddress } from "../workbook/areas.ts";
import { asFlag, asNumber, asText, integerAt, optionalText, stateAt } from "./arguments.ts";
import { change, chartTypeOf, chartTypes, newSeries, typeName } from "./charts.ts";
import { fault } from "./fault.ts";
import type { Host } from "./host.ts";
import { hold, type Arguments, type Family, type Held, type OnAxis, type OnChart, type OnSeries } from "./model.ts";
import { colorOf } from "./rangeFormat.ts";

export const chartTitle: Family<OnChart> = {
  read: { Text: ({ chart }) => chart.title.text, Visible: ({ chart }) => chart.title.visible },
  write: {
    Text: (state, host, value) =>
      change(host, state, ({ title }) => Object.assign(title, { text: asText(value), visible: true })),
    Visible: (state, host, value) => change(host, state, ({ title }) => (title.visible = asFlag(value))),
  },
  lacks: [
    "Overlay",
    "HorizontalAlignment",
    "Top",
    "Left",
    "Width",
    "Height",
    "VerticalAlignment",
    "TextOrientation",
    "Position",
    "ShowShadow",
  ],
};

export const chartLegend: Family<OnChart> = {
  read: { Visible: ({ chart }) => chart.legend, Position: () => "Bottom" },
  write: {
    Visible: (state, host, value) => change(host, state, (chart) => (chart.legend = asFlag(value))),
    // Drawn below the picture wherever it is asked to stand.
    Position: (state, host, value) => change(host, state, () => asText(value)),
  },
  lacks: ["Overlay", "Left", "Top", "Width", "Height", "ShowShadow"],
};

export const chartAxes: Family<OnChart> = {
  part: {
    CategoryAxis: (state) => hold("ChartAxis", { ...state, axis: "x" }),
    ValueAxis: (state) => hold("ChartAxis", { ...state, axis: "y" }),
    GetItem: (state, _host, args) => {
      const type = asText(args[0]);
      if (type !== "Category" && type !== "Value") throw fault("ApiNotFound", `Axis ${type}.`);
      return hold("ChartAxis", { ...state, axis: type === "Category" ? "x" : "y" });
    },
  },
};

/** The API tells an end that Excel chooses as a number; the stand-in as blank. */
const endOf = (value: number | null): number | string => value ?? "";
const asEnd = (value: unknown): number | null => (value === "" ? null : asNumber(value));

export const chartAxis: Family<OnAxis> = {
  read: {
    Minimum: ({ chart, axis }) => endOf(chart[axis].minimum),
    Maximum: ({ chart, axis }) => endOf(chart[axis].maximum),
    NumberFormat: ({ chart, axis }) => chart[axis].numberFormat,
    Visible: ({ chart, axis }) => chart[axis].visible,
    Type: ({ axis }) => (axis === "x" ? "Category" : "Value"),
  },
  write: {
    Minimum: (state, host, value) => change(host, state, ({ [state.axis]: axis }) => (axis.minimum = asEnd(value))),
    Maximum: (state, host, value) => change(host, state, ({ [state.axis]: axis }) => (axis.maximum = asEnd(value))),
    NumberFormat: (state, host, value) =>
      change(host, state, ({ [state.axis]: axis }) => (axis.numberFormat = asText(value))),
    Visible: (state, host, value) => change(host, state, ({ [state.axis]: axis }) => (axis.visible = asFlag(value))),
  },
  part: {
    Title: (state) => hold("ChartAxisTitle", state),
    MajorGridlines: (state) => hold("ChartGridlines", state),
  },
  lacks: [
    "MajorUnit",
    "MinorUnit",
    "DisplayUnit",
    "ShowDisplayUnitLabel",
    "CustomDisplayUnit",
    "MinorTimeUnitScale",
    "MajorTimeUnitScale",
    "BaseTimeUnit",
    "CategoryType",
    "AxisGroup",
    "ScaleType",
    "LogBase",
    "Left",
    "Top",
    "Height",
    "Width",
    "ReversePlotOrder",
    "Crosses",
    "CrossesAt",
    "IsBetweenCategories",
    "MajorTickMark",
    "MinorTickMark",
    "TickMarkSpacing",
    "TickLabelPosition",
    "TickLabelSpacing",
    "Alignment",
    "MultiLevel",
    "LinkNumberFormat",
    "Offset",
    "TextOrientation",
    "Position",
    "PositionAt",
  ],
};

export const chartAxisTitle: Family<OnAxis> = {
  read: {
    Text: ({ chart, axis }) => chart[axis].title.text,
    Visible: ({ chart, axis }) => chart[axis].title.visible,
  },
  write: {
    Text: (state, host, value) =>
      change(host, state, (chart) => Object.assign(chart[state.axis].title, { text: asText(value), visible: true })),
    Visible: (state, host, value) => change(host, state, (chart) => (chart[state.axis].title.visible = asFlag(value))),
  },
  lacks: ["TextOrientation"],
};

export const chartGridlines: Family<OnAxis> = {
  read: { Visible: ({ chart, axis }) => chart[axis].gridlines },
  write: {
    Visible: (state, host, value) => change(host, state, (chart) => (chart[state.axis].gridlines = asFlag(value))),
  },
};

const held = (state: OnChart, series: OnSeries["series"]): Held => hold("ChartSeries", { ...state, series });

function addSeries(host: Host, state: OnChart, args: Arguments): Held {
  const { kind, series } = state.chart;
  const name = optionalText(args, 0) ?? `Series${series.length + 1}`;
  const added = { ...newSeries(typeName(kind, series)), name };
  change(host, state, () =>
    series.splice(args[1] === undefined || args[1] === null ? series.length : integerAt(args, 1), 0, added),
  );
  return held(state, added);
}

export const chartSeriesCollection: Family<OnChart> = {
  read: { Count: ({ chart }) => chart.series.length },
  items: (state) => state.chart.series.map((series) => held(state, series)),
  part: {
    Add: (state, host, args) => addSeries(host, state, args),
    GetItemAt: (state, _host, args) => {
      const series = state.chart.series[integerAt(args, 0)];
      if (series === undefined) throw fault("InvalidArgument");
      return held(state, series);
    },
  },
  call: { GetCount: ({ chart }) => chart.series.length },
};

function changeSeries(host: Host, state: OnSeries, what: Partial<OnSeries["series"]>): void {
  change(host, state, ({ series }) => {
    if (!series.includes(state.series)) throw fault("ItemNotFound");
    Object.assign(state.series, what);
  });
}

function sourceOf(host: Host, args: Arguments): string {
  const area = stateAt(args, 0, "Range");
  if (area.rows > 1 && area.columns > 1) throw fault("InvalidArgument");
  return absoluteAddress(host.book, area);
}

export const chartSeries: Family<OnSeries> = {
  read: {
    Name: ({ series }) => series.name,
    ChartType: ({ chart, series }) => typeName(chart.kind, [series]),
    MarkerStyle: ({ series }) => (series.markers ? "Circle" : "None"),
    MarkerSize: ({ series }) => series.markerSize,
    MarkerBackgroundColor: ({ series }) => series.color,
    MarkerForegroundColor: ({ series }) => series.color,
    Smooth: () => false,
  },
  write: {
    Name: (state, host, value) => changeSeries(host, state, { name: asText(value) }),
    ChartType: (state, host, value) => {
      const { line, markers } = chartTypes[chartTypeOf(value)];
      changeSeries(host, state, { line, markers });
    },
    MarkerStyle: (state, host, value) => changeSeries(host, state, { markers: asText(value) !== "None" }),
    MarkerSize: (state, host, value) => changeSeries(host, state, { markerSize: asNumber(value) }),
    MarkerBackgroundColor: (state, host, value) => changeSeries(host, state, { color: colorOf(value) }),
    MarkerForegroundColor: (state, host, value) => changeSeries(host, state, { color: colorOf(value) }),
    // Lines are drawn straight; a wish for curves is refused rather than passed over.
    Smooth: (_state, _host, value) => {
      if (asFlag(value)) throw fault("ApiNotFound", "Smooth lines.");
    },
  },
  part: { Format: (state) => hold("ChartSeriesFormat", state) },
  call: {
    Delete: (state, host) =>
      change(host, state, ({ series }) => {
        if (!series.includes(state.series)) throw fault("ItemNotFound");
        series.splice(series.indexOf(state.series), 1);
      }),
    SetValues: (state, host, args) => changeSeries(host, state, { y: sourceOf(host, args) }),
    SetXAxisValues: (state, host, args) => changeSeries(host, state, { x: sourceOf(host, args) }),
  },
};

export const chartSeriesFormat: Family<OnSeries> = {
  part: {
    Line: (state) => hold("ChartLineFormat", state),
    Fill: (state) => hold("ChartFill", state),
  },
};

const lineStyles = { None: false, Continuous: true } as const;

export const chartLine: Family<OnSeries> = {
  read: {
    Color: ({ series }) => series.color,
    LineStyle: ({ series }) => (series.line ? "Continuous" : "None"),
    Weight: ({ series }) => series.lineWeight,
  },
  write: {
    Color: (state, host, value) => changeSeries(host, state, { color: colorOf(value) }),
    LineStyle: (state, host, value) => {
      const style = asText(value);
      if (!(style in lineStyles)) throw fault("ApiNotFound", `Line style ${style}.`);
      changeSeries(host, state, { line: lineStyles[style as keyof typeof lineStyles] });
    },
    Weight: (state, host, value) => changeSeries(host, state, { lineWeight: asNumber(value) }),
  },
  call: { Clear: (state, host) => changeSeries(host, state, { line: false }) },
};

export const chartFill: Family<OnSeries> = {
  call: { SetSolidColor: (state, host, args) => changeSeries(host, state, { color: colorOf(args[0]) }) },
};
