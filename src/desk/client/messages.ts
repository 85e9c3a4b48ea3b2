/** Kinds of messages on the client's native bridge; the last is the loader's own. */
export const messageType = { request: 1, response: 2, notice: 3, ready: 100 } as const;

/** Categories and kinds within a notice. */
export const notice = { functions: 1, events: 65_536, call: 1000, cancel: 1001 } as const;

/** Flags of a function call. */
export const callFlag = { cancelable: 1, errorsPass: 4 } as const;

/** Flag of a request that Excel is to hold back until the user has finished editing a cell. */
export const delayForCellEdit = 64;

export interface BridgeRequest {
  readonly id: number;
  readonly type: number;
  readonly flags?: number;
  readonly message: { readonly body: unknown };
}
