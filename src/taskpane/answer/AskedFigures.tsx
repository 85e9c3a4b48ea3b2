import { makeStyles, mergeClasses, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Answer } from "../../core/answer/answer.ts";
import type { AskedEstimate } from "../../core/answer/asked.ts";
import { askedJointTable, heldInWords } from "../../core/answer/askedTables.ts";
import { estimateSentence, jointSentence } from "../../core/answer/askedWords.ts";
import { numberInWords } from "../../core/answer/wording.ts";
import { useType } from "../look/type.ts";
import { keepTogether } from "../parts/keepTogether.ts";
import { pFigure } from "../parts/pFigure.ts";
import { standardErrorInWords, writerFor } from "./driverFigures.ts";

const useStyles = makeStyles({
  list: { display: "grid", rowGap: tokens.spacingVerticalS, margin: 0, padding: 0, listStyleType: "none" },
  table: {
    width: "100%",
    borderCollapse: "collapse",
    fontSize: tokens.fontSizeBase200,
    lineHeight: "18px",
    fontVariantNumeric: "tabular-nums",
  },
  side: {
    fontWeight: tokens.fontWeightRegular,
    textAlign: "left",
    padding: "2px 4px 2px 0",
    color: tokens.colorNeutralForeground3,
    borderTop: `1px solid ${tokens.colorNeutralStroke2}`,
  },
  head: { textAlign: "right", padding: "2px 0 2px 8px", verticalAlign: "bottom" },
  cell: {
    textAlign: "right",
    whiteSpace: "nowrap",
    padding: "2px 0 2px 8px",
    borderTop: `1px solid ${tokens.colorNeutralStroke2}`,
  },
});

/** What was asked of the coefficients beside the drivers: a sentence each, with its figures. */
export function AskedFigures({ answer }: { readonly answer: Answer }): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { estimates, joint, options } = answer;
  if (estimates.length === 0 && joint.asked === null) return null;
  return (
    <section aria-label="Asked of the coefficients">
      <h3 className={type.subhead}>Asked of the coefficients</h3>
      <ul className={styles.list}>
        {estimates.map((asked, index) => (
          <li key={index}>
            <p className={type.body}>{keepTogether(estimateSentence(asked, options.level))}</p>
            <EstimateTable asked={asked} level={options.level} />
          </li>
        ))}
        {joint.asked !== null && (
          <li>
            <p className={type.body}>{keepTogether(jointSentence(joint.asked, options.level))}</p>
            <JointTable answer={answer} />
          </li>
        )}
      </ul>
    </section>
  );
}

const ratioDecimals = 2;

function EstimateTable({ asked, level }: { readonly asked: AskedEstimate; readonly level: number }): ReactNode {
  const styles = useStyles();
  const { estimate, text } = asked;
  if (estimate === null) return null;
  const write = writerFor(estimate);
  const lines: readonly (readonly [string, string])[] = [
    ["estimate", write(estimate.value)],
    ["standard error", standardErrorInWords(estimate.standardError)],
    ["held against", heldInWords(asked)],
    ["ratio", numberInWords(estimate.ratio, ratioDecimals).replace("-", "−")],
    ["p-value", pFigure(estimate.pValue, level)],
    ["from", write(estimate.low)],
    ["to", write(estimate.high)],
  ];
  return (
    <table className={styles.table} aria-label={`Asked: ${text}`}>
      <tbody>
        {lines.map(([label, figure]) => (
          <tr key={label}>
            <th scope="row" className={styles.side}>
              {label}
            </th>
            <td className={styles.cell}>{figure}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

/** The equations under each kind of standard errors. */
function JointTable({ answer }: { readonly answer: Answer }): ReactNode {
  const styles = useStyles();
  const [headings = [], ...body] = askedJointTable(answer);
  if (body.length === 0) return null;
  return (
    <table className={styles.table} aria-label="The equations under each kind of standard errors">
      <thead>
        <tr>
          {headings.map((heading, column) => (
            <th key={heading} scope="col" className={mergeClasses(styles.side, column > 0 && styles.head)}>
              {heading}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {body.map(([kind, statistic, law, pValue]) => (
          <tr key={kind}>
            <th scope="row" className={styles.side}>
              {String(kind).replace(" (in force)", "\u00a0●")}
            </th>
            <td className={styles.cell}>{numberInWords(Number(statistic), ratioDecimals)}</td>
            <td className={styles.cell}>{law}</td>
            <td className={styles.cell}>{pFigure(Number(pValue), answer.options.level)}</td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}
