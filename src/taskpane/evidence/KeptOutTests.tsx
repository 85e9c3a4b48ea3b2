import type { ReactNode } from "react";
import { capitalised, listInWords } from "../../core/answer/wording.ts";
import { useType } from "../look/type.ts";
import { type TestGroup, keptOut } from "./testGroups.ts";

/** The tests that say nothing about these data, a paragraph a reason. */
export function KeptOutTests({ groups }: { readonly groups: readonly TestGroup[] }): ReactNode {
  const type = useType();
  if (groups.length === 0) return null;
  return (
    <>
      <h2 className={type.head}>Tests that do not apply</h2>
      {keptOut(groups).map(({ because, titles }) => (
        <p key={because} className={type.remark}>
          {capitalised(because)}. Left out: {listInWords(titles)}.
        </p>
      ))}
    </>
  );
}
