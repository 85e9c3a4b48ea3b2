import { Button, Field, Select, makeStyles } from "@fluentui/react-components";
import { type ReactNode, useState } from "react";
import type { Setup } from "../../app/setup.ts";
import type { Options } from "../../core/answer/options.ts";
import type { Policy } from "../../core/decision/wish.ts";
import { useType } from "../look/type.ts";
import { underLine } from "../look/underLine.ts";
import { Disclosure } from "../parts/Disclosure.tsx";
import { KindSettings } from "./KindSettings.tsx";
import { TextField } from "../parts/TextField.tsx";
import { usePane } from "../paneContext.ts";

type Fixed = NonNullable<Options["fixed"]>;

const useStyles = makeStyles({
  fields: underLine,
});

const policies: readonly (readonly [Policy, string])[] = [
  ["careful", "careful: made for small samples"],
  ["textbook", "textbook: as handbooks teach it"],
  ["always-robust", "always robust: tests not asked"],
];

/** How the standard errors are chosen, and the way to fix a kind with a reason. A change answers again at once. */
export function Choice(): ReactNode {
  const styles = useStyles();
  const { state, dispatch, commands } = usePane();
  const { setup } = state;
  if (setup === null) return null;
  const change = (options: Partial<Setup["options"]>): void => {
    dispatch({ kind: "setup changed", change: { options: { ...setup.options, ...options } } });
    commands.answer();
  };
  const { policy, fixed } = setup.options;
  return (
    <Disclosure label={`Change how they are chosen (${fixed === null ? policy.replace("-", " ") : "fixed by hand"})`}>
      <div className={styles.fields}>
        <Field label="Policy" size="small">
          <Select
            size="small"
            value={policy}
            onChange={(_, { value }) => change({ policy: policies.find(([name]) => name === value)?.[0] ?? "careful" })}
          >
            {policies.map(([name, words]) => (
              <option key={name} value={name}>
                {words}
              </option>
            ))}
          </Select>
        </Field>
        <FixedKind key={fixed?.errors ?? "by tests"} setup={setup} fixed={fixed} change={change} />
        <KindSettings setup={setup} change={change} />
      </div>
    </Disclosure>
  );
}

const kinds: readonly (readonly [Fixed["errors"], string])[] = [
  ["classical", "classical"],
  ["white", "White"],
  ["newey-west", "Newey-West"],
  ["grouped", "by group"],
];

/** Kinds that make sense of the rows as they are. */
const fits = (kind: Fixed["errors"], rows: Setup["rows"]): boolean =>
  kind === "newey-west" ? rows === "time" : kind === "grouped" ? rows === "groups" : true;

interface FixedKindProps {
  readonly setup: Setup;
  readonly fixed: Fixed | null;
  readonly change: (options: Partial<Setup["options"]>) => void;
}

function FixedKind({ setup, fixed, change }: FixedKindProps): ReactNode {
  const type = useType();
  const [kind, setKind] = useState<Fixed["errors"] | null>(fixed?.errors ?? null);
  const [reason, setReason] = useState(fixed?.reason ?? "");
  const fix = (): void => {
    if (kind !== null) change({ fixed: { errors: kind, reason: reason.trim() === "" ? null : reason.trim() } });
  };
  const choose = (value: string): void => {
    const chosen = kinds.find(([name]) => name === value)?.[0] ?? null;
    setKind(chosen);
    if (chosen === null && fixed !== null) change({ fixed: null });
  };
  return (
    <>
      <Field label="Standard errors" size="small">
        <Select size="small" value={kind ?? ""} onChange={(_, { value }) => choose(value)}>
          <option value="">as the tests say</option>
          {kinds
            .filter(([name]) => fits(name, setup.rows))
            .map(([name, words]) => (
              <option key={name} value={name}>
                always {words}
              </option>
            ))}
        </Select>
      </Field>
      {kind !== null && (
        <>
          <TextField label="Reason, which the report keeps" value={reason} onText={setReason} />
          <p className={type.remark}>Without a reason the report says: none given.</p>
          <Button size="small" onClick={fix}>
            {fixed === null ? "Fix this kind" : "Keep this kind and reason"}
          </Button>
        </>
      )}
    </>
  );
}
