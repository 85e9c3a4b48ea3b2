import { makeStyles, mergeClasses, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Answer } from "../../core/answer/answer.ts";
import { numberInWords } from "../../core/answer/wording.ts";
import { useType } from "../look/type.ts";
import { type KindFigures, kindFigures, lawsInWords, standardErrorInWords, writerFor } from "./driverFigures.ts";
import { pFigure } from "../parts/pFigure.ts";

const useStyles = makeStyles({
  table: {
    width: "100%",
    borderCollapse: "collapse",
    fontSize: tokens.fontSizeBase200,
    fontVariantNumeric: "tabular-nums",
    marginBottom: tokens.spacingVerticalXS,
  },
  head: {
    fontWeight: tokens.fontWeightRegular,
    textAlign: "right",
    padding: "4px 0 4px 4px",
    color: tokens.colorNeutralForeground3,
    verticalAlign: "bottom",
  },
  side: {
    fontWeight: tokens.fontWeightRegular,
    textAlign: "left",
    padding: "3px 2px 3px 0",
    whiteSpace: "nowrap",
    verticalAlign: "top",
    color: tokens.colorNeutralForeground3,
    borderTop: `1px solid ${tokens.colorNeutralStroke2}`,
  },
  cell: { textAlign: "right", padding: "3px 0 3px 4px", borderTop: `1px solid ${tokens.colorNeutralStroke2}` },
  inForce: { color: tokens.colorNeutralForeground1, fontWeight: tokens.fontWeightSemibold },
});

type Line = readonly [label: string, figure: (figures: KindFigures) => string];

/** The figures of one term under every kind side by side, the kind in force in bold and in words. */
export function DriverTable({ answer, index }: { readonly answer: Answer; readonly index: number }): ReactNode {
  const styles = useStyles();
  const type = useType();
  const kinds = kindFigures(answer, index);
  return (
    <>
      <table className={styles.table} aria-label={`Figures of ${answer.terms[index] ?? ""}`}>
        <thead>
          <tr>
            <td />
            {kinds.map(({ label, inForce }) => (
              <th key={label} scope="col" className={mergeClasses(styles.head, inForce && styles.inForce)}>
                {label}
                {inForce && "\u00a0●"}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {linesFor(answer, index).map(([label, figure]) => (
            <tr key={label}>
              <th scope="row" className={styles.side}>
                {label}
              </th>
              {kinds.map((figures) => (
                <td key={figures.label} className={mergeClasses(styles.cell, figures.inForce && styles.inForce)}>
                  {figure(figures)}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
      <p className={type.remark}>{lawsInWords(kinds)}</p>
    </>
  );
}

const ratioDecimals = 2;

function linesFor(answer: Answer, index: number): readonly Line[] {
  const write = writerFor(answer.drivers[index]!);
  const bare = (pValue: number): string => pFigure(pValue, answer.options.level);
  return [
    ["standard error", ({ standardError }) => standardErrorInWords(standardError)],
    ["ratio", ({ ratio }) => numberInWords(ratio, ratioDecimals).replace("-", "−")],
    ["p-value", ({ pValue }) => bare(pValue)],
    ["by the normal", ({ pValueNormal }) => bare(pValueNormal)],
    ["from", ({ low }) => write(low)],
    ["to", ({ high }) => write(high)],
  ];
}
