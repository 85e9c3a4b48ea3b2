import type { SheetKind } from "../../sheet/answerSheet.ts";
import type { WrittenBlock } from "../../sheet/written.ts";
import type { Setup } from "../setup.ts";

/**
 * Where data are found again: by the name of their table, or by a name of the workbook for their cells. Both move with
 * inserted rows and columns and outlive a renamed sheet, which no address does; and both can be seen and mended by hand.
 */
export interface Anchor {
  readonly kind: "table" | "name";
  readonly name: string;
}

/** Data that a set-up or a sheet goes back to. */
export interface Origin {
  readonly anchor: Anchor;
  /** Where they stood when this was stored, for the user to know. */
  readonly address: string;
}

/** A set-up kept in the workbook under a name. */
export interface StoredSetup extends Origin {
  readonly name: string;
  readonly setup: Setup;
}

/** What is known of a result sheet: what it was made from, and what stands in its cells. */
export interface SheetRecord extends Origin {
  /** Stands on the sheet itself, so that the sheet may be renamed. */
  readonly id: string;
  readonly kind: SheetKind;
  readonly setup: Setup;
  /** Of the data when it was written. */
  readonly fingerprint: string;
  /** null where it cannot be told: on a live sheet. */
  readonly written: readonly WrittenBlock[] | null;
}

/** One model of a comparison sheet. */
export interface ModelRecord extends StoredSetup {
  /** Of its data when the sheet was written. */
  readonly fingerprint: string;
}

/** What is known of a sheet that shows several models side by side: always values. */
export interface ComparisonRecord {
  readonly id: string;
  readonly kind: "comparison";
  readonly models: readonly ModelRecord[];
  readonly written: readonly WrittenBlock[];
}

/** Everything that Footing keeps in a workbook. */
export interface StoredBook {
  readonly setups: readonly StoredSetup[];
  readonly sheets: readonly SheetRecord[];
  readonly comparisons: readonly ComparisonRecord[];
}

export const emptyBook: StoredBook = { setups: [], sheets: [], comparisons: [] };

/** The book with a record in the place of the one that has its id. */
export const withRecord = (book: StoredBook, record: SheetRecord | ComparisonRecord): StoredBook =>
  record.kind === "comparison"
    ? { ...book, comparisons: book.comparisons.map((one) => (one.id === record.id ? record : one)) }
    : { ...book, sheets: book.sheets.map((one) => (one.id === record.id ? record : one)) };

/** The book with a record of a new sheet; those of sheets that are no longer there go. */
export function withNewRecord(
  { setups, ...book }: StoredBook,
  record: SheetRecord | ComparisonRecord,
  present: readonly (string | null)[],
): StoredBook {
  const stays = ({ id }: { readonly id: string }): boolean => id !== record.id && present.includes(id);
  const [sheets, comparisons] = [book.sheets.filter(stays), book.comparisons.filter(stays)];
  return record.kind === "comparison"
    ? { setups, sheets, comparisons: [...comparisons, record] }
    : { setups, sheets: [...sheets, record], comparisons };
}

/** Names of set-ups differ without regard to case and outer blanks. */
export const sameName = (a: string, b: string): boolean => a.trim().toLowerCase() === b.trim().toLowerCase();
