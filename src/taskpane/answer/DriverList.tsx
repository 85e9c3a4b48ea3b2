import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Answer, DriverAnswer } from "../../core/answer/answer.ts";
import { Disclosure } from "../parts/Disclosure.tsx";
import { DriverBlock } from "./DriverBlock.tsx";

const useStyles = makeStyles({
  list: {
    display: "grid",
    gridTemplateColumns: "minmax(0, 1fr)",
    rowGap: tokens.spacingVerticalL,
    margin: 0,
    padding: 0,
    listStyleType: "none",
  },
});

/** One block a term; the season stands behind a click, and the constant comes last, as it is seldom what was asked. */
export function DriverList({ answer }: { readonly answer: Answer }): ReactNode {
  const styles = useStyles();
  const order = answer.terms.map((_, index) => index);
  const kindOf = (index: number): DriverAnswer["kind"] | undefined => answer.drivers[index]?.kind;
  const of = (kind: DriverAnswer["kind"]): number[] => order.filter((index) => kindOf(index) === kind);
  const [season, constant] = [of("season"), of("constant")];
  return (
    <ul className={styles.list}>
      <Blocks answer={answer} places={order.filter((index) => ![...season, ...constant].includes(index))} />
      {season.length > 0 && (
        <li>
          <Disclosure label={`The season: ${season.length} terms`}>
            <ul className={styles.list}>
              <Blocks answer={answer} places={season} />
            </ul>
          </Disclosure>
        </li>
      )}
      <Blocks answer={answer} places={constant} />
    </ul>
  );
}

const Blocks = ({ answer, places }: { readonly answer: Answer; readonly places: readonly number[] }): ReactNode =>
  places.map((index) => (
    <li key={answer.terms[index]}>
      <DriverBlock answer={answer} index={index} />
    </li>
  ));
