import { Button, Link, makeStyles, mergeClasses, tokens } from "@fluentui/react-components";
import { type KeyboardEvent, type ReactNode, useEffect, useRef } from "react";
import { useType } from "../look/type.ts";
import { keepTogether } from "../parts/keepTogether.ts";
import { SectionTitle } from "../parts/SectionTitle.tsx";
import { type Concept, concepts, helpPages } from "./concepts.ts";
import { useHelp } from "./helpContext.ts";
import type { HelpPart } from "./helpPage.ts";

const useStyles = makeStyles({
  back: { marginBottom: tokens.spacingVerticalM },
  text: { lineHeight: "20px", textWrap: "pretty" },
  terms: { margin: `0 0 ${tokens.spacingVerticalM}` },
  term: { fontWeight: tokens.fontWeightSemibold, fontSize: tokens.fontSizeBase300, lineHeight: "20px" },
  meaning: {
    margin: `0 0 ${tokens.spacingVerticalS}`,
    paddingLeft: tokens.spacingHorizontalM,
    borderLeft: `2px solid ${tokens.colorNeutralStroke2}`,
    fontSize: tokens.fontSizeBase300,
  },
  others: { margin: 0, padding: 0, listStyleType: "none" },
  other: {
    display: "inline-flex",
    alignItems: "center",
    minHeight: "28px",
    textAlign: "left",
    "@media (forced-colors: active)": { color: "LinkText" },
  },
});

interface HelpArticleProps {
  readonly about: Concept;
  /** The name of the section that one came from. */
  readonly backTo: string;
}

/** One page of help, with the way back and the other pages. */
export function HelpArticle({ about, backTo }: HelpArticleProps): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { back, show } = useHelp();
  const article = useRef<HTMLElement>(null);
  const { title, parts } = helpPages[about];
  useEffect(() => {
    const heading = article.current?.querySelector<HTMLElement>("h1");
    article.current?.scrollIntoView({ block: "start" });
    heading?.focus({ preventScroll: true });
  }, [about]);
  const leave = ({ key }: KeyboardEvent): void => {
    if (key === "Escape") back();
  };
  return (
    <article ref={article} aria-label={`Help: ${title}`} onKeyDown={leave}>
      <Button size="small" className={styles.back} onClick={back}>
        Back to {backTo}
      </Button>
      <SectionTitle>{title}</SectionTitle>
      {parts.map((part, index) => (
        <Part key={index} part={part} />
      ))}
      <h2 className={type.head}>More help</h2>
      <ul className={styles.others}>
        {concepts
          .filter((concept) => concept !== about)
          .map((concept) => (
            <li key={concept}>
              <Link as="button" className={styles.other} onClick={() => show(concept, null)}>
                {helpPages[concept].title}
              </Link>
            </li>
          ))}
      </ul>
    </article>
  );
}

function Part({ part }: { readonly part: HelpPart }): ReactNode {
  const styles = useStyles();
  const type = useType();
  if (typeof part === "string") return <p className={mergeClasses(type.body, styles.text)}>{keepTogether(part)}</p>;
  return (
    <dl className={styles.terms}>
      {part.terms.map(([term, meaning]) => (
        <div key={term}>
          <dt className={styles.term}>{term}</dt>
          <dd className={mergeClasses(styles.text, styles.meaning)}>{keepTogether(meaning)}</dd>
        </div>
      ))}
    </dl>
  );
}
