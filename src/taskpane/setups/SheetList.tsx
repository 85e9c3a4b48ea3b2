import { Button, makeStyles, mergeClasses, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { messageOf } from "../../core/problem/messages.ts";
import { type SheetStatus, canBeRedone } from "../../app/stored/sheetStatus.ts";
import { quoteSheet } from "../../core/table/address.ts";
import { useType } from "../look/type.ts";
import { CellLink } from "../parts/CellLink.tsx";
import { usePane } from "../paneContext.ts";

const useStyles = makeStyles({
  list: { margin: 0, padding: 0, listStyleType: "none", display: "grid", rowGap: tokens.spacingVerticalS },
  line: {
    display: "grid",
    gridTemplateColumns: "1fr auto",
    columnGap: tokens.spacingHorizontalS,
    alignItems: "center",
  },
  name: { minWidth: 0, overflowWrap: "anywhere" },
  standing: { margin: 0 },
  behind: { fontWeight: tokens.fontWeightSemibold, color: tokens.colorNeutralForeground1 },
});

/** The result sheets of the workbook and how each stands to its data; a kept one can be redone in place of itself. */
export function SheetList({ sheets }: { readonly sheets: readonly SheetStatus[] }): ReactNode {
  const styles = useStyles();
  const { state, commands } = usePane();
  return (
    <>
      <ul className={styles.list}>
        {sheets.map((status) => (
          <li key={status.sheet} className={styles.line}>
            <Standing status={status} />
            {canBeRedone(status) && (
              <Button
                size="small"
                aria-label={`Redo ${status.sheet} in place`}
                disabledFocusable={state.busy !== null}
                onClick={() => commands.redoSheet(status.sheet)}
              >
                Redo
              </Button>
            )}
          </li>
        ))}
      </ul>
    </>
  );
}

function Standing({ status }: { readonly status: SheetStatus }): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { sheet, standing } = status;
  const isBehind = standing.kind === "out of date" || standing.kind === "cut off";
  return (
    <div className={styles.name}>
      <CellLink address={`${quoteSheet(sheet)}!A1`}>{sheet}</CellLink>
      <p className={mergeClasses(type.remark, styles.standing, isBehind && styles.behind)}>{wordsFor(status)}</p>
    </div>
  );
}

function wordsFor({ standing, record }: SheetStatus): string {
  switch (standing.kind) {
    case "follows":
      return "Live: follows its cells.";
    case "being checked":
      return "Kept. Being checked against its cells.";
    case "current":
      return standing.below === null
        ? "Kept, and as its cells are."
        : `Kept, and as its cells are; ${standing.below} right below them is filled too, but not in it.`;
    case "out of date":
      return record?.written === null
        ? "Out of date: its cells have changed. It was live once; write the answer to a new sheet."
        : "Out of date: its cells have changed.";
    case "cut off":
      return `Cut off from its data. ${messageOf(standing.problem)}`;
    case "not known":
      return "Values that stay; the sheet itself says what they were made from.";
  }
}
