import { Field, Select } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { ColumnSetup } from "../../app/setup.ts";
import type { Transform } from "../../core/design/model.ts";
import { usePane } from "../paneContext.ts";
import { NumberField } from "../parts/NumberField.tsx";

const ways: readonly (readonly [Transform["kind"], string])[] = [
  ["none", "as it stands"],
  ["logarithm", "its logarithm"],
  ["square", "its square"],
  ["lag", "its value some periods earlier"],
  ["change", "its change over some periods"],
  ["growth rate", "its growth over some periods, in %"],
];

/** What enters the regression of a column of numbers. */
export function Transforms({ setup }: { readonly setup: ColumnSetup }): ReactNode {
  const { dispatch } = usePane();
  const change = (transform: Transform): void =>
    dispatch({ kind: "column changed", column: setup.column, details: { transform } });
  const { transform } = setup;
  return (
    <>
      <Field label="What enters" size="small">
        <Select
          size="small"
          value={transform.kind}
          onChange={(_, { value }) => change(transformOf(ways.find(([kind]) => kind === value)?.[0] ?? "none"))}
        >
          {ways.map(([kind, words]) => (
            <option key={kind} value={kind}>
              {words}
            </option>
          ))}
        </Select>
      </Field>
      {"periods" in transform && (
        <NumberField
          label="Periods back"
          value={transform.periods}
          fault={(periods) => (Number.isInteger(periods) && periods > 0 ? null : "Type a whole number, 1 or more.")}
          onNumber={(periods) => change({ ...transform, periods })}
        />
      )}
    </>
  );
}

/** A transform that looks back begins with one period. */
function transformOf(kind: Transform["kind"]): Transform {
  switch (kind) {
    case "none":
    case "logarithm":
    case "square":
      return { kind };
    case "lag":
    case "change":
    case "growth rate":
      return { kind, periods: 1 };
  }
}
