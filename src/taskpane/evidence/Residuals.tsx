import { type ReactNode, useMemo } from "react";
import type { Answer } from "../../core/answer/answer.ts";
import { addressOf, parseAddress } from "../../core/table/address.ts";
import { useType } from "../look/type.ts";
import { CellList } from "../parts/CellList.tsx";
import { ResidualPicture } from "../pictures/ResidualPicture.tsx";
import { FiguresBehind } from "./FiguresBehind.tsx";
import { OwnPast } from "./OwnPast.tsx";
import { Quantiles } from "./Quantiles.tsx";
import { largestResiduals, overFittedInWords, overRowsInWords } from "./residualWords.ts";

const mostListed = 5;

interface ResidualsProps {
  readonly answer: Answer;
  /** Where the data stand. */
  readonly address: string;
}

/** Residuals over fitted values, through time, against their own past and a normal law; the rows that fit worst. */
export function Residuals({ answer, address }: ResidualsProps): ReactNode {
  const type = useType();
  const { points, observations } = answer;
  const worst = useMemo(() => largestResiduals(points, mostListed), [points]);
  const words = useMemo(() => overFittedInWords(points), [points]);
  const shown = points.fitted.length.toLocaleString("en-US");
  return (
    <>
      <h3 className={type.subhead}>Over fitted values</h3>
      <ResidualPicture
        x={points.fitted}
        residuals={points.residuals}
        xTitle={`fitted ${answer.outcome}`}
        yTitle="residual"
        alternative={words}
      />
      <p className={type.remark}>
        A fan says that the spread is uneven, a bend that a curve is missing.
        {points.thinned && ` Shown are ${shown} of ${observations.toLocaleString("en-US")} rows.`}
      </p>
      <FiguresBehind
        picture="residuals over fitted values"
        headings={["row", "fitted", "residual"]}
        lines={points.rows.map((row, index) => ({
          name: `row ${row}`,
          cells: rowAddress(address, row),
          figures: [points.fitted[index]!, points.residuals[index]!],
        }))}
      />
      <ThroughTime answer={answer} address={address} />
      <OwnPast answer={answer} />
      <Quantiles answer={answer} />
      <h3 className={type.subhead}>Farthest from the fit{points.thinned && ", among the rows shown"}</h3>
      <CellList
        items={worst.map(({ row, words: said }) => ({ address: rowAddress(address, row), words: said }))}
        more={0}
      />
    </>
  );
}

function ThroughTime({ answer, address }: ResidualsProps): ReactNode {
  const type = useType();
  const { points, rows } = answer;
  const words = useMemo(() => overRowsInWords(points), [points]);
  if (rows.kind !== "time" || points.periods === null) return null;
  const { unit } = rows.period;
  return (
    <>
      <h3 className={type.subhead}>Through time</h3>
      <ResidualPicture
        x={points.periods}
        residuals={points.residuals}
        xTitle={`${unit} (1 is ${rows.first})`}
        yTitle="residual"
        alternative={words}
      />
      <p className={type.remark}>Long runs on one side of zero say that the errors follow on.</p>
      <FiguresBehind
        picture="residuals through time"
        headings={["row", unit, "residual"]}
        lines={points.rows.map((row, index) => ({
          name: `row ${row}`,
          cells: rowAddress(address, row),
          figures: [points.periods![index]!, points.residuals[index]!],
        }))}
      />
    </>
  );
}

/** The part of a sheet row inside the data: "Months!A14:D14". */
function rowAddress(address: string, row: number): string {
  const area = parseAddress(address);
  return area === null ? `row ${row}` : addressOf({ ...area, row: row - 1, rows: 1 });
}
