import { Button, MessageBar, MessageBarActions, MessageBarBody, makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { type LostColumn, lostProblem } from "../../app/carrying.ts";
import { ProblemWords } from "../parts/ProblemWords.tsx";
import { usePane } from "../paneContext.ts";

const useStyles = makeStyles({ notice: { margin: `${tokens.spacingVerticalS} 0` } });

/** Columns that the set-up used and that are gone: each is named, and another can take its place. */
export function LostColumns(): ReactNode {
  const { lost } = usePane().state;
  return lost.map((one) => <Lost key={one.column.column} lost={one} />);
}

function Lost({ lost }: { readonly lost: LostColumn }): ReactNode {
  const styles = useStyles();
  const { dispatch } = usePane();
  const { column, candidate } = lost;
  return (
    <MessageBar intent="warning" layout="multiline" className={styles.notice}>
      <MessageBarBody>
        <ProblemWords problem={lostProblem(lost)} />
      </MessageBarBody>
      <MessageBarActions>
        {candidate !== null && (
          <Button size="small" onClick={() => dispatch({ kind: "lost settled", lost, by: candidate })}>
            Take {candidate} as {column.role === "unused" ? "it" : column.role}
          </Button>
        )}
        <Button size="small" onClick={() => dispatch({ kind: "lost settled", lost, by: null })}>
          Go on without {column.column}
        </Button>
      </MessageBarActions>
    </MessageBar>
  );
}
