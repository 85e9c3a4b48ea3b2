import { settingsSaid } from "../core/answer/settingsSaid.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import type { ComparedModel } from "../sheet/comparison.ts";
import { planComparison } from "../sheet/comparisonSheet.ts";
import { fingerprintOf } from "./fingerprint.ts";
import type { Errand } from "./host.ts";
import { hiddenSetting } from "./sheetFacts.ts";
import { askAgain } from "./stored/checking.ts";
import { type StoredSetup, sameName } from "./stored/storedBook.ts";
import { type Work, fail } from "./work.ts";

/** Stored set-ups answered side by side, each with its own data as they stand now. */
export interface Comparison {
  readonly models: readonly ComparedModel[];
  /** Whether cells behind it have changed since. */
  readonly outdated: boolean;
}

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
): Promise<Result<readonly ComparedModel[]>> {
  if (names.length < 2) return failure({ code: "too-few-setups", setups: names.length });
  const { setups } = work.store.get().kept.book;
  const models: ComparedModel[] = [];
  for (const [index, name] of names.entries()) {
    const entry = setups.find((setup) => sameName(setup.name, name));
    if (entry === undefined) return failure({ code: "setup-gone", name });
    const model = await answerOne(work, entry, partOf(errand, { index, count: names.length, name }));
    if (!model.ok) return model;
    models.push(model.value);
  }
  return success(models);
}

async function answerOne(work: Work, entry: StoredSetup, errand: Errand): Promise<Result<ComparedModel>> {
  const { name } = entry;
  const asked = await askAgain(work, entry, { whose: `the set-up "${name}"`, errand });
  if (!asked.ok) return asked;
  const { data, question } = asked.value;
  const answer = await work.analyst.analyse(question, errand);
  return answer.ok ? success({ name, answer: answer.value, question, address: data.address }) : answer;
}

/** The share of one model in the whole. */
function partOf(
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
  const { models } = comparison;
  const errand = work.errands.start("writing");
  const facts = await Promise.all(
    models.map(async ({ question }) => ({
      fingerprint: await fingerprintOf(question),
      settings: [...settingsSaid(question.model, question.options), ...hiddenSetting(question.source)],
    })),
  );
  const { today, version } = work.edition;
  const plan = planComparison(models, { date: today(), version, models: facts });
  const written = await work.host.write(plan, errand);
  if (errand.signal.aborted) return;
  if (written.ok) work.store.dispatch({ kind: "comparison written", sheet: written.value.sheet });
  else fail(work, written.problem);
}
