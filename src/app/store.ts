/** A value that changes by actions alone, and tells those who listen. */
export interface Store<State, Action> {
  readonly get: () => State;
  readonly dispatch: (action: Action) => void;
  /** Calls back after each change; answers with a way to stop. */
  readonly subscribe: (listener: () => void) => () => void;
}

export function createStore<State, Action>(
  reduce: (state: State, action: Action) => State,
  initial: State,
): Store<State, Action> {
  let state = initial;
  const listeners = new Set<() => void>();
  const dispatch = (action: Action): void => {
    const next = reduce(state, action);
    if (next === state) return;
    state = next;
    listeners.forEach((listener) => listener());
  };
  const subscribe = (listener: () => void): (() => void) => {
    listeners.add(listener);
    return () => listeners.delete(listener);
  };
  return { get: () => state, dispatch, subscribe };
}
