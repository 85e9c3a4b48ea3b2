import { makeStyles, mergeClasses, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Answer } from "../../core/answer/answer.ts";
import { lawInWords } from "../../core/answer/tables.ts";
import { pValueInWords } from "../../core/answer/wording.ts";
import type { Figure, TestOutcome } from "../../core/diagnostics/outcome.ts";
import { testWords } from "../../core/diagnostics/words.ts";
import { keepTogether } from "../parts/keepTogether.ts";
import { pFigure } from "../parts/pFigure.ts";
import type { TestGroup } from "./testGroups.ts";

const useStyles = makeStyles({
  figures: {
    margin: `0 0 ${tokens.spacingVerticalXS}`,
    fontSize: tokens.fontSizeBase200,
    lineHeight: "18px",
    fontVariantNumeric: "tabular-nums",
  },
  table: { borderCollapse: "collapse", width: "100%" },
  head: { fontWeight: tokens.fontWeightRegular, textAlign: "right", color: tokens.colorNeutralForeground3 },
  cell: {
    textAlign: "right",
    whiteSpace: "nowrap",
    borderTop: `1px solid ${tokens.colorNeutralStroke2}`,
    padding: "2px 0",
  },
  wide: { textAlign: "left", borderTop: `1px solid ${tokens.colorNeutralStroke2}`, padding: "2px 0 2px 12px" },
  side: { textAlign: "left", fontWeight: tokens.fontWeightRegular },
  main: { fontWeight: tokens.fontWeightSemibold },
});

interface TestFiguresProps {
  readonly group: TestGroup;
  readonly answer: Answer;
}

/** Statistic, the law it is held against, p-value: two lines for one outcome, a table where there are several orders. */
export function TestFigures({ group, answer }: TestFiguresProps): ReactNode {
  const styles = useStyles();
  if (group.outcomes.length > 1) return <OrderTable group={group} answer={answer} />;
  const { main } = group;
  if (main.kind !== "computed") return null;
  return (
    <p className={styles.figures}>
      {keepTogether(figureInWords(main.figure, answer))}
      {main.fForm !== null && (
        <>
          <br />
          {keepTogether(figureInWords(main.fForm, answer))}
        </>
      )}
    </p>
  );
}

const statistic = new Intl.NumberFormat("en-US", { minimumSignificantDigits: 4, maximumSignificantDigits: 4 });

/** "8.412 against chi-square(3), p = 0.038". */
const figureInWords = (figure: Figure, answer: Answer): string =>
  `${statistic.format(figure.statistic)} against ${lawPhrase(figure)}, ${pInWords(figure, answer)}`;

const lawPhrase = (figure: Figure): string =>
  figure.law === "exact" || figure.law === "limit" ? `its ${figure.law} distribution` : lawInWords(figure);

const pInWords = ({ pValue }: Figure, { decision }: Answer): string => pValueInWords(pValue, decision.testLevel);

/** One line an order; the one that decided in bold. */
function OrderTable({ group, answer }: TestFiguresProps): ReactNode {
  const styles = useStyles();
  const hasF = group.outcomes.some((outcome) => outcome.kind === "computed" && outcome.fForm !== null);
  const heads = ["statistic", "p-value", ...(hasF ? ["F form", "p-value"] : [])];
  return (
    <table
      className={mergeClasses(styles.figures, styles.table)}
      aria-label={`${testWords[group.test].title} by order`}
    >
      <thead>
        <tr>
          <th scope="col" className={mergeClasses(styles.head, styles.side)}>
            order
          </th>
          {heads.map((head, index) => (
            <th key={index} scope="col" className={styles.head}>
              {head}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {group.outcomes.map((outcome) => (
          <tr key={outcome.order} className={mergeClasses(outcome === group.main && group.decided && styles.main)}>
            <th scope="row" className={mergeClasses(styles.cell, styles.side)}>
              {outcome.order}
            </th>
            <Figures outcome={outcome} answer={answer} columns={heads.length} />
          </tr>
        ))}
      </tbody>
    </table>
  );
}

interface FiguresProps {
  readonly outcome: TestOutcome;
  readonly answer: Answer;
  readonly columns: number;
}

function Figures({ outcome, answer, columns }: FiguresProps): ReactNode {
  const styles = useStyles();
  if (outcome.kind !== "computed") {
    return (
      <td colSpan={columns} className={styles.wide}>
        {outcome.because}
      </td>
    );
  }
  const bare = ({ pValue }: Figure): string => pFigure(pValue, answer.decision.testLevel);
  const { figure, fForm } = outcome;
  const cells = [statistic.format(figure.statistic), bare(figure)];
  const fCells = fForm === null ? ["", ""] : [statistic.format(fForm.statistic), bare(fForm)];
  return [...cells, ...fCells].slice(0, columns).map((words, index) => (
    <td key={index} className={styles.cell}>
      {words}
    </td>
  ));
}
