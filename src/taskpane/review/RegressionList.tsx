import type { ReactNode } from "react";
import { isLong, listedOf } from "../../app/review/listing.ts";
import type { ReviewInHand } from "../../app/review/reviewState.ts";
import { summaryOf } from "../../core/review/reviewWords.ts";
import { useType } from "../look/type.ts";
import { Disclosure } from "../parts/Disclosure.tsx";
import { SectionTitle } from "../parts/SectionTitle.tsx";
import { counted } from "../../core/problem/spots.ts";
import { RegressionEntries } from "./RegressionEntries.tsx";
import { ReviewChoices } from "./ReviewChoices.tsx";
import { ReviewOutdated } from "./ReviewOutdated.tsx";
import { SheetCraft } from "./SheetCraft.tsx";
import { SheetGroups } from "./SheetGroups.tsx";
import { StillToReview } from "./StillToReview.tsx";
import { UnreadList } from "./UnreadList.tsx";

/** All regressions found, each with how it came out, sheet by sheet where there are many; then what is said of the sheets, and what could not be read. */
export function RegressionList({ review }: { readonly review: ReviewInHand }): ReactNode {
  const type = useType();
  const { regressions, craft, unread } = review;
  const reviews = regressions.flatMap((one) => (one.review === null ? [] : [one.review]));
  return (
    <>
      <SectionTitle>{counted(regressions.length, "regression")} found</SectionTitle>
      <ReviewOutdated review={review} />
      {reviews.length > 0 && <p className={type.body}>{summaryOf(reviews)}</p>}
      <StillToReview review={review} />
      {isLong(review) ? <SheetGroups review={review} /> : <RegressionEntries entries={listedOf(review)} />}
      <SheetCraft findings={craft} />
      <UnreadList unread={unread} />
      <Disclosure label="Review something else">
        <ReviewChoices />
      </Disclosure>
    </>
  );
}
