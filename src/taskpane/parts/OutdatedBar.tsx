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
import { usePane } from "../paneContext.ts";

const useStyles = makeStyles({
  notice: { marginBottom: tokens.spacingVerticalM },
  text: { whiteSpace: "normal", overflowWrap: "anywhere" },
});

interface OutdatedBarProps {
  /** What puts it right, in the button's words. */
  readonly label: string;
  readonly mend: () => void;
  /** What has changed. */
  readonly children: ReactNode;
}

/** Says that the figures below belong to something that has changed since, and puts it right in one click. */
export function OutdatedBar({ label, mend, children }: OutdatedBarProps): ReactNode {
  const styles = useStyles();
  const { state } = usePane();
  return (
    <MessageBar intent="warning" layout="multiline" className={styles.notice}>
      <MessageBarBody className={styles.text}>
        <MessageBarTitle>Out of date.</MessageBarTitle> {children}
      </MessageBarBody>
      <MessageBarActions>
        <Button size="small" disabledFocusable={state.busy !== null} onClick={mend}>
          {label}
        </Button>
      </MessageBarActions>
    </MessageBar>
  );
}
