import { Button, makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { FoundRegression, ReviewInHand } from "../../app/review/reviewState.ts";
import { originInWords, rangeOfLine, titleOf } from "../../core/review/reviewWords.ts";
import type { Claim } from "../../core/review/claim.ts";
import { useType } from "../look/type.ts";
import { CellLink } from "../parts/CellLink.tsx";
import { Disclosure } from "../parts/Disclosure.tsx";
import { SectionTitle } from "../parts/SectionTitle.tsx";
import { usePane } from "../paneContext.ts";
import { OtherData } from "./OtherData.tsx";
import { PlacesSaid } from "./PlacesSaid.tsx";
import { ReviewChoices } from "./ReviewChoices.tsx";
import { ReviewedWords } from "./ReviewedWords.tsx";
import { ReviewOutdated } from "./ReviewOutdated.tsx";
import { StillToReview } from "./StillToReview.tsx";

const useStyles = makeStyles({
  back: { marginBottom: tokens.spacingVerticalS },
  formula: { fontFamily: tokens.fontFamilyMonospace, fontSize: tokens.fontSizeBase200, overflowWrap: "anywhere" },
});

interface RegressionDetailsProps {
  readonly review: ReviewInHand;
  readonly regression: FoundRegression;
}

/** One regression in full: where it stands, what is said of it, and the way to an answer of one's own. */
export function RegressionDetails({ review, regression }: RegressionDetailsProps): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { dispatch } = usePane();
  const { claim } = regression;
  const many = review.regressions.length > 1;
  return (
    <>
      {many && (
        <Button
          size="small"
          className={styles.back}
          onClick={() => dispatch({ kind: "regression opened", index: null })}
        >
          All {review.regressions.length} regressions
        </Button>
      )}
      <SectionTitle>{titleOf(claim)}</SectionTitle>
      <ReviewOutdated review={review} />
      <p className={type.remark}>
        Reported at <CellLink address={claim.place} />: {originInWords(claim)}.
      </p>
      {claim.origin.kind === "formula" && <p className={styles.formula}>{claim.origin.formula}</p>}
      <StillToReview review={review} />
      {regression.review !== null && <ReviewedWords review={review} regression={regression.review} />}
      <h2 className={type.head}>The data it names</h2>
      <ItsData claim={claim} />
      <OtherData key={claim.place} claim={claim} />
      <Disclosure label="Review something else">
        <ReviewChoices />
      </Disclosure>
    </>
  );
}

function ItsData({ claim }: { readonly claim: Claim }): ReactNode {
  const { state, commands } = usePane();
  const { outcome, drivers } = claim;
  const lines = [outcome, ...drivers].map((line, index) => ({
    address: rangeOfLine(line),
    words: `${line.name}, ${index === 0 ? "outcome" : "driver"}`,
  }));
  return (
    <>
      <PlacesSaid places={lines} />
      <Button size="small" disabledFocusable={state.busy !== null} onClick={() => commands.review.takeOver(claim)}>
        Open the data and answer it yourself
      </Button>
    </>
  );
}
