import type { Analyst, Inquirer, Reviewer } from "../app/analyst.ts";
import type { Errand } from "../app/host.ts";
import type { Report } from "../core/answer/question.ts";
import { type Result, failure } from "../core/problem/result.ts";
import { type Tasks, tasks } from "./tasks.ts";

/** Computes on the calling thread. */
export const inlineAnalystOf = ({ analyse, inquire, listClaims, review }: Tasks): Analyst & Inquirer & Reviewer => ({
  analyse: (question, errand) => run(errand, (report) => analyse(question, report)),
  inquire: (question, inquiry, errand) => run(errand, (report) => inquire({ ...question, inquiry }, report)),
  listClaims: (book, asked, errand) => run(errand, (report) => listClaims({ ...asked, book }, report)),
  review: (claim, errand) => run(errand, (report) => review({ claim }, report)),
});

/** In Node, and in browsers where a worker cannot start. */
export const inlineAnalyst = inlineAnalystOf(tasks);

async function run<T>({ signal, progress }: Errand, compute: (report: Report) => Result<T>): Promise<Result<T>> {
  await untilPainted();
  return signal.aborted ? failure({ code: "cancelled" }) : compute((what, share) => progress({ what, share }));
}

/** One turn of the event loop, so that what was said before the thread is taken can be seen. */
const untilPainted = (): Promise<void> => new Promise((resolve) => setTimeout(resolve, 0));
