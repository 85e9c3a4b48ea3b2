import type { Question } from "../core/answer/question.ts";
import type { Column } from "../core/table/source.ts";
import { type SheetKind, planAnswer } from "../sheet/answerSheet.ts";
import { fingerprint } from "./fingerprint.ts";
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
  fingerprint: await fingerprint(usedColumns(question)),
  headingRow,
});

/** The columns an answer rests on, for the fingerprint: outcome, drivers, then what orders or groups the rows. */
function usedColumns({ source, model }: Question): readonly Column[] {
  const { rows } = model;
  const byRows = rows.kind === "cases" ? [] : rows.kind === "time" ? [rows.order] : [rows.by, rows.second, rows.order];
  const names = new Set([model.outcome.column, ...model.drivers.map(({ column }) => column), ...byRows]);
  return [...names].flatMap((name) => source.columns.filter((column) => column.name === name));
}

/** Shows a cell or a range in the spreadsheet. */
export async function goToCell(work: Work, address: string): Promise<void> {
  const gone = await work.host.goTo(address);
  if (gone.ok) work.store.dispatch({ kind: "said", text: `${address} is selected in the sheet.` });
  else fail(work, gone.problem);
}
