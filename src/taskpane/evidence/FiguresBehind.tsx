import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { useType } from "../look/type.ts";
import { CellLink } from "../parts/CellLink.tsx";
import { Disclosure } from "../parts/Disclosure.tsx";

export interface FiguresBehindProps {
  /** The picture they stand behind: "residuals over fitted values". */
  readonly picture: string;
  readonly headings: readonly string[];
  readonly lines: readonly FigureLine[];
}

export interface FigureLine {
  /** What the line is of: a lag, a rank, or a row that can be jumped to. */
  readonly name: string;
  readonly cells: string | null;
  readonly figures: readonly number[];
}

const useStyles = makeStyles({
  frame: { maxHeight: "260px", overflowY: "auto" },
  table: {
    width: "100%",
    borderCollapse: "collapse",
    fontSize: tokens.fontSizeBase200,
    fontVariantNumeric: "tabular-nums",
  },
  head: {
    position: "sticky",
    top: 0,
    padding: "2px 0",
    backgroundColor: tokens.colorNeutralBackground1,
    color: tokens.colorNeutralForeground3,
    fontWeight: tokens.fontWeightRegular,
    textAlign: "right",
    ":first-child": { textAlign: "left" },
  },
  name: {
    padding: "2px 0",
    fontWeight: tokens.fontWeightRegular,
    textAlign: "left",
    borderTop: `1px solid ${tokens.colorNeutralStroke2}`,
  },
  figure: { padding: "2px 0", textAlign: "right", borderTop: `1px solid ${tokens.colorNeutralStroke2}` },
});

const mostLines = 200;
const brief = new Intl.NumberFormat("en-US", { maximumSignificantDigits: 4 });

/** The numbers that a picture is drawn from. */
export const FiguresBehind = (props: FiguresBehindProps): ReactNode => {
  const type = useType();
  return (
    <Disclosure
      label={
        <>
          Figures behind it<span className={type.hidden}> (the picture of {props.picture})</span>
        </>
      }
    >
      <FigureTable {...props} />
    </Disclosure>
  );
};

function FigureTable({ picture, headings, lines }: FiguresBehindProps): ReactNode {
  const styles = useStyles();
  const type = useType();
  const rest = lines.length - mostLines;
  return (
    <>
      <div className={styles.frame} tabIndex={0} role="region" aria-label={`Figures behind the picture of ${picture}`}>
        <table className={styles.table}>
          <thead>
            <tr>
              {headings.map((heading) => (
                <th key={heading} scope="col" className={styles.head}>
                  {heading}
                </th>
              ))}
            </tr>
          </thead>
          <tbody>
            {lines.slice(0, mostLines).map(({ name, cells, figures }) => (
              <tr key={name}>
                <th scope="row" className={styles.name}>
                  {cells === null ? name : <CellLink address={cells}>{name}</CellLink>}
                </th>
                {figures.map((figure, index) => (
                  <td key={index} className={styles.figure}>
                    {brief.format(figure).replace("-", "−")}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
      {rest > 0 && (
        <p className={type.remark}>And {rest.toLocaleString("en-US")} more; the result sheet holds them all.</p>
      )}
    </>
  );
}
