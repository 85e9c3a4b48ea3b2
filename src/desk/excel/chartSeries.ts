import { absoluteAddress } from "../workbook/areas.ts";
import { asFlag, asNumber, asText, integerAt, optionalText, stateAt } from "./arguments.ts";
import { change, chartTypeOf, chartTypes, newSeries, typeName } from "./charts.ts";
import { fault } from "./fault.ts";
import type { Host } from "./host.ts";
import { hold, type Held, type OnChart, type OnSeries } from "./held.ts";
import type { Arguments, Family } from "./model.ts";
import { colorOf } from "./rangeFormat.ts";

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
    HasDataLabels: ({ series }) => series.label !== "none",
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
    // Labels show the value until they are told to show the name.
    HasDataLabels: (state, host, value) => changeSeries(host, state, { label: asFlag(value) ? "value" : "none" }),
    MarkerBackgroundColor: (state, host, value) => changeSeries(host, state, { color: colorOf(value) }),
    MarkerForegroundColor: (state, host, value) => changeSeries(host, state, { color: colorOf(value) }),
    // Lines are drawn straight; a wish for curves is refused rather than passed over.
    Smooth: (_state, _host, value) => {
      if (asFlag(value)) throw fault("ApiNotFound", "Smooth lines.");
    },
  },
  part: {
    Format: (state) => hold("ChartSeriesFormat", state),
    DataLabels: (state) => hold("ChartDataLabels", state),
  },
  lacks: [
    "Filtered",
    "ShowShadow",
    "PlotOrder",
    "GapWidth",
    "DoughnutHoleSize",
    "AxisGroup",
    "Explosion",
    "FirstSliceAngle",
    "InvertIfNegative",
    "BubbleScale",
    "SecondPlotSize",
    "SplitType",
    "SplitValue",
    "VaryByCategories",
    "ShowLeaderLines",
    "Overlap",
    "GradientStyle",
    "GradientMinimumType",
    "GradientMidpointType",
    "GradientMaximumType",
    "GradientMinimumValue",
    "GradientMidpointValue",
    "GradientMaximumValue",
    "GradientMinimumColor",
    "GradientMidpointColor",
    "GradientMaximumColor",
    "ParentLabelStrategy",
    "ShowConnectorLines",
    "InvertColor",
  ],
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

/** Labels stand to the right of their points, and show one thing at a time. */
export const chartDataLabels: Family<OnSeries> = {
  read: {
    Position: () => "Right",
    ShowSeriesName: ({ series }) => series.label === "name",
    ShowValue: ({ series }) => series.label === "value",
  },
  write: {
    Position: (_state, _host, value) => {
      if (asText(value) !== "Right") throw fault("ApiNotFound", `Labels ${asText(value)} of their points.`);
    },
    ShowSeriesName: (state, host, value) => relabel(host, state, { label: "name", on: asFlag(value) }),
    ShowValue: (state, host, value) => relabel(host, state, { label: "value", on: asFlag(value) }),
  },
  lacks: [
    "ShowBubbleSize",
    "ShowCategoryName",
    "ShowLegendKey",
    "ShowPercentage",
    "Separator",
    "NumberFormat",
    "LinkNumberFormat",
    "HorizontalAlignment",
    "VerticalAlignment",
    "TextOrientation",
    "AutoText",
  ],
};

interface Relabelling {
  readonly label: "value" | "name";
  readonly on: boolean;
}

function relabel(host: Host, state: OnSeries, { label, on }: Relabelling): void {
  if (on) changeSeries(host, state, { label });
  else if (state.series.label === label) changeSeries(host, state, { label: "none" });
}

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
