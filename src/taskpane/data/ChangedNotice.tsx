import { Button, MessageBar, MessageBarActions, MessageBarBody, makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { CellLink } from "../parts/CellLink.tsx";
import { usePane } from "../paneContext.ts";

const useStyles = makeStyles({
  notice: { margin: `${tokens.spacingVerticalS} 0` },
  text: { whiteSpace: "normal", overflowWrap: "anywhere" },
});

/** Says that the sheet has moved on since it was read. */
export function ChangedNotice(): ReactNode {
  const styles = useStyles();
  const { state, commands } = usePane();
  const { data, busy } = state;
  if (data === null || data.changedCell === null) return null;
  return (
    <MessageBar intent="warning" layout="multiline" className={styles.notice}>
      <MessageBarBody className={styles.text}>
        <CellLink address={data.changedCell} /> has changed since these cells were read.
      </MessageBarBody>
      <MessageBarActions>
        <Button
          size="small"
          disabledFocusable={busy !== null}
          onClick={() => commands.read({ kind: "address", address: data.address })}
        >
          Read again
        </Button>
      </MessageBarActions>
    </MessageBar>
  );
}
