import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { CellLink } from "./CellLink.tsx";

export interface CellListItem {
  readonly address: string;
  /** What is said of the cell. */
  readonly words: string;
}

const useStyles = makeStyles({
  list: {
    margin: `0 0 ${tokens.spacingVerticalS}`,
    padding: 0,
    listStyleType: "none",
    fontSize: tokens.fontSizeBase200,
  },
  item: { display: "flex", columnGap: tokens.spacingHorizontalS, alignItems: "baseline", lineHeight: "18px" },
  words: { overflowWrap: "anywhere", color: tokens.colorNeutralForeground3 },
});

/** Cells that jump, each with what is said of it, and how many more there are. */
export function CellList({
  items,
  more,
}: {
  readonly items: readonly CellListItem[];
  readonly more: number;
}): ReactNode {
  const styles = useStyles();
  return (
    <ul className={styles.list}>
      {items.map(({ address, words }) => (
        <li key={`${address} ${words}`} className={styles.item}>
          <CellLink address={address}>{localPart(address)}</CellLink>
          <span className={styles.words}>{words}</span>
        </li>
      ))}
      {more > 0 && <li className={styles.item}>and {more} more</li>}
    </ul>
  );
}

/** "C14" of "Months!C14": the sheet is the one that the data stand on. */
const localPart = (address: string): string => address.slice(address.lastIndexOf("!") + 1);
