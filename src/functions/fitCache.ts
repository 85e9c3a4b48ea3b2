import { type Result, failure } from "../core/problem/result.ts";

/** Work in hand or done, known by what it is about. */
interface Entry<T> {
  readonly result: Promise<Result<T>>;
  readonly stop: AbortController;
  waiting: number;
  settled: boolean;
}

export type Share<T> = (
  key: string,
  signal: AbortSignal,
  work: (signal: AbortSignal) => Promise<Result<T>>,
) => Promise<Result<T>>;

/** Problems of the moment: the same question may well be answered next time. */
const passing = new Set(["time-limit", "cancelled"]);

/**
 * Lets all who ask the same thing share one piece of work, also while it is under way, and keeps the latest results.
 * Work is stopped only when the last of those who wait for it has given up.
 * @param most - how many results are kept; the one that was not asked for longest goes first.
 */
export function fitCache<T>(most: number): Share<T> {
  const entries = new Map<string, Entry<T>>();
  const begin = (key: string, work: (signal: AbortSignal) => Promise<Result<T>>): Entry<T> => {
    const stop = new AbortController();
    const entry: Entry<T> = { result: work(stop.signal), stop, waiting: 0, settled: false };
    const drop = (): void => {
      if (entries.get(key) === entry) entries.delete(key);
    };
    entry.result.then((result) => {
      entry.settled = true;
      if (!result.ok && passing.has(result.problem.code)) drop();
    }, drop);
    return entry;
  };
  return (key, signal, work) => {
    const entry = entries.get(key) ?? begin(key, work);
    entries.delete(key);
    entries.set(key, entry);
    const [oldest] = entries;
    if (entries.size > most && oldest?.[1].settled === true) entries.delete(oldest[0]);
    return waitFor(entry, signal, () => {
      if (entries.get(key) === entry) entries.delete(key);
    });
  };
}

/** Waits for shared work; one who gives up leaves the others their result. */
function waitFor<T>(entry: Entry<T>, signal: AbortSignal, forsaken: () => void): Promise<Result<T>> {
  entry.waiting++;
  return new Promise((resolve, reject) => {
    const giveUp = (): void => {
      resolve(failure({ code: "cancelled" }));
      entry.waiting--;
      if (entry.waiting > 0 || entry.settled) return;
      forsaken();
      entry.stop.abort();
    };
    signal.addEventListener("abort", giveUp, { once: true });
    entry.result.then(resolve, reject).finally(() => signal.removeEventListener("abort", giveUp));
    if (signal.aborted) giveUp();
  });
}
