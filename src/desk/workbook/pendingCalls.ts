import type { Area } from "./areas.ts";

/** What a formula asks of an add-in's function. */
export interface Wanted {
  readonly functionId: string;
  /** The arguments in JSON, in order. */
  readonly arguments: readonly string[];
  /** "Data!C1", for functions that ask where they are called from. */
  readonly address: string | null;
  readonly parameterAddresses: readonly string[] | null;
  readonly cancelable: boolean;
}

export interface Call extends Wanted {
  readonly id: number;
}

/** What came back: a value, a block of values, or an error sign with the message shown beside it. */
export type CallOutcome = { readonly value: unknown } | { readonly error: string; readonly message: string };

interface Pending {
  readonly call: Call;
  readonly cell: Area;
  outcome: CallOutcome | null;
  /** Its result went into the calculation under way; the next calculation asks anew. */
  used: boolean;
  /** The calculation that asked for it last. */
  askedIn: number;
}

/** Calls under way. A formula's calls are told apart by what they ask, since one formula may make several. */
export interface Calls {
  /** The outcome of a call if it is there; otherwise has the call made, unless the same is already under way. */
  readonly ask: (cell: Area, wanted: Wanted) => CallOutcome | null;
  readonly answer: (outcomes: readonly (readonly [id: number, outcome: CallOutcome])[]) => void;
  /** A calculation is over: what it asked for goes out, what it used or no longer asks for is dropped. */
  readonly settle: () => void;
  /** Calls that have gone out and not come back. */
  readonly unanswered: () => readonly Call[];
}

export interface CallDoors {
  readonly make: (calls: readonly Call[]) => void;
  readonly cancel: (ids: readonly number[]) => void;
  /** Cells whose results arrived, each with the area its result will fill. */
  readonly arrived: (results: readonly { readonly cell: Area; readonly fills: Area }[]) => void;
}

interface State {
  readonly pending: Map<number, Pending>;
  /** Numbers of the calls of each cell. */
  readonly byCell: Map<string, Pending[]>;
  unsent: Call[];
  calculation: number;
}

const keyOf = ({ sheet, row, column }: Area): string => `${sheet} ${row} ${column}`;

export function startCalls(doors: CallDoors): Calls {
  const state: State = { pending: new Map(), byCell: new Map(), unsent: [], calculation: 1 };
  let next = 1;
  return {
    ask(cell, wanted) {
      const ofCell = state.byCell.get(keyOf(cell)) ?? [];
      let one = ofCell.find(({ call }) => isSame(call, wanted));
      if (one === undefined) {
        one = { call: { ...wanted, id: next++ }, cell, outcome: null, used: false, askedIn: 0 };
        state.byCell.set(keyOf(cell), [...ofCell, one]);
        state.pending.set(one.call.id, one);
        state.unsent.push(one.call);
      }
      one.askedIn = state.calculation;
      one.used = one.outcome !== null;
      return one.outcome;
    },
    answer: (outcomes) => answer(state, outcomes, doors),
    settle: () => settle(state, doors),
    unanswered: () =>
      [...state.pending.values()]
        .filter(({ call, outcome }) => outcome === null && !state.unsent.includes(call))
        .map(({ call }) => call),
  };
}

function isSame(call: Call, wanted: Wanted): boolean {
  return (
    call.functionId === wanted.functionId &&
    call.arguments.length === wanted.arguments.length &&
    call.arguments.every((text, index) => text === wanted.arguments[index])
  );
}

function answer(state: State, outcomes: Parameters<Calls["answer"]>[0], { arrived }: CallDoors): void {
  const results = outcomes.flatMap(([id, outcome]) => {
    // A call that was dropped meanwhile: its late answer is of no use.
    const one = state.pending.get(id);
    if (one === undefined) return [];
    one.outcome = outcome;
    return [{ cell: one.cell, fills: { ...one.cell, ...sizeOf(outcome) } }];
  });
  if (results.length > 0) arrived(results);
}

function sizeOf(outcome: CallOutcome): { readonly rows: number; readonly columns: number } {
  if (!("value" in outcome) || !Array.isArray(outcome.value)) return { rows: 1, columns: 1 };
  const [first] = outcome.value as readonly unknown[];
  return { rows: Math.max(1, outcome.value.length), columns: Array.isArray(first) ? Math.max(1, first.length) : 1 };
}

function settle(state: State, { make, cancel }: CallDoors): void {
  const cancelled: number[] = [];
  for (const [key, ofCell] of state.byCell) {
    const calculated = ofCell.some(({ askedIn }) => askedIn === state.calculation);
    const left = calculated ? ofCell.filter((one) => one.askedIn === state.calculation && !one.used) : ofCell;
    if (left.length === 0) state.byCell.delete(key);
    else state.byCell.set(key, left);
    for (const one of ofCell.filter((other) => !left.includes(other))) {
      state.pending.delete(one.call.id);
      if (one.outcome === null && one.call.cancelable && !state.unsent.includes(one.call)) cancelled.push(one.call.id);
    }
  }
  const out = state.unsent.filter(({ id }) => state.pending.has(id));
  state.unsent = [];
  state.calculation += 1;
  if (cancelled.length > 0) cancel(cancelled);
  if (out.length > 0) make(out);
}
