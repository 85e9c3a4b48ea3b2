import type { ReactNode } from "react";
import { useType } from "../look/type.ts";

/** The title of a section: where the focus goes when the user is brought there, or when what had it has gone. */
export function SectionTitle({ children }: { readonly children: ReactNode }): ReactNode {
  const type = useType();
  return (
    <h1 tabIndex={-1} className={type.title} data-section-title>
      {children}
    </h1>
  );
}
