import { Button, MessageBar, MessageBarBody, makeStyles, tokens } from "@fluentui/react-components";
import { type ReactNode, useEffect, useRef } from "react";
import type { Fault } from "../../app/state.ts";
import { usePane } from "../paneContext.ts";
import { BugReport } from "./BugReport.tsx";
import { ProblemWords } from "./ProblemWords.tsx";
import { Remedy } from "./Remedy.tsx";

const useStyles = makeStyles({ notice: { marginBottom: tokens.spacingVerticalM } });

/** What went wrong and what to do; read aloud as soon as it stands there. */
export function FaultNotice(): ReactNode {
  const styles = useStyles();
  const { state, dispatch } = usePane();
  const place = useRef<HTMLDivElement>(null);
  // The button that led here may stand far below.
  useEffect(() => {
    if (state.fault !== null) place.current?.scrollIntoView({ block: "nearest" });
  }, [state.fault]);
  const dismiss = (): void => dispatch({ kind: "dismissed" });
  return (
    <div ref={place} role="alert" className={state.fault === null ? undefined : styles.notice}>
      {state.fault !== null && <Notice fault={state.fault} onDismiss={dismiss} />}
    </div>
  );
}

function Notice({ fault, onDismiss }: { readonly fault: Fault; readonly onDismiss: () => void }): ReactNode {
  if (fault.kind === "bug") return <BugReport details={fault.details} onDismiss={onDismiss} />;
  return (
    <MessageBar intent="error" layout="multiline">
      <MessageBarBody>
        <ProblemWords problem={fault.problem} />
      </MessageBarBody>
      <Remedy problem={fault.problem}>
        <Button size="small" onClick={onDismiss}>
          Dismiss
        </Button>
      </Remedy>
    </MessageBar>
  );
}
