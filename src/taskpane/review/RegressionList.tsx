import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { FoundRegression, ReviewInHand } from "../../app/review/reviewState.ts";
import { capitalised } from "../../core/answer/wording.ts";
import { gravestRank, originInWords, summaryOf, titleOf } from "../../core/review/reviewWords.ts";
import { useType } from "../look/type.ts";
import { Disclosure } from "../parts/Disclosure.tsx";
import { SectionTitle } from "../parts/SectionTitle.tsx";
import { counted } from "../../core/problem/spots.ts";
import { usePane } from "../paneContext.ts";
import { FindingList } from "./FindingList.tsx";
import { RankMark } from "./RankMark.tsx";
import { ReviewChoices } from "./ReviewChoices.tsx";
import { ReviewOutdated } from "./ReviewOutdated.tsx";
import { StillToReview } from "./StillToReview.tsx";
import { UnreadList } from "./UnreadList.tsx";

const useStyles = makeStyles({
  list: { margin: 0, padding: 0, listStyleType: "none" },
  item: { ":not(:first-child)": { borderTop: `1px solid ${tokens.colorNeutralStroke2}` } },
  open: {
    display: "grid",
    gridTemplateColumns: "16px minmax(0, 1fr)",
    columnGap: tokens.spacingHorizontalXS,
    width: "100%",
    padding: `${tokens.spacingVerticalS} 0`,
    border: "none",
    background: "none",
    color: "inherit",
    font: "inherit",
    fontSize: tokens.fontSizeBase200,
    lineHeight: "17px",
    textAlign: "left",
    cursor: "pointer",
    borderRadius: tokens.borderRadiusSmall,
    overflowWrap: "anywhere",
    ":hover": { color: tokens.colorBrandForegroundLink },
    ":focus-visible": { outline: `2px solid ${tokens.colorStrokeFocus2}`, outlineOffset: "-2px" },
  },
  mark: { paddingTop: "3px" },
  title: {
    display: "block",
    fontSize: tokens.fontSizeBase300,
    lineHeight: "19px",
    fontWeight: tokens.fontWeightSemibold,
  },
  line: { display: "block" },
  quiet: { display: "block", color: tokens.colorNeutralForeground3 },
});

/** All regressions found, each with its verdict; then what is said of the sheets, and what could not be read. */
export function RegressionList({ review }: { readonly review: ReviewInHand }): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { regressions, craft, unread } = review;
  const reviews = regressions.flatMap((one) => (one.review === null ? [] : [one.review]));
  return (
    <>
      <SectionTitle>{counted(regressions.length, "regression")} found</SectionTitle>
      <ReviewOutdated review={review} />
      {reviews.length > 0 && <p className={type.body}>{summaryOf(reviews)}</p>}
      <StillToReview review={review} />
      <ul className={styles.list}>
        {regressions.map((regression, index) => (
          <li key={index} className={styles.item}>
            <RegressionEntry regression={regression} index={index} />
          </li>
        ))}
      </ul>
      {craft.length > 0 && (
        <>
          <h2 className={type.head}>Sheet craft</h2>
          <FindingList findings={craft} />
        </>
      )}
      <UnreadList unread={unread} />
      <Disclosure label="Review something else">
        <ReviewChoices />
      </Disclosure>
    </>
  );
}

interface RegressionEntryProps {
  readonly regression: FoundRegression;
  readonly index: number;
}

function RegressionEntry({ regression, index }: RegressionEntryProps): ReactNode {
  const styles = useStyles();
  const { dispatch } = usePane();
  const { claim, review } = regression;
  const rank = review === null ? null : gravestRank(review.findings);
  return (
    <button type="button" className={styles.open} onClick={() => dispatch({ kind: "regression opened", index })}>
      <span className={styles.mark}>{review !== null && <RankMark rank={rank} />}</span>
      <span>
        <span className={styles.title}>{titleOf(claim)}</span>
        <span className={styles.line}>
          {review === null ? "Not reviewed yet" : rank === null ? "Nothing found" : capitalised(rank)}
        </span>
        <span className={styles.quiet}>
          {claim.place}, {originInWords(claim)}
        </span>
      </span>
    </button>
  );
}
