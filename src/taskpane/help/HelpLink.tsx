import { Link, makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { useType } from "../look/type.ts";
import { type Concept, helpPages } from "./concepts.ts";
import { useHelp } from "./helpContext.ts";

const useStyles = makeStyles({
  link: {
    display: "inline-flex",
    alignItems: "center",
    minHeight: "24px",
    fontSize: tokens.fontSizeBase200,
    fontWeight: tokens.fontWeightRegular,
    textAlign: "left",
    "@media (forced-colors: active)": { color: "LinkText" },
  },
});

export interface HelpLinkProps {
  readonly about: Concept;
  /** What the link asks, where one page has several ways in. */
  readonly asks?: string;
}

/** "What is this?", where the question arises. */
export function HelpLink({ about, asks = "What is this?" }: HelpLinkProps): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { show } = useHelp();
  return (
    <Link as="button" className={styles.link} onClick={({ currentTarget }) => show(about, currentTarget)}>
      {asks}
      <span className={type.hidden}> Help: {helpPages[about].title}</span>
    </Link>
  );
}
