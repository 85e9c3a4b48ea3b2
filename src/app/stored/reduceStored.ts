import { announce } from "../spoken.ts";
import { comparabilityOf } from "../../sheet/comparison.ts";
import type { PaneState, Section } from "../state.ts";
import type { StoredAction } from "./actions.ts";
import type { SheetStatus, Standing } from "./sheetStatus.ts";
import { sameName } from "./storedBook.ts";

type Of<Kind extends StoredAction["kind"]> = Extract<StoredAction, { kind: Kind }>;

/** The pane after something happened to what the workbook keeps. */
export const storedChanges: {
  readonly [Kind in StoredAction["kind"]]: (state: PaneState, action: Of<Kind>) => PaneState;
} = {
  "kept found": (state, { book, leftAlone }) => ({ ...state, kept: { book, leftAlone } }),
  anchored: (state, { address, anchor }) =>
    state.data?.address === address ? { ...state, data: { ...state.data, anchor } } : state,
  "anchor lost": (state, { anchor }) =>
    state.data?.anchor?.kind === anchor.kind && state.data.anchor.name === anchor.name
      ? { ...state, data: { ...state.data, anchor: null } }
      : state,
  "setup stored": (state, { name }) =>
    announce({ ...state, opened: name, fault: null }, `The set-up ${name} is stored in the workbook.`),
  "setup opened": opened,
  "setup waits": (state, { setup }) => ({ ...state, waiting: setup }),
  "setup renamed": (state, { from, to }) =>
    announce(
      { ...state, opened: isOpen(state, from) ? to : state.opened, fault: null },
      `The set-up ${from} is called ${to} now.`,
    ),
  "setup removed": (state, { name }) =>
    announce(
      { ...state, opened: isOpen(state, name) ? null : state.opened, fault: null },
      `The set-up ${name} is removed from the workbook.`,
    ),
  "sheets found": (state, { sheets }) => ({ ...state, sheets: sheets.map((one) => asBefore(one, state.sheets)) }),
  "sheet checked": (state, { sheet, standing }) => withStanding(state, sheet, standing),
  "source changed": sourceChanged,
  compared: (state, { models }) =>
    announce(
      { ...arriveAt(state, "answer"), comparison: { models, outdated: false }, busy: null, fault: null },
      `${models.length} set-ups are compared. ${comparabilityOf(models)[0] ?? ""}`,
    ),
  "compared cells changed": (state) =>
    state.comparison === null || state.comparison.outdated
      ? state
      : announce({ ...state, comparison: { ...state.comparison, outdated: true } }, "The comparison is out of date."),
  "comparison written": (state, { sheet }) =>
    announce(
      withSheetNamed({ ...state, busy: null, fault: null }, sheet),
      `The comparison is written to the sheet ${sheet}.`,
    ),
  "comparison closed": (state) => ({ ...arriveAt(state, "answer"), comparison: null }),
  "sheet redone": (state, { sheet }) => {
    const written = state.written?.sheet === sheet ? { ...state.written, outdated: false } : state.written;
    return announce({ ...state, written, busy: null, fault: null }, `The sheet ${sheet} is written anew.`);
  },
};

const arriveAt = (state: PaneState, section: Section): PaneState => ({
  ...state,
  section,
  arrivals: state.arrivals + 1,
});

const withSheetNamed = (state: PaneState, sheet: string): PaneState => ({
  ...state,
  sheets: [...state.sheets, { sheet, record: null, standing: { kind: "not known" } }],
});

const isOpen = ({ opened }: PaneState, name: string): boolean => opened !== null && sameName(opened, name);

/** Another set-up is another question: nothing of the old answer stays, even over the same cells. */
function opened(state: PaneState, { name, data, setup, lost }: Of<"setup opened">): PaneState {
  const fresh = { data, setup, lost, answered: null, written: null, waiting: null, opened: name };
  const next: PaneState = {
    ...state,
    ...fresh,
    busy: null,
    fault: null,
    section: "data",
    arrivals: state.arrivals + 1,
  };
  const rows = data.source.rowCount;
  return announce(next, `Opened the set-up ${name}, with ${rows} rows from ${data.address}.`);
}

/** While a sheet is being checked again, it shows what is known of it from before. */
function asBefore(found: SheetStatus, before: readonly SheetStatus[]): SheetStatus {
  const known = before.find(({ sheet }) => sheet === found.sheet);
  const checking = found.standing.kind === "being checked" && known?.record?.id === found.record?.id;
  return checking && known !== undefined && known.standing.kind !== "follows"
    ? { ...found, standing: known.standing }
    : found;
}

const withStanding = (state: PaneState, sheet: string, standing: Standing): PaneState => ({
  ...state,
  sheets: state.sheets.map((one) => (one.sheet === sheet ? { ...one, standing } : one)),
});

function sourceChanged(state: PaneState, { sheet }: Of<"source changed">): PaneState {
  const status = state.sheets.find((one) => one.sheet === sheet);
  if (status === undefined || status.standing.kind !== "current") return state;
  const next = withStanding(state, sheet, { kind: "out of date" });
  // The answer over the same cells tells of the change itself.
  return state.data?.address === undefined || state.answered === null
    ? announce(next, `The sheet ${sheet} is out of date: its cells have changed.`)
    : next;
}
