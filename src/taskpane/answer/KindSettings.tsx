import { Field, Select } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Setup } from "../../app/setup.ts";
import type { GroupedVersion, LagRule } from "../../core/covariance/choice.ts";
import { whiteWishes } from "../../core/decision/wish.ts";
import { HelpLink } from "../help/HelpLink.tsx";
import { usePane } from "../paneContext.ts";
import { NumberField } from "../parts/NumberField.tsx";

export interface KindSettingsProps {
  readonly setup: Setup;
  readonly change: (options: Partial<Setup["options"]>) => void;
}

const whiteWords: Readonly<Record<(typeof whiteWishes)[number], string>> = {
  HC0: "HC0: as it comes",
  HC1: "HC1: corrected for the coefficients fitted",
  HC2: "HC2: corrected row by row",
  "HC2 bell-mccaffrey": "HC2 with degrees of freedom of its own",
  HC3: "HC3: careful with few rows",
  HC4: "HC4: careful with rows far out",
  HC4m: "HC4m: the same, milder",
  HC5: "HC5: stricter still for rows far out",
};

/** How White and Newey-West are made in detail. */
export function KindSettings({ setup, change }: KindSettingsProps): ReactNode {
  return (
    <>
      <Field label="White version" size="small">
        <Select
          size="small"
          value={setup.options.whiteVersion}
          onChange={(_, { value }) =>
            change({ whiteVersion: whiteWishes.find((version) => version === value) ?? "HC3" })
          }
        >
          {whiteWishes.map((version) => (
            <option key={version} value={version}>
              {whiteWords[version]}
            </option>
          ))}
        </Select>
      </Field>
      {setup.rows === "groups" && <Grouped setup={setup} change={change} />}
      {setup.rows === "time" && <Lags setup={setup} change={change} />}
    </>
  );
}

const groupedVersions: readonly (readonly [GroupedVersion, string])[] = [
  ["CR0", "CR0: as it comes"],
  ["CR1", "CR1: corrected for the number of groups"],
  ["CR2", "CR2: each group corrected by itself"],
];

const Grouped = ({ setup, change }: KindSettingsProps): ReactNode => (
  <>
    <Field label="Version by group" size="small">
      <Select
        size="small"
        value={setup.options.groupedVersion}
        onChange={(_, { value }) =>
          change({ groupedVersion: groupedVersions.find(([version]) => version === value)?.[0] ?? "CR1" })
        }
      >
        {groupedVersions.map(([version, words]) => (
          <option key={version} value={version}>
            {words}
          </option>
        ))}
      </Select>
    </Field>
    <HelpLink about="groups" />
  </>
);

type Rule = readonly [name: string, rule: LagRule | null, words: string];

/** @param used - the lags that the answer shown used: where a number of one's own begins. */
const rulesFrom = (used: number): readonly Rule[] => [
  ["policy", null, "by the policy's rule"],
  ["careful", { kind: "careful" }, "careful: 1.3 √n less 1, rounded up"],
  ["thumb", { kind: "thumb" }, "thumb: 4 (n / 100)^(2/9)"],
  ["cube root", { kind: "cube root" }, "cube root: 0.75 n^(1/3)"],
  ["newey-west 1994", { kind: "newey-west 1994", prewhiten: false }, "from the data: Newey and West 1994"],
  ["andrews 1991", { kind: "andrews 1991", kernel: "bartlett", prewhiten: false }, "from the data: Andrews 1991"],
  ["given", { kind: "given", lags: used }, "a number"],
];

function Lags({ setup, change }: KindSettingsProps): ReactNode {
  const { lags } = setup.options;
  const rules = rulesFrom(usePane().state.answered?.answer.lags ?? 1);
  return (
    <>
      <Field label="Lags of Newey-West" size="small">
        <Select
          size="small"
          value={lags?.kind ?? "policy"}
          onChange={(_, { value }) => change({ lags: rules.find(([name]) => name === value)?.[1] ?? null })}
        >
          {rules.map(([name, , words]) => (
            <option key={name} value={name}>
              {words}
            </option>
          ))}
        </Select>
      </Field>
      {lags?.kind === "given" && (
        <NumberField
          label="Number of lags"
          value={lags.lags}
          fault={(count) => (Number.isInteger(count) && count >= 0 ? null : "Type a whole number, 0 or more.")}
          onNumber={(count) => change({ lags: { kind: "given", lags: count } })}
        />
      )}
    </>
  );
}
