import { type SheetKind, planAnswer } from "../sheet/answerSheet.ts";
import { fingerprintOf } from "./fingerprint.ts";
import { sheetFactsOf } from "./sheetFacts.ts";
import type { Answered } from "./state.ts";
import { recordSheet } from "./stored/recording.ts";
import { type Edition, type Work, fail } from "./work.ts";

/** Writes the answer shown to a new sheet. */
export async function writeSheet(work: Work, wanted: SheetKind): Promise<void> {
  const { answered } = work.store.get();
  if (answered === null) return;
  const kind = canBeLive(answered) ? wanted : "kept";
  const errand = work.errands.start("writing");
  const facts = sheetFactsOf(answered.question, await madeOf(answered, work.edition));
  const plan = planAnswer(answered.answer, facts, kind);
  const written = await work.host.write(plan, errand);
  if (errand.signal.aborted) return;
  if (!written.ok) {
    fail(work, written.problem);
    return;
  }
  const { sheet } = written.value;
  work.store.dispatch({ kind: "written", sheet, as: kind });
  await recordSheet(work, { sheet, kind, plan, answered });
}

/** Worksheet functions see every row of their ranges: an answer without the hidden ones is written as values. */
export const canBeLive = ({ question }: Answered): boolean => question.source.hidden?.leftOut !== true;

export const madeOf = async ({ question, headingRow, table }: Answered, { today, version }: Edition) => ({
  date: today(),
  version,
  fingerprint: await fingerprintOf(question),
  headingRow,
  table,
});

/** Shows a cell or a range in the spreadsheet. */
export async function goToCell(work: Work, address: string): Promise<void> {
  const gone = await work.host.goTo(address);
  if (gone.ok) work.store.dispatch({ kind: "said", text: `${address} is selected in the sheet.` });
  else fail(work, gone.problem);
}
