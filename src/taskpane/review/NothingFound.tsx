import type { ReactNode } from "react";
import type { ReviewInHand } from "../../app/review/reviewState.ts";
import { useType } from "../look/type.ts";
import { SectionTitle } from "../parts/SectionTitle.tsx";
import { FindingList } from "./FindingList.tsx";
import { ReviewChoices } from "./ReviewChoices.tsx";
import { UnreadList } from "./UnreadList.tsx";

/** The workbook reports no regression that can be read: what that means, and what to do. */
export function NothingFound({ review }: { readonly review: ReviewInHand }): ReactNode {
  const type = useType();
  const { unread, craft } = review;
  return (
    <>
      <SectionTitle>No regression was found</SectionTitle>
      <p className={type.body}>
        {unread.length === 0
          ? "No formula fits a regression (LINEST, SLOPE, INTERCEPT, TREND, FORECAST, RSQ, STEYX, CORREL), and no figures stand under headings such as coefficient and standard error, or in brackets with coefficients."
          : "Something looks like a regression, but could not be read. The reasons stand below."}
      </p>
      <p className={type.body}>
        If results are typed in, select them and say where they come from. A regression that was run elsewhere leaves no
        trace to follow but its figures.
      </p>
      <ReviewChoices />
      <UnreadList unread={unread} />
      {craft.length > 0 && (
        <>
          <h2 className={type.head}>Sheet craft</h2>
          <FindingList findings={craft} />
        </>
      )}
    </>
  );
}
