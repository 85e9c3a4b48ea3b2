import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Guards, PlacedRow } from "../../core/answer/guards.ts";
import type { Guard } from "../../core/diagnostics/guards/guard.ts";
import { useType } from "../look/type.ts";
import { CellList } from "../parts/CellList.tsx";
import { guardNames } from "./guardNames.ts";

const useStyles = makeStyles({
  list: { display: "grid", rowGap: tokens.spacingVerticalS, margin: 0, padding: 0, listStyleType: "none" },
  name: { margin: 0, fontSize: tokens.fontSizeBase300, lineHeight: "19px", fontWeight: tokens.fontWeightSemibold },
  finding: { fontWeight: tokens.fontWeightRegular, color: tokens.colorNeutralForeground3 },
});

const mostRows = 5;

/** What to know beside the tests, those to look into first; then the rows that weigh most. */
export function GuardList({ guards }: { readonly guards: Guards }): ReactNode {
  const styles = useStyles();
  const type = useType();
  return (
    <>
      <ul className={styles.list}>
        {sorted(guards.found).map(({ guard, finding, sentences }) => (
          <li key={guard}>
            <h3 className={styles.name}>
              {guardNames[guard]} <span className={styles.finding}>{finding}</span>
            </h3>
            {sentences.map((sentence) => (
              <p key={sentence} className={type.remark}>
                {sentence}
              </p>
            ))}
          </li>
        ))}
      </ul>
      {guards.rows.length > 0 && (
        <>
          <h3 className={type.subhead}>Rows that weigh most</h3>
          <CellList items={guards.rows.slice(0, mostRows).map(rowItem)} more={0} />
          <p className={type.remark}>
            Cook's distance: how far all fitted values would move without the row. As a rule of thumb look at rows above
            1, and at one far above the rest. Outside residual: how far the row lies from a fit made without it, in
            standard deviations.
          </p>
        </>
      )}
    </>
  );
}

const urgency: Readonly<Record<Guard["finding"], number>> = {
  "look into it": 0,
  "worth knowing": 1,
  "nothing found": 2,
};

const sorted = (found: readonly Guard[]): readonly Guard[] =>
  found.toSorted((one, other) => urgency[one.finding] - urgency[other.finding]);

const brief = new Intl.NumberFormat("en-US", { maximumSignificantDigits: 2 });

const rowItem = ({ row, cell, cook, outside }: PlacedRow) => ({
  address: cell,
  words: `row ${row}: Cook's distance ${brief.format(cook)}, outside residual ${brief.format(outside).replace("-", "−")}`,
});
