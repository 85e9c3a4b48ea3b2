import { Radio, RadioGroup } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { type Setup, columnWithRole } from "../../app/setup.ts";
import { useType } from "../look/type.ts";
import { usePane } from "../paneContext.ts";

const kinds: readonly (readonly [Setup["rows"], string])[] = [
  ["cases", "separate cases"],
  ["time", "through time"],
  ["groups", "in groups"],
];

/** What rows are to each other: the one thing that cells cannot tell. */
export function RowsAre(): ReactNode {
  const type = useType();
  const { state, dispatch } = usePane();
  const { setup } = state;
  if (setup === null) return null;
  const choose = (rows: Setup["rows"]): void => dispatch({ kind: "setup changed", change: { rows } });
  return (
    <>
      <RadioGroup
        aria-label="Rows are"
        value={setup.rows}
        onChange={(_, { value }) => choose(kinds.find(([kind]) => kind === value)?.[0] ?? "cases")}
      >
        {kinds.map(([kind, words]) => (
          <Radio key={kind} value={kind} label={words} />
        ))}
      </RadioGroup>
      <p className={type.remark} aria-live="polite">
        {setup.rowsGuessed && "A guess. "}
        {meaningOf(setup)}
      </p>
    </>
  );
}

/** What follows from the choice, and what is still missing for it. */
function meaningOf(setup: Setup): string {
  const time = columnWithRole(setup, "time");
  const group = columnWithRole(setup, "group");
  switch (setup.rows) {
    case "cases":
      return "The order of the rows means nothing, so whether errors follow on is not asked.";
    case "time":
      return time === null
        ? "In the order in which they stand. Give a column the role time if one tells it."
        : `In the order of ${time}.`;
    case "groups":
      return group === null
        ? "Give one column the role group: rows with the same value there belong together."
        : `Rows with the same ${group} belong together${second(setup)}${time === null ? "" : `, in the order of ${time}`}.${crossed(setup)}`;
  }
}

/** Groups that cross the first ones. */
function second(setup: Setup): string {
  const column = columnWithRole(setup, "second group");
  return column === null ? "" : `, and so do rows with the same ${column}`;
}

/** That there may be a second way is easily missed in the list of roles. */
const crossed = (setup: Setup): string =>
  columnWithRole(setup, "second group") === null
    ? " Where they belong together in two ways, such as by shop and by month, give another column the role 2nd group."
    : "";
