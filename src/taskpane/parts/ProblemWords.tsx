import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { messageOf } from "../../core/problem/messages.ts";
import type { Problem } from "../../core/problem/problem.ts";
import { CellLink } from "./CellLink.tsx";

const useStyles = makeStyles({
  text: { whiteSpace: "normal", overflowWrap: "anywhere", padding: `${tokens.spacingVerticalXS} 0` },
  cells: { display: "flex", flexWrap: "wrap", columnGap: tokens.spacingHorizontalM },
});

/** The sentence about a fault, and the cells it names, to jump to. */
export function ProblemWords({ problem }: { readonly problem: Problem }): ReactNode {
  const styles = useStyles();
  const cells = cellsOf(problem);
  return (
    <div className={styles.text}>
      {messageOf(problem)}
      {cells.length > 0 && (
        <div className={styles.cells}>
          {cells.map((cell) => (
            <CellLink key={cell} address={cell} />
          ))}
        </div>
      )}
    </div>
  );
}

/** The cells that a fault names and that can be jumped to. */
function cellsOf(problem: Problem): readonly string[] {
  const listed = "cells" in problem && typeof problem.cells === "object" ? problem.cells : [];
  const single = "cell" in problem ? [problem.cell] : [];
  return [...listed, ...single].filter((cell) => cell.includes("!"));
}
