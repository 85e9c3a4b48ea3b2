import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Answer } from "../../core/answer/answer.ts";
import { findingInWords } from "../../core/answer/findings.ts";
import { HelpLink } from "../help/HelpLink.tsx";
import { useType } from "../look/type.ts";
import { keepTogether } from "../parts/keepTogether.ts";
import { FourCases } from "../pictures/FourCases.tsx";

const useStyles = makeStyles({
  reasons: {
    display: "grid",
    gridTemplateColumns: "auto 1fr",
    columnGap: tokens.spacingHorizontalM,
    margin: `${tokens.spacingVerticalXS} 0 ${tokens.spacingVerticalS}`,
    fontSize: tokens.fontSizeBase200,
    lineHeight: "18px",
  },
  question: { color: tokens.colorNeutralForeground3 },
  finding: { margin: 0, fontVariantNumeric: "tabular-nums" },
  cautions: { margin: 0, padding: 0, listStyleType: "none" },
});

/** Why these standard errors: the sentence, the four cases, and the two p-values that put the answer there. */
export function WhichErrors({ answer }: { readonly answer: Answer }): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { decision, verdict } = answer;
  return (
    <>
      <p className={type.body}>{verdict[1]}</p>
      <FourCases decision={decision} />
      <dl className={styles.reasons}>
        <dt className={styles.question}>Spread</dt>
        <dd className={styles.finding}>{keepTogether(findingInWords(decision, "spread"))}</dd>
        <dt className={styles.question}>Follow-on</dt>
        <dd className={styles.finding}>{keepTogether(findingInWords(decision, "follow-on"))}</dd>
      </dl>
      <ul className={styles.cautions}>
        {decision.cautions.map((caution) => (
          <li key={caution} className={type.remark}>
            {keepTogether(caution)}
          </li>
        ))}
      </ul>
      <HelpLink about="what tests miss" asks="What can the tests miss?" />
    </>
  );
}
