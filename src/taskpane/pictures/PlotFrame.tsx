import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { type Scale, percentOf, roundTicks, tickLabel } from "./scale.ts";

export interface PlotFrameProps {
  readonly across: Scale;
  readonly up: Scale;
  /** The values named across; round ones where nothing is said. */
  readonly ticks?: readonly number[];
  readonly xTitle: string;
  readonly yTitle: string;
  /** What the picture shows, for those who do not see it. */
  readonly alternative: string;
  /** What is drawn inside, in per cent of the frame. */
  readonly children: ReactNode;
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
  xTicks: { position: "relative", height: "20px", gridColumn: "2" },
  xTick: { position: "absolute", top: "2px", transform: "translateX(-50%)", whiteSpace: "nowrap" },
  xTitle: { gridColumn: "2", textAlign: "right", overflowWrap: "anywhere" },
});

/** About so many values are named across. */
export const ticksAcross = 4;

/** Two axes with round numbers, and room for what is drawn between them. */
export function PlotFrame({ across, up, ticks, xTitle, yTitle, alternative, children }: PlotFrameProps): ReactNode {
  const styles = useStyles();
  const named = ticks ?? roundTicks(across, ticksAcross);
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
        {children}
      </svg>
      <div className={styles.xTicks} aria-hidden="true">
        {named.map((tick) => (
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
export const heightOf = (up: Scale, value: number): string => `${(100 - up.percent(value)).toFixed(2)}%`;

const useLineStyles = makeStyles({ line: { color: tokens.colorNeutralForeground3 } });

/** A dotted level line: zero, or a bound. */
export function LevelLine({ up, at }: { readonly up: Scale; readonly at: number }): ReactNode {
  const styles = useLineStyles();
  const height = heightOf(up, at);
  return (
    <g className={styles.line}>
      <line x1="0" x2="100%" y1={height} y2={height} stroke="currentColor" strokeDasharray="2 3" />
    </g>
  );
}

export interface PointsProps {
  readonly across: Scale;
  readonly up: Scale;
  readonly x: readonly number[];
  readonly y: readonly number[];
}

/** Crowded pictures get smaller points. */
const crowded = 300;

export const Points = ({ across, up, x, y }: PointsProps): ReactNode => (
  <g fill="currentColor" fillOpacity="0.7">
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
