import type { Answer } from "../core/answer/answer.ts";
import type { Question } from "../core/answer/question.ts";
import type { Problem } from "../core/problem/problem.ts";
import type { SheetKind } from "../sheet/answerSheet.ts";
import type { LostColumn } from "./carrying.ts";
import type { Comparison } from "./compared.ts";
import type { DataInHand } from "./dataInHand.ts";
import type { Progress } from "./errand.ts";
import type { DataPlace } from "./host.ts";
import { type Pointing, type ReviewInHand, emptyPointing } from "./review/reviewState.ts";
import type { Setup } from "./setup.ts";
import type { SheetStatus } from "./stored/sheetStatus.ts";
import { type StoredBook, type StoredSetup, emptyBook } from "./stored/storedBook.ts";
import type { TableInHand } from "./tableInHand.ts";

export type Section = "data" | "answer" | "evidence" | "review";

/** What is under way; one thing at a time. */
export interface Busy {
  readonly with: "reading" | "answering" | "writing" | "keeping" | "redoing" | "comparing" | "reviewing";
  readonly progress: Progress;
}

/** Why figures that are shown no longer tell what the sheet and the set-up say. */
export type Outdated = { readonly because: "cells"; readonly cell: string } | { readonly because: "set-up" };

export interface Answered {
  readonly answer: Answer;
  readonly question: Question;
  /** The set-up that asked it. */
  readonly setup: Setup;
  /** Where its data stand, "Months!A1:D97". */
  readonly address: string;
  /** The sheet row of its headings, from 0. */
  readonly headingRow: number | null;
  /** The table that its data are, if they are one. */
  readonly table: TableInHand | null;
  readonly outdated: Outdated | null;
  /** The answer as plain text, once it was asked for. */
  readonly memo: string | null;
}

/** A result sheet written from this pane. */
export interface Written {
  readonly sheet: string;
  readonly kind: SheetKind;
  /** Whether it holds an earlier answer than the one shown: only a kept sheet can. */
  readonly outdated: boolean;
}

export type Fault =
  | { readonly kind: "problem"; readonly problem: Problem }
  /** A fault of the add-in's own, with what a report of it needs. */
  | { readonly kind: "bug"; readonly details: string };

export interface PaneState {
  readonly section: Section;
  /** Counts how often the user was taken to a section, so that focus can follow. */
  readonly arrivals: number;
  readonly places: readonly DataPlace[];
  readonly data: DataInHand | null;
  readonly setup: Setup | null;
  /** Columns that the set-up used and that are no longer found. */
  readonly lost: readonly LostColumn[];
  /** What the workbook keeps for Footing, and parts of it that are left alone, with the reason. */
  readonly kept: { readonly book: StoredBook; readonly leftAlone: readonly Problem[] };
  /** The name of the stored set-up in hand, null where it has none. */
  readonly opened: string | null;
  /** A stored set-up whose data are gone: it is for the data that are chosen next. */
  readonly waiting: StoredSetup | null;
  /** The result sheets of the workbook. */
  readonly sheets: readonly SheetStatus[];
  /** Stored set-ups side by side, shown in place of the answer. */
  readonly comparison: Comparison | null;
  readonly answered: Answered | null;
  readonly written: Written | null;
  /** The regressions that someone else built, as they were found last. */
  readonly review: ReviewInHand | null;
  readonly pointing: Pointing;
  /** What was done last with the sheet in front, as a sentence; empty where nothing was. */
  readonly sheetDone: string;
  readonly busy: Busy | null;
  readonly fault: Fault | null;
  /** What a screen reader is told; counted, so that the same words can be said twice. */
  readonly said: { readonly text: string; readonly count: number };
}

export const emptyState: PaneState = {
  section: "data",
  arrivals: 0,
  places: [],
  data: null,
  setup: null,
  lost: [],
  kept: { book: emptyBook, leftAlone: [] },
  opened: null,
  waiting: null,
  sheets: [],
  comparison: null,
  answered: null,
  written: null,
  review: null,
  pointing: emptyPointing,
  sheetDone: "",
  busy: null,
  fault: null,
  said: { text: "", count: 0 },
};
