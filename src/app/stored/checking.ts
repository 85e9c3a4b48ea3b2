import { type Result, failure, success } from "../../core/problem/result.ts";
import type { Question } from "../../core/answer/question.ts";
import { bringSetup, lostProblem } from "../carrying.ts";
import type { DataInHand } from "../dataInHand.ts";
import { fingerprintOf } from "../fingerprint.ts";
import type { Errand } from "../errand.ts";
import { questionOf } from "../questionOf.ts";
import type { Setup } from "../setup.ts";
import { type Work, fail } from "../work.ts";
import { readOrigin } from "./anchors.ts";
import { loadKept } from "./keeping.ts";
import type { SheetStatus, Standing } from "./sheetStatus.ts";
import type { ComparisonRecord, Origin, SheetRecord } from "./storedBook.ts";

/** Something stored with its data as they stand now: the question that it asks today. */
export interface Asked {
  readonly data: DataInHand;
  readonly setup: Setup;
  readonly question: Question;
}

/** @returns "unknown-heading" where a column that takes part is gone: another question would be asked without it. */
export async function askAgain(
  work: Work,
  origin: Origin & { readonly setup: Setup },
  by: { readonly whose: string; readonly errand: Errand },
): Promise<Result<Asked>> {
  const data = await readOrigin(work.host, origin, by);
  if (!data.ok) return data;
  const { setup, lost } = bringSetup(origin.setup, data.value);
  const [first] = lost;
  if (first !== undefined) return failure(lostProblem(first));
  const question = questionOf(data.value.source, setup);
  return question.ok ? success({ data: data.value, setup, question: question.value }) : question;
}

/** Nobody waits for it, and nothing else is held up by it. */
const quietly = (): Errand => ({ signal: new AbortController().signal, progress: () => undefined });

/** Finds the result sheets of the workbook and tells of each kept one whether its data have changed since. */
export async function checkSheets(work: Work): Promise<void> {
  const kept = await loadKept(work);
  if (!kept.ok) {
    fail(work, kept.problem);
    return;
  }
  const found = await work.host.resultSheets();
  if (!found.ok) {
    fail(work, found.problem);
    return;
  }
  const records = [...kept.value.book.sheets, ...kept.value.book.comparisons];
  const statuses = found.value.map(({ sheet, record }) =>
    statusOf(
      sheet,
      records.find(({ id }) => id === record),
    ),
  );
  work.store.dispatch({ kind: "sheets found", sheets: statuses });
  const sources: { readonly address: string; readonly sheet: string }[] = [];
  for (const { sheet, record } of statuses) {
    if (record === null || record.kind === "live") continue;
    const { standing, addresses } = await standingOf(work, sheet, record);
    work.store.dispatch({ kind: "sheet checked", sheet, standing });
    sources.push(...addresses.map((address) => ({ address, sheet })));
  }
  await work.watchSources(sources);
}

type AnyRecord = SheetRecord | ComparisonRecord;

function statusOf(sheet: string, record: AnyRecord | undefined): SheetStatus {
  if (record === undefined) return { sheet, record: null, standing: { kind: "not known" } };
  return { sheet, record, standing: { kind: record.kind === "live" ? "follows" : "being checked" } };
}

/** A comparison is as current as the one of its models that is least so. */
async function standingOf(
  work: Work,
  sheet: string,
  record: AnyRecord,
): Promise<{ readonly standing: Standing; readonly addresses: readonly string[] }> {
  const asked: (Asked & { readonly same: boolean })[] = [];
  for (const origin of record.kind === "comparison" ? record.models : [record]) {
    const again = await askAgain(work, origin, { whose: `the sheet "${sheet}"`, errand: quietly() });
    if (!again.ok) return { standing: { kind: "cut off", problem: again.problem }, addresses: [] };
    asked.push({ ...again.value, same: (await fingerprintOf(again.value.question)) === origin.fingerprint });
  }
  const addresses = [...new Set(asked.map(({ data }) => data.address))];
  if (asked.some(({ same }) => !same)) return { standing: { kind: "out of date" }, addresses };
  const below = asked.map(({ data }) => data.below).find((one) => one !== null) ?? null;
  return { standing: { kind: "current", below }, addresses };
}
