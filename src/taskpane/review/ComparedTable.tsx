import { makeStyles, mergeClasses, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { ClaimReview } from "../../core/review/claimReview.ts";
import { type ComparedRow, comparedRows } from "../../core/review/reviewTables.ts";
import { CellLink } from "../parts/CellLink.tsx";

const useStyles = makeStyles({
  table: {
    width: "100%",
    borderCollapse: "collapse",
    fontSize: tokens.fontSizeBase200,
    lineHeight: "17px",
    fontVariantNumeric: "tabular-nums",
  },
  head: {
    fontWeight: tokens.fontWeightRegular,
    textAlign: "right",
    verticalAlign: "bottom",
    padding: "2px 0 2px 6px",
    color: tokens.colorNeutralForeground3,
  },
  name: { textAlign: "left", fontWeight: tokens.fontWeightRegular, padding: 0, overflowWrap: "anywhere" },
  side: {
    textAlign: "left",
    fontWeight: tokens.fontWeightRegular,
    padding: "0 0 4px",
    color: tokens.colorNeutralForeground3,
  },
  cell: { textAlign: "right", verticalAlign: "top", padding: "0 0 4px 6px", overflowWrap: "anywhere" },
  line: { borderTop: `1px solid ${tokens.colorNeutralStroke2}` },
  differs: { fontWeight: tokens.fontWeightSemibold, color: tokens.colorNeutralForeground1 },
});

/**
 * Every reported number beside what its cells give; where something explains the difference, what they give then.
 * Names stand above their figures, so that three columns of figures fit a narrow pane.
 */
export function ComparedTable({ review }: { readonly review: ClaimReview }): ReactNode {
  const styles = useStyles();
  const rows = comparedRows(review);
  const isExplained = rows.some(({ explained }) => explained !== null);
  const heads = ["reported", "recomputed", ...(isExplained ? ["as explained"] : [])];
  return (
    <table className={styles.table} aria-label="Reported and recomputed">
      <thead>
        <tr>
          <td />
          {heads.map((head) => (
            <th key={head} scope="col" className={styles.head}>
              {head}
            </th>
          ))}
        </tr>
      </thead>
      {rows.map((row, index) => (
        <ComparedNumber key={index} row={row} isExplained={isExplained} />
      ))}
    </table>
  );
}

interface ComparedNumberProps {
  readonly row: ComparedRow;
  readonly isExplained: boolean;
}

function ComparedNumber({ row, isExplained }: ComparedNumberProps): ReactNode {
  const styles = useStyles();
  const { name, cell, reported, recomputed, explained, agrees } = row;
  return (
    <tbody>
      <tr className={styles.line}>
        <th scope="rowgroup" colSpan={isExplained ? 4 : 3} className={styles.name}>
          {name} <CellLink address={cell}>{localPart(cell)}</CellLink>
        </th>
      </tr>
      <tr>
        <th scope="row" className={mergeClasses(styles.side, !agrees && styles.differs)}>
          {agrees ? "agrees" : "differs"}
        </th>
        <td className={styles.cell}>{reported}</td>
        <td className={mergeClasses(styles.cell, !agrees && styles.differs)}>{recomputed}</td>
        {isExplained && <td className={styles.cell}>{explained ?? ""}</td>}
      </tr>
    </tbody>
  );
}

/** "B6" of "Handover!B6": the sheet is the one of the report. */
const localPart = (address: string): string => address.slice(address.lastIndexOf("!") + 1);
