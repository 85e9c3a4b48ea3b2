import { Field, Select } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { ColumnSetup } from "../../app/setup.ts";
import { usePane } from "../paneContext.ts";
import type { ColumnInHand } from "./columnInHand.ts";

const ways: readonly (readonly [ColumnSetup["as"], string])[] = [
  ["number", "numbers"],
  ["category", "categories"],
  ["date", "points in time"],
];

/** How a driver is read, and for categories the one that the others are compared with. */
export function ReadAs({ column, setup }: ColumnInHand): ReactNode {
  const { dispatch } = usePane();
  const change = (details: Partial<Pick<ColumnSetup, "as" | "base">>): void =>
    dispatch({ kind: "column changed", column: setup.column, details });
  return (
    <>
      <Field label="Read as" size="small">
        <Select
          size="small"
          value={setup.as}
          onChange={(_, { value }) => change({ as: ways.find(([as]) => as === value)?.[0] ?? "number" })}
        >
          {ways.map(([as, words]) => (
            <option key={as} value={as}>
              {words}
            </option>
          ))}
        </Select>
      </Field>
      {setup.as === "category" && column.levels.length > 0 && (
        <Field label="Compared with" size="small">
          <Select
            size="small"
            value={setup.base ?? ""}
            onChange={(_, { value }) => change({ base: value === "" ? null : value })}
          >
            <option value="">the most frequent category</option>
            {column.levels.map(({ level, count }) => (
              <option key={level} value={level}>
                {level} ({count})
              </option>
            ))}
          </Select>
        </Field>
      )}
    </>
  );
}
