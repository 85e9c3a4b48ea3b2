import { Button, Checkbox, makeStyles, tokens } from "@fluentui/react-components";
import { type ReactNode, useState } from "react";
import type { StoredSetup } from "../../app/stored/storedBook.ts";
import { useType } from "../look/type.ts";
import { usePane } from "../paneContext.ts";
import { SetupEntry } from "./SetupEntry.tsx";

const useStyles = makeStyles({
  list: { margin: 0, padding: 0, listStyleType: "none", display: "grid", rowGap: tokens.spacingVerticalS },
  compare: { marginTop: tokens.spacingVerticalS },
});

/** The stored set-ups: each can be opened, renamed, removed, and chosen for a comparison. */
export function SetupList({ setups }: { readonly setups: readonly StoredSetup[] }): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { state, commands } = usePane();
  const [chosen, choose] = useState<readonly string[]>([]);
  const names = setups.map(({ name }) => name).filter((name) => chosen.includes(name));
  if (setups.length === 0)
    return <p className={type.remark}>None yet. A stored set-up comes back with the workbook.</p>;
  const toggle = (name: string, on: boolean): void =>
    choose(on ? [...chosen, name] : chosen.filter((one) => one !== name));
  return (
    <>
      <ul className={styles.list}>
        {setups.map((setup) => (
          <li key={setup.name}>
            <SetupEntry setup={setup}>
              {setups.length > 1 && (
                <Checkbox
                  aria-label={`Compare ${setup.name}`}
                  checked={names.includes(setup.name)}
                  onChange={(_, { checked }) => toggle(setup.name, checked === true)}
                />
              )}
            </SetupEntry>
          </li>
        ))}
      </ul>
      {setups.length > 1 && (
        <Button
          size="small"
          className={styles.compare}
          disabledFocusable={names.length < 2 || state.busy !== null}
          onClick={() => commands.compare(names)}
        >
          {names.length < 2 ? "Compare: mark two or more" : `Compare ${names.length} side by side`}
        </Button>
      )}
    </>
  );
}
