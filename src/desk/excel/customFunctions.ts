import type { Family } from "./model.ts";

/** One result as the runtime sends it: number of the call, whether it succeeded, value or message, kind of error. */
export type CallResult = readonly [id: number, succeeded: boolean, value: unknown, error?: unknown];

/** Where the runtime of worksheet functions reports to. */
export const customFunctions: Family<null> = {
  call: {
    SetInvocationArrayResults: (_state, host, args) => host.takeResults((args[0] ?? []) as readonly CallResult[]),
    _SetOsfControlContainerReadyForCustomFunctions: () => null,
    // The runtime's own improvements: larger results in slices, shorter waits between reports.
    _GetEnabledFeatures: () => [1, 2, 3, 4],
  },
};
