import { Button, makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { ReviewInHand } from "../../app/review/reviewState.ts";
import { useType } from "../look/type.ts";
import { counted } from "../../core/problem/spots.ts";
import { usePane } from "../paneContext.ts";

const useStyles = makeStyles({
  line: {
    display: "grid",
    gridTemplateColumns: "1fr auto",
    columnGap: tokens.spacingHorizontalS,
    alignItems: "center",
    marginBottom: tokens.spacingVerticalS,
  },
  words: { margin: 0 },
});

/** After a round that was cut short: how many are left, and the way on. */
export function StillToReview({ review }: { readonly review: ReviewInHand }): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { state, commands } = usePane();
  const left = review.regressions.filter((one) => one.review === null).length;
  if (left === 0 || state.busy !== null) return null;
  return (
    <div className={styles.line}>
      <p className={`${type.remark} ${styles.words}`}>{counted(left, "regression")} not reviewed yet.</p>
      <Button size="small" onClick={commands.review.rest}>
        Go on
      </Button>
    </div>
  );
}
