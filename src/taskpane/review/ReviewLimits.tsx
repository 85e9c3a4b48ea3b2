import type { ReactNode } from "react";
import { reviewLimits } from "../../core/review/reviewWords.ts";
import { HelpLink } from "../help/HelpLink.tsx";
import { useType } from "../look/type.ts";

/** What a review cannot show, in short, and the way to the whole of it. */
export function ReviewLimits(): ReactNode {
  const type = useType();
  return (
    <div className={type.footnote}>
      <span>{reviewLimits}</span> <HelpLink about="reviews" asks="What a review can show" />
    </div>
  );
}
