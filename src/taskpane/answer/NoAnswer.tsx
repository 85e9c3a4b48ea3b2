import { Button } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { useType } from "../look/type.ts";
import { SectionTitle } from "../parts/SectionTitle.tsx";
import { usePane } from "../paneContext.ts";
import { AskMore } from "./AskMore.tsx";

/** A section that has nothing to show yet says what is missing and takes the user there. */
export function NoAnswer({ section }: { readonly section: "Answer" | "Evidence" }): ReactNode {
  const type = useType();
  const { state, dispatch, commands } = usePane();
  const hasData = state.data !== null;
  const options = state.setup?.options;
  const asksMore = options !== undefined && options.estimates.length + options.jointTest.length > 0;
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
      {/* What a stored set-up asks may not fit its columns any more, and must be within reach to be mended. */}
      {section === "Answer" && asksMore && <AskMore />}
    </>
  );
}
