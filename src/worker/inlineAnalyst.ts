import type { Analyst } from "../app/analyst.ts";
import { failure } from "../core/problem/result.ts";
import { type Tasks, tasks } from "./tasks.ts";

/** Computes on the calling thread: in Node, and in browsers where a worker cannot start. */
export const inlineAnalystOf = ({ analyse }: Tasks): Analyst => ({
  analyse: async (question, { signal, progress }) => {
    await untilPainted();
    if (signal.aborted) return failure({ code: "cancelled" });
    return analyse(question, (what, share) => progress({ what, share }));
  },
});

export const inlineAnalyst = inlineAnalystOf(tasks);

/** One turn of the event loop, so that what was said before the thread is taken can be seen. */
const untilPainted = (): Promise<void> => new Promise((resolve) => setTimeout(resolve, 0));
