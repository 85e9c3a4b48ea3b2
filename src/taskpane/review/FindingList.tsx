import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { capitalised } from "../../core/answer/wording.ts";
import type { Finding } from "../../core/review/finding.ts";
import { gravestFirst } from "../../core/review/reviewWords.ts";
import { useType } from "../look/type.ts";
import { CellLink } from "../parts/CellLink.tsx";
import { keepTogether } from "../parts/keepTogether.ts";
import { RankMark } from "./RankMark.tsx";

const useStyles = makeStyles({
  list: { margin: 0, padding: 0, listStyleType: "none" },
  item: {
    display: "grid",
    gridTemplateColumns: "16px minmax(0, 1fr)",
    columnGap: tokens.spacingHorizontalXS,
    padding: `${tokens.spacingVerticalS} 0`,
    ":not(:first-child)": { borderTop: `1px solid ${tokens.colorNeutralStroke2}` },
  },
  mark: { paddingTop: "2px" },
  rank: { margin: 0, fontSize: tokens.fontSizeBase200, lineHeight: "18px", fontWeight: tokens.fontWeightSemibold },
  cells: {
    display: "flex",
    flexWrap: "wrap",
    columnGap: tokens.spacingHorizontalM,
    fontSize: tokens.fontSizeBase200,
  },
  figures: { fontVariantNumeric: "tabular-nums" },
});

/** Findings, the gravest first: what, the figures, what to do, and the cells to jump to. */
export function FindingList({ findings }: { readonly findings: readonly Finding[] }): ReactNode {
  const styles = useStyles();
  return (
    <ul className={styles.list}>
      {gravestFirst(findings).map((finding, index) => (
        <li key={index} className={styles.item}>
          <span className={styles.mark}>
            <RankMark rank={finding.rank} />
          </span>
          <FindingWords finding={finding} />
        </li>
      ))}
    </ul>
  );
}

function FindingWords({ finding }: { readonly finding: Finding }): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { rank, what, toDo, reported, recomputed, cells } = finding;
  return (
    <div>
      <h3 className={styles.rank}>{capitalised(rank)}</h3>
      <p className={type.body}>{keepTogether(what)}</p>
      {(reported !== null || recomputed !== null) && (
        <p className={`${type.remark} ${styles.figures}`}>
          Reported {reported ?? "nothing"}, recomputed {recomputed ?? "nothing"}.
        </p>
      )}
      <p className={type.remark}>{keepTogether(toDo)}</p>
      {cells.length > 0 && (
        <div className={styles.cells}>
          {cells.map((cell) => (
            <CellLink key={cell} address={cell} />
          ))}
        </div>
      )}
    </div>
  );
}
