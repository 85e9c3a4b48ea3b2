import { Button, makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Pointing } from "../../app/review/reviewState.ts";
import { useType } from "../look/type.ts";
import { TextField } from "../parts/TextField.tsx";
import { usePane } from "../paneContext.ts";

const useStyles = makeStyles({
  form: { display: "grid", rowGap: tokens.spacingVerticalS },
  line: { display: "grid", gridTemplateColumns: "1fr auto", columnGap: tokens.spacingHorizontalS, alignItems: "end" },
});

const fields: readonly (readonly [field: keyof Pointing, label: string, placeholder: string])[] = [
  ["reported", "Cells that report it", "Handover!A4:D10"],
  ["outcome", "Outcome: heading or cells", "Repairs"],
  ["drivers", "Drivers, in the order of the report", "Price index, Rainy days"],
];

/** Where a report stands, and which cells it speaks of where Footing cannot tell by itself. */
export function PointingForm(): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { state, commands } = usePane();
  const { pointing, busy } = state;
  const isIncomplete = busy !== null || pointing.reported.trim() === "";
  const submit = (event: { readonly preventDefault: () => void }): void => {
    event.preventDefault();
    if (!isIncomplete) commands.review.pointed();
  };
  return (
    <form className={styles.form} onSubmit={submit} aria-label="Where the results come from">
      {fields.map(([field, label, placeholder]) => (
        <PointingLine key={field} field={field} label={label} placeholder={placeholder} />
      ))}
      <p className={type.remark}>
        Outcome and drivers may be left empty: Footing then looks for columns with the names beside the figures.
      </p>
      <div>
        <Button size="small" type="submit" disabledFocusable={isIncomplete}>
          Review these results
        </Button>
      </div>
    </form>
  );
}

interface PointingLineProps {
  readonly field: keyof Pointing;
  readonly label: string;
  readonly placeholder: string;
}

function PointingLine({ field, label, placeholder }: PointingLineProps): ReactNode {
  const styles = useStyles();
  const { state, dispatch, commands } = usePane();
  return (
    <div className={styles.line}>
      <TextField
        label={label}
        placeholder={placeholder}
        value={state.pointing[field]}
        onText={(text) => dispatch({ kind: "pointing changed", pointing: { [field]: text } })}
      />
      <Button
        size="small"
        aria-label={`Selection for: ${label}`}
        disabledFocusable={state.busy !== null}
        onClick={() => commands.review.point(field)}
      >
        Selection
      </Button>
    </div>
  );
}
