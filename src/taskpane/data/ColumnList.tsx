import { makeStyles } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { useType } from "../look/type.ts";
import { usePane } from "../paneContext.ts";
import { ColumnRow } from "./ColumnRow.tsx";

const useStyles = makeStyles({
  list: { margin: 0, padding: 0, listStyleType: "none" },
});

/** One line a column, in the order of the sheet; roles that are still guesses say so. */
export function ColumnList(): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { data, setup } = usePane().state;
  if (data === null || setup === null) return null;
  const guesses = setup.columns.some(({ guessed }) => guessed);
  return (
    <>
      {guesses && (
        <p className={type.remark}>The roles are guesses from the headings and the values. Change what is wrong.</p>
      )}
      <ul className={styles.list}>
        {data.columns.map((column, index) => (
          <li key={column.name}>
            <ColumnRow column={column} setup={setup.columns[index]!} />
          </li>
        ))}
      </ul>
    </>
  );
}
