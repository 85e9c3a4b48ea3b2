import type { Problem } from "../../core/problem/problem.ts";
import type { AnsweredModel } from "../compared.ts";
import type { LostColumn } from "../carrying.ts";
import type { DataInHand } from "../dataInHand.ts";
import type { Setup } from "../setup.ts";
import type { SheetStatus, Standing } from "./sheetStatus.ts";
import type { Anchor, StoredBook, StoredSetup } from "./storedBook.ts";

/** What can happen to what the workbook keeps. */
export type StoredAction =
  | { readonly kind: "kept found"; readonly book: StoredBook; readonly leftAlone: readonly Problem[] }
  /** The data in hand have got a name by which they are found again. */
  | { readonly kind: "anchored"; readonly address: string; readonly anchor: Anchor }
  | { readonly kind: "anchor lost"; readonly anchor: Anchor }
  | { readonly kind: "setup stored"; readonly name: string }
  | {
      readonly kind: "setup opened";
      readonly name: string;
      readonly data: DataInHand;
      readonly setup: Setup;
      readonly lost: readonly LostColumn[];
    }
  /** Its data are gone: it is for the data that are chosen next. */
  | { readonly kind: "setup waits"; readonly setup: StoredSetup }
  | { readonly kind: "setup renamed"; readonly from: string; readonly to: string }
  | { readonly kind: "setup removed"; readonly name: string }
  | { readonly kind: "sheets found"; readonly sheets: readonly SheetStatus[] }
  | { readonly kind: "sheet checked"; readonly sheet: string; readonly standing: Standing }
  | { readonly kind: "source changed"; readonly sheet: string }
  | { readonly kind: "sheet redone"; readonly sheet: string }
  | { readonly kind: "compared"; readonly models: readonly AnsweredModel[] }
  | { readonly kind: "compared cells changed" }
  | { readonly kind: "comparison written"; readonly sheet: string }
  | { readonly kind: "comparison closed" };
