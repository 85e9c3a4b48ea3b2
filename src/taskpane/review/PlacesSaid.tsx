import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { CellLink } from "../parts/CellLink.tsx";

export interface PlaceSaid {
  readonly address: string;
  /** What is said of the cells. */
  readonly words: string;
}

const useStyles = makeStyles({
  list: { margin: `0 0 ${tokens.spacingVerticalS}`, padding: 0, listStyleType: "none" },
  item: {
    display: "flex",
    flexWrap: "wrap",
    columnGap: tokens.spacingHorizontalS,
    alignItems: "baseline",
    fontSize: tokens.fontSizeBase200,
    lineHeight: "18px",
  },
  words: { overflowWrap: "anywhere", color: tokens.colorNeutralForeground3 },
});

/** Cells of any sheet that jump, each with what is said of it. */
export function PlacesSaid({ places }: { readonly places: readonly PlaceSaid[] }): ReactNode {
  const styles = useStyles();
  return (
    <ul className={styles.list}>
      {places.map(({ address, words }, index) => (
        <li key={index} className={styles.item}>
          <CellLink address={address} />
          <span className={styles.words}>{words}</span>
        </li>
      ))}
    </ul>
  );
}
