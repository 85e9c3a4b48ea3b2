import type { ReactNode } from "react";
import type { Axis, Picture, Series } from "./pictureOf.ts";

/** Room around the plot, in pixels. */
const margin = { left: 62, right: 16, top: 14, bottom: 30 };
const titleRoom = 22;
const axisTitleRoom = 20;
const legendRoom = 22;
const markerRadius = 3;

interface Plot {
  readonly left: number;
  readonly right: number;
  readonly top: number;
  readonly bottom: number;
  readonly x: (value: number) => number;
  readonly y: (value: number) => number;
}

/** A chart over the cells, as plain as a spreadsheet draws it. */
export function ChartPicture({ picture }: { readonly picture: Picture }): ReactNode {
  const plot = plotOf(picture);
  const { width, height, title } = picture;
  return (
    <svg className="chart" role="img" aria-label={`Chart: ${title}`} viewBox={`0 0 ${width} ${height}`}>
      <text className="chart-title" x={width / 2} y={margin.top + 6} textAnchor="middle">
        {title}
      </text>
      <HorizontalAxis axis={picture.x} plot={plot} />
      <VerticalAxis axis={picture.y} plot={plot} />
      {picture.series.map((series, index) => (
        <Drawn key={index} series={series} plot={plot} columns={picture.kind === "columns"} />
      ))}
      {picture.legend && <Legend series={picture.series} y={height - 8} width={width} />}
    </svg>
  );
}

function plotOf({ width, height, title, legend, x, y }: Picture): Plot {
  const left = margin.left + (y.title === "" ? 0 : axisTitleRoom) / 2;
  const right = width - margin.right;
  const top = margin.top + (title === "" ? 0 : titleRoom);
  const bottom = height - margin.bottom - (x.title === "" ? 0 : axisTitleRoom) - (legend ? legendRoom : 0);
  const along = ({ minimum, maximum }: Axis, value: number): number => (value - minimum) / (maximum - minimum);
  return {
    left,
    right,
    top,
    bottom,
    x: (value) => left + along(x, value) * (right - left),
    y: (value) => bottom - along(y, value) * (bottom - top),
  };
}

function HorizontalAxis({ axis, plot }: { readonly axis: Axis; readonly plot: Plot }): ReactNode {
  return (
    <g>
      <line className="chart-axis" x1={plot.left} x2={plot.right} y1={plot.bottom} y2={plot.bottom} />
      {axis.ticks.map((tick) => (
        <text key={tick} x={plot.x(tick)} y={plot.bottom + 16} textAnchor="middle">
          {tick}
        </text>
      ))}
      <text x={(plot.left + plot.right) / 2} y={plot.bottom + 16 + axisTitleRoom} textAnchor="middle">
        {axis.title}
      </text>
    </g>
  );
}

function VerticalAxis({ axis, plot }: { readonly axis: Axis; readonly plot: Plot }): ReactNode {
  const middle = (plot.top + plot.bottom) / 2;
  return (
    <g>
      {axis.ticks.map((tick) => (
        <g key={tick}>
          <line className="chart-grid" x1={plot.left} x2={plot.right} y1={plot.y(tick)} y2={plot.y(tick)} />
          <text x={plot.left - 6} y={plot.y(tick) + 4} textAnchor="end">
            {tick}
          </text>
        </g>
      ))}
      <text x={14} y={middle} textAnchor="middle" transform={`rotate(-90 14 ${middle})`}>
        {axis.title}
      </text>
    </g>
  );
}

interface DrawnProps {
  readonly series: Series;
  readonly plot: Plot;
  readonly columns: boolean;
}

function Drawn({ series, plot, columns }: DrawnProps): ReactNode {
  const { color, line, markers } = series;
  const points = series.points.filter((point) => point !== null);
  if (columns)
    return points.map(({ x, y }) => <Bar key={x} at={plot.x(x)} from={plot.y(0)} to={plot.y(y)} color={color} />);
  return (
    <g>
      {line && <path d={pathOf(series.points, plot)} fill="none" stroke={color} strokeWidth={2} />}
      {markers &&
        points.map(({ x, y }, index) => (
          <circle key={index} cx={plot.x(x)} cy={plot.y(y)} r={markerRadius} fill={color} />
        ))}
      {series.label !== "none" &&
        points.map(({ x, y }, index) => (
          <text key={index} x={plot.x(x) + 2 * markerRadius} y={plot.y(y) + 4}>
            {series.label === "name" ? series.name : y}
          </text>
        ))}
    </g>
  );
}

interface BarProps {
  readonly at: number;
  readonly from: number;
  readonly to: number;
  readonly color: string;
}

const barWidth = 14;

const Bar = ({ at, from, to, color }: BarProps): ReactNode => (
  <rect x={at - barWidth / 2} y={Math.min(from, to)} width={barWidth} height={Math.abs(to - from)} fill={color} />
);

/** A gap lifts the pen. */
function pathOf(points: Series["points"], plot: Plot): string {
  return points
    .map((point, index) =>
      point === null ? "" : `${points[index - 1] ? "L" : "M"}${plot.x(point.x)} ${plot.y(point.y)}`,
    )
    .join("");
}

interface LegendProps {
  readonly series: readonly Series[];
  readonly y: number;
  readonly width: number;
}

function Legend({ series, y, width }: LegendProps): ReactNode {
  const room = width / (series.length + 1);
  return series.map(({ name, color, line }, index) => (
    <g key={index} transform={`translate(${room * (index + 0.6)} ${y})`}>
      {line ? (
        <line x1={0} x2={16} y1={-4} y2={-4} stroke={color} strokeWidth={2} />
      ) : (
        <circle cx={8} cy={-4} r={markerRadius} fill={color} />
      )}
      <text x={22}>{name}</text>
    </g>
  ));
}
