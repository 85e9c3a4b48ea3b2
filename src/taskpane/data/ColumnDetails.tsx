import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { ColumnSetup } from "../../app/setup.ts";
import { useType } from "../look/type.ts";
import { underLine } from "../look/underLine.ts";
import { CellList } from "../parts/CellList.tsx";
import { TextField } from "../parts/TextField.tsx";
import { usePane } from "../paneContext.ts";
import type { ColumnInHand } from "./columnInHand.ts";
import { NumberField } from "../parts/NumberField.tsx";
import { ReadAs } from "./ReadAs.tsx";
import { TextNumbers } from "./TextNumbers.tsx";
import { AlsoEnters, Transforms } from "./Transforms.tsx";
import { unusableCells } from "./columnWords.ts";

const useStyles = makeStyles({
  details: { ...underLine, padding: `0 0 ${tokens.spacingVerticalM} 16px` },
});

/** What else can be said of a column: cells that cannot be used, how it is read, its unit, the value tested against. */
export function ColumnDetails({ column, setup }: ColumnInHand): ReactNode {
  const styles = useStyles();
  const isDriver = setup.role === "driver";
  const isNumber = setup.role === "outcome" || (isDriver && setup.as === "number");
  const isPlain = setup.transform.kind === "none" && setup.also.kind === "none";
  return (
    <div className={styles.details}>
      <Unusable column={column} setup={setup} />
      <TextNumbers column={column} setup={setup} />
      {isDriver && <ReadAs column={column} setup={setup} />}
      {isNumber && <Transforms setup={setup} />}
      {isNumber && <AlsoEnters setup={setup} />}
      {isNumber && <Unit setup={setup} />}
      {isDriver && isNumber && isPlain && <Against setup={setup} />}
    </div>
  );
}

function Unusable({ column, setup }: ColumnInHand): ReactNode {
  const type = useType();
  const { cells, count } = unusableCells(column, setup);
  if (count === 0) return <p className={type.remark}>Every cell of {column.range} can be used.</p>;
  const items = cells.map(({ address, value }) => ({ address, words: value === "" ? "is empty" : `holds “${value}”` }));
  return (
    <div>
      <p className={type.remark}>Cells that cannot be used:</p>
      <CellList items={items} more={count - cells.length} />
    </div>
  );
}

function Unit({ setup }: { readonly setup: ColumnSetup }): ReactNode {
  const { dispatch } = usePane();
  const example = setup.role === "outcome" ? "Such as: orders a month" : "Such as: rainy day";
  const change = (unit: string): void => dispatch({ kind: "column changed", column: setup.column, details: { unit } });
  return <TextField label="One unit of it, in words" hint={example} value={setup.unit} onText={change} />;
}

const Against = ({ setup }: { readonly setup: ColumnSetup }): ReactNode => {
  const { dispatch } = usePane();
  return (
    <NumberField
      label="Test its coefficient against"
      value={setup.against}
      onNumber={(against) => dispatch({ kind: "column changed", column: setup.column, details: { against } })}
    />
  );
};
