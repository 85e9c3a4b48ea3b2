import { settingsSaid } from "../core/answer/settingsSaid.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import { planComparison } from "../sheet/comparisonSheet.ts";
import type { SheetPlan } from "../sheet/plan.ts";
import { writtenBlocks } from "../sheet/written.ts";
import type { AnsweredModel } from "./compared.ts";
import { fingerprintOf } from "./fingerprint.ts";
import type { Errand } from "./errand.ts";
import { hiddenSetting } from "./sheetFacts.ts";
import { askAgain } from "./stored/checking.ts";
import { keepRecord } from "./stored/recording.ts";
import { type ModelRecord, type StoredSetup, sameName } from "./stored/storedBook.ts";
import { type Work, fail } from "./work.ts";

export async function compareSetups(work: Work, names: readonly string[]): Promise<void> {
  const errand = work.errands.start("comparing");
  const models = await answerAll(work, names, errand);
  if (errand.signal.aborted) return;
  if (!models.ok) {
    fail(work, models.problem);
    return;
  }
  work.store.dispatch({ kind: "compared", models: models.value });
  await work.watchCompared(models.value.map(({ address, name }) => ({ address, sheet: name })));
}

async function answerAll(
  work: Work,
  names: readonly string[],
  errand: Errand,
): Promise<Result<readonly AnsweredModel[]>> {
  if (names.length < 2) return failure({ code: "too-few-setups", setups: names.length });
  const { setups } = work.store.get().kept.book;
  const models: AnsweredModel[] = [];
  for (const [index, name] of names.entries()) {
    const entry = setups.find((setup) => sameName(setup.name, name));
    if (entry === undefined) return failure({ code: "setup-gone", name });
    const part = partOf(errand, { index, count: names.length, name });
    const model = await answerOne(work, entry, { whose: `the set-up "${entry.name}"`, errand: part });
    if (!model.ok) return model;
    models.push(model.value);
  }
  return success(models);
}

/** Answers one model with its data as they stand now. */
export async function answerOne(
  work: Work,
  { name, anchor, ...entry }: StoredSetup,
  by: { readonly whose: string; readonly errand: Errand },
): Promise<Result<AnsweredModel>> {
  const asked = await askAgain(work, { ...entry, anchor }, by);
  if (!asked.ok) return asked;
  const { data, setup, question } = asked.value;
  const answer = await work.analyst.analyse(question, by.errand);
  return answer.ok ? success({ name, answer: answer.value, question, address: data.address, setup, anchor }) : answer;
}

/** The share of one model in the whole. */
export function partOf(
  errand: Errand,
  part: { readonly index: number; readonly count: number; readonly name: string },
): Errand {
  const { index, count, name } = part;
  return {
    ...errand,
    progress: ({ what, share }) => errand.progress({ what: `${name}: ${what}`, share: (index + (share ?? 0)) / count }),
  };
}

/** Writes the comparison shown to a new sheet. */
export async function writeComparison(work: Work): Promise<void> {
  const { comparison } = work.store.get();
  if (comparison === null) return;
  const errand = work.errands.start("writing");
  const { plan, records } = await planOfModels(work, comparison.models);
  const written = await work.host.write(plan, errand);
  if (errand.signal.aborted) return;
  if (!written.ok) {
    fail(work, written.problem);
    return;
  }
  const { sheet } = written.value;
  work.store.dispatch({ kind: "comparison written", sheet });
  const id = crypto.randomUUID();
  await keepRecord(work, sheet, { id, kind: "comparison", models: records, written: writtenBlocks(plan) });
}

/** The sheet of a comparison, and what is to be known of its models. */
export async function planOfModels(
  { edition }: Pick<Work, "edition">,
  models: readonly AnsweredModel[],
): Promise<{ readonly plan: SheetPlan; readonly records: readonly ModelRecord[] }> {
  const fingerprints = await Promise.all(models.map(({ question }) => fingerprintOf(question)));
  const facts = models.map(({ question }, index) => ({
    fingerprint: fingerprints[index]!,
    settings: [...settingsSaid(question.model, question.options), ...hiddenSetting(question.source)],
  }));
  const plan = planComparison(models, { date: edition.today(), version: edition.version, models: facts });
  const records = models.map(({ name, setup, anchor, address }, index) => ({
    name,
    setup,
    anchor,
    address,
    fingerprint: fingerprints[index]!,
  }));
  return { plan, records };
}
