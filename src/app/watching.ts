import type { Action } from "./actions.ts";
import type { Host } from "./host.ts";

/** Looks after the cells that the pane's figures come from: the latest addresses alone. */
export type Watch = (addresses: readonly string[]) => Promise<void>;

export function createWatch(host: Host, dispatch: (action: Action) => void): Watch {
  let stop: (() => Promise<void>) | null = null;
  let round = 0;
  return async (addresses) => {
    const own = ++round;
    await stop?.();
    stop = null;
    const watching = await host.watch(addresses, (cell) => {
      if (own === round) dispatch({ kind: "cell changed", cell });
    });
    if (!watching.ok) dispatch({ kind: "failed", fault: { kind: "problem", problem: watching.problem } });
    else if (own === round) stop = watching.value;
    else await watching.value();
  };
}
