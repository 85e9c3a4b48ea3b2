import type { ReactNode } from "react";
import { type ReviewInHand, reviewShown } from "../../app/review/reviewState.ts";
import { reviewText } from "../../core/review/reviewText.ts";
import { TextToCopy } from "../parts/TextToCopy.tsx";

const linesInView = 6;

/** The review that is shown as plain text, for a letter. */
export function ReviewAsText({ review }: { readonly review: ReviewInHand }): ReactNode {
  const words = reviewText(reviewShown(review)).map((line) => line.words);
  return <TextToCopy label="The review as text" text={words.join("\n")} rows={linesInView} />;
}
