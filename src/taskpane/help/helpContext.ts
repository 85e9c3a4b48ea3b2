import { createContext, useContext } from "react";
import type { Concept } from "./concepts.ts";

/** The page of help that is open, and the ways in and out. */
export interface Help {
  readonly about: Concept | null;
  /** @param from - the link that was followed: where the focus returns to; null within the help. */
  readonly show: (about: Concept, from: HTMLElement | null) => void;
  readonly back: () => void;
}

export const HelpContext = createContext<Help | null>(null);

export function useHelp(): Help {
  const help = useContext(HelpContext);
  if (help === null) throw new Error("A link to help stands outside of the pane.");
  return help;
}
