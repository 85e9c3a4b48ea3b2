import type { ReactNode } from "react";
import type { Answer } from "../../core/answer/answer.ts";
import { useType } from "../look/type.ts";
import { CellInText } from "../parts/CellLink.tsx";
import { pFigure } from "../parts/pFigure.ts";
import { writerFor } from "./driverFigures.ts";

/** How far the conclusion about a term could move: across every choice of standard errors, and without its weightiest row. */
export function WhatWouldChange({ answer, index }: { readonly answer: Answer; readonly index: number }): ReactNode {
  const type = useType();
  const { pValues, leaveOneOut } = answer.firmness.terms[index]!;
  const write = writerFor(answer.drivers[index]!);
  const [smallest, largest] = [pValues.smallest, pValues.largest].map((p) =>
    pFigure(p, answer.options.level).replace("<", "under"),
  );
  const range = smallest === largest ? `is ${smallest ?? ""}` : `runs from ${smallest ?? ""} to ${largest ?? ""}`;
  return (
    <p className={type.remark}>
      Over all {answer.firmness.choices.length} choices of standard errors and distribution, p {range}. Without the row
      of <CellInText address={leaveOneOut.cell} /> the coefficient would be {write(leaveOneOut.without)}.
    </p>
  );
}
