import { type SheetKind, planAnswer } from "../sheet/answerSheet.ts";
import { fingerprintOf } from "./fingerprint.ts";
import { sheetFactsOf } from "./sheetFacts.ts";
import type { Answered } from "./state.ts";
import { type Work, fail } from "./work.ts";

/** What a result sheet says of its making: the day in words, and the version. */
export interface Edition {
  readonly today: () => string;
  readonly version: string;
}

/** Writes the answer shown to a new sheet. */
export async function writeSheet(work: Work, kind: SheetKind): Promise<void> {
  const { answered } = work.store.get();
  if (answered === null) return;
  const errand = work.errands.start("writing");
  const facts = sheetFactsOf(answered.question, await madeOf(answered, work.edition));
  const written = await work.host.write(planAnswer(answered.answer, facts, kind), errand);
  if (errand.signal.aborted) return;
  if (written.ok) work.store.dispatch({ kind: "written", sheet: written.value.sheet, as: kind });
  else fail(work, written.problem);
}

const madeOf = async ({ question, headingRow }: Answered, { today, version }: Edition) => ({
  date: today(),
  version,
  fingerprint: await fingerprintOf(question),
  headingRow,
});

/** Shows a cell or a range in the spreadsheet. */
export async function goToCell(work: Work, address: string): Promise<void> {
  const gone = await work.host.goTo(address);
  if (gone.ok) work.store.dispatch({ kind: "said", text: `${address} is selected in the sheet.` });
  else fail(work, gone.problem);
}
