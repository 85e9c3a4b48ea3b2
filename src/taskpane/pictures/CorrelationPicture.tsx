import { type ReactNode, useMemo } from "react";
import { LevelLine, PlotFrame, heightOf, ticksAcross } from "./PlotFrame.tsx";
import { percentOf, scaleOver, wholeTicks } from "./scale.ts";

export interface CorrelationPictureProps {
  /** One a lag, from lag 1. */
  readonly values: readonly number[];
  readonly bound: number;
  readonly xTitle: string;
  readonly alternative: string;
}

/** The correlation at each lag as an upright from zero, thick where it leaves the bounds. */
export function CorrelationPicture({ values, bound, xTitle, alternative }: CorrelationPictureProps): ReactNode {
  const across = useMemo(() => scaleOver([0, values.length + 1], 0), [values]);
  const up = useMemo(() => scaleOver([...values, bound, -bound]), [values, bound]);
  return (
    <PlotFrame
      across={across}
      up={up}
      ticks={wholeTicks(across, ticksAcross)}
      xTitle={xTitle}
      yTitle="correlation"
      alternative={alternative}
    >
      <line x1="0" x2="100%" y1={heightOf(up, 0)} y2={heightOf(up, 0)} stroke="currentColor" />
      {[bound, -bound].map((level) => (
        <LevelLine key={level} up={up} at={level} />
      ))}
      <g stroke="currentColor">
        {values.map((value, index) => (
          <line
            key={index}
            x1={percentOf(across, index + 1)}
            x2={percentOf(across, index + 1)}
            y1={heightOf(up, 0)}
            y2={heightOf(up, value)}
            strokeWidth={Math.abs(value) > bound ? 5 : 2}
          />
        ))}
      </g>
    </PlotFrame>
  );
}
