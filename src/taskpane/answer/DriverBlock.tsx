import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Answer, DriverAnswer } from "../../core/answer/answer.ts";
import { listInWords } from "../../core/answer/wording.ts";
import { useType } from "../look/type.ts";
import { Disclosure } from "../parts/Disclosure.tsx";
import { IntervalPicture } from "../pictures/IntervalPicture.tsx";
import { DriverTable } from "./DriverTable.tsx";
import { HowItCame } from "./HowItCame.tsx";
import { WhatWouldChange } from "./WhatWouldChange.tsx";
import { FirmnessMark } from "./FirmnessMark.tsx";
import { intervalsInWords, kindFigures, pInWords, writerFor } from "./driverFigures.ts";

const useStyles = makeStyles({
  name: {
    margin: 0,
    fontSize: tokens.fontSizeBase300,
    fontWeight: tokens.fontWeightSemibold,
    overflowWrap: "anywhere",
  },
  figures: {
    display: "flex",
    flexWrap: "wrap",
    alignItems: "baseline",
    columnGap: tokens.spacingHorizontalM,
    margin: `2px 0 ${tokens.spacingVerticalXS}`,
    fontVariantNumeric: "tabular-nums",
  },
  coefficient: {
    minWidth: 0,
    overflowWrap: "anywhere",
    fontSize: tokens.fontSizeBase500,
    lineHeight: tokens.lineHeightBase500,
  },
  unit: { fontSize: tokens.fontSizeBase200, color: tokens.colorNeutralForeground3 },
  firmness: {
    display: "flex",
    columnGap: tokens.spacingHorizontalXS,
    fontSize: tokens.fontSizeBase200,
    lineHeight: "18px",
  },
});

/** One driver: coefficient, p-value in force, the intervals of each kind, whether the conclusion is firm. */
export function DriverBlock({ answer, index }: { readonly answer: Answer; readonly index: number }): ReactNode {
  const styles = useStyles();
  const type = useType();
  const driver = answer.drivers[index]!;
  const write = writerFor(driver);
  const unit = answer.options.units[answer.outcome];
  return (
    <article aria-label={driver.term}>
      <h3 className={styles.name}>{driver.term}</h3>
      <p className={styles.figures}>
        <span className={styles.coefficient}>{write(driver.coefficient)}</span>
        {unit !== undefined && <span className={styles.unit}>{unit}</span>}
        <span>{pInWords(driver.pValue, answer)}</span>
        {driver.against !== 0 && <span className={styles.unit}>against {driver.against}</span>}
      </p>
      <Firmness driver={driver} className={styles.firmness} />
      <IntervalPicture
        lines={kindFigures(answer, index)}
        estimate={driver.coefficient}
        against={driver.against}
        alternative={intervalsInWords(answer, index)}
      />
      <Disclosure
        label={
          <>
            Figures<span className={type.hidden}> of {driver.term}</span>
          </>
        }
      >
        <DriverTable answer={answer} index={index} />
        <HowItCame answer={answer} index={index} />
        <WhatWouldChange answer={answer} index={index} />
      </Disclosure>
    </article>
  );
}

const Firmness = ({ driver, className }: { readonly driver: DriverAnswer; readonly className: string }): ReactNode => (
  <div className={className}>
    <FirmnessMark firmness={driver.firmness} />
    <span>
      {driver.firmness.kind === "firm"
        ? "firm: the other kinds agree"
        : `leans on the choice: ${listInWords(driver.firmness.on)} would say otherwise`}
    </span>
  </div>
);
