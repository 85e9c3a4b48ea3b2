/** How much a finding matters, gravest first. */
export const ranks = ["changes the conclusion", "changes a number", "worth knowing"] as const;
export type Rank = (typeof ranks)[number];

/** One thing a reviewer should know, in words for people and with cells to jump to. */
export interface Finding {
  readonly rank: Rank;
  /** A short name for programs: "row-left-off", "text-in-range". */
  readonly code: string;
  /** Addresses with their sheets, at most ten. */
  readonly cells: readonly string[];
  /** The number as reported and as recomputed, where the finding is about one. */
  readonly reported: string | null;
  readonly recomputed: string | null;
  /** What was found, a full sentence. */
  readonly what: string;
  /** What to do about it, a full sentence. */
  readonly toDo: string;
}
