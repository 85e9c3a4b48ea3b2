import type { Problem } from "../../core/problem/problem.ts";
import type { ComparisonRecord, SheetRecord } from "./storedBook.ts";

/** How a result sheet stands to its data. */
export type Standing =
  /** Live: its formulas follow the cells. */
  | { readonly kind: "follows" }
  | { readonly kind: "being checked" }
  /** `below`: filled rows right below its data that are not in it. */
  | { readonly kind: "current"; readonly below: string | null }
  | { readonly kind: "out of date" }
  /** What it was made from is no longer found. */
  | { readonly kind: "cut off"; readonly problem: Problem }
  /** Nothing is known of its making. */
  | { readonly kind: "not known" };

export interface SheetStatus {
  readonly sheet: string;
  readonly record: SheetRecord | ComparisonRecord | null;
  readonly standing: Standing;
}

/** Whether Footing can write the sheet again in place of itself: it must know its own cells there. */
export const canBeRedone = ({ record }: SheetStatus): boolean =>
  record !== null && record.kind !== "live" && record.written !== null;
