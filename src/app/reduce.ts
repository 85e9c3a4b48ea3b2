import type { Action } from "./actions.ts";
import { takeOver } from "./carrying.ts";
import { reviewChanges } from "./review/reduceReview.ts";
import { type Setup, assignRole, changeColumn } from "./setup.ts";
import {
  announce,
  answeredWords,
  changedWords,
  keptWords,
  readWords,
  recalculatedWords,
  writtenWords,
} from "./spoken.ts";
import { storedChanges } from "./stored/reduceStored.ts";
import type { Outdated, PaneState, Section } from "./state.ts";

/** The pane after something happened. Pure: what is asked of the spreadsheet is asked elsewhere. */
export function reduce(state: PaneState, action: Action): PaneState {
  // Each entry takes the member of the union that its key names; the compiler cannot follow that through the look-up.
  const change = changes[action.kind] as (state: PaneState, action: Action) => PaneState;
  return change(state, action);
}

type Of<Kind extends Action["kind"]> = Extract<Action, { kind: Kind }>;

const changes: { readonly [Kind in Action["kind"]]: (state: PaneState, action: Of<Kind>) => PaneState } = {
  ...storedChanges,
  ...reviewChanges,
  shown: (state, { section }) => ({ ...state, section }),
  "places found": (state, { places }) => ({ ...state, places }),
  started: (state, { on }) => ({
    ...state,
    fault: null,
    sheetDone: "",
    busy: { with: on, progress: { what: "", share: null } },
  }),
  progressed: (state, { progress }) => (state.busy === null ? state : { ...state, busy: { ...state.busy, progress } }),
  cancelled: (state) => announce({ ...state, busy: null }, "Cancelled."),
  failed: (state, { fault }) => ({ ...state, busy: null, fault }),
  dismissed: (state) => ({ ...state, fault: null }),
  "role chosen": (state, { column, role }) => withSetup(state, (setup) => assignRole(setup, column, role)),
  "column changed": (state, { column, details }) => withSetup(state, (setup) => changeColumn(setup, column, details)),
  "setup changed": (state, { change }) =>
    withSetup(state, (setup) => ({
      ...setup,
      ...change,
      rowsGuessed: change.rows === undefined && setup.rowsGuessed,
    })),
  "lost settled": lostSettled,
  read,
  answered,
  written: (state, { sheet, as }) => {
    const written = { sheet, kind: as, outdated: false };
    return announce({ ...state, written, busy: null, fault: null }, writtenWords(written));
  },
  recalculated: (state, { sheet }) => withSheetDone({ ...state, fault: null }, recalculatedWords(sheet)),
  kept: ({ written, ...state }, { sheet }) => {
    const now = written?.sheet === sheet ? { ...written, kind: "kept" as const } : written;
    return withSheetDone({ ...state, written: now, busy: null }, keptWords(sheet));
  },
  "memo made": ({ answered, ...state }, { text }) => ({
    ...state,
    answered: answered === null ? null : { ...answered, memo: text },
  }),
  "cell changed": cellChanged,
  said: (state, { text }) => announce(state, text),
};

const withSheetDone = (state: PaneState, sheetDone: string): PaneState => announce({ ...state, sheetDone }, sheetDone);

/** A changed set-up leaves the answer standing, but says that it belongs to the set-up before. */
function withSetup(state: PaneState, change: (setup: Setup) => Setup): PaneState {
  if (state.setup === null) return state;
  const setup = change(state.setup);
  if (setup === state.setup) return state;
  const { answered } = state;
  const outdated = answered?.outdated ?? { because: "set-up" };
  return { ...state, setup, fault: null, answered: answered === null ? null : { ...answered, outdated } };
}

/** What was chosen for a lost column goes to the one that takes its place. */
function lostSettled(state: PaneState, { lost, by }: Of<"lost settled">): PaneState {
  const rest = { ...state, lost: state.lost.filter((one) => one !== lost) };
  return by === null ? rest : withSetup(rest, (setup) => takeOver(setup, lost, by));
}

/** New data leave nothing of the old; the same cells read again leave the answer, which says if it is out of date. */
function read(state: PaneState, { data, setup, lost, opened }: Of<"read">): PaneState {
  const same = state.data?.address === data.address;
  const next = { ...state, data, setup, lost, opened, waiting: null, busy: null, fault: null };
  return announce(same ? next : arriveAt({ ...next, answered: null, written: null }, "data"), readWords(data));
}

function answered(state: PaneState, { answered }: Of<"answered">): PaneState {
  const { written } = state;
  const next: PaneState = {
    ...state,
    busy: null,
    fault: null,
    comparison: null,
    answered: { ...answered, memo: null, outdated: outdatedAlready(state, answered) },
    written: written === null ? null : { ...written, outdated: written.kind === "kept" },
  };
  return announce(state.section === "data" ? arriveAt(next, "answer") : next, answeredWords(answered.answer));
}

/** Cells and set-up may have changed while the answer was being found. */
function outdatedAlready({ data, setup }: PaneState, answered: Of<"answered">["answered"]): Outdated | null {
  if (data !== null && data.changedCell !== null) return { because: "cells", cell: data.changedCell };
  return setup === answered.setup ? null : { because: "set-up" };
}

const arriveAt = (state: PaneState, section: Section): PaneState => ({
  ...state,
  section,
  arrivals: state.arrivals + 1,
});

/** A live sheet moves with the cells, also after the first that changed; what was read, an answer and a kept sheet do not. */
function cellChanged(before: PaneState, { cell }: Of<"cell changed">): PaneState {
  const { data, answered, written } = before;
  const state = written?.kind === "kept" ? { ...before, written: { ...written, outdated: true } } : before;
  if (data === null || data.changedCell !== null) return state;
  const next: PaneState = {
    ...state,
    data: { ...data, changedCell: cell },
    answered: answered === null ? null : { ...answered, outdated: { because: "cells", cell } },
  };
  return answered === null ? next : announce(next, changedWords(cell));
}
