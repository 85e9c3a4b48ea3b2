import { Button, MessageBar, MessageBarActions, MessageBarBody, makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { CellLink } from "../parts/CellLink.tsx";
import { usePane } from "../paneContext.ts";

const useStyles = makeStyles({
  notice: { margin: `${tokens.spacingVerticalS} 0` },
  text: { whiteSpace: "normal", overflowWrap: "anywhere" },
});

/** Says that rows were added below the data of a stored set-up, which its name does not reach. */
export function RowsBelow(): ReactNode {
  const styles = useStyles();
  const { state, commands } = usePane();
  const below = state.data?.below ?? null;
  if (below === null) return null;
  return (
    <MessageBar intent="info" layout="multiline" className={styles.notice}>
      <MessageBarBody className={styles.text}>
        <CellLink address={below} /> right below these data is filled too, but not among them.
      </MessageBarBody>
      <MessageBarActions>
        <Button size="small" disabledFocusable={state.busy !== null} onClick={commands.takeInBelow}>
          Take it in
        </Button>
      </MessageBarActions>
    </MessageBar>
  );
}
