import { makeStyles, tokens } from "@fluentui/react-components";
import { type ReactNode, useMemo } from "react";
import { type Scale, percentOf, roundTicks, scaleOver, tickLabel } from "./scale.ts";

export interface ResidualPictureProps {
  readonly x: readonly number[];
  readonly residuals: readonly number[];
  readonly xTitle: string;
  readonly yTitle: string;
  readonly alternative: string;
}

const useStyles = makeStyles({
  figure: {
    display: "grid",
    gridTemplateColumns: "auto 1fr",
    gridTemplateRows: "auto 168px auto",
    margin: 0,
    fontSize: tokens.fontSizeBase200,
    color: tokens.colorNeutralForeground3,
    fontVariantNumeric: "tabular-nums",
  },
  yTitle: { gridColumn: "1 / -1", paddingBottom: tokens.spacingVerticalXS },
  yTicks: { position: "relative", minWidth: "34px" },
  yTick: { position: "absolute", right: "6px", transform: "translateY(-50%)" },
  plot: {
    display: "block",
    width: "100%",
    height: "100%",
    borderLeft: `1px solid ${tokens.colorNeutralStroke1}`,
    borderBottom: `1px solid ${tokens.colorNeutralStroke1}`,
    boxSizing: "border-box",
    color: tokens.colorBrandForeground1,
    "@media (forced-colors: active)": { color: "CanvasText" },
  },
  zero: { color: tokens.colorNeutralForeground3 },
  xTicks: { position: "relative", height: "20px", gridColumn: "2" },
  xTick: { position: "absolute", top: "2px", transform: "translateX(-50%)", whiteSpace: "nowrap" },
  xTitle: { gridColumn: "2", textAlign: "right" },
});

/** Residuals as points over something, with the line of zero. */
export function ResidualPicture({ x, residuals, xTitle, yTitle, alternative }: ResidualPictureProps): ReactNode {
  const styles = useStyles();
  const across = useMemo(() => scaleOver(x), [x]);
  const up = useMemo(() => scaleOver([...residuals, 0]), [residuals]);
  return (
    <figure className={styles.figure} role="img" aria-label={alternative}>
      <span className={styles.yTitle}>{yTitle}</span>
      <div className={styles.yTicks} aria-hidden="true">
        {roundTicks(up, 4).map((tick) => (
          <span key={tick} className={styles.yTick} style={{ top: heightOf(up, tick) }}>
            {tickLabel(tick)}
          </span>
        ))}
      </div>
      <svg className={styles.plot} aria-hidden="true">
        <g className={styles.zero}>
          <line
            x1="0"
            x2="100%"
            y1={heightOf(up, 0)}
            y2={heightOf(up, 0)}
            stroke="currentColor"
            strokeDasharray="2 3"
          />
        </g>
        <Points across={across} up={up} x={x} y={residuals} />
      </svg>
      <div className={styles.xTicks} aria-hidden="true">
        {roundTicks(across, 3).map((tick) => (
          <span key={tick} className={styles.xTick} style={{ left: percentOf(across, tick) }}>
            {tickLabel(tick)}
          </span>
        ))}
      </div>
      <span className={styles.xTitle}>{xTitle}</span>
    </figure>
  );
}

/** Heights run downwards in SVG. */
const heightOf = (up: Scale, value: number): string => `${(100 - up.percent(value)).toFixed(2)}%`;

interface PointsProps {
  readonly across: Scale;
  readonly up: Scale;
  readonly x: readonly number[];
  readonly y: readonly number[];
}

/** Crowded pictures get smaller points. */
const crowded = 300;

const Points = ({ across, up, x, y }: PointsProps): ReactNode => (
  <g fill="currentColor" fillOpacity="0.55">
    {x.map((value, index) => (
      <circle
        key={index}
        cx={percentOf(across, value)}
        cy={heightOf(up, y[index]!)}
        r={x.length > crowded ? 1.6 : 2.6}
      />
    ))}
  </g>
);
