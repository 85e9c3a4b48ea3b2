import type { Book } from "../workbook/book.ts";
import type { Events } from "./events.ts";
import type { Held } from "./held.ts";

/** States of Excel in which it refuses; tests set them. */
export interface Switches {
  /** A cell's editor is open. */
  editing: boolean;
  /** A chart is selected, not cells. */
  chartSelected: boolean;
  /** Another workbook's window is in front. */
  otherWorkbook: boolean;
  /** Excel on the web limits what one request and one response may carry; the desktop does not. */
  profile: "web" | "desktop";
  /** The workbook's structure is protected: sheets may not come or go. */
  structureProtected: boolean;
}

export const calm = (profile: Switches["profile"]): Switches => ({
  editing: false,
  chartSelected: false,
  otherWorkbook: false,
  profile,
  structureProtected: false,
});

/** One result as the runtime sends it: number of the call, whether it succeeded, value or message, kind of error. */
export type CallResult = readonly [id: number, succeeded: boolean, value: unknown, error?: unknown];

/** All that the object model works on. */
export interface Host {
  readonly book: Book;
  readonly switches: Switches;
  readonly events: Events;
  /** Ranges that an add-in tracks, by the reference it was given. */
  readonly references: {
    readonly kept: Map<string, Held>;
    readonly names: WeakMap<Held, string>;
    given: number;
  };
  readonly isCalculating: () => boolean;
  /** Resolves when every formula has its value; functions of the add-in still at work show #BUSY! meanwhile. */
  readonly calculated: () => Promise<void>;
  /** Results of worksheet functions that the add-in computed. */
  readonly takeResults: (results: readonly CallResult[]) => void;
}
