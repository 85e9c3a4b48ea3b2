import { asFlag, asNumber, asText } from "./arguments.ts";
import { change } from "./charts.ts";
import { fault } from "./fault.ts";
import { hold, type OnAxis, type OnChart } from "./held.ts";
import type { Family } from "./model.ts";

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
