import type { ReactNode } from "react";
import type { ReviewInHand } from "../../app/review/reviewState.ts";
import { CellLink } from "../parts/CellLink.tsx";
import { OutdatedBar } from "../parts/OutdatedBar.tsx";
import { usePane } from "../paneContext.ts";

/** Says that a cell of what was reviewed has changed, and looks again in one click. */
export function ReviewOutdated({ review }: { readonly review: ReviewInHand }): ReactNode {
  const { commands } = usePane();
  if (review.changedCell === null) return null;
  return (
    <OutdatedBar label="Review again" mend={commands.review.again}>
      <CellLink address={review.changedCell} /> has changed since this review.
    </OutdatedBar>
  );
}
