import type { Answer } from "../core/answer/answer.ts";
import { confidenceInWords, listInWords } from "../core/answer/wording.ts";
import type { ErrorsChoice } from "../core/covariance/choice.ts";
import type { InferenceTable } from "../core/inference/inference.ts";
import { type PlacedChart, columnArea, dataBlock, noteOver } from "./chartData.ts";
import { chartDataColumn } from "./columns.ts";
import type { Area, AxisEnds, ChartPlan, PlanCell } from "./plan.ts";
import { number } from "./section.ts";

type Series = ChartPlan["series"][number];

/** Behind the residuals: the upright of the tested value, the names, then two columns and a blank one a kind. */
const uprightColumn = chartDataColumn + 6;
const namesColumn = chartDataColumn + 9;
const kindsColumn = chartDataColumn + 12;
const kindColumns = 3;

/**
 * The intervals of each driver under every kind of standard errors, in units of the standard error in force, so that
 * drivers of any scale share one axis; a bar that crosses the tested value is an effect that cannot be shown. Each
 * interval is a line from its low to its high end with a blank row after it, and each driver's name a point with a label:
 * the charts of the host have neither error bars of given length nor words on an upright axis of numbers.
 */
export function intervalChart(answer: Answer, place: Area): PlacedChart {
  const terms = answer.terms.flatMap((_, index) => (answer.drivers[index]?.sentence === null ? [] : [index]));
  const kinds = kindsOf(answer);
  const drawn = kinds.map((kind, order) => drawnKind(answer, terms, { kind, order }));
  const xRange = roomFor(drawn.flatMap(({ ends }) => ends));
  const heights = { minimum: 0.4, maximum: terms.length + 0.6 };
  return {
    chart: {
      title: `${confidenceInWords(answer.options.level)} intervals, from top: ${listInWords(kinds.map(({ name }) => name))}`,
      kind: "scatter",
      place,
      xTitle: "Standard errors in force from the tested value; thick: the kind in force",
      yTitle: "",
      xRange,
      yRange: heights,
      yHidden: true,
      legend: false,
      series: [upright, ...drawn.map(({ series }) => series), ...names(answer, terms)],
    },
    blocks: [
      dataBlock(uprightColumn, ["Tested value", "From it", "Height"], uprightCells(heights)),
      dataBlock(namesColumn, ["Drivers", "From it", "Height"], nameCells(terms.length, xRange.minimum)),
      ...drawn.map(({ block }) => block),
    ],
    formats: [uprightColumn, namesColumn, ...drawn.map(({ column }) => column)].map((column) => noteOver(column, 2)),
  };
}

interface Kind {
  readonly name: string;
  readonly table: InferenceTable;
  readonly inForce: boolean;
}

function kindsOf({ inference, decision }: Answer): Kind[] {
  const found: readonly (readonly [ErrorsChoice["kind"], string, InferenceTable | null])[] = [
    ["classical", "classical", inference.classical],
    ["white", "White", inference.white],
    ["newey-west", "Newey-West", inference.neweyWest],
    ["grouped", "grouped", inference.grouped],
  ];
  return found.flatMap(([kind, name, own]) => {
    if (own === null) return [];
    const inForce = kind === decision.inForce.errors.kind;
    return [{ name, table: inForce ? inference.inForce : own, inForce }];
  });
}

interface Placed {
  readonly kind: Kind;
  /** From the top, within each driver. */
  readonly order: number;
}

/** Between the bars of one driver, in drivers. */
const gap = 0.22;

function drawnKind(answer: Answer, terms: readonly number[], { kind, order }: Placed) {
  const column = kindsColumn + order * kindColumns;
  const lines = terms.map((term, position) => {
    const unit = answer.inference.inForce.standardErrors[term]!;
    const { against } = answer.drivers[term]!;
    const ends = [kind.table.low[term]!, kind.table.high[term]!].map((end) => (end - against) / unit);
    return { ends, height: terms.length - position + (1 - order) * gap };
  });
  const cells = lines.flatMap(({ ends, height }): PlanCell[][] => [
    ...ends.map((end) => [number(end), number(height)]),
    [null, null],
  ]);
  const series: Series = {
    name: kind.name,
    x: columnArea(column, cells.length),
    y: columnArea(column + 1, cells.length),
    drawn: "line",
    look: kind.inForce ? "in force" : "beside",
  };
  const block = dataBlock(column, [kind.name, "From and to", "Height"], cells);
  return { column, series, block, ends: lines.flatMap(({ ends }) => ends) };
}

/** The share of the picture's width that is kept for the names, before its ends are rounded. */
const nameShare = 0.26;
const wantedSteps = 6;
const roundSteps = [1, 2, 5, 10];

/** Ends on round numbers of standard errors, with room for the names at the left. */
function roomFor(ends: readonly number[]): AxisEnds {
  const [low, high] = [Math.min(0, ...ends), Math.max(0, ...ends)];
  const span = (high - low) / (1 - nameShare);
  const power = 10 ** Math.floor(Math.log10(span / wantedSteps));
  const step = power * roundSteps.find((size) => size * power * wantedSteps >= span)!;
  return { minimum: step * Math.floor((high - span) / step), maximum: step * Math.ceil(high / step) };
}

const upright: Series = {
  name: "Tested value",
  x: columnArea(uprightColumn, 2),
  y: columnArea(uprightColumn + 1, 2),
  drawn: "line",
  look: "mark",
};

const uprightCells = ({ minimum, maximum }: AxisEnds): PlanCell[][] =>
  [minimum, maximum].map((height) => [number(0), number(height)]);

const nameCells = (count: number, left: number): PlanCell[][] =>
  Array.from({ length: count }, (_, position) => [number(left), number(count - position)]);

const names = ({ terms }: Answer, drawn: readonly number[]): Series[] =>
  drawn.map((term, position) => ({
    name: shortened(terms[term]!),
    x: columnArea(namesColumn, 1, position),
    y: columnArea(namesColumn + 1, 1, position),
    drawn: "name",
    look: "mark",
  }));

/** Letters of a name that have room in the picture. */
const longestName = 24;

const shortened = (name: string): string =>
  name.length <= longestName ? name : `${name.slice(0, longestName - 1).trimEnd()}…`;
