import { Button, makeStyles, tokens } from "@fluentui/react-components";
import { type ReactNode, useState } from "react";
import { useType } from "../look/type.ts";
import { TextField } from "../parts/TextField.tsx";
import { usePane } from "../paneContext.ts";
import { ColumnRow } from "./ColumnRow.tsx";
import { roomForColumns, shownColumns } from "./shownColumns.ts";

const useStyles = makeStyles({
  list: { margin: `${tokens.spacingVerticalS} 0 0`, padding: 0, listStyleType: "none" },
});

/** One line a column, in the order of the sheet; roles that are still guesses say so. */
export function ColumnList(): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { data, setup } = usePane().state;
  const [wanted, setWanted] = useState("");
  const [room, setRoom] = useState(roomForColumns);
  if (data === null || setup === null) return null;
  const guesses = setup.columns.some(({ guessed }) => guessed);
  const { shown, hidden } = shownColumns(setup.columns, wanted, room);
  return (
    <>
      {guesses && (
        <p className={type.remark}>The roles are guesses from the headings and the values. Change what is wrong.</p>
      )}
      {data.columns.length > roomForColumns && (
        <TextField label="Find a column by its name" value={wanted} onText={setWanted} />
      )}
      {shown.length === 0 && <p className={type.remark}>No column has this in its name.</p>}
      <ul className={styles.list}>
        {shown.map((place) => (
          <li key={data.columns[place]!.name}>
            <ColumnRow column={data.columns[place]!} setup={setup.columns[place]!} />
          </li>
        ))}
      </ul>
      {hidden > 0 && (
        <Button size="small" onClick={() => setRoom(room + roomForColumns)}>
          Show more columns ({hidden.toLocaleString("en-US")} not shown)
        </Button>
      )}
    </>
  );
}
