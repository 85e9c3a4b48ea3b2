import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Answer } from "../../core/answer/answer.ts";
import { lawInWords, readingOf } from "../../core/answer/tables.ts";
import { pValueInWords } from "../../core/answer/wording.ts";
import type { Figure, TestOutcome } from "../../core/diagnostics/outcome.ts";
import { testWords } from "../../core/diagnostics/words.ts";
import { useType } from "../look/type.ts";

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
  figures: {
    margin: `0 0 ${tokens.spacingVerticalXS}`,
    fontSize: tokens.fontSizeBase200,
    lineHeight: "18px",
    fontVariantNumeric: "tabular-nums",
  },
  reading: { margin: `0 0 ${tokens.spacingVerticalXS}`, fontSize: tokens.fontSizeBase300, lineHeight: "19px" },
});

/** Every test: its question, its figures, what they mean here, where it comes from. Those that decided come first. */
export function TestList({ answer }: { readonly answer: Answer }): ReactNode {
  const styles = useStyles();
  const decided = (outcome: TestOutcome): boolean =>
    answer.decision.restsOn.some(
      (entry) => entry.outcome.test === outcome.test && entry.outcome.order === outcome.order,
    );
  const sorted = [...answer.tests.filter(decided), ...answer.tests.filter((outcome) => !decided(outcome))];
  return (
    <ul className={styles.list}>
      {sorted.map((outcome) => (
        <li key={`${outcome.test} ${outcome.order ?? ""}`} className={styles.test}>
          <Test outcome={outcome} answer={answer} decided={decided(outcome)} />
        </li>
      ))}
    </ul>
  );
}

interface TestProps {
  readonly outcome: TestOutcome;
  readonly answer: Answer;
  readonly decided: boolean;
}

function Test({ outcome, answer, decided }: TestProps): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { title, question, source } = testWords[outcome.test];
  return (
    <>
      <h2 className={styles.question}>{question}</h2>
      {outcome.kind === "computed" ? (
        <>
          <p className={styles.reading}>{readingOf(outcome, answer)}</p>
          <p className={styles.figures}>
            {figureInWords(outcome.figure, answer)}
            {outcome.fForm !== null && (
              <>
                <br />
                {figureInWords(outcome.fForm, answer)}
              </>
            )}
          </p>
        </>
      ) : (
        <p className={styles.reading}>Does not apply: {outcome.because}</p>
      )}
      <p className={type.remark}>
        {title}
        {outcome.order !== null && `, order ${outcome.order}`}
        {outcome.kind === "computed" && outcome.form !== null && `, ${outcome.form}`}. {source}.
        {decided && " This test decided."}
      </p>
    </>
  );
}

const statistic = new Intl.NumberFormat("en-US", { maximumSignificantDigits: 5 });

/** "8.412 against chi-square(3), p = 0.038". */
const figureInWords = (figure: Figure, { decision }: Answer): string =>
  `${statistic.format(figure.statistic)} against ${lawInWords(figure)}, ${pValueInWords(figure.pValue, decision.testLevel)}`;
