import { Button, makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { useType } from "../look/type.ts";
import { Disclosure } from "../parts/Disclosure.tsx";
import { usePane } from "../paneContext.ts";
import { PointingForm } from "./PointingForm.tsx";

const useStyles = makeStyles({
  choices: { display: "grid", rowGap: tokens.spacingVerticalS, marginBottom: tokens.spacingVerticalM },
});

/** The ways to a review: all that the workbook reports, or the cells that report one regression. */
export function ReviewChoices(): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { state, commands } = usePane();
  const busy = state.busy !== null;
  const isPointing = state.pointing.reported !== "";
  return (
    <div className={styles.choices}>
      <Button
        appearance={state.review === null ? "primary" : "secondary"}
        disabledFocusable={busy}
        onClick={commands.review.book}
      >
        List the regressions in this workbook
      </Button>
      <Button disabledFocusable={busy} onClick={commands.review.selection}>
        Review the selected cells
      </Button>
      <p className={type.remark}>
        Select a formula such as LINEST, or typed results with their headings and the names beside them.
      </p>
      {isPointing ? (
        <PointingForm />
      ) : (
        <Disclosure label="Say where typed results come from">
          <PointingForm />
        </Disclosure>
      )}
    </div>
  );
}
