import { type ReactNode, useEffect, useMemo, useRef, useState } from "react";
import type { Section } from "../../app/state.ts";
import type { Concept } from "./concepts.ts";
import { HelpContext } from "./helpContext.ts";

interface HelpProviderProps {
  /** Where the user is: going elsewhere closes the help. */
  readonly section: Section;
  readonly children: ReactNode;
}

interface Opened {
  readonly about: Concept;
  readonly section: Section;
}

/** Keeps which page of help is open, and gives the focus back to where one came from. */
export function HelpProvider({ section, children }: HelpProviderProps): ReactNode {
  const [opened, setOpened] = useState<Opened | null>(null);
  const origin = useRef<HTMLElement | null>(null);
  if (opened !== null && opened.section !== section) setOpened(null);
  const about = opened?.section === section ? opened.about : null;
  const [returns, setReturns] = useState(0);
  // The link is drawn again by now: it was hidden while the help was open.
  useEffect(() => {
    if (returns > 0) origin.current?.focus();
  }, [returns]);
  const help = useMemo(
    () => ({
      about,
      show: (next: Concept, from: HTMLElement | null): void => {
        if (from !== null) origin.current = from;
        setOpened({ about: next, section });
      },
      back: (): void => {
        setOpened(null);
        setReturns((count) => count + 1);
      },
    }),
    [about, section],
  );
  return <HelpContext value={help}>{children}</HelpContext>;
}
