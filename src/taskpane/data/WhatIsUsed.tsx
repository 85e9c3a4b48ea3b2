import { MessageBar, MessageBarBody, makeStyles, tokens } from "@fluentui/react-components";
import { type ReactNode, useMemo } from "react";
import { type Preview, previewOf } from "../../app/preview.ts";
import type { Problem } from "../../core/problem/problem.ts";
import { useType } from "../look/type.ts";
import { LeftOutList } from "../parts/LeftOutList.tsx";
import { ProblemWords } from "../parts/ProblemWords.tsx";
import { counted } from "../../core/problem/spots.ts";
import { Remedy } from "../parts/Remedy.tsx";
import { rowsInWords } from "../parts/rowWords.ts";
import { usePane } from "../paneContext.ts";

/** What the set-up makes of the rows, as it stands: the rows it can use, those it leaves out, or what is in the way. */
export function WhatIsUsed(): ReactNode {
  const type = useType();
  const { data, setup } = usePane().state;
  const source = data?.source ?? null;
  const preview = useMemo(() => (source === null || setup === null ? null : previewOf(source, setup)), [source, setup]);
  if (preview === null) {
    return <p className={type.remark}>With so many rows, what is left out is told with the answer.</p>;
  }
  return preview.ok ? <Used preview={preview.value} /> : <InTheWay problem={preview.problem} />;
}

/** What was said of the data when they were read stands above, and is not said again. */
function Used({ preview }: { readonly preview: Preview }): ReactNode {
  const type = useType();
  const known = usePane().state.data?.notes ?? [];
  return (
    <>
      <p className={type.remark} role="status">
        {counted(preview.used, "row")} can be used, {rowsInWords(preview.rows)}.
      </p>
      <LeftOutList leftOut={preview.leftOut} count={preview.leftOutCount} />
      {preview.notes
        .filter((note) => !known.includes(note))
        .map((note) => (
          <p key={note} className={type.remark}>
            {note}
          </p>
        ))}
    </>
  );
}

const useStyles = makeStyles({ notice: { margin: `${tokens.spacingVerticalS} 0` } });

function InTheWay({ problem }: { readonly problem: Problem }): ReactNode {
  const styles = useStyles();
  return (
    <MessageBar intent="warning" layout="multiline" className={styles.notice}>
      <MessageBarBody>
        <ProblemWords problem={problem} />
      </MessageBarBody>
      <Remedy problem={problem} />
    </MessageBar>
  );
}
