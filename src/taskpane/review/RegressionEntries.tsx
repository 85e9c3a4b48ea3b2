import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Listed } from "../../app/review/listing.ts";
import { capitalised } from "../../core/answer/wording.ts";
import { gravestRank, originInWords, titleOf } from "../../core/review/reviewWords.ts";
import { rowButton } from "../look/rowButton.ts";
import { usePane } from "../paneContext.ts";
import { RankMark } from "./RankMark.tsx";

const useStyles = makeStyles({
  list: { margin: 0, padding: 0, listStyleType: "none" },
  item: { ":not(:first-child)": { borderTop: `1px solid ${tokens.colorNeutralStroke2}` } },
  open: { ...rowButton, gridTemplateColumns: "16px minmax(0, 1fr)" },
  mark: { paddingTop: "3px" },
  title: {
    display: "block",
    fontSize: tokens.fontSizeBase300,
    lineHeight: "19px",
    fontWeight: tokens.fontWeightSemibold,
  },
  line: { display: "block" },
  quiet: { display: "block", color: tokens.colorNeutralForeground3 },
});

/** Regressions with how they came out and where they stand; each opens. */
export function RegressionEntries({ entries }: { readonly entries: readonly Listed[] }): ReactNode {
  const styles = useStyles();
  return (
    <ul className={styles.list}>
      {entries.map((entry) => (
        <li key={entry.index} className={styles.item}>
          <RegressionEntry {...entry} />
        </li>
      ))}
    </ul>
  );
}

function RegressionEntry({ regression, index }: Listed): ReactNode {
  const styles = useStyles();
  const { dispatch } = usePane();
  const { claim, review } = regression;
  const rank = review === null ? null : gravestRank(review.findings);
  return (
    <button type="button" className={styles.open} onClick={() => dispatch({ kind: "regression opened", index })}>
      <span className={styles.mark}>{review !== null && <RankMark rank={rank} />}</span>
      <span>
        <span className={styles.title}>{titleOf(claim)}</span>
        <span className={styles.line}>
          {review === null ? "Not reviewed yet" : rank === null ? "Nothing found" : capitalised(rank)}
        </span>
        <span className={styles.quiet}>
          {claim.place}, {originInWords(claim)}
        </span>
      </span>
    </button>
  );
}
