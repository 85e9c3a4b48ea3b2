import { messageType, notice, type TravellingCalls } from "./messages.ts";

/** The client library's own distributor of messages, of which its bridge of texts is one source. */
interface Distributor {
  readonly dispatchMessage: (message: object) => void;
}

/** Whether a message holds calls of functions, told from its first words. */
export const holdsCalls = (text: string): boolean => text.startsWith(`{"type":${messageType.calls},`);

/**
 * Hands calls over to the client library's runtime. Values that several calls take are one object for all of them;
 * in Excel each call has its own copy, so they are frozen: what a function wrote into its cells would reach the others.
 */
export function deliverCalls(text: string, distributor: Distributor): void {
  const { values, calls } = JSON.parse(text) as TravellingCalls;
  values.forEach(freeze);
  const entries = calls.map(([id, functionId, places, ...rest]) => ({
    messageCategory: notice.functions,
    messageType: notice.call,
    message: [id, functionId, places.map((place) => values[place]), ...rest],
  }));
  distributor.dispatchMessage({ type: messageType.notice, message: { entries } });
}

function freeze(value: unknown): void {
  if (!Array.isArray(value)) return;
  for (const row of value as readonly unknown[]) Object.freeze(row);
  Object.freeze(value);
}
