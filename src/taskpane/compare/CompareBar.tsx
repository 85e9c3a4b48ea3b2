import { Button } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { type SheetStatus, canBeRedone } from "../../app/stored/sheetStatus.ts";
import { quoteSheet } from "../../core/table/address.ts";
import { CellLink } from "../parts/CellLink.tsx";
import { usePane } from "../paneContext.ts";

/** What can be done with a comparison, and the sheets that already show these models. */
export function CompareBar({ className }: { readonly className: string }): ReactNode {
  const { state, commands } = usePane();
  const names = (state.comparison?.models ?? []).map(({ name }) => name);
  return (
    <footer className={className}>
      <Button appearance="primary" onClick={commands.writeComparison}>
        Write the comparison to a sheet
      </Button>
      {state.sheets
        .filter((status) => shows(status, names))
        .map((status) => (
          <Written key={status.sheet} status={status} />
        ))}
    </footer>
  );
}

const shows = ({ record }: SheetStatus, names: readonly string[]): boolean =>
  record?.kind === "comparison" &&
  record.models.length === names.length &&
  record.models.every(({ name }, index) => name === names[index]);

function Written({ status }: { readonly status: SheetStatus }): ReactNode {
  const { commands } = usePane();
  const { sheet, standing } = status;
  const isBehind = standing.kind === "out of date";
  return (
    <span>
      Written to <CellLink address={`${quoteSheet(sheet)}!A1`}>{sheet}</CellLink>
      {isBehind ? ", out of date. " : "."}
      {isBehind && canBeRedone(status) && (
        <Button size="small" aria-label={`Redo ${sheet} in place`} onClick={() => commands.redoSheet(sheet)}>
          Redo
        </Button>
      )}
    </span>
  );
}
