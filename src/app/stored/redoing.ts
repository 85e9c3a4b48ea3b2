import type { Problem } from "../../core/problem/problem.ts";
import { type Result, success } from "../../core/problem/result.ts";
import { planAnswer } from "../../sheet/answerSheet.ts";
import type { SheetPlan } from "../../sheet/plan.ts";
import { writtenBlocks } from "../../sheet/written.ts";
import { answerOne, partOf, planOfModels } from "../comparing.ts";
import type { Errand } from "../errand.ts";
import { sheetFactsOf } from "../sheetFacts.ts";
import type { Answered } from "../state.ts";
import { type Work, fail } from "../work.ts";
import { madeOf } from "../writing.ts";
import { askAgain, checkSheets } from "./checking.ts";
import { changeRecord } from "./recording.ts";
import { type SheetStatus, canBeRedone } from "./sheetStatus.ts";
import type { ComparisonRecord, SheetRecord } from "./storedBook.ts";

/** Answers a sheet's own questions with their data as they stand now, and writes the sheet in place of itself. */
export async function redoSheet(work: Work, sheet: string): Promise<void> {
  const record = redoable(work, sheet);
  if (record === null) {
    fail(work, { code: "sheet-not-known", sheet });
    return;
  }
  const errand = work.errands.start("redoing");
  const by = { whose: `the sheet "${sheet}"`, errand };
  const renewed =
    record.kind === "comparison" ? await compareAgain(work, record, by) : await answerAgain(work, record, by);
  if (errand.signal.aborted) return;
  if (renewed.ok) await writeOver(work, { sheet, record, ...renewed.value, errand });
  else fail(work, renewed.problem);
}

/** Who asks for data again, for the fault that tells that they are gone. */
interface Asker {
  readonly whose: string;
  readonly errand: Errand;
}

/** A sheet as it is to be: what it shows, and what is to be known of it, bar its cells. */
interface Renewed {
  readonly plan: SheetPlan;
  readonly renewed: SheetRecord | ComparisonRecord;
}

async function answerAgain(work: Work, record: SheetRecord, by: Asker): Promise<Result<Renewed>> {
  const asked = await askAgain(work, record, by);
  if (!asked.ok) return asked;
  const { data, setup, question } = asked.value;
  const answer = await work.analyst.analyse(question, by.errand);
  if (!answer.ok) return answer;
  const { address, headingRow, table } = data;
  const answered = { answer: answer.value, question, setup, address, headingRow, table, outdated: null, memo: null };
  return success(await renewedBy(work, record, answered));
}

async function renewedBy({ edition }: Work, record: SheetRecord, answered: Answered): Promise<Renewed> {
  const made = await madeOf(answered, edition);
  const { answer, question, setup, address } = answered;
  const plan = planAnswer(answer, sheetFactsOf(question, made), "kept");
  return { plan, renewed: { ...record, setup, address, fingerprint: made.fingerprint } };
}

async function compareAgain(work: Work, record: ComparisonRecord, by: Asker): Promise<Result<Renewed>> {
  const models = [];
  for (const [index, entry] of record.models.entries()) {
    const errand = partOf(by.errand, { index, count: record.models.length, name: entry.name });
    const model = await answerOne(work, entry, { ...by, errand });
    if (!model.ok) return model;
    models.push(model.value);
  }
  const { plan, records } = await planOfModels(work, models);
  return success({ plan, renewed: { ...record, models: records } });
}

/** Writes the answer shown in the place of an earlier one. */
export async function redoWith(work: Work, sheet: string, answered: Answered): Promise<void> {
  const record = redoable(work, sheet);
  if (record === null || record.kind === "comparison") {
    fail(work, { code: "sheet-not-known", sheet });
    return;
  }
  const errand = work.errands.start("redoing");
  await writeOver(work, { sheet, record, ...(await renewedBy(work, record, answered)), errand });
}

function redoable({ store }: Work, sheet: string): SheetStatus["record"] {
  const status: SheetStatus | undefined = store.get().sheets.find((one) => one.sheet === sheet);
  return status !== undefined && canBeRedone(status) ? status.record : null;
}

interface Overwriting extends Renewed {
  readonly sheet: string;
  readonly record: SheetRecord | ComparisonRecord;
  readonly errand: Errand;
}

/** Refusals that come before any cell is touched. */
const untouched: readonly Problem["code"][] = ["cells-of-others", "sheet-protected", "unknown-place", "cancelled"];

async function writeOver(work: Work, { sheet, record, plan, renewed, errand }: Overwriting): Promise<void> {
  const [before, after] = [record.written ?? [], writtenBlocks(plan)];
  // Should it break off half-way, what stands there by then is known for Footing's own, old or new.
  const both = await changeRecord(work, { ...record, written: [...before, ...after] });
  if (!both.ok) {
    fail(work, both.problem);
    return;
  }
  const done = await work.host.rewrite(plan, { sheet, written: before }, errand);
  if (!done.ok) {
    if (untouched.includes(done.problem.code)) await changeRecord(work, record);
    fail(work, done.problem);
    return;
  }
  const kept = await changeRecord(work, { ...renewed, written: after });
  if (!kept.ok) {
    fail(work, kept.problem);
    return;
  }
  work.store.dispatch({ kind: "sheet redone", sheet });
  await checkSheets(work);
}
