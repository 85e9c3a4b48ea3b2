import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Answer } from "../../core/answer/answer.ts";
import type { TestOutcome } from "../../core/diagnostics/outcome.ts";
import { testWords } from "../../core/diagnostics/words.ts";
import { useType } from "../look/type.ts";
import { TestFigures } from "./TestFigures.tsx";
import { type TestGroup, readingOfGroup } from "./testGroups.ts";

const useStyles = makeStyles({
  list: { margin: 0, padding: 0, listStyleType: "none" },
  test: {
    padding: `${tokens.spacingVerticalM} 0`,
    ":not(:first-child)": { borderTop: `1px solid ${tokens.colorNeutralStroke2}` },
  },
  question: {
    margin: `0 0 ${tokens.spacingVerticalXS}`,
    fontSize: tokens.fontSizeBase300,
    lineHeight: "19px",
    fontWeight: tokens.fontWeightSemibold,
  },
  reading: { margin: `0 0 ${tokens.spacingVerticalXS}`, fontSize: tokens.fontSizeBase300, lineHeight: "19px" },
});

interface TestListProps {
  readonly groups: readonly TestGroup[];
  readonly answer: Answer;
}

/** Tests, each with its question, what it means here, its figures, where it comes from. */
export function TestList({ groups, answer }: TestListProps): ReactNode {
  const styles = useStyles();
  return (
    <ul className={styles.list}>
      {groups.map((group) => (
        <li key={group.test} className={styles.test}>
          <Test group={group} answer={answer} />
        </li>
      ))}
    </ul>
  );
}

function Test({ group, answer }: { readonly group: TestGroup; readonly answer: Answer }): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { title, question, source } = testWords[group.test];
  return (
    <>
      <h3 className={styles.question}>{question}</h3>
      <p className={styles.reading}>{readingOfGroup(group, answer)}</p>
      <TestFigures group={group} answer={answer} />
      <p className={type.remark}>
        {title}
        {formOf(group.main)}. {source}.{group.decided && ` It decided${orderOf(group.main)}.`}
      </p>
    </>
  );
}

const formOf = (outcome: TestOutcome): string =>
  outcome.kind === "computed" && outcome.form !== null ? `, ${outcome.form}` : "";

const orderOf = ({ order }: TestOutcome): string => (order === null ? "" : `, at order ${order}`);
