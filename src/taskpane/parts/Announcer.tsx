import type { ReactNode } from "react";
import type { PaneState } from "../../app/state.ts";
import { useType } from "../look/type.ts";

/** Tells screen readers what happened. Two regions take turns, so that the same words are heard a second time. */
export function Announcer({ said }: { readonly said: PaneState["said"] }): ReactNode {
  const type = useType();
  const turn = said.count % 2;
  return (
    <>
      <div role="status" className={type.hidden}>
        {turn === 0 ? said.text : ""}
      </div>
      <div role="status" className={type.hidden}>
        {turn === 1 ? said.text : ""}
      </div>
    </>
  );
}
