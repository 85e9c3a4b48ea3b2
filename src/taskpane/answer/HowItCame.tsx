import type { ReactNode } from "react";
import type { Answer } from "../../core/answer/answer.ts";
import { HelpLink } from "../help/HelpLink.tsx";
import { useType } from "../look/type.ts";
import { keepTogether } from "../parts/keepTogether.ts";
import { derivationInWords } from "./derivation.ts";

/** Step by step from the rows to the p-value and the interval of one term. */
export function HowItCame({ answer, index }: { readonly answer: Answer; readonly index: number }): ReactNode {
  const type = useType();
  return (
    <>
      {derivationInWords(answer, index).map((sentence) => (
        <p key={sentence} className={type.remark}>
          {keepTogether(sentence)}
        </p>
      ))}
      <HelpLink about="reference distribution" asks="What is compared with what?" />
    </>
  );
}
