import { Button } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { useType } from "../look/type.ts";
import { SectionTitle } from "../parts/SectionTitle.tsx";
import { usePane } from "../paneContext.ts";

/** A section that has nothing to show yet says what is missing and takes the user there. */
export function NoAnswer({ section }: { readonly section: "Answer" | "Evidence" }): ReactNode {
  const type = useType();
  const { state, dispatch, commands } = usePane();
  const hasData = state.data !== null;
  return (
    <>
      <SectionTitle>No answer yet</SectionTitle>
      <p className={type.body}>
        {section === "Answer"
          ? "Here will stand what holds for each driver, how firmly, and which standard errors say so."
          : "Here will stand every test with its question, its figures and what they mean."}
      </p>
      {hasData ? (
        <Button appearance="primary" disabledFocusable={state.busy !== null} onClick={commands.answer}>
          Get the answer
        </Button>
      ) : (
        <Button appearance="primary" onClick={() => dispatch({ kind: "shown", section: "data" })}>
          Choose the data
        </Button>
      )}
    </>
  );
}
