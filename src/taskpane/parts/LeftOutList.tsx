import type { ReactNode } from "react";
import type { LeftOut } from "../../core/design/design.ts";
import { HelpLink } from "../help/HelpLink.tsx";
import { CellList } from "./CellList.tsx";
import { Disclosure } from "./Disclosure.tsx";
import { counted } from "../../core/problem/spots.ts";

export interface LeftOutListProps {
  readonly leftOut: readonly LeftOut[];
  readonly count: number;
}

const mostListed = 50;

/** The rows that are left out, each with the cell that is to blame and the reason. */
export function LeftOutList({ leftOut, count }: LeftOutListProps): ReactNode {
  if (count === 0) return null;
  const listed = leftOut.slice(0, mostListed);
  return (
    <Disclosure label={`${counted(count, "row")} left out`}>
      <CellList
        items={listed.map(({ cell, because }) => ({ address: cell, words: because }))}
        more={count - listed.length}
      />
      <HelpLink about="left-out rows" asks="Why are rows left out?" />
    </Disclosure>
  );
}
