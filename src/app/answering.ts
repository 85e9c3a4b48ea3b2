import { lostProblem } from "./carrying.ts";
import { questionOf } from "./questionOf.ts";
import { readData } from "./reading.ts";
import type { PaneState } from "./state.ts";
import { type Work, fail } from "./work.ts";

/** Answers the question that the set-up asks; cells that changed since they were read are read again first. */
export async function findAnswer(work: Work): Promise<void> {
  const before = work.store.get().data;
  if (before !== null && needsReading(work.store.get())) {
    const known = work.store.get().lost;
    await readData(work, { kind: "address", address: before.address });
    const newlyLost = work.store.get().lost.find((one) => !known.includes(one));
    // An answer without a driver that was asked for would be another answer.
    if (newlyLost !== undefined) {
      fail(work, lostProblem(newlyLost));
      return;
    }
  }
  const { data, setup } = work.store.get();
  if (data === null || setup === null || data.changedCell !== null) return;
  const question = questionOf(data.source, setup);
  if (!question.ok) {
    fail(work, question.problem);
    return;
  }
  const errand = work.errands.start("answering");
  const answer = await work.analyst.analyse(question.value, errand);
  if (errand.signal.aborted) return;
  if (!answer.ok) {
    fail(work, answer.problem);
    return;
  }
  const { address, headingRow, table } = data;
  const answered = { answer: answer.value, question: question.value, setup, address, headingRow, table };
  work.store.dispatch({ kind: "answered", answered });
}

/** Cells that changed are read again; which rows are hidden is asked anew, since hiding changes no cell. */
const needsReading = ({ data, setup }: PaneState): boolean =>
  data !== null && (data.changedCell !== null || setup?.visibleOnly === true);
