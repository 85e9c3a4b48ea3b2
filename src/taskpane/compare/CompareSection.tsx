import { Button, MessageBar, MessageBarActions, MessageBarBody, makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Comparison } from "../../app/compared.ts";
import { comparabilityOf } from "../../sheet/comparison.ts";
import { useType } from "../look/type.ts";
import { SectionTitle } from "../parts/SectionTitle.tsx";
import { usePane } from "../paneContext.ts";
import { DriversCompared } from "./DriversCompared.tsx";
import { ModelsCompared } from "./ModelsCompared.tsx";

const useStyles = makeStyles({
  notice: { marginBottom: tokens.spacingVerticalM },
  notes: { margin: 0, padding: 0, listStyleType: "none" },
  back: { marginTop: tokens.spacingVerticalL },
});

/** Stored set-ups side by side, in the place of the answer: drivers in rows, models in columns. */
export function CompareSection({ comparison }: { readonly comparison: Comparison }): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { state, commands, dispatch } = usePane();
  const { models, outdated } = comparison;
  return (
    <>
      <SectionTitle>{models.length} models side by side</SectionTitle>
      {outdated && (
        <MessageBar intent="warning" layout="multiline" className={styles.notice}>
          <MessageBarBody>Out of date: cells behind the models have changed.</MessageBarBody>
          <MessageBarActions>
            <Button
              size="small"
              disabledFocusable={state.busy !== null}
              onClick={() => commands.compare(models.map(({ name }) => name))}
            >
              Compare again
            </Button>
          </MessageBarActions>
        </MessageBar>
      )}
      <ul aria-label="What can be compared" className={styles.notes}>
        {comparabilityOf(models).map((note) => (
          <li key={note} className={type.body}>
            {note}
          </li>
        ))}
      </ul>
      <h2 className={type.head}>Drivers</h2>
      <DriversCompared models={models} />
      <h2 className={type.head}>Models</h2>
      <ModelsCompared models={models} />
      <Button size="small" className={styles.back} onClick={() => dispatch({ kind: "comparison closed" })}>
        Back to the answer
      </Button>
    </>
  );
}
