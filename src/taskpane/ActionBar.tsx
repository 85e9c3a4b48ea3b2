import { Button, ProgressBar, Select, makeStyles, tokens } from "@fluentui/react-components";
import { type ReactNode, useState } from "react";
import type { Busy } from "../app/state.ts";
import { canBeLive } from "../app/writing.ts";
import type { SheetKind } from "../sheet/answerSheet.ts";
import { CompareBar } from "./compare/CompareBar.tsx";
import { HelpLink } from "./help/HelpLink.tsx";
import { CellLink } from "./parts/CellLink.tsx";
import { usePane } from "./paneContext.ts";
import { ReviewBar } from "./review/ReviewBar.tsx";

const useStyles = makeStyles({
  bar: {
    flexShrink: 0,
    display: "grid",
    rowGap: tokens.spacingVerticalXS,
    padding: `${tokens.spacingVerticalS} ${tokens.spacingHorizontalL}`,
    borderTop: `1px solid ${tokens.colorNeutralStroke2}`,
    backgroundColor: tokens.colorNeutralBackground2,
    fontSize: tokens.fontSizeBase200,
  },
  line: {
    display: "grid",
    gridTemplateColumns: "1fr auto",
    columnGap: tokens.spacingHorizontalS,
    alignItems: "center",
  },
  hint: { color: tokens.colorNeutralForeground3 },
  words: { overflow: "hidden", textOverflow: "ellipsis", whiteSpace: "nowrap" },
});

/** What can be done next, or how far the work under way has come. */
export function ActionBar(): ReactNode {
  const styles = useStyles();
  const { state } = usePane();
  // Kept here, so that it is still chosen after the work of writing.
  const [wanted, setWanted] = useState<SheetKind>("live");
  if (state.busy !== null) return <Working busy={state.busy} />;
  if (state.section === "review") {
    return state.review === null ? null : <ReviewBar review={state.review} className={styles.bar} />;
  }
  if (state.section === "data") return state.data === null ? null : <AskBar />;
  if (state.section === "answer" && state.comparison !== null) return <CompareBar className={styles.bar} />;
  return state.answered === null ? null : <WriteBar wanted={wanted} choose={setWanted} />;
}

function AskBar(): ReactNode {
  const styles = useStyles();
  const { commands } = usePane();
  return (
    <footer className={styles.bar}>
      <Button appearance="primary" onClick={commands.answer}>
        Get the answer
      </Button>
    </footer>
  );
}

const doing: Readonly<Record<Busy["with"], string>> = {
  reading: "Reading the cells",
  answering: "Finding the answer",
  writing: "Writing the sheet",
  keeping: "Putting values in the place of formulas",
  redoing: "Redoing the sheet",
  comparing: "Comparing the set-ups",
  reviewing: "Reviewing",
};

function Working({ busy }: { readonly busy: Busy }): ReactNode {
  const styles = useStyles();
  const { commands } = usePane();
  const { what, share } = busy.progress;
  const words = what === "" ? doing[busy.with] : what;
  return (
    <footer className={styles.bar}>
      <ProgressBar aria-label={doing[busy.with]} {...(share === null ? {} : { value: share })} />
      <div className={styles.line}>
        <span className={styles.words}>
          {words}
          {share !== null && `, ${Math.round(100 * share)} %`}
        </span>
        <Button size="small" onClick={commands.cancel}>
          Cancel
        </Button>
      </div>
    </footer>
  );
}

interface WriteBarProps {
  readonly wanted: SheetKind;
  readonly choose: (kind: SheetKind) => void;
}

function WriteBar({ wanted, choose }: WriteBarProps): ReactNode {
  const styles = useStyles();
  const { state, commands } = usePane();
  const { written, answered } = state;
  const onlyKept = answered !== null && !canBeLive(answered);
  const kind = onlyKept ? "kept" : wanted;
  return (
    <footer className={styles.bar}>
      <div className={styles.line}>
        <Button appearance="primary" onClick={() => commands.write(kind)}>
          Write to the workbook
        </Button>
        <Select
          size="small"
          aria-label="Live or kept"
          value={kind}
          onChange={(_, { value }) => choose(value === "kept" ? "kept" : "live")}
        >
          {!onlyKept && <option value="live">live</option>}
          <option value="kept">kept</option>
        </Select>
      </div>
      <span className={styles.hint}>
        {kind === "live" ? "Live: formulas that follow the cells." : "Kept: values that stay as they are."}
        {onlyKept && " Functions cannot see which rows are hidden."} <HelpLink about="live and kept" />
      </span>
      {written !== null && (
        <span>
          Written to <CellLink address={`'${written.sheet.replaceAll("'", "''")}'!A1`}>{written.sheet}</CellLink>,{" "}
          {written.kind}
          {written.outdated && ", out of date"}.
        </span>
      )}
    </footer>
  );
}
