import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { ColumnDescription } from "../../core/table/describe.ts";
import { percentOf, scaleOver } from "./scale.ts";

const useStyles = makeStyles({
  picture: {
    display: "block",
    width: "44px",
    height: "24px",
    overflow: "visible",
    color: tokens.colorBrandForeground1,
    "@media (forced-colors: active)": { color: "CanvasText" },
  },
});

export interface ColumnPictureProps {
  readonly column: ColumnDescription;
  /** Whether the rows follow one another, so that a line may join them. */
  readonly joined: boolean;
}

/** The values of a column at a glance: points in row order (joined where rows run through time), or bars by category. */
export function ColumnPicture({ column, joined }: ColumnPictureProps): ReactNode {
  const styles = useStyles();
  const { holds, levels, sample } = column;
  const drawn = holds === "categories" ? levels.length > 0 : sample.length > 1;
  if (!drawn) return <span />;
  return (
    <svg className={styles.picture} role="img" aria-label={pictureInWords(column)}>
      {holds === "categories" ? <Bars levels={levels} /> : joined ? <Line sample={sample} /> : <Dots sample={sample} />}
    </svg>
  );
}

const mostBars = 8;

function Bars({ levels }: { readonly levels: ColumnDescription["levels"] }): ReactNode {
  const shown = levels.slice(0, mostBars);
  const tallest = shown[0]?.count ?? 1;
  const width = 100 / shown.length;
  return shown.map(({ level, count }, index) => (
    <rect
      key={level}
      x={`${index * width}%`}
      width={`${width * 0.75}%`}
      y={`${100 - (100 * count) / tallest}%`}
      height={`${(100 * count) / tallest}%`}
      fill="currentColor"
    />
  ));
}

function Dots({ sample }: { readonly sample: readonly number[] }): ReactNode {
  const up = scaleOver(sample);
  const across = scaleOver([0, sample.length - 1]);
  return sample.map((value, index) => (
    <circle
      key={index}
      cx={percentOf(across, index)}
      cy={`${(100 - up.percent(value)).toFixed(2)}%`}
      r="1.3"
      fill="currentColor"
    />
  ));
}

const Line = ({ sample }: { readonly sample: readonly number[] }): ReactNode => {
  const up = scaleOver(sample);
  const across = scaleOver([0, sample.length - 1]);
  const at = (index: number) => ({
    x: percentOf(across, index),
    y: `${(100 - up.percent(sample[index]!)).toFixed(2)}%`,
  });
  return sample.slice(1).map((_, index) => {
    const [from, to] = [at(index), at(index + 1)];
    return <line key={index} x1={from.x} y1={from.y} x2={to.x} y2={to.y} stroke="currentColor" strokeWidth="1.2" />;
  });
};

const most = new Intl.NumberFormat("en-US", { maximumSignificantDigits: 4 });

function pictureInWords({ name, holds, levels, min, max }: ColumnDescription): string {
  if (holds === "categories") {
    const named = levels.slice(0, 3).map(({ level, count }) => `${level} ${count}`);
    return `${name}, most frequent: ${named.join(", ")}`;
  }
  if (min === null || max === null) return name;
  return holds === "numbers"
    ? `${name}, values from ${most.format(min)} to ${most.format(max)}`
    : `${name} in row order`;
}
