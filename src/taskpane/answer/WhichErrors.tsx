import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Answer } from "../../core/answer/answer.ts";
import { findingInWords } from "../../core/answer/findings.ts";
import type { Decision } from "../../core/decision/decision.ts";
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

/** Whether the tests were asked at all: where rows are in groups, or under a policy that does not ask them, they are not. */
const isAsked = ({ fourCase }: Decision): boolean =>
  fourCase.spread !== "not asked" || fourCase.followOn !== "not asked";

const notAsked = ({ rows }: Answer): string =>
  rows.kind === "groups"
    ? "Rows in groups fall into none of the four cases: what the tests say of spread stands under Evidence, and does not choose."
    : "The four cases are not asked: what the tests say stands under Evidence, and does not choose.";

/** The four cases, and the p-values that put the answer into one. */
function Cases({ decision }: { readonly decision: Decision }): ReactNode {
  const styles = useStyles();
  return (
    <>
      <FourCases decision={decision} />
      <dl className={styles.reasons}>
        <dt className={styles.question}>Spread</dt>
        <dd className={styles.finding}>{keepTogether(findingInWords(decision, "spread"))}</dd>
        <dt className={styles.question}>Follow-on</dt>
        <dd className={styles.finding}>{keepTogether(findingInWords(decision, "follow-on"))}</dd>
      </dl>
    </>
  );
}

/** Why these standard errors: the sentence, the four cases, and the two p-values that put the answer there. */
export function WhichErrors({ answer }: { readonly answer: Answer }): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { decision, verdict } = answer;
  return (
    <>
      <p className={type.body}>{verdict[1]}</p>
      {isAsked(decision) ? <Cases decision={decision} /> : <p className={type.remark}>{notAsked(answer)}</p>}
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
