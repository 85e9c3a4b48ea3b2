import type { Errand } from "../app/errand.ts";
import type { Report } from "../core/answer/question.ts";
import { type Result, failure } from "../core/problem/result.ts";

/** Computes on the calling thread, after what was said before can be seen. */
export async function onThisThread<T>(
  { signal, progress }: Errand,
  compute: (report: Report) => Result<T>,
): Promise<Result<T>> {
  await untilPainted();
  return signal.aborted ? failure({ code: "cancelled" }) : compute((what, share) => progress({ what, share }));
}

/** One turn of the event loop. */
const untilPainted = (): Promise<void> => new Promise((resolve) => setTimeout(resolve, 0));
