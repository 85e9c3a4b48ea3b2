import { Field, type FieldProps, Input, type InputProps, makeStyles } from "@fluentui/react-components";
import type { ReactNode } from "react";

export interface TextFieldProps extends Pick<InputProps, "placeholder" | "inputMode" | "onBlur"> {
  readonly label: string;
  readonly value: string;
  readonly onText: (text: string) => void;
  readonly hint?: NonNullable<FieldProps["hint"]>;
  /** What is wrong with what was typed; null where nothing is. */
  readonly complaint?: string | null;
}

const useStyles = makeStyles({
  field: { minWidth: 0 },
  input: { minWidth: 0 },
  // The small size leaves 22 pixels, two less than a finger needs.
  target: { minHeight: "24px" },
});

/** A small field for text, under its label. */
export function TextField({ label, value, onText, hint, complaint = null, ...rest }: TextFieldProps): ReactNode {
  const styles = useStyles();
  return (
    <Field
      label={label}
      size="small"
      className={styles.field}
      {...(hint === undefined ? {} : { hint })}
      {...(complaint === null ? {} : { validationMessage: complaint })}
    >
      <Input
        {...rest}
        size="small"
        className={styles.input}
        input={{ className: styles.target }}
        spellCheck={false}
        value={value}
        onChange={(_, data) => onText(data.value)}
      />
    </Field>
  );
}
