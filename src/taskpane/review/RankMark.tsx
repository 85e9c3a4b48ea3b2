import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Rank } from "../../core/review/finding.ts";

const useStyles = makeStyles({
  mark: { display: "inline-flex", flexShrink: 0, color: tokens.colorNeutralForeground1 },
  grave: {
    color: tokens.colorStatusDangerForeground1,
    "@media (forced-colors: active)": { color: "CanvasText" },
  },
});

const shapes: Readonly<Record<Rank, ReactNode>> = {
  "changes the conclusion": <path d="M6 1 11.5 11H.5Z" fill="currentColor" />,
  "changes a number": <path d="M6 2 10.5 10.5h-9Z" fill="none" stroke="currentColor" strokeWidth="1.3" />,
  "worth knowing": <circle cx="6" cy="6" r="2" fill="currentColor" />,
};

/** How much a finding matters, as a shape; words beside it say the same. Nothing found is a tick. */
export function RankMark({ rank }: { readonly rank: Rank | null }): ReactNode {
  const styles = useStyles();
  const isGrave = rank === "changes the conclusion";
  return (
    <span className={isGrave ? styles.grave : styles.mark} aria-hidden="true">
      <svg width="12" height="12" viewBox="0 0 12 12">
        {rank === null ? (
          <path d="M2 6.5 5 9.5 10 3" fill="none" stroke="currentColor" strokeWidth="1.5" />
        ) : (
          shapes[rank]
        )}
      </svg>
    </span>
  );
}
