import type { Action } from "./actions.ts";
import type { Host } from "./host.ts";

/** Looks after the cells that the pane's figures come from: the latest addresses alone. */
export type Watch = (addresses: readonly string[]) => Promise<void>;

export function createWatch(
  host: Host,
  dispatch: (action: Action) => void,
  toAction: (cell: string) => Action = (cell) => ({ kind: "cell changed", cell }),
): Watch {
  let stop: (() => Promise<void>) | null = null;
  let round = 0;
  return async (addresses) => {
    const own = ++round;
    await stop?.();
    stop = null;
    const watching = await host.watch(addresses, (cell) => {
      if (own === round) dispatch(toAction(cell));
    });
    if (!watching.ok) dispatch({ kind: "failed", fault: { kind: "problem", problem: watching.problem } });
    else if (own === round) stop = watching.value;
    else await watching.value();
  };
}

/** The data that kept sheets, or the models of a comparison, were made from. */
export type WatchSources = (sources: readonly { readonly address: string; readonly sheet: string }[]) => Promise<void>;

/**
 * Looks after what several things were made from, in place of what was looked after before.
 * @param changed - what happens to one of them when a cell of its data changes.
 */
export function createSourcesWatch(
  host: Host,
  dispatch: (action: Action) => void,
  changed: (sheet: string) => Action,
): WatchSources {
  let stops: (() => Promise<void>)[] = [];
  return async (sources) => {
    const before = stops;
    stops = [];
    for (const stop of before) await stop();
    for (const { address, sheet } of sources) {
      const watching = await host.watch([address], () => dispatch(changed(sheet)));
      if (watching.ok) stops.push(watching.value);
      else dispatch({ kind: "failed", fault: { kind: "problem", problem: watching.problem } });
    }
  };
}
