import {
  Button,
  MessageBar,
  MessageBarActions,
  MessageBarBody,
  MessageBarTitle,
  makeStyles,
  tokens,
} from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { ReviewInHand } from "../../app/review/reviewState.ts";
import { CellLink } from "../parts/CellLink.tsx";
import { usePane } from "../paneContext.ts";

const useStyles = makeStyles({
  notice: { marginBottom: tokens.spacingVerticalM },
  text: { whiteSpace: "normal", overflowWrap: "anywhere" },
});

/** Says that a cell of what was reviewed has changed, and looks again in one click. */
export function ReviewOutdated({ review }: { readonly review: ReviewInHand }): ReactNode {
  const styles = useStyles();
  const { state, commands } = usePane();
  if (review.changedCell === null) return null;
  return (
    <MessageBar intent="warning" layout="multiline" className={styles.notice}>
      <MessageBarBody className={styles.text}>
        <MessageBarTitle>Out of date.</MessageBarTitle> <CellLink address={review.changedCell} /> has changed since this
        review.
      </MessageBarBody>
      <MessageBarActions>
        <Button size="small" disabledFocusable={state.busy !== null} onClick={commands.review.again}>
          Review again
        </Button>
      </MessageBarActions>
    </MessageBar>
  );
}
