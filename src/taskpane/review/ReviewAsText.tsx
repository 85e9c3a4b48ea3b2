import { Button, makeStyles, tokens } from "@fluentui/react-components";
import { type ReactNode, useRef, useState } from "react";
import { type ReviewInHand, reviewShown } from "../../app/review/reviewState.ts";
import { reviewText } from "../../core/review/reviewText.ts";
import { copyFrom } from "../parts/copyText.ts";

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

/** The review that is shown as plain text, for a letter. */
export function ReviewAsText({ review }: { readonly review: ReviewInHand }): ReactNode {
  const styles = useStyles();
  const field = useRef<HTMLTextAreaElement>(null);
  const [copied, setCopied] = useState("");
  const copy = async (): Promise<void> => {
    const done = await copyFrom(field.current);
    setCopied(done ? "Copied." : "The text is selected: copy it with the keys.");
  };
  const words = reviewText(reviewShown(review)).map((line) => line.words);
  return (
    <div className={styles.box}>
      <textarea
        ref={field}
        readOnly
        rows={6}
        className={styles.text}
        aria-label="The review as text"
        value={words.join("\n")}
      />
      <div>
        <Button size="small" onClick={() => void copy()}>
          Copy as text
        </Button>{" "}
        <span role="status">{copied}</span>
      </div>
    </div>
  );
}
