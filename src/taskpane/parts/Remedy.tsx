import { Button, MessageBarActions } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Problem } from "../../core/problem/problem.ts";
import { usePane } from "../paneContext.ts";

interface RemedyProps {
  readonly problem: Problem;
  /** What can be clicked beside it. */
  readonly children?: ReactNode;
}

/** What puts a problem right in one click, where anything does. */
export function Remedy({ problem, children }: RemedyProps): ReactNode {
  const remedy = useRemedy(problem);
  if (remedy === null && children === undefined) return null;
  return (
    <MessageBarActions>
      {remedy !== null && (
        <Button size="small" onClick={remedy.apply}>
          {remedy.words}
        </Button>
      )}
      {children}
    </MessageBarActions>
  );
}

interface OneClick {
  readonly words: string;
  readonly apply: () => void;
}

/** Text is read as numbers, and a column is left out, only with the user's leave: this is where it is given. */
function useRemedy(problem: Problem): OneClick | null {
  const { state, dispatch } = usePane();
  const { data, setup } = state;
  switch (problem.code) {
    case "text-numbers": {
      const { column } = problem;
      const textNumbers = data?.columns.find(({ name }) => name === column)?.textNumbers?.decimal ?? ".";
      const apply = (): void => dispatch({ kind: "column changed", column, details: { textNumbers } });
      return { words: "Read them as numbers", apply };
    }
    case "dependent-columns": {
      const { column } = problem;
      const isDriver = setup?.columns.some((one) => one.column === column && one.role === "driver") === true;
      const apply = (): void => dispatch({ kind: "role chosen", column, role: "unused" });
      return isDriver ? { words: `Leave out ${column}`, apply } : null;
    }
    default:
      return null;
  }
}
