import type { ReactNode } from "react";
import type { Answer } from "../../core/answer/answer.ts";
import { useType } from "../look/type.ts";
import { CorrelationPicture } from "../pictures/CorrelationPicture.tsx";
import { FiguresBehind } from "./FiguresBehind.tsx";
import { correlationsInWords } from "./shapeWords.ts";

/** How far residuals are correlated with those some periods earlier; nothing where rows have no time. */
export function OwnPast({ answer }: { readonly answer: Answer }): ReactNode {
  const type = useType();
  const { correlations } = answer.shape;
  if (correlations === null) return null;
  const { values, bound } = correlations;
  const unit = answer.rows.kind === "time" ? answer.rows.period.unit : "period";
  return (
    <>
      <h3 className={type.subhead}>Against their own past</h3>
      <CorrelationPicture
        values={values}
        bound={bound}
        xTitle={`lag, in ${unit}s`}
        alternative={correlationsInWords(correlations)}
      />
      <p className={type.remark}>
        Between the dotted lines lie 95 % of such correlations if errors do not follow on, near enough: one in twenty
        outside them is no news.
      </p>
      <FiguresBehind
        picture="residuals against their own past"
        headings={["lag", "correlation"]}
        lines={values.map((value, index) => ({ name: String(index + 1), cells: null, figures: [value] }))}
      />
    </>
  );
}
