import { Button, makeStyles, mergeClasses, tokens } from "@fluentui/react-components";
import { type ReactNode, useState } from "react";
import { sameName, type StoredSetup } from "../../app/stored/storedBook.ts";
import { useType } from "../look/type.ts";
import { TextField } from "../parts/TextField.tsx";
import { usePane } from "../paneContext.ts";

const useStyles = makeStyles({
  line: {
    display: "grid",
    gridTemplateColumns: "auto 1fr auto",
    alignItems: "center",
    columnGap: tokens.spacingHorizontalXS,
  },
  name: { minWidth: 0, overflowWrap: "anywhere", gridColumn: "2" },
  remark: { margin: 0 },
  // The words of a button without a frame stand in line with the name.
  buttons: { display: "flex", flexWrap: "wrap", margin: `${tokens.spacingVerticalXS} 0 0 -8px` },
});

export interface SetupEntryProps {
  readonly setup: StoredSetup;
  /** The mark for a comparison. */
  readonly children: ReactNode;
}

/** One stored set-up: what it asks, and what can be done with it. */
export function SetupEntry({ setup, children }: SetupEntryProps): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { state, commands } = usePane();
  const [doing, setDoing] = useState<"renaming" | "removing" | null>(null);
  const { name } = setup;
  const isOpen = state.opened !== null && sameName(state.opened, name);
  const busy = state.busy !== null;
  const done = (): void => setDoing(null);
  return (
    <>
      <div className={styles.line}>
        {children}
        <div className={styles.name}>
          <strong>{name}</strong>
          {isOpen && " (open)"}
          <p className={mergeClasses(type.remark, styles.remark)}>{askedBy(setup)}</p>
        </div>
        <Button
          size="small"
          aria-label={`Open ${name}`}
          disabledFocusable={busy}
          onClick={() => commands.openSetup(name)}
        >
          Open
        </Button>
      </div>
      {doing === "renaming" && <Renaming name={name} onDone={done} />}
      {doing === "removing" && <Removing name={name} onDone={done} />}
      {doing === null && (
        <div className={styles.buttons}>
          <Button size="small" appearance="subtle" aria-label={`Rename ${name}`} onClick={() => setDoing("renaming")}>
            Rename
          </Button>
          <Button size="small" appearance="subtle" aria-label={`Remove ${name}`} onClick={() => setDoing("removing")}>
            Remove
          </Button>
        </div>
      )}
    </>
  );
}

/** "Repairs by Price and Rain, Months!A1:E97" */
function askedBy({ setup, address }: StoredSetup): string {
  const outcome = setup.columns.find(({ role }) => role === "outcome")?.column ?? "no outcome";
  const drivers = setup.columns.filter(({ role }) => role === "driver").map(({ column }) => column);
  const by = [...drivers, ...setup.calendar].join(", ");
  return `${outcome} explained by ${by === "" ? "nothing yet" : by}; stored over ${address}`;
}

interface DoingProps {
  readonly name: string;
  readonly onDone: () => void;
}

const useForm = makeStyles({
  form: {
    display: "grid",
    gridTemplateColumns: "1fr auto auto",
    columnGap: tokens.spacingHorizontalXS,
    alignItems: "end",
    marginTop: tokens.spacingVerticalXS,
  },
  question: { margin: 0, alignSelf: "center" },
});

function Renaming({ name, onDone }: DoingProps): ReactNode {
  const styles = useForm();
  const { commands } = usePane();
  const [to, setTo] = useState(name);
  const rename = (event: { readonly preventDefault: () => void }): void => {
    event.preventDefault();
    if (to.trim() !== name) commands.renameSetup({ from: name, to });
    onDone();
  };
  return (
    <form className={styles.form} onSubmit={rename}>
      <TextField label={`New name of ${name}`} value={to} onText={setTo} />
      <Button size="small" type="submit" disabledFocusable={to.trim() === ""}>
        Rename it
      </Button>
      <Button size="small" onClick={onDone}>
        Leave it
      </Button>
    </form>
  );
}

/** What is stored cannot be brought back, so it is asked once more, in place. */
function Removing({ name, onDone }: DoingProps): ReactNode {
  const styles = useForm();
  const type = useType();
  const { commands } = usePane();
  return (
    <div className={styles.form} role="group" aria-label={`Remove ${name}`}>
      <span className={mergeClasses(type.remark, styles.question)}>It cannot be brought back.</span>
      <Button size="small" onClick={() => commands.removeSetup(name)}>
        Remove it
      </Button>
      <Button size="small" onClick={onDone}>
        Keep it
      </Button>
    </div>
  );
}
