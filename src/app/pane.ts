import type { SheetKind } from "../sheet/answerSheet.ts";
import type { Action } from "./actions.ts";
import type { Analyst, Reviewer } from "./analyst.ts";
import { findAnswer } from "./answering.ts";
import { compareSetups, writeComparison } from "./comparing.ts";
import { createErrands } from "./errands.ts";
import type { Host, WhereToRead } from "./host.ts";
import { listPlaces, readData } from "./reading.ts";
import { makeMemo } from "./memo.ts";
import { reduce } from "./reduce.ts";
import { type ReviewCommands, reviewCommands } from "./review/commands.ts";
import { insertSample } from "./sampling.ts";
import { keepSheet, recalculateSheet } from "./sheetInFront.ts";
import { type Store, createStore } from "./store.ts";
import { type PaneState, emptyState } from "./state.ts";
import { takeInBelow } from "./stored/below.ts";
import { checkSheets } from "./stored/checking.ts";
import { redoSheet, redoWith } from "./stored/redoing.ts";
import { openSetup, removeSetup, renameSetup, storeSetup, type Renaming } from "./stored/setups.ts";
import { createSourcesWatch, createWatch } from "./watching.ts";
import { goToCell, writeSheet } from "./writing.ts";
import type { Edition, Work } from "./work.ts";

export interface PaneParts {
  readonly host: Host;
  readonly analyst: Analyst & Reviewer;
  readonly edition: Edition;
  /** Runs work and tells the pane of a fault of ours: the entry's one place to catch. */
  readonly guard: (work: () => Promise<void>) => void;
}

/** What a person can ask of the pane beside changing its set-up, which is done by actions alone. */
export interface Commands {
  readonly open: () => void;
  readonly read: (where: WhereToRead) => void;
  /** Puts invented data on a new sheet and reads them. */
  readonly insertSample: () => void;
  readonly answer: () => void;
  readonly write: (kind: SheetKind) => void;
  /** Reads the cells again, answers again, and writes a kept sheet in place of itself where one was left out of date. */
  readonly redo: () => void;
  /** Writes a kept sheet in place of itself, from its own set-up and its data as they stand now. */
  readonly redoSheet: (sheet: string) => void;
  /** Finds the workbook's result sheets and which of them are out of date. */
  readonly checkSheets: () => void;
  readonly storeSetup: (name: string) => void;
  readonly openSetup: (name: string) => void;
  readonly renameSetup: (renaming: Renaming) => void;
  readonly removeSetup: (name: string) => void;
  /** Reads the data again with the rows that were added below them. */
  readonly takeInBelow: () => void;
  /** Answers stored set-ups side by side. */
  readonly compare: (names: readonly string[]) => void;
  readonly writeComparison: () => void;
  readonly review: ReviewCommands;
  /** Has the functions of the sheet in front calculated again. */
  readonly recalculate: () => void;
  /** Turns the live sheet in front into a kept one. */
  readonly keep: () => void;
  /** Puts the answer shown into plain text. */
  readonly makeMemo: () => void;
  readonly goTo: (address: string) => void;
  readonly cancel: () => void;
}

export interface Pane {
  readonly store: Store<PaneState, Action>;
  readonly commands: Commands;
}

/** The pane without its looks: state, actions and what can be asked, over any spreadsheet and any analyst. */
export function createPane({ host, analyst, edition, guard }: PaneParts): Pane {
  const store = createStore(reduce, emptyState);
  const errands = createErrands(store.dispatch);
  const work: Work = {
    host,
    analyst,
    store,
    errands,
    watch: createWatch(host, store.dispatch),
    watchSources: createSourcesWatch(host, store.dispatch, (sheet) => ({ kind: "source changed", sheet })),
    watchCompared: createSourcesWatch(host, store.dispatch, () => ({ kind: "compared cells changed" })),
    watchReviewed: createWatch(host, store.dispatch, (cell) => ({ kind: "reviewed cell changed", cell })),
    edition,
  };
  const commands: Commands = {
    open: () => guard(() => open(work)),
    read: (where) => guard(() => readData(work, where)),
    insertSample: () => guard(() => insertSample(work)),
    answer: () => guard(() => findAnswer(work)),
    write: (kind) => guard(() => writeSheet(work, kind)),
    redo: () => guard(() => redo(work)),
    redoSheet: (sheet) => guard(() => redoSheet(work, sheet)),
    checkSheets: () => guard(() => checkSheets(work)),
    storeSetup: (name) => guard(() => storeSetup(work, name)),
    openSetup: (name) => guard(() => openSetup(work, name)),
    renameSetup: (renaming) => guard(() => renameSetup(work, renaming)),
    compare: (names) => guard(() => compareSetups(work, names)),
    writeComparison: () => guard(() => writeComparison(work)),
    takeInBelow: () => guard(() => takeInBelow(work)),
    removeSetup: (name) => guard(() => removeSetup(work, name)),
    review: reviewCommands(work, guard),
    recalculate: () => guard(() => recalculateSheet(work)),
    keep: () => guard(() => keepSheet(work)),
    makeMemo: () => guard(() => makeMemo(work)),
    goTo: (address) => guard(() => goToCell(work, address)),
    cancel: errands.cancel,
  };
  return { store, commands };
}

async function open(work: Work): Promise<void> {
  await listPlaces(work);
  await checkSheets(work);
}

async function redo(work: Work): Promise<void> {
  await findAnswer(work);
  const { written, answered } = work.store.get();
  if (written?.outdated === true && answered?.outdated === null) await redoWith(work, written.sheet, answered);
}
