import { Button, Field, Select, makeStyles, tokens } from "@fluentui/react-components";
import { type ReactNode, useState } from "react";
import type { DataPlace } from "../../app/host.ts";
import { TextField } from "../parts/TextField.tsx";
import { usePane } from "../paneContext.ts";

const useStyles = makeStyles({
  form: { display: "grid", rowGap: tokens.spacingVerticalM },
  line: { display: "grid", gridTemplateColumns: "1fr auto", columnGap: tokens.spacingHorizontalS, alignItems: "end" },
  narrow: { minWidth: 0 },
});

/** The three ways to point at data: the selection, a table, named range or sheet, or an address. */
export function PlaceChooser(): ReactNode {
  const styles = useStyles();
  const { state, commands } = usePane();
  const reading = state.busy?.with === "reading";
  return (
    <div className={styles.form}>
      <Button
        appearance={state.data === null ? "primary" : "secondary"}
        disabledFocusable={reading}
        onClick={() => commands.read({ kind: "selection" })}
      >
        Use selection
      </Button>
      {state.places.length > 0 && <PlaceList places={state.places} />}
      <AddressForm />
    </div>
  );
}

const kinds: readonly (readonly [DataPlace["kind"], string])[] = [
  ["table", "Tables"],
  ["name", "Named ranges"],
  ["sheet", "Sheets"],
];

/** Choosing and reading are two acts, so that the list can be walked through by keyboard without reading each. */
function PlaceList({ places }: { readonly places: readonly DataPlace[] }): ReactNode {
  const styles = useStyles();
  const { commands } = usePane();
  const [chosen, choose] = useState(0);
  const place = places[chosen] ?? places[0];
  return (
    <div className={styles.line}>
      <Field label="Table, named range or sheet" size="small" className={styles.narrow}>
        <Select size="small" value={String(chosen)} onChange={(_, { value }) => choose(Number(value))}>
          {kinds.map(([kind, label]) => (
            <PlaceGroup key={kind} kind={kind} label={label} places={places} />
          ))}
        </Select>
      </Field>
      <Button size="small" onClick={() => place !== undefined && commands.read({ kind: "place", place })}>
        Use it
      </Button>
    </div>
  );
}

interface PlaceGroupProps {
  readonly kind: DataPlace["kind"];
  readonly label: string;
  readonly places: readonly DataPlace[];
}

function PlaceGroup({ kind, label, places }: PlaceGroupProps): ReactNode {
  const options = places.flatMap((place, index) =>
    place.kind === kind
      ? [
          <option key={place.name} value={index}>
            {place.name}
          </option>,
        ]
      : [],
  );
  return options.length === 0 ? null : <optgroup label={label}>{options}</optgroup>;
}

function AddressForm(): ReactNode {
  const styles = useStyles();
  const { commands } = usePane();
  const [address, setAddress] = useState("");
  const submit = (event: { readonly preventDefault: () => void }): void => {
    event.preventDefault();
    if (address.trim() !== "") commands.read({ kind: "address", address: address.trim() });
  };
  return (
    <form className={styles.line} onSubmit={submit}>
      <TextField label="Or type an address" placeholder="Sheet1!A1:D97" value={address} onText={setAddress} />
      <Button size="small" type="submit">
        Read it
      </Button>
    </form>
  );
}
