import type { ReactNode } from "react";
import type { Answer } from "../../core/answer/answer.ts";
import { useType } from "../look/type.ts";
import { QuantilePicture } from "../pictures/QuantilePicture.tsx";
import { FiguresBehind } from "./FiguresBehind.tsx";
import { quantilesInWords } from "./shapeWords.ts";

/** Whether the residuals are spread as a normal law would spread them. */
export function Quantiles({ answer }: { readonly answer: Answer }): ReactNode {
  const type = useType();
  const { quantiles } = answer.shape;
  const { residuals, normal } = quantiles;
  return (
    <>
      <h3 className={type.subhead}>Against a normal law</h3>
      <QuantilePicture quantiles={quantiles} alternative={quantilesInWords(quantiles)} />
      <p className={type.remark}>
        On the dotted line the errors are as a normal law has them. Ends that leave it mean large errors more often, or
        on one side: with few rows, p-values are then less exact.
        {residuals.length < answer.observations &&
          ` Shown are ${residuals.length} of ${answer.observations.toLocaleString("en-US")} rows, evenly by rank.`}
      </p>
      <FiguresBehind
        picture="residuals against a normal law"
        headings={["rank", "normal law", "residual"]}
        lines={residuals.map((residual, index) => ({
          name: String(index + 1),
          cells: null,
          figures: [normal[index]!, residual],
        }))}
      />
    </>
  );
}
