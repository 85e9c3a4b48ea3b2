import { makeStyles, mergeClasses, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { useType } from "../look/type.ts";
import { HelpLink, type HelpLinkProps } from "./HelpLink.tsx";

const useStyles = makeStyles({
  line: {
    display: "flex",
    justifyContent: "space-between",
    alignItems: "baseline",
    columnGap: tokens.spacingHorizontalM,
  },
  head: { margin: 0, fontSize: "inherit", fontWeight: "inherit", lineHeight: "24px" },
});

/** The small head over a group, and at its right the way to what it is about. */
export function HelpHead({ children, ...link }: HelpLinkProps & { readonly children: ReactNode }): ReactNode {
  const styles = useStyles();
  const type = useType();
  return (
    <div className={mergeClasses(type.head, styles.line)}>
      <h2 className={styles.head}>{children}</h2>
      <HelpLink {...link} />
    </div>
  );
}
