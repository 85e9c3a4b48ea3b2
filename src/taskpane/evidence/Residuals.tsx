import { type ReactNode, useMemo } from "react";
import type { Answer } from "../../core/answer/answer.ts";
import { addressOf, parseAddress } from "../../core/table/address.ts";
import { useType } from "../look/type.ts";
import { CellList } from "../parts/CellList.tsx";
import { ResidualPicture } from "../pictures/ResidualPicture.tsx";
import { largestResiduals, residualsInWords } from "./residualWords.ts";

const mostListed = 5;

/** Residuals over fitted values: a fan says uneven spread, a bend says a missing curve; and the rows that fit worst. */
export function Residuals({ answer, address }: { readonly answer: Answer; readonly address: string }): ReactNode {
  const type = useType();
  const { points } = answer;
  const words = useMemo(() => residualsInWords(points), [points]);
  const worst = useMemo(() => largestResiduals(points, mostListed), [points]);
  return (
    <>
      <ResidualPicture
        x={points.fitted}
        residuals={points.residuals}
        xTitle={`fitted ${answer.outcome}`}
        yTitle="residual"
        alternative={words}
      />
      <p className={type.remark}>
        A fan says that the spread is uneven, a bend that a curve is missing.
        {points.thinned &&
          ` Shown are ${points.fitted.length.toLocaleString("en-US")} of ${answer.observations.toLocaleString("en-US")} rows.`}
      </p>
      <p className={type.remark}>Farthest from the fit{points.thinned ? ", among the rows shown" : ""}:</p>
      <CellList
        items={worst.map(({ row, words: said }) => ({ address: rowAddress(address, row), words: said }))}
        more={0}
      />
    </>
  );
}

/** The part of a sheet row inside the data: "Months!A14:D14". */
function rowAddress(address: string, row: number): string {
  const area = parseAddress(address);
  return area === null ? `row ${row}` : addressOf({ ...area, row: row - 1, rows: 1 });
}
