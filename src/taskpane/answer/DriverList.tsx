import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Answer } from "../../core/answer/answer.ts";
import { DriverBlock } from "./DriverBlock.tsx";

const useStyles = makeStyles({
  list: {
    display: "grid",
    gridTemplateColumns: "minmax(0, 1fr)",
    rowGap: tokens.spacingVerticalL,
    margin: 0,
    padding: 0,
    listStyleType: "none",
  },
});

/** One block a term; the constant comes last, as it is seldom what was asked. */
export function DriverList({ answer }: { readonly answer: Answer }): ReactNode {
  const styles = useStyles();
  const order = answer.terms.map((_, index) => index);
  const isConstant = (index: number): boolean => answer.drivers[index]?.sentence === null;
  const sorted = [...order.filter((index) => !isConstant(index)), ...order.filter(isConstant)];
  return (
    <ul className={styles.list}>
      {sorted.map((index) => (
        <li key={answer.terms[index]}>
          <DriverBlock answer={answer} index={index} />
        </li>
      ))}
    </ul>
  );
}
