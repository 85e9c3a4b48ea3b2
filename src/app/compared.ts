import type { ComparedModel } from "../sheet/comparison.ts";
import type { Setup } from "./setup.ts";
import type { Anchor } from "./stored/storedBook.ts";

/** A stored set-up answered, and what it was answered from. */
export interface AnsweredModel extends ComparedModel {
  readonly setup: Setup;
  readonly anchor: Anchor;
}

/** Stored set-ups answered side by side, each with its own data as they stand now. */
export interface Comparison {
  readonly models: readonly AnsweredModel[];
  /** Whether cells behind it have changed since. */
  readonly outdated: boolean;
}
