import type { Analyst } from "../app/analyst.ts";
import { withinLimits } from "../app/timeLimit.ts";
import { type Hiring, type Job, add, lineUp, remove } from "./lineUp.ts";

/**
 * Computes in a worker, one question after the other; a computation under way is cancelled by putting a new worker in
 * its place. `seconds` is how long one analysis may take, its wait in the line included.
 */
export function workerAnalyst({ hire, fallback, seconds }: Hiring & { readonly seconds: number }): Analyst {
  const line = lineUp({ hire, fallback });
  let count = 0;
  const wait = (question: Job["question"], errand: Job["errand"]): ReturnType<Analyst["analyse"]> =>
    new Promise((resolve, reject) => {
      const job: Job = { id: count++, question, errand, resolve, reject };
      errand.signal.addEventListener("abort", () => remove(line, job), { once: true });
      add(line, job);
    });
  return {
    analyse: (question, { signal, progress }) =>
      withinLimits({ signal, seconds }, (own) => wait(question, { signal: own, progress })),
  };
}
