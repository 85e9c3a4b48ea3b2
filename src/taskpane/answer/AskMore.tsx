import { Button, Field, Select, makeStyles } from "@fluentui/react-components";
import { type ReactNode, useState } from "react";
import { type Asked, type Example, examplesFor, readAsked } from "../../app/asking.ts";
import type { Setup } from "../../app/setup.ts";
import { capitalised } from "../../core/answer/wording.ts";
import { messageOf } from "../../core/problem/messages.ts";
import type { Problem } from "../../core/problem/problem.ts";
import { useType } from "../look/type.ts";
import { underLine } from "../look/underLine.ts";
import { usePane } from "../paneContext.ts";
import { Disclosure } from "../parts/Disclosure.tsx";
import { TextField } from "../parts/TextField.tsx";

const useStyles = makeStyles({
  form: underLine,
  example: { display: "block", overflowWrap: "anywhere", textIndent: "-8px", paddingLeft: "8px" },
});

/** Numbers made of the coefficients, equations tested at once, and whom predictions are for. */
export function AskMore(): ReactNode {
  const { setup } = usePane().state;
  if (setup === null) return null;
  const count = setup.options.estimates.length + setup.options.jointTest.length;
  return (
    <Disclosure label={`Ask more of the coefficients${count === 0 ? "" : ` (${count} asked)`}`}>
      <AskForm setup={setup} />
    </Disclosure>
  );
}

const kinds = ["estimates", "jointTest"] as const satisfies readonly (keyof Asked)[];

const labels: Readonly<Record<keyof Asked, string>> = {
  estimates: "Sums and quotients of coefficients",
  jointTest: "Equations tested all at once",
};

type Drafts = Readonly<Partial<Record<keyof Asked, string>>>;
type Faults = Readonly<Partial<Record<keyof Asked, Problem>>>;

/** What is typed stays until it is asked; what cannot be read is not asked, and the last answer stands meanwhile. */
function AskForm({ setup }: { readonly setup: Setup }): ReactNode {
  const styles = useStyles();
  const { state, dispatch, commands } = usePane();
  const [drafts, setDrafts] = useState<Drafts>({});
  const [faults, setFaults] = useState<Faults>({});
  const { options } = setup;
  const change = (asked: Partial<Setup["options"]>): void => {
    dispatch({ kind: "setup changed", change: { options: { ...options, ...asked } } });
    commands.answer();
  };
  const said = (kind: keyof Asked): string => drafts[kind] ?? options[kind].join(", ");
  const ask = (event: { readonly preventDefault: () => void }): void => {
    event.preventDefault();
    if (state.busy !== null) return;
    const read = kinds.map((kind) => [kind, readAsked(kind, said(kind), state.answered)] as const);
    const wrong = read.flatMap(([kind, { problem }]) => (problem === null ? [] : [[kind, problem] as const]));
    setFaults(Object.fromEntries(wrong));
    if (wrong.length > 0) return;
    change(Object.fromEntries(read.map(([kind, { texts }]) => [kind, texts])));
    setDrafts({});
  };
  const type = (kind: keyof Asked, text: string): void => {
    setDrafts({ ...drafts, [kind]: text });
    setFaults(Object.fromEntries(Object.entries(faults).filter(([other]) => other !== kind)));
  };
  return (
    <form className={styles.form} onSubmit={ask}>
      {kinds.map((kind) => (
        <AskField key={kind} kind={kind} value={said(kind)} fault={faults[kind]} onText={(text) => type(kind, text)} />
      ))}
      <Button size="small" type="submit" disabledFocusable={state.busy !== null}>
        Ask this
      </Button>
      <PredictFor value={options.predictFor} change={change} />
    </form>
  );
}

interface AskFieldProps {
  readonly kind: keyof Asked;
  readonly value: string;
  readonly fault: Problem | undefined;
  readonly onText: (text: string) => void;
}

/** A field with what could be asked in it, made of the drivers that there are. */
function AskField({ kind, value, fault, onText }: AskFieldProps): ReactNode {
  const { answered } = usePane().state;
  const examples = answered === null ? [] : examplesFor(answered.answer)[kind];
  return (
    <TextField
      label={labels[kind]}
      value={value}
      onText={onText}
      complaint={fault === undefined ? null : messageOf(fault)}
      hint={<Examples examples={examples} />}
    />
  );
}

function Examples({ examples }: { readonly examples: readonly Example[] }): ReactNode {
  const styles = useStyles();
  return (
    <>
      Coefficients by their names, with commas between.
      {examples.map(({ words, typed }) => (
        <span key={typed} className={styles.example}>
          {capitalised(words)}: {typed}
        </span>
      ))}
    </>
  );
}

interface PredictForProps {
  readonly value: Setup["options"]["predictFor"];
  readonly change: (options: Partial<Setup["options"]>) => void;
}

function PredictFor({ value, change }: PredictForProps): ReactNode {
  const type = useType();
  return (
    <>
      <Field label="Predictions are for" size="small">
        <Select
          size="small"
          value={value}
          onChange={(_, data) => change({ predictFor: data.value === "single row" ? "single row" : "mean" })}
        >
          <option value="mean">the mean of many such rows</option>
          <option value="single row">a single row</option>
        </Select>
      </Field>
      <p className={type.remark}>
        For FOOTING.PREDICT with the settings of a result sheet. A single row has an interval under even spread alone.
      </p>
    </>
  );
}
