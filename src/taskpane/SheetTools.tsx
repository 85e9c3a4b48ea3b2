import { Button, makeStyles, mergeClasses, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { cellSigns } from "../app/cellSigns.ts";
import { Disclosure } from "./parts/Disclosure.tsx";
import { useType } from "./look/type.ts";
import { usePane } from "./paneContext.ts";

const useStyles = makeStyles({
  place: { marginTop: tokens.spacingVerticalL },
  buttons: {
    display: "flex",
    flexWrap: "wrap",
    gap: tokens.spacingHorizontalS,
    margin: `${tokens.spacingVerticalXS} 0 ${tokens.spacingVerticalS}`,
  },
  signs: { margin: `${tokens.spacingVerticalXS} 0 0` },
  sign: { fontWeight: tokens.fontWeightSemibold, fontSize: tokens.fontSizeBase200 },
  call: { overflowWrap: "anywhere" },
  meaning: { margin: `0 0 ${tokens.spacingVerticalS}` },
});

/** What can be done with the functions of the sheet in front, and what their signs mean. */
export function SheetTools(): ReactNode {
  const styles = useStyles();
  const { state } = usePane();
  return (
    <section className={styles.place} aria-label="Functions in the sheet">
      <Disclosure label="Functions in the sheet in front">
        <Tools />
      </Disclosure>
      {state.sheetDone !== "" && <Done words={state.sheetDone} />}
    </section>
  );
}

function Tools(): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { state, commands } = usePane();
  const busy = state.busy !== null;
  return (
    <>
      <div className={styles.buttons}>
        <Button size="small" disabledFocusable={busy} onClick={commands.recalculate}>
          Recalculate this sheet's functions
        </Button>
        <Button size="small" disabledFocusable={busy} onClick={commands.keep}>
          Turn into a kept sheet
        </Button>
      </div>
      <p className={type.remark}>
        A kept sheet holds values alone and needs no add-in where it is read. Formulas are replaced on sheets that
        Footing wrote, and on no others.
      </p>
      <Disclosure label="The worksheet functions">
        <Functions />
      </Disclosure>
      <Disclosure label="What #NAME?, #BUSY! and #SPILL! mean">
        <Signs />
      </Disclosure>
    </>
  );
}

function Functions(): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { functions } = usePane();
  return (
    <dl className={styles.signs} aria-label="The worksheet functions">
      {functions.map(({ call, description }) => (
        <div key={call}>
          <dt className={mergeClasses(styles.sign, styles.call)}>{call}</dt>
          <dd className={mergeClasses(type.remark, styles.meaning)}>{description}</dd>
        </div>
      ))}
    </dl>
  );
}

function Signs(): ReactNode {
  const styles = useStyles();
  const type = useType();
  return (
    <dl className={styles.signs} aria-label="What the signs mean">
      {cellSigns.map(([sign, meaning]) => (
        <div key={sign}>
          <dt className={styles.sign}>{sign}</dt>
          <dd className={mergeClasses(type.remark, styles.meaning)}>{meaning}</dd>
        </div>
      ))}
    </dl>
  );
}

function Done({ words }: { readonly words: string }): ReactNode {
  const type = useType();
  return <p className={type.remark}>{words}</p>;
}
