import { Button } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { usePane } from "../paneContext.ts";

/** What can be done with a comparison. */
export function CompareBar({ className }: { readonly className: string }): ReactNode {
  const { commands } = usePane();
  return (
    <footer className={className}>
      <Button appearance="primary" onClick={commands.writeComparison}>
        Write the comparison to a sheet
      </Button>
    </footer>
  );
}
