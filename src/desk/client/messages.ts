/** Kinds of messages on the client's native bridge; the last two are the loader's own. */
export const messageType = { request: 1, response: 2, notice: 3, ready: 100, calls: 101 } as const;

/** Categories and kinds within a notice. */
export const notice = { functions: 1, events: 65_536, call: 1000, cancel: 1001 } as const;

/** Flags of a function call. */
export const callFlag = { cancelable: 1, errorsPass: 4 } as const;

/** Flag of a request that Excel is to hold back until the user has finished editing a cell. */
export const delayForCellEdit = 64;

/** A call as it travels: its arguments by their places among the values of its message. */
export type TravellingCall = readonly [
  id: number,
  functionId: string,
  values: readonly number[],
  address: string | null,
  flags: number,
  parameterAddresses: readonly string[] | null,
];

/** Calls of functions on their way to the add-in: a range that many of them read travels once. */
export interface TravellingCalls {
  readonly type: typeof messageType.calls;
  readonly values: readonly unknown[];
  readonly calls: readonly TravellingCall[];
}

export interface BridgeRequest {
  readonly id: number;
  readonly type: number;
  readonly flags?: number;
  readonly message: { readonly body: unknown };
}
