import type { ReactNode } from "react";
import type { Commands } from "../../app/pane.ts";
import type { Outdated, PaneState, Written } from "../../app/state.ts";
import { CellLink } from "../parts/CellLink.tsx";
import { OutdatedBar } from "../parts/OutdatedBar.tsx";
import { usePane } from "../paneContext.ts";

/** Says that the figures below belong to cells or a set-up that have changed, and puts it right in one click. */
export function OutdatedNotice(): ReactNode {
  const { state, commands } = usePane();
  const { outdated, sheet } = whatIsOutdated(state);
  if (outdated === null && sheet === null) return null;
  const { label, mend } = remedyFor(outdated, sheet, commands);
  return (
    <OutdatedBar label={label} mend={mend}>
      <Reason outdated={outdated} />
      {sheet !== null && <> The kept sheet {sheet.sheet} shows an earlier answer.</>}
    </OutdatedBar>
  );
}

interface WhatIsOutdated {
  readonly outdated: Outdated | null;
  readonly sheet: Written | null;
}

const whatIsOutdated = ({ answered, written }: PaneState): WhatIsOutdated => ({
  outdated: answered?.outdated ?? null,
  sheet: written?.outdated === true ? written : null,
});

interface Remedy {
  readonly label: string;
  readonly mend: () => void;
}

/** A sheet is written again only where its own cells changed, or where it is all that is behind. */
function remedyFor(outdated: Outdated | null, sheet: Written | null, commands: Commands): Remedy {
  if (sheet === null || outdated?.because === "set-up") return { label: "Answer again", mend: commands.answer };
  if (outdated === null) return { label: "Redo the sheet", mend: commands.redo };
  return { label: "Redo answer and sheet", mend: commands.redo };
}

function Reason({ outdated }: { readonly outdated: Outdated | null }): ReactNode {
  if (outdated === null) return null;
  if (outdated.because === "set-up") return <>The set-up has changed since this answer.</>;
  return (
    <>
      <CellLink address={outdated.cell} /> has changed since this answer.
    </>
  );
}
