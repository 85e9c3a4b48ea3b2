import type { Problem } from "../core/problem/problem.ts";
import { type Result, failure } from "../core/problem/result.ts";

/** How long a piece of work may take, and the signal by which its caller gives up. */
export interface Limits {
  readonly signal: AbortSignal;
  readonly seconds: number;
}

/**
 * Answers when the work does, when the caller gives up or when time is up, whichever comes first.
 * The work gets a signal of its own, which is raised in the last two cases.
 */
export async function withinLimits<T>(
  { signal, seconds }: Limits,
  work: (signal: AbortSignal) => Promise<Result<T>>,
): Promise<Result<T>> {
  if (signal.aborted) return failure({ code: "cancelled" });
  const own = new AbortController();
  let stop: (problem: Problem) => void = () => undefined;
  const stopped = new Promise<Result<T>>((resolve) => {
    stop = (problem) => {
      resolve(failure(problem));
      own.abort();
    };
  });
  const cancel = (): void => stop({ code: "cancelled" });
  const timer = setTimeout(() => stop({ code: "time-limit", seconds }), seconds * 1000);
  signal.addEventListener("abort", cancel);
  try {
    return await Promise.race([stopped, work(own.signal)]);
  } finally {
    clearTimeout(timer);
    signal.removeEventListener("abort", cancel);
  }
}
