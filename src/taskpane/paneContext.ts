import { createContext, useContext } from "react";
import type { Action } from "../app/actions.ts";
import type { Commands } from "../app/pane.ts";
import type { PaneState } from "../app/state.ts";

/** A worksheet function, to be looked up. */
export interface ListedFunction {
  /** "=FOOTING.LAGS(rows, [rule])" */
  readonly call: string;
  readonly description: string;
}

/** What every part of the pane shows and can ask for. */
export interface PaneView {
  readonly state: PaneState;
  readonly dispatch: (action: Action) => void;
  readonly commands: Commands;
  readonly functions: readonly ListedFunction[];
}

export const PaneContext = createContext<PaneView | null>(null);

export function usePane(): PaneView {
  const view = useContext(PaneContext);
  if (view === null) throw new Error("A part of the pane stands outside of it.");
  return view;
}
