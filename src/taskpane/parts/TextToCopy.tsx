import { Button, makeStyles, tokens } from "@fluentui/react-components";
import { type ReactNode, useRef, useState } from "react";
import { copyFrom } from "./copyText.ts";

const useStyles = makeStyles({
  box: { display: "grid", rowGap: tokens.spacingVerticalXS },
  text: {
    width: "100%",
    padding: tokens.spacingHorizontalXS,
    border: `1px solid ${tokens.colorNeutralStroke1}`,
    color: "inherit",
    backgroundColor: tokens.colorNeutralBackground1,
    fontFamily: tokens.fontFamilyMonospace,
    fontSize: tokens.fontSizeBase200,
  },
});

export interface TextToCopyProps {
  /** What the text is, for those who do not see it. */
  readonly label: string;
  readonly text: string;
  /** Lines of the field that are in view. */
  readonly rows: number;
  /** What the button says. */
  readonly copies?: string;
  /** Further buttons, beside the one that copies. */
  readonly children?: ReactNode;
}

/** A text in a field, and a button that copies it; where the clipboard is closed it stays selected for the keys. */
export function TextToCopy({ label, text, rows, copies = "Copy as text", children }: TextToCopyProps): ReactNode {
  const styles = useStyles();
  const field = useRef<HTMLTextAreaElement>(null);
  const [copied, setCopied] = useState("");
  const copy = async (): Promise<void> => {
    const done = await copyFrom(field.current);
    setCopied(done ? "Copied." : "The text is selected: copy it with the keys.");
  };
  return (
    <div className={styles.box}>
      <textarea ref={field} readOnly rows={rows} className={styles.text} aria-label={label} value={text} />
      <div>
        <Button size="small" onClick={() => void copy()}>
          {copies}
        </Button>{" "}
        {children} <span role="status">{copied}</span>
      </div>
    </div>
  );
}
