import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Consequence } from "../../core/review/claimReview.ts";
import { keepTogether } from "../parts/keepTogether.ts";

const useStyles = makeStyles({
  list: { margin: 0 },
  driver: {
    fontSize: tokens.fontSizeBase300,
    lineHeight: "19px",
    fontWeight: tokens.fontWeightSemibold,
    overflowWrap: "anywhere",
  },
  said: {
    margin: `0 0 ${tokens.spacingVerticalS}`,
    fontSize: tokens.fontSizeBase200,
    lineHeight: "18px",
    overflowWrap: "anywhere",
  },
  quiet: { color: tokens.colorNeutralForeground3 },
});

/** What each driver was taken to say, what the data say, and whether that is another conclusion. */
export function ConsequenceList({ consequences }: { readonly consequences: readonly Consequence[] }): ReactNode {
  const styles = useStyles();
  return (
    <dl className={styles.list}>
      {consequences.map(({ driver, asReported, asItShouldBe, changes }) => (
        <div key={driver}>
          <dt className={styles.driver}>{driver}</dt>
          <dd className={styles.said}>
            <span className={styles.quiet}>As reported:</span> {keepTogether(asReported)}
            <br />
            <span className={styles.quiet}>As it should be:</span> {keepTogether(asItShouldBe)}
            {changes && (
              <>
                <br />
                The conclusion changes.
              </>
            )}
          </dd>
        </div>
      ))}
    </dl>
  );
}
