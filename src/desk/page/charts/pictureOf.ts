import { parseArea } from "../../workbook/areas.ts";
import type { Book } from "../../workbook/book.ts";
import { cellAt, cellsOf, kindOf, valueOf } from "../../workbook/cells.ts";
import type { ChartRecord, SeriesRecord } from "../../workbook/records.ts";
import { scaleOf, type Scale } from "./scale.ts";

/** A chart ready to be drawn: every point in the data's own units. */
export interface Picture {
  readonly title: string;
  readonly kind: ChartRecord["kind"];
  /** In pixels. */
  readonly width: number;
  readonly height: number;
  readonly legend: boolean;
  readonly x: Axis;
  readonly y: Axis;
  readonly series: readonly Series[];
}

export interface Axis extends Scale {
  readonly title: string;
}

export interface Series {
  readonly name: string;
  readonly color: string;
  readonly line: boolean;
  readonly markers: boolean;
  readonly label: SeriesRecord["label"];
  /** Neighbouring points are joined; null is a gap. */
  readonly points: readonly ({ readonly x: number; readonly y: number } | null)[];
}

const colors = ["#0f6cbd", "#b35309", "#4f7a28", "#7a3e9d", "#9d2c2c", "#2f7d7a"];
const pixelsPerPoint = 4 / 3;

export function pictureOf(book: Book, sheet: string, chart: ChartRecord): Picture {
  const series = chart.series.map((one, index) => seriesOf(book, { sheet, kind: chart.kind, index }, one));
  const points = series.flatMap((one) => one.points.filter((point) => point !== null));
  const ends =
    chart.kind === "columns" && chart.y.minimum === null
      ? { ...chart.y, minimum: Math.min(0, ...points.map(({ y }) => y)) }
      : chart.y;
  return {
    title: chart.title.visible ? chart.title.text : "",
    kind: chart.kind,
    width: chart.width * pixelsPerPoint,
    height: chart.height * pixelsPerPoint,
    legend: chart.legend,
    x: {
      title: titleOf(chart.x),
      ...scaleOf(
        points.map(({ x }) => x),
        chart.x,
      ),
    },
    y: {
      title: titleOf(chart.y),
      ...scaleOf(
        points.map(({ y }) => y),
        ends,
      ),
      ...(chart.y.visible ? {} : { ticks: [] }),
    },
    series,
  };
}

const titleOf = ({ title }: ChartRecord["x"]): string => (title.visible ? title.text : "");

interface Place {
  readonly sheet: string;
  readonly kind: ChartRecord["kind"];
  readonly index: number;
}

function seriesOf(book: Book, { sheet, kind, index }: Place, record: SeriesRecord): Series {
  const ys = numbersIn(book, sheet, record.y);
  const xs = kind === "columns" || record.x === "" ? [] : numbersIn(book, sheet, record.x);
  return {
    name: record.name,
    color: record.color === "" ? colors[index % colors.length]! : record.color,
    line: record.line,
    markers: record.markers,
    label: record.label,
    points: ys.map((y, i) => pointAt(xs.length === 0 ? i + 1 : xs[i], y)),
  };
}

const pointAt = (x: number | null | undefined, y: number | null): { readonly x: number; readonly y: number } | null =>
  x === null || x === undefined || y === null ? null : { x, y };

/** The numbers of a range, row by row; whatever is no number is a gap. */
function numbersIn(book: Book, sheet: string, address: string): readonly (number | null)[] {
  const area = parseArea(book, address.replaceAll("$", ""), sheet);
  if (area === null) return [];
  const cells = cellsOf(book, area.sheet);
  return Array.from({ length: area.rows * area.columns }, (_, index) => {
    const cell = cellAt(cells, area.row + Math.floor(index / area.columns), area.column + (index % area.columns));
    const value = valueOf(cell);
    return kindOf(cell) === "Double" && typeof value === "number" ? value : null;
  });
}
