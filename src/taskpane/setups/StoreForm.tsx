import { Button, makeStyles, tokens } from "@fluentui/react-components";
import { type ReactNode, useState } from "react";
import { sameName } from "../../app/stored/storedBook.ts";
import { TextField } from "../parts/TextField.tsx";
import { usePane } from "../paneContext.ts";

const useStyles = makeStyles({
  form: {
    display: "grid",
    gridTemplateColumns: "1fr auto",
    columnGap: tokens.spacingHorizontalS,
    alignItems: "end",
    marginTop: tokens.spacingVerticalS,
  },
});

/** Stores what is chosen above under a name, which is that of the opened set-up until another is typed. */
export function StoreForm(): ReactNode {
  const styles = useStyles();
  const { state, commands } = usePane();
  const { opened, kept } = state;
  const [typed, setTyped] = useState<string | null>(null);
  const name = typed ?? opened ?? "";
  const isOwn = opened !== null && sameName(name, opened);
  const taken = !isOwn && kept.book.setups.some((setup) => sameName(setup.name, name));
  const store = (event: { readonly preventDefault: () => void }): void => {
    event.preventDefault();
    commands.storeSetup(name);
    setTyped(null);
  };
  return (
    <form className={styles.form} onSubmit={store}>
      <TextField
        label="Store this set-up as"
        placeholder="Repairs by month"
        value={name}
        onText={setTyped}
        complaint={taken ? "Another set-up has this name." : null}
      />
      <Button size="small" type="submit" disabledFocusable={name.trim() === "" || taken}>
        {isOwn ? "Store again" : "Store"}
      </Button>
    </form>
  );
}
