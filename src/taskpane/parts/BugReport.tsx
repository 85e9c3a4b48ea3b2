import { Button, MessageBar, MessageBarBody, MessageBarTitle, makeStyles, tokens } from "@fluentui/react-components";
import { type ReactNode, useRef, useState } from "react";
import { copyFrom } from "./copyText.ts";

const useStyles = makeStyles({
  body: {
    minWidth: 0,
    display: "grid",
    rowGap: tokens.spacingVerticalS,
    padding: `${tokens.spacingVerticalS} ${tokens.spacingHorizontalM} ${tokens.spacingVerticalS} 0`,
  },
  text: {
    width: "100%",
    boxSizing: "border-box",
    padding: tokens.spacingHorizontalXS,
    border: `1px solid ${tokens.colorNeutralStroke1}`,
    color: "inherit",
    backgroundColor: tokens.colorNeutralBackground1,
    fontFamily: tokens.fontFamilyMonospace,
    fontSize: tokens.fontSizeBase200,
  },
});

/** A fault of the add-in's own: said plainly, with details that can be copied for a report. */
export function BugReport({
  details,
  onDismiss,
}: {
  readonly details: string;
  readonly onDismiss?: () => void;
}): ReactNode {
  const styles = useStyles();
  const field = useRef<HTMLTextAreaElement>(null);
  const [copied, setCopied] = useState("");
  const copy = async (): Promise<void> => {
    const done = await copyFrom(field.current);
    setCopied(done ? "Copied." : "The details are selected: copy them with the keys.");
  };
  return (
    <MessageBar intent="error" layout="multiline">
      <MessageBarBody className={styles.body}>
        <div>
          <MessageBarTitle>Footing made a mistake.</MessageBarTitle> Please try again; if it happens again, these
          details help to mend it.
        </div>
        <textarea
          ref={field}
          readOnly
          rows={3}
          className={styles.text}
          aria-label="Details of the fault"
          value={details}
          onFocus={({ currentTarget }) => currentTarget.select()}
        />
        <div>
          <Button size="small" onClick={() => void copy()}>
            Copy the details
          </Button>{" "}
          {onDismiss !== undefined && (
            <Button size="small" appearance="subtle" onClick={onDismiss}>
              Dismiss
            </Button>
          )}
        </div>
        <span role="status">{copied}</span>
      </MessageBarBody>
    </MessageBar>
  );
}
