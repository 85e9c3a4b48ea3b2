import type { Held } from "./held.ts";
import type { Host } from "./host.ts";

export type Arguments = readonly unknown[];

/**
 * One type of the object model. Names are those of the wire: the API's, with a capital.
 * A member that stands in no table answers ApiNotFound.
 */
export interface Family<S> {
  /** What identifies the object within its collection, where it has an identity. */
  readonly id?: (state: S, host: Host) => string | number;
  readonly read?: Readonly<Record<string, (state: S, host: Host) => unknown>>;
  readonly write?: Readonly<Record<string, (state: S, host: Host, value: unknown) => void>>;
  /** Properties and methods that answer with an object; null is the null object. */
  readonly part?: Readonly<Record<string, (state: S, host: Host, args: Arguments) => Held | null>>;
  /** Methods that do something or answer with a value. */
  readonly call?: Readonly<Record<string, (state: S, host: Host, args: Arguments) => unknown>>;
  /** The members of a collection. */
  readonly items?: (state: S, host: Host) => readonly Held[];
  /** Values that are loaded only by name, since Excel never loads them by default. */
  readonly unasked?: readonly string[];
  /** Properties that Excel has and this host has not: they answer ApiNotFound, other names InvalidArgument. */
  readonly lacks?: readonly string[];
}
