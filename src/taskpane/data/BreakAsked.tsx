import { Field, Select } from "@fluentui/react-components";
import { type ReactNode, useMemo } from "react";
import { breakPlacesOf } from "../../app/breakPlace.ts";
import type { Setup } from "../../app/setup.ts";
import { useType } from "../look/type.ts";
import { NumberField } from "../parts/NumberField.tsx";
import { usePane } from "../paneContext.ts";

/** Where Chow's test parts the rows: in the middle, or at a row that is named. */
export function BreakAsked(): ReactNode {
  const { state, dispatch } = usePane();
  const { data, setup } = state;
  if (data === null || setup?.rows !== "time") return null;
  const { breakAfter } = setup.options;
  const half = Math.floor(data.source.rowCount / 2);
  const change = (after: number | null): void =>
    dispatch({ kind: "setup changed", change: { options: { ...setup.options, breakAfter: after } } });
  return (
    <>
      <Field label="Break that Chow's test asks about" size="small">
        <Select
          size="small"
          value={breakAfter === null ? "half" : "named"}
          onChange={(_, { value }) => change(value === "named" ? half : null)}
        >
          <option value="half">in the middle of the rows</option>
          <option value="named">before a row that I name</option>
        </Select>
      </Field>
      {breakAfter !== null && <NamedBreak setup={setup} breakAfter={breakAfter} change={change} />}
    </>
  );
}

interface NamedBreakProps {
  readonly setup: Setup;
  readonly breakAfter: number;
  readonly change: (after: number) => void;
}

/** By the row's number in the sheet; where there are very many rows, by how many stand before it. */
function NamedBreak({ setup, breakAfter, change }: NamedBreakProps): ReactNode {
  const type = useType();
  const source = usePane().state.data?.source ?? null;
  const places = useMemo(() => (source === null ? null : breakPlacesOf(source, setup)), [source, setup]);
  if (places === null) {
    return (
      <NumberField
        label="Rows before the break"
        value={breakAfter}
        fault={(rows) => (Number.isInteger(rows) && rows > 0 ? null : "Type a whole number, 1 or more.")}
        onNumber={change}
      />
    );
  }
  const fault = (row: number): string | null => {
    const before = places.before(row);
    if (before === null) return "Type the number of a row that is used.";
    return before === 0 ? "Nothing comes before the first row: type a later one." : null;
  };
  return (
    <>
      <NumberField
        label="First row after the break, by its number in the sheet"
        value={places.after(breakAfter) ?? places.count}
        fault={fault}
        onNumber={(row) => change(places.before(row) ?? breakAfter)}
      />
      <p className={type.remark}>
        {Math.min(breakAfter, places.count).toLocaleString("en-US")} rows stand before it,{" "}
        {Math.max(0, places.count - breakAfter).toLocaleString("en-US")} from it on. Name a break for a reason known
        beforehand; one that is found in the data is what the largest Chow statistic is for.
      </p>
    </>
  );
}
