import type { Problem } from "../core/problem/problem.ts";
import type { Action } from "./actions.ts";
import type { Analyst, Reviewer } from "./analyst.ts";
import type { Errands } from "./errands.ts";
import type { Host } from "./host.ts";
import type { PaneState } from "./state.ts";
import type { Store } from "./store.ts";
import type { Watch, WatchSources } from "./watching.ts";

/** What a result sheet says of its making: the day in words, and the version. */
export interface Edition {
  readonly today: () => string;
  readonly version: string;
}

/** What the pane's use cases work with. */
export interface Work {
  readonly host: Host;
  readonly analyst: Analyst & Reviewer;
  readonly store: Store<PaneState, Action>;
  readonly errands: Errands;
  readonly watch: Watch;
  readonly watchSources: WatchSources;
  readonly watchCompared: WatchSources;
  /** Looks after the cells of what was reviewed. */
  readonly watchReviewed: Watch;
  readonly edition: Edition;
}

/** Shows a fault that the user can mend; what the user cancelled is none. */
export function fail({ store }: Pick<Work, "store">, problem: Problem): void {
  if (problem.code === "cancelled") store.dispatch({ kind: "cancelled" });
  else store.dispatch({ kind: "failed", fault: { kind: "problem", problem } });
}
