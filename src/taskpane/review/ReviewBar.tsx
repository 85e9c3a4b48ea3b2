import { Button } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { type ReviewInHand, reviewShown } from "../../app/review/reviewState.ts";
import { quoteSheet } from "../../core/table/address.ts";
import { CellLink } from "../parts/CellLink.tsx";
import { counted } from "../../core/problem/spots.ts";
import { usePane } from "../paneContext.ts";

interface ReviewBarProps {
  readonly review: ReviewInHand;
  readonly className: string;
}

/** Writing down the review that is shown, for someone who was not there. */
export function ReviewBar({ review, className }: ReviewBarProps): ReactNode {
  const { commands } = usePane();
  const { length } = reviewShown(review).claims;
  if (length === 0) return null;
  return (
    <footer className={className}>
      <Button appearance="primary" onClick={commands.review.write}>
        {length === 1 ? "Write to a review sheet" : `Write all ${counted(length, "review")} to a sheet`}
      </Button>
      {review.written !== null && (
        <span>
          Written to <CellLink address={`${quoteSheet(review.written)}!A1`}>{review.written}</CellLink>.
        </span>
      )}
    </footer>
  );
}
