import type { ReactNode } from "react";
import { counted } from "../../core/problem/spots.ts";
import type { Finding } from "../../core/review/finding.ts";
import { useType } from "../look/type.ts";
import { Disclosure } from "../parts/Disclosure.tsx";
import { FindingList } from "./FindingList.tsx";

/** More findings than these stand folded away. */
const mostAtOnce = 10;

/** What is said of the sheets beside the regressions. */
export function SheetCraft({ findings }: { readonly findings: readonly Finding[] }): ReactNode {
  const type = useType();
  if (findings.length === 0) return null;
  return (
    <>
      <h2 className={type.head}>Sheet craft</h2>
      {findings.length > mostAtOnce ? (
        <Disclosure label={counted(findings.length, "finding")}>
          <FindingList findings={findings} />
        </Disclosure>
      ) : (
        <FindingList findings={findings} />
      )}
    </>
  );
}
