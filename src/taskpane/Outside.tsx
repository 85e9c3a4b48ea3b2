import { FluentProvider, makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { messageOf } from "../core/problem/messages.ts";
import { usePage } from "./look/page.ts";
import { themeFor } from "./look/theme.ts";
import { useType } from "./look/type.ts";
import { type HostIsDark, useDark } from "./look/useDark.ts";

/** Why there is no spreadsheet to work on. */
export type WhyOutside =
  { readonly kind: "waiting" } | { readonly kind: "no host" } | { readonly kind: "too old"; readonly missing: string };

const useStyles = makeStyles({
  page: { minHeight: "100vh", boxSizing: "border-box", padding: tokens.spacingHorizontalXXL, maxWidth: "40rem" },
});

/** What stands in place of the pane where no spreadsheet answers. */
export function Outside({ why, hostIsDark }: { readonly why: WhyOutside; readonly hostIsDark: HostIsDark }): ReactNode {
  usePage();
  const styles = useStyles();
  const type = useType();
  const { title, words } = wordsFor(why);
  return (
    <FluentProvider theme={themeFor(useDark(hostIsDark))}>
      <main className={styles.page} aria-live="polite">
        <h1 className={type.title}>{title}</h1>
        <p className={type.verdict}>{words}</p>
      </main>
    </FluentProvider>
  );
}

function wordsFor(why: WhyOutside): { readonly title: string; readonly words: string } {
  switch (why.kind) {
    case "waiting":
      return { title: "Footing", words: "Waiting for Excel to answer." };
    case "no host":
      return {
        title: "Footing works inside Excel",
        words: "This page is its task pane. Open it there, with the Footing button on the Home tab.",
      };
    case "too old":
      return {
        title: "This Excel is too old for Footing",
        words: messageOf({ code: "excel-too-old", missing: why.missing }),
      };
  }
}
