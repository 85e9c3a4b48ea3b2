import { Button, MessageBar, MessageBarBody, MessageBarTitle, makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { TextToCopy } from "./TextToCopy.tsx";

const useStyles = makeStyles({
  body: {
    minWidth: 0,
    display: "grid",
    gridTemplateColumns: "minmax(0, 1fr)",
    rowGap: tokens.spacingVerticalS,
    padding: `${tokens.spacingVerticalS} ${tokens.spacingHorizontalM} ${tokens.spacingVerticalS} 0`,
  },
});

const linesInView = 3;

/** A fault of the add-in's own: said plainly, with details that can be copied for a report. */
export function BugReport({
  details,
  onDismiss,
}: {
  readonly details: string;
  readonly onDismiss?: () => void;
}): ReactNode {
  const styles = useStyles();
  return (
    <MessageBar intent="error" layout="multiline">
      <MessageBarBody className={styles.body}>
        <div>
          <MessageBarTitle>Footing made a mistake.</MessageBarTitle> Please try again; if it happens again, these
          details help to mend it.
        </div>
        <TextToCopy label="Details of the fault" text={details} rows={linesInView} copies="Copy the details">
          {onDismiss !== undefined && (
            <Button size="small" appearance="subtle" onClick={onDismiss}>
              Dismiss
            </Button>
          )}
        </TextToCopy>
      </MessageBarBody>
    </MessageBar>
  );
}
