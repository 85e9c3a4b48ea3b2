import { makeStyles, mergeClasses, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Decision } from "../../core/decision/decision.ts";
import { type CaseCell, caseCells, followOns, isInForce, pointedAt, spreads } from "./caseGrid.ts";

const useStyles = makeStyles({
  table: {
    width: "100%",
    tableLayout: "fixed",
    borderCollapse: "separate",
    borderSpacing: "4px",
    fontSize: tokens.fontSizeBase200,
    lineHeight: tokens.lineHeightBase200,
    fontVariantNumeric: "tabular-nums",
  },
  corner: { width: "27%" },
  head: { fontWeight: tokens.fontWeightRegular, textAlign: "left", verticalAlign: "bottom", padding: "2px 0" },
  side: { fontWeight: tokens.fontWeightRegular, textAlign: "left", verticalAlign: "middle", padding: 0 },
  asked: { display: "block", color: tokens.colorNeutralForeground3 },
  cell: {
    height: "52px",
    padding: "4px 8px",
    border: `1px solid ${tokens.colorNeutralStroke2}`,
    borderRadius: tokens.borderRadiusSmall,
    color: tokens.colorNeutralForeground3,
    verticalAlign: "middle",
  },
  pointed: { border: `1px dashed ${tokens.colorNeutralForeground3}`, color: tokens.colorNeutralForeground1 },
  inForce: {
    border: `2px solid ${tokens.colorBrandForeground1}`,
    padding: "3px 7px",
    color: tokens.colorNeutralForeground1,
    fontWeight: tokens.fontWeightSemibold,
    "@media (forced-colors: active)": { border: "3px solid Highlight" },
  },
  mark: { display: "block", fontWeight: tokens.fontWeightRegular },
});

/** Which of the four cases the evidence falls into, and which standard errors are in force. */
export function FourCases({ decision }: { readonly decision: Decision }): ReactNode {
  const styles = useStyles();
  return (
    <table className={styles.table} aria-label="The four cases: spread of the errors against follow-on">
      <thead>
        <tr>
          <td className={styles.corner} />
          {followOns.map((followOn) => (
            <th key={followOn} scope="col" className={styles.head}>
              <span className={styles.asked}>follow-on</span> {followOn}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {spreads.map((spread) => (
          <tr key={spread}>
            <th scope="row" className={styles.side}>
              <span className={styles.asked}>spread</span> {spread}
            </th>
            {caseCells
              .filter((cell) => cell.spread === spread)
              .map((cell) => (
                <Case key={cell.followOn} cell={cell} decision={decision} />
              ))}
          </tr>
        ))}
      </tbody>
    </table>
  );
}

function Case({ cell, decision }: { readonly cell: CaseCell; readonly decision: Decision }): ReactNode {
  const styles = useStyles();
  const inForce = isInForce(decision, cell);
  const pointed = pointedAt(decision, cell);
  const notAsked = cell.followOn === "some" && decision.fourCase.followOn === "not asked";
  return (
    <td className={mergeClasses(styles.cell, pointed && styles.pointed, inForce && styles.inForce)}>
      {cell.errors}
      {inForce && <span className={styles.mark}>● in force</span>}
      {!inForce && pointed && <span className={styles.mark}>○ the tests point here</span>}
      {!inForce && !pointed && notAsked && <span className={styles.mark}>not asked</span>}
    </td>
  );
}
