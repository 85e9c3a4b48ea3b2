import { Button, Field, Select } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { ColumnSetup } from "../../app/setup.ts";
import { useType } from "../look/type.ts";
import { usePane } from "../paneContext.ts";
import type { ColumnInHand } from "./columnInHand.ts";

/** Text that is plainly numbers: read as such only with the user's leave, which can be taken back. */
export function TextNumbers({ column, setup }: ColumnInHand): ReactNode {
  const type = useType();
  const { dispatch } = usePane();
  const found = column.textNumbers;
  if (found === null) return null;
  const read = (textNumbers: ColumnSetup["textNumbers"]): void =>
    dispatch({ kind: "column changed", column: column.name, details: { textNumbers } });
  if (setup.textNumbers !== null) return <DecimalMark setup={setup} read={read} />;
  const cells = found.count === 1 ? "cell holds a number" : "cells hold numbers";
  return (
    <div>
      <p className={type.remark}>
        {found.count.toLocaleString("en-US")} {cells} kept as text, such as “{found.example}”.
        {!found.certain && " Its decimal mark could be a point or a comma: look before you use it."}
      </p>
      <Button size="small" onClick={() => read(found.decimal)}>
        Read as numbers
      </Button>
    </div>
  );
}

interface DecimalMarkProps {
  readonly setup: ColumnSetup;
  readonly read: (textNumbers: ColumnSetup["textNumbers"]) => void;
}

const DecimalMark = ({ setup, read }: DecimalMarkProps): ReactNode => (
  <Field label="Text in this column" size="small">
    <Select
      size="small"
      value={setup.textNumbers ?? ""}
      onChange={(_, { value }) => read(value === "," || value === "." ? value : null)}
    >
      <option value=".">is read as numbers like 1,234.5</option>
      <option value=",">is read as numbers like 1.234,5</option>
      <option value="">is not read</option>
    </Select>
  </Field>
);
