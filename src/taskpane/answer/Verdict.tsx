import { makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Answer, DriverAnswer } from "../../core/answer/answer.ts";
import { scopeInWords } from "../../core/answer/verdict.ts";
import { capitalised } from "../../core/answer/wording.ts";
import { HelpLink } from "../help/HelpLink.tsx";
import { useType } from "../look/type.ts";
import { Disclosure } from "../parts/Disclosure.tsx";
import { keepTogether } from "../parts/keepTogether.ts";
import { GuardsFound } from "./GuardsFound.tsx";
import { FirmnessMark } from "./FirmnessMark.tsx";

const useStyles = makeStyles({
  list: { margin: 0, padding: 0, listStyleType: "none" },
  item: { display: "grid", gridTemplateColumns: "16px 1fr", columnGap: tokens.spacingHorizontalS },
  mark: { paddingTop: "7px" },
});

/**
 * The sentences a reader takes along: one a driver, then how much the drivers account for; the title has named them.
 * The months or quarters of a season would bury the others, and stand behind a click.
 */
export function Verdict({ answer }: { readonly answer: Answer }): ReactNode {
  const type = useType();
  const isSeason = ({ kind }: DriverAnswer): boolean => kind === "season";
  const season = answer.drivers.filter(isSeason);
  return (
    <section aria-label="Verdict">
      <Sentences drivers={answer.drivers.filter((driver) => !isSeason(driver))} />
      {season.length > 0 && (
        <Disclosure label={`The season, in ${season.length} sentences`}>
          <Sentences drivers={season} />
        </Disclosure>
      )}
      <p className={type.body}>{keepTogether(capitalised(scopeInWords(answer)))}</p>
      <GuardsFound answer={answer} />
      <HelpLink about="firm" asks="What does firm mean?" />
    </section>
  );
}

function Sentences({ drivers }: { readonly drivers: readonly DriverAnswer[] }): ReactNode {
  const styles = useStyles();
  const type = useType();
  return (
    <ul className={styles.list}>
      {drivers.map(
        ({ term, sentence, firmness }) =>
          sentence !== null && (
            <li key={term} className={styles.item}>
              <FirmnessMark firmness={firmness} className={styles.mark} />
              <p className={type.verdict}>{keepTogether(sentence)}</p>
            </li>
          ),
      )}
    </ul>
  );
}
