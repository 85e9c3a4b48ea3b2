import { Field, Select } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { ColumnSetup } from "../../app/setup.ts";
import type { Transform } from "../../core/design/model.ts";
import { usePane } from "../paneContext.ts";
import { NumberField } from "../parts/NumberField.tsx";

type Ways = readonly (readonly [Transform["kind"], string])[];

const made: Ways = [
  ["logarithm", "its logarithm"],
  ["square", "its square"],
  ["lag", "its value some periods earlier"],
  ["change", "its change over some periods"],
  ["growth rate", "its growth over some periods, in %"],
];

const ways: Ways = [["none", "as it stands"], ...made];

/** What enters the regression of a column of numbers. */
export function Transforms({ setup }: { readonly setup: ColumnSetup }): ReactNode {
  const { dispatch } = usePane();
  const change = (transform: Transform): void =>
    dispatch({ kind: "column changed", column: setup.column, details: { transform } });
  return (
    <TransformChoice
      label="What enters"
      periods="Periods back"
      ways={ways}
      transform={setup.transform}
      change={change}
    />
  );
}

/**
 * What else enters of the same column, as a driver of its own: of a driver whatever is not the form that enters already,
 * of the outcome its earlier values alone, since all else would explain it by itself.
 */
export function AlsoEnters({ setup }: { readonly setup: ColumnSetup }): ReactNode {
  const { dispatch } = usePane();
  const change = (also: Transform): void =>
    dispatch({ kind: "column changed", column: setup.column, details: { also } });
  const isOutcome = setup.role === "outcome";
  const others = made.filter(([kind]) => (isOutcome ? kind === "lag" : kind !== setup.transform.kind));
  return (
    <TransformChoice
      label={isOutcome ? "Enters as a driver too" : "Enters a second time"}
      periods="Periods back, second time"
      ways={[["none", "no"], ...others]}
      transform={setup.also}
      change={change}
    />
  );
}

interface TransformChoiceProps {
  readonly label: string;
  /** The label of the periods that a transform looks back. */
  readonly periods: string;
  readonly ways: Ways;
  readonly transform: Transform;
  readonly change: (transform: Transform) => void;
}

function TransformChoice({ label, periods: back, ways: offered, transform, change }: TransformChoiceProps): ReactNode {
  return (
    <>
      <Field label={label} size="small">
        <Select
          size="small"
          value={transform.kind}
          onChange={(_, { value }) => change(transformOf(offered.find(([kind]) => kind === value)?.[0] ?? "none"))}
        >
          {offered.map(([kind, words]) => (
            <option key={kind} value={kind}>
              {words}
            </option>
          ))}
        </Select>
      </Field>
      {"periods" in transform && (
        <NumberField
          label={back}
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
