import type { Analyst, Inquirer, Reviewer } from "../app/analyst.ts";
import type { Errand } from "../app/errand.ts";
import { withinLimits } from "../app/timeLimit.ts";
import type { Result } from "../core/problem/result.ts";
import { type Job, add, lineUp, remove } from "./lineUp.ts";
import type { WorkerLine } from "./protocol.ts";

export interface Hiring {
  readonly hire: () => WorkerLine;
  /** Who computes where a worker cannot start. */
  readonly fallback: Analyst & Inquirer & Reviewer;
  /** How long one piece of work may take, its wait in the line included. */
  readonly seconds: number;
}

/**
 * Computes in a worker, one question after the other; a computation under way is cancelled by putting a new worker in
 * its place.
 */
export function workerAnalyst({ hire, fallback, seconds }: Hiring): Analyst & Inquirer & Reviewer {
  const line = lineUp(hire);
  let count = 0;
  const compute = <T>(
    { task, asked }: Pick<Job, "task" | "asked">,
    { signal, progress }: Errand,
    otherwise: (errand: Errand) => Promise<Result<T>>,
  ): Promise<Result<T>> =>
    withinLimits({ signal, seconds }, (own) => {
      const errand = { signal: own, progress };
      return new Promise((resolve, reject) => {
        const withoutWorker = (): void => resolve(otherwise(errand));
        // A task answers with its own kind of result.
        const answer = resolve as Job["resolve"];
        const job: Job = { id: count++, task, asked, errand, resolve: answer, reject, withoutWorker };
        own.addEventListener("abort", () => remove(line, job), { once: true });
        add(line, job);
      });
    });
  return {
    analyse: (question, errand) =>
      compute({ task: "analyse", asked: question }, errand, (own) => fallback.analyse(question, own)),
    inquire: (question, inquiry, errand) =>
      compute({ task: "inquire", asked: { ...question, inquiry } }, errand, (own) =>
        fallback.inquire(question, inquiry, own),
      ),
    listClaims: (book, asked, errand) =>
      compute({ task: "listClaims", asked: { ...asked, book } }, errand, (own) =>
        fallback.listClaims(book, asked, own),
      ),
    review: (claim, errand) =>
      compute({ task: "review", asked: { claim } }, errand, (own) => fallback.review(claim, own)),
  };
}
