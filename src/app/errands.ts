import type { Action } from "./actions.ts";
import type { Errand, Progress } from "./errand.ts";
import type { Busy } from "./state.ts";

/** One long piece of work at a time: a new one takes the place of the one before, and late news of that one is dropped. */
export interface Errands {
  readonly start: (on: Busy["with"]) => Errand;
  readonly cancel: () => void;
}

export function createErrands(dispatch: (action: Action) => void): Errands {
  let current: AbortController | null = null;
  const start = (on: Busy["with"]): Errand => {
    current?.abort();
    const own = new AbortController();
    current = own;
    dispatch({ kind: "started", on });
    const progress = (progress: Progress): void => {
      if (!own.signal.aborted) dispatch({ kind: "progressed", progress });
    };
    return { signal: own.signal, progress };
  };
  const cancel = (): void => {
    if (current === null || current.signal.aborted) return;
    current.abort();
    dispatch({ kind: "cancelled" });
  };
  return { start, cancel };
}
