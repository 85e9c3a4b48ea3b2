import { questionOf } from "./questionOf.ts";
import { readData } from "./reading.ts";
import { type Work, fail } from "./work.ts";

/** Answers the question that the set-up asks; cells that changed since they were read are read again first. */
export async function findAnswer(work: Work): Promise<void> {
  const before = work.store.get().data;
  if (before !== null && before.changedCell !== null) {
    await readData(work, { kind: "address", address: before.address });
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
  const { address, headingRow } = data;
  const answered = { answer: answer.value, question: question.value, setup, address, headingRow };
  work.store.dispatch({ kind: "answered", answered });
}
