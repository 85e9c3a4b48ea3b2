import { makeStyles, mergeClasses, tokens } from "@fluentui/react-components";
import { Fragment, type ReactNode } from "react";
import { type Scale, percentOf, roundTicks, scaleOver, tickLabel } from "./scale.ts";

/** One kind of standard errors and the interval it gives. */
export interface IntervalLine {
  readonly label: string;
  readonly low: number;
  readonly high: number;
  readonly inForce: boolean;
}

export interface IntervalPictureProps {
  readonly lines: readonly IntervalLine[];
  readonly estimate: number;
  /** The value tested against, drawn as a dotted upright. */
  readonly against: number;
  readonly alternative: string;
}

const useStyles = makeStyles({
  figure: {
    display: "grid",
    gridTemplateColumns: "auto 1fr",
    columnGap: tokens.spacingHorizontalS,
    alignItems: "center",
    margin: 0,
    fontSize: tokens.fontSizeBase200,
    lineHeight: "22px",
    fontVariantNumeric: "tabular-nums",
  },
  label: { color: tokens.colorNeutralForeground3, whiteSpace: "nowrap" },
  inForce: { color: tokens.colorNeutralForeground1, fontWeight: tokens.fontWeightSemibold },
  line: { display: "block", width: "100%", height: "22px", overflow: "visible", color: tokens.colorNeutralForeground3 },
  full: { color: tokens.colorBrandForeground1, "@media (forced-colors: active)": { color: "Highlight" } },
  axis: { display: "block", width: "100%", height: "20px", overflow: "visible", color: tokens.colorNeutralForeground3 },
});

/** The intervals that the kinds of standard errors give for one coefficient, on one scale; the one in force drawn full. */
export function IntervalPicture({ lines, estimate, against, alternative }: IntervalPictureProps): ReactNode {
  const styles = useStyles();
  const { scale, againstShown } = intervalScale(lines, against);
  const upright = againstShown ? against : null;
  return (
    <figure className={styles.figure} role="img" aria-label={alternative}>
      {lines.map((line) => (
        <Fragment key={line.label}>
          <span className={mergeClasses(styles.label, line.inForce && styles.inForce)}>
            {line.label}
            {line.inForce && " ●"}
          </span>
          <svg className={mergeClasses(styles.line, line.inForce && styles.full)} aria-hidden="true">
            <Upright at={upright} scale={scale} />
            <Interval line={line} estimate={estimate} scale={scale} />
          </svg>
        </Fragment>
      ))}
      <span />
      <Axis scale={scale} against={upright} className={styles.axis} />
    </figure>
  );
}

/** The value tested against is shown unless it lies so far off that the intervals would shrink to dots. */
const farthest = 5;

function intervalScale(
  lines: readonly IntervalLine[],
  against: number,
): { readonly scale: Scale; readonly againstShown: boolean } {
  const ends = lines.flatMap(({ low, high }) => [low, high]);
  const low = Math.min(...ends);
  const high = Math.max(...ends);
  const away = Math.max(low - against, against - high, 0);
  const againstShown = away <= farthest * (high - low);
  return { scale: scaleOver(againstShown ? [low, high, against] : [low, high]), againstShown };
}

const Upright = ({ at, scale }: { readonly at: number | null; readonly scale: Scale }): ReactNode =>
  at === null ? null : (
    <line
      x1={percentOf(scale, at)}
      x2={percentOf(scale, at)}
      y1="0"
      y2="100%"
      stroke="currentColor"
      strokeDasharray="2 3"
    />
  );

/** In force: a thick bar with a full dot. The others: a thin bar with a hollow one. */
function Interval({
  line,
  estimate,
  scale,
}: {
  readonly line: IntervalLine;
  readonly estimate: number;
  readonly scale: Scale;
}): ReactNode {
  const [low, high] = [percentOf(scale, line.low), percentOf(scale, line.high)];
  const cap = line.inForce ? 6 : 4;
  return (
    <g stroke="currentColor" strokeWidth={line.inForce ? 3 : 1.25}>
      <line x1={low} x2={high} y1="11" y2="11" />
      <line x1={low} x2={low} y1={11 - cap} y2={11 + cap} />
      <line x1={high} x2={high} y1={11 - cap} y2={11 + cap} />
      <circle
        cx={percentOf(scale, estimate)}
        cy="11"
        r={line.inForce ? 4 : 3}
        fill={line.inForce ? "currentColor" : tokens.colorNeutralBackground1}
      />
    </g>
  );
}

/** Room that a label needs beside the next, in per cent of the narrowest picture. */
const labelRoom = 16;

function Axis({
  scale,
  against,
  className,
}: {
  readonly scale: Scale;
  readonly against: number | null;
  readonly className: string;
}): ReactNode {
  const clear = (tick: number): boolean =>
    against === null || tick === against || Math.abs(scale.percent(tick) - scale.percent(against)) > labelRoom;
  const ticks = [...new Set([...roundTicks(scale, 3).filter(clear), ...(against === null ? [] : [against])])];
  return (
    <svg className={className} aria-hidden="true">
      {ticks.map((tick) => (
        <g key={tick}>
          <line x1={percentOf(scale, tick)} x2={percentOf(scale, tick)} y1="0" y2="4" stroke="currentColor" />
          <text
            x={percentOf(scale, tick)}
            y="17"
            fontSize="12"
            textAnchor={anchorAt(scale.percent(tick), tickLabel(tick).length)}
            fill="currentColor"
          >
            {tickLabel(tick)}
          </text>
        </g>
      ))}
    </svg>
  );
}

/** Half a sign of a label, in per cent of the narrowest picture. */
const halfSign = 2;

/** Labels too long for the room to an edge lean inwards, so that none is cut off. */
function anchorAt(percent: number, signs: number): "start" | "middle" | "end" {
  const half = halfSign * signs;
  return percent < half ? "start" : percent > 100 - half ? "end" : "middle";
}
