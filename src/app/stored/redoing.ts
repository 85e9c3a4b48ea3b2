import type { Problem } from "../../core/problem/problem.ts";
import { type Result, success } from "../../core/problem/result.ts";
import { planAnswer } from "../../sheet/answerSheet.ts";
import { writtenBlocks } from "../../sheet/written.ts";
import type { Errand } from "../host.ts";
import { sheetFactsOf } from "../sheetFacts.ts";
import type { Answered } from "../state.ts";
import { type Work, fail } from "../work.ts";
import { madeOf } from "../writing.ts";
import { askAgain, checkSheets } from "./checking.ts";
import { changeRecord } from "./recording.ts";
import { type SheetStatus, canBeRedone } from "./sheetStatus.ts";
import type { SheetRecord } from "./storedBook.ts";

/** Answers a kept sheet's own question with its data as they stand now, and writes the sheet in place of itself. */
export async function redoSheet(work: Work, sheet: string): Promise<void> {
  const record = redoable(work, sheet);
  if (record === null) {
    fail(work, { code: "sheet-not-known", sheet });
    return;
  }
  const errand = work.errands.start("redoing");
  const answered = await answerAgain(work, record, { whose: `the sheet "${sheet}"`, errand });
  if (errand.signal.aborted) return;
  if (answered.ok) await writeOver(work, { sheet, record, answered: answered.value, errand });
  else fail(work, answered.problem);
}

async function answerAgain(
  work: Work,
  record: SheetRecord,
  by: { readonly whose: string; readonly errand: Errand },
): Promise<Result<Answered>> {
  const asked = await askAgain(work, record, by);
  if (!asked.ok) return asked;
  const { data, setup, question } = asked.value;
  const answer = await work.analyst.analyse(question, by.errand);
  if (!answer.ok) return answer;
  const { address, headingRow, table } = data;
  return success({ answer: answer.value, question, setup, address, headingRow, table, outdated: null, memo: null });
}

/** Writes the answer shown in the place of an earlier one. */
export async function redoWith(work: Work, sheet: string, answered: Answered): Promise<void> {
  const record = redoable(work, sheet);
  if (record === null) {
    fail(work, { code: "sheet-not-known", sheet });
    return;
  }
  await writeOver(work, { sheet, record, answered, errand: work.errands.start("redoing") });
}

function redoable({ store }: Work, sheet: string): SheetRecord | null {
  const status: SheetStatus | undefined = store.get().sheets.find((one) => one.sheet === sheet);
  return status !== undefined && canBeRedone(status) ? status.record : null;
}

interface Overwriting {
  readonly sheet: string;
  readonly record: SheetRecord;
  readonly answered: Answered;
  readonly errand: Errand;
}

/** Refusals that come before any cell is touched. */
const untouched: readonly Problem["code"][] = ["cells-of-others", "sheet-protected", "unknown-place", "cancelled"];

async function writeOver(work: Work, { sheet, record, answered, errand }: Overwriting): Promise<void> {
  const made = await madeOf(answered, work.edition);
  const plan = planAnswer(answered.answer, sheetFactsOf(answered.question, made), "kept");
  const [before, after] = [record.written ?? [], writtenBlocks(plan)];
  // Should it break off half-way, what stands there by then is known for Footing's own, old or new.
  const both = await changeRecord(work, record.id, (one) => ({ ...one, written: [...before, ...after] }));
  if (!both.ok) {
    fail(work, both.problem);
    return;
  }
  const done = await work.host.rewrite(plan, { sheet, written: before }, errand);
  if (!done.ok) {
    if (untouched.includes(done.problem.code)) await changeRecord(work, record.id, () => record);
    fail(work, done.problem);
    return;
  }
  const { setup, address } = answered;
  const { fingerprint } = made;
  const kept = await changeRecord(work, record.id, (one) => ({ ...one, setup, address, fingerprint, written: after }));
  if (!kept.ok) {
    fail(work, kept.problem);
    return;
  }
  work.store.dispatch({ kind: "sheet redone", sheet });
  await checkSheets(work);
}
