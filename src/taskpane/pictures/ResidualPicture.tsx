import { type ReactNode, useMemo } from "react";
import { LevelLine, PlotFrame, Points, ticksAcross } from "./PlotFrame.tsx";
import { scaleOver, wholeTicks } from "./scale.ts";

export interface ResidualPictureProps {
  readonly x: readonly number[];
  readonly residuals: readonly number[];
  readonly xTitle: string;
  readonly yTitle: string;
  readonly alternative: string;
}

/** Residuals as points over something, with the line of zero; periods are counted. */
export function ResidualPicture({ x, residuals, ...titles }: ResidualPictureProps): ReactNode {
  const across = useMemo(() => scaleOver(x), [x]);
  const up = useMemo(() => scaleOver([...residuals, 0]), [residuals]);
  return (
    <PlotFrame
      across={across}
      up={up}
      {...titles}
      {...(x.every(Number.isInteger) ? { ticks: wholeTicks(across, ticksAcross) } : {})}
    >
      <LevelLine up={up} at={0} />
      <Points across={across} up={up} x={x} y={residuals} />
    </PlotFrame>
  );
}
