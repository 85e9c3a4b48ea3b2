import type { ReactNode } from "react";
import type { Answer } from "../../core/answer/answer.ts";
import { useType } from "../look/type.ts";
import { LeftOutList } from "../parts/LeftOutList.tsx";
import { counted } from "../../core/problem/spots.ts";
import { rowsInWords } from "../parts/rowWords.ts";

/** How many rows the answer rests on, what they are to each other, what was left out and why, what was done to the data. */
export function RowsUsed({ answer }: { readonly answer: Answer }): ReactNode {
  const type = useType();
  return (
    <>
      <p className={type.body}>
        {counted(answer.observations, "row")} used, {rowsInWords(answer.rows)}.
      </p>
      <LeftOutList leftOut={answer.leftOut} count={answer.leftOutCount} />
      {answer.notes.map((note) => (
        <p key={note} className={type.remark}>
          {note}
        </p>
      ))}
    </>
  );
}
