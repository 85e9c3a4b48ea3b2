import { type Result, failure, success } from "../../core/problem/result.ts";
import type { Question } from "../../core/answer/question.ts";
import { bringSetup, lostProblem } from "../carrying.ts";
import type { DataInHand } from "../dataInHand.ts";
import { fingerprintOf } from "../fingerprint.ts";
import type { Errand } from "../host.ts";
import { questionOf } from "../questionOf.ts";
import type { Setup } from "../setup.ts";
import { type Work, fail } from "../work.ts";
import { readOrigin } from "./anchors.ts";
import { loadKept } from "./keeping.ts";
import type { SheetStatus, Standing } from "./sheetStatus.ts";
import type { Origin, SheetRecord } from "./storedBook.ts";

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
  const { sheets } = kept.value.book;
  const statuses = found.value.map(({ sheet, record }) =>
    statusOf(
      sheet,
      sheets.find(({ id }) => id === record),
    ),
  );
  work.store.dispatch({ kind: "sheets found", sheets: statuses });
  const sources: { readonly address: string; readonly sheet: string }[] = [];
  for (const { sheet, record } of statuses) {
    if (record?.kind !== "kept") continue;
    const { standing, address } = await standingOf(work, sheet, record);
    work.store.dispatch({ kind: "sheet checked", sheet, standing });
    if (address !== null) sources.push({ address, sheet });
  }
  await work.watchSources(sources);
}

function statusOf(sheet: string, record: SheetRecord | undefined): SheetStatus {
  if (record === undefined) return { sheet, record: null, standing: { kind: "not known" } };
  return { sheet, record, standing: { kind: record.kind === "live" ? "follows" : "being checked" } };
}

async function standingOf(
  work: Work,
  sheet: string,
  record: SheetRecord,
): Promise<{ readonly standing: Standing; readonly address: string | null }> {
  const asked = await askAgain(work, record, { whose: `the sheet "${sheet}"`, errand: quietly() });
  if (!asked.ok) return { standing: { kind: "cut off", problem: asked.problem }, address: null };
  const same = (await fingerprintOf(asked.value.question)) === record.fingerprint;
  const { address, below } = asked.value.data;
  return { standing: same ? { kind: "current", below } : { kind: "out of date" }, address };
}
