import type { ReactNode } from "react";
import { type ReviewInHand, reviewShown } from "../../app/review/reviewState.ts";
import type { ClaimReview } from "../../core/review/claimReview.ts";
import { explanationsOf } from "../../core/review/reviewWords.ts";
import { useType } from "../look/type.ts";
import { Disclosure } from "../parts/Disclosure.tsx";
import { keepTogether } from "../parts/keepTogether.ts";
import { ComparedTable } from "./ComparedTable.tsx";
import { ConsequenceList } from "./ConsequenceList.tsx";
import { FindingList } from "./FindingList.tsx";
import { ReviewAsText } from "./ReviewAsText.tsx";
import { ReviewLimits } from "./ReviewLimits.tsx";
import { UnreadList } from "./UnreadList.tsx";

interface ReviewedWordsProps {
  readonly review: ReviewInHand;
  readonly regression: ClaimReview;
}

/** What a review says of one regression, the verdict first. */
export function ReviewedWords({ review, regression }: ReviewedWordsProps): ReactNode {
  const type = useType();
  const { claim, verdict, findings, tried, errors, consequences } = regression;
  const { craft, unread } = reviewShown(review);
  return (
    <>
      <section aria-label="Verdict on the work">
        <p className={type.verdict}>{keepTogether(verdict)}</p>
      </section>
      {(claim.assumed ?? []).map((words) => (
        <p key={words} className={type.remark}>
          {words}
        </p>
      ))}
      <h2 className={type.head}>Findings</h2>
      {findings.length === 0 && <p className={type.body}>Nothing was found against the work.</p>}
      <FindingList findings={findings} />
      <h2 className={type.head}>Reported and recomputed</h2>
      <ComparedTable review={regression} />
      <Sentences heading="What explains the difference" sentences={explanationsOf(regression)} />
      {tried.length > 0 && (
        <Disclosure label="What was tried, and does not explain the difference">
          <ul className={type.remark}>
            {tried.map((words) => (
              <li key={words}>{words}</li>
            ))}
          </ul>
        </Disclosure>
      )}
      <Sentences heading="Which standard errors" sentences={errors === null ? [] : [errors.sentence]} />
      {consequences.length > 0 && <h2 className={type.head}>What follows for each driver</h2>}
      <ConsequenceList consequences={consequences} />
      {craft.length > 0 && <h2 className={type.head}>Sheet craft</h2>}
      <FindingList findings={craft} />
      <UnreadList unread={unread} />
      <Disclosure label="As text">
        <ReviewAsText review={review} />
      </Disclosure>
      <ReviewLimits />
    </>
  );
}

interface SentencesProps {
  readonly heading: string;
  readonly sentences: readonly string[];
}

function Sentences({ heading, sentences }: SentencesProps): ReactNode {
  const type = useType();
  if (sentences.length === 0) return null;
  return (
    <>
      <h2 className={type.head}>{heading}</h2>
      {sentences.map((words) => (
        <p key={words} className={type.body}>
          {keepTogether(words)}
        </p>
      ))}
    </>
  );
}
