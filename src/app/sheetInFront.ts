import { recordKept } from "./stored/recording.ts";
import { type Work, fail } from "./work.ts";

/** Has the functions of the sheet in front calculated again; their values come when they are ready. */
export async function recalculateSheet(work: Work): Promise<void> {
  const done = await work.host.recalculateSheet();
  if (done.ok) work.store.dispatch({ kind: "recalculated", sheet: done.value.sheet });
  else fail(work, done.problem);
}

/** Turns the live sheet in front into a kept one. */
export async function keepSheet(work: Work): Promise<void> {
  const errand = work.errands.start("keeping");
  const done = await work.host.keepSheet(errand);
  if (errand.signal.aborted) return;
  if (!done.ok) {
    fail(work, done.problem);
    return;
  }
  work.store.dispatch({ kind: "kept", sheet: done.value.sheet });
  await recordKept(work, done.value.sheet);
}
