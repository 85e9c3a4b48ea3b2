import type { ReactNode } from "react";
import { HelpArticle } from "./HelpArticle.tsx";
import { useHelp } from "./helpContext.ts";

/** A section, with the page of help in its place while one is open. The section stays as it was left. */
export function HelpRoom({ backTo, children }: { readonly backTo: string; readonly children: ReactNode }): ReactNode {
  const { about } = useHelp();
  return (
    <>
      {about !== null && <HelpArticle about={about} backTo={backTo} />}
      <div hidden={about !== null}>{children}</div>
    </>
  );
}
