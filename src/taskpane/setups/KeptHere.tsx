import { MessageBar, MessageBarBody, makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { ProblemWords } from "../parts/ProblemWords.tsx";
import { useType } from "../look/type.ts";
import { usePane } from "../paneContext.ts";
import { SetupList } from "./SetupList.tsx";
import { SheetList } from "./SheetList.tsx";
import { StoreForm } from "./StoreForm.tsx";

const useStyles = makeStyles({ notice: { margin: `${tokens.spacingVerticalS} 0` } });

/** What this workbook keeps: set-ups under their names, and result sheets with how they stand to their data. */
export function KeptHere(): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { data, kept, sheets } = usePane().state;
  const { setups } = kept.book;
  return (
    <>
      {(data !== null || setups.length > 0 || kept.leftAlone.length > 0) && (
        <section aria-label="Set-ups in this workbook">
          <h2 className={type.head}>Set-ups in this workbook</h2>
          {kept.leftAlone.map((problem, index) => (
            <MessageBar key={index} intent="warning" layout="multiline" className={styles.notice}>
              <MessageBarBody>
                <ProblemWords problem={problem} />
              </MessageBarBody>
            </MessageBar>
          ))}
          <SetupList setups={setups} />
          {data !== null && <StoreForm />}
        </section>
      )}
      {sheets.length > 0 && (
        <section aria-label="Result sheets in this workbook">
          <h2 className={type.head}>Result sheets in this workbook</h2>
          <SheetList sheets={sheets} />
        </section>
      )}
    </>
  );
}
