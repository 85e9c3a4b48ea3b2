import { makeStyles, tokens } from "@fluentui/react-components";
import { type ReactNode, useMemo } from "react";
import type { Answer } from "../../core/answer/answer.ts";
import { PlotFrame, Points, heightOf } from "./PlotFrame.tsx";
import { percentOf, scaleOver } from "./scale.ts";

export interface QuantilePictureProps {
  readonly quantiles: Answer["shape"]["quantiles"];
  readonly alternative: string;
}

const useStyles = makeStyles({ line: { color: tokens.colorNeutralForeground3 } });

/** Residuals in order over where a normal law would put them, with the line on which they would then lie. */
export function QuantilePicture({ quantiles, alternative }: QuantilePictureProps): ReactNode {
  const styles = useStyles();
  const { normal, residuals } = quantiles;
  const across = useMemo(() => scaleOver(normal), [normal]);
  const up = useMemo(() => scaleOver([...residuals, ...normal]), [residuals, normal]);
  const ends = [normal[0] ?? 0, normal.at(-1) ?? 0] as const;
  return (
    <PlotFrame across={across} up={up} xTitle="under a normal law" yTitle="residual" alternative={alternative}>
      <g className={styles.line}>
        <line
          x1={percentOf(across, ends[0])}
          x2={percentOf(across, ends[1])}
          y1={heightOf(up, ends[0])}
          y2={heightOf(up, ends[1])}
          stroke="currentColor"
          strokeDasharray="2 3"
        />
      </g>
      <Points across={across} up={up} x={normal} y={residuals} />
    </PlotFrame>
  );
}
