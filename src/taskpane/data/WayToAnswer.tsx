import { Switch, makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { confidenceInWords } from "../../core/answer/wording.ts";
import { Disclosure } from "../parts/Disclosure.tsx";
import { usePane } from "../paneContext.ts";
import { BreakAsked } from "./BreakAsked.tsx";
import { NumberField } from "../parts/NumberField.tsx";

const useStyles = makeStyles({
  block: { marginTop: tokens.spacingVerticalS },
  fields: {
    display: "grid",
    gridTemplateColumns: "minmax(0, 1fr)",
    rowGap: tokens.spacingVerticalS,
    paddingLeft: "16px",
  },
});

/** The settings that seldom change: the level, the constant. */
export function WayToAnswer(): ReactNode {
  const styles = useStyles();
  const { state, dispatch } = usePane();
  const { setup } = state;
  if (setup === null) return null;
  const { options, constant } = setup;
  const label = `${confidenceInWords(options.level)} intervals, ${constant ? "with" : "without"} a constant`;
  return (
    <div className={styles.block}>
      <Disclosure label={label}>
        <div className={styles.fields}>
          <NumberField
            label="Level at which an effect is called shown"
            value={options.level}
            fault={levelFault}
            onNumber={(level) => dispatch({ kind: "setup changed", change: { options: { ...options, level } } })}
          />
          <Switch
            label="With a constant"
            checked={constant}
            onChange={(_, { checked }) => dispatch({ kind: "setup changed", change: { constant: checked } })}
          />
          <BreakAsked />
        </div>
      </Disclosure>
    </div>
  );
}

const levelFault = (level: number): string | null =>
  level > 0 && level < 1 ? null : "Type a number between 0 and 1, such as 0.05.";
