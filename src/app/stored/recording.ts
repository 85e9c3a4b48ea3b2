import { success } from "../../core/problem/result.ts";
import type { SheetKind } from "../../sheet/answerSheet.ts";
import type { SheetPlan } from "../../sheet/plan.ts";
import { writtenBlocks } from "../../sheet/written.ts";
import { fingerprintOf } from "../fingerprint.ts";
import type { Answered } from "../state.ts";
import { type Work, fail } from "../work.ts";
import { askAgain, checkSheets } from "./checking.ts";
import { changeKept } from "./keeping.ts";
import { type Anchor, type ComparisonRecord, type SheetRecord, withNewRecord, withRecord } from "./storedBook.ts";

export interface WrittenSheet {
  readonly sheet: string;
  readonly kind: SheetKind;
  readonly plan: SheetPlan;
  readonly answered: Answered;
}

/** Keeps what a sheet was made from, so that it can be told later when that has changed. */
export async function recordSheet(work: Work, { sheet, kind, plan, answered }: WrittenSheet): Promise<void> {
  const anchor = await anchorFor(work, answered);
  if (!anchor.ok) {
    fail(work, anchor.problem);
    return;
  }
  const record: SheetRecord = {
    id: crypto.randomUUID(),
    kind,
    setup: answered.setup,
    anchor: anchor.value,
    address: answered.address,
    fingerprint: await fingerprintOf(answered.question),
    written: kind === "live" ? null : writtenBlocks(plan),
  };
  await keepRecord(work, sheet, record);
}

/** Marks a sheet with the id of its record, and keeps the record in the workbook. */
export async function keepRecord(work: Work, sheet: string, record: SheetRecord | ComparisonRecord): Promise<void> {
  const tagged = await work.host.tagSheet(sheet, record.id);
  if (!tagged.ok) {
    fail(work, tagged.problem);
    return;
  }
  const present = await work.host.resultSheets();
  if (!present.ok) {
    fail(work, present.problem);
    return;
  }
  const ids = present.value.map((one) => one.record);
  const changed = await changeKept(work, (book) => success(withNewRecord(book, record, ids)));
  if (!changed.ok) {
    fail(work, changed.problem);
    return;
  }
  await checkSheets(work);
}

/** The data may have been chosen by a name of the user's; where other data are in hand by now, their cells get one. */
async function anchorFor({ host, store }: Work, { address }: Answered) {
  const { data } = store.get();
  if (data !== null && data.address === address && data.anchor !== null) return success(data.anchor);
  const named = await host.nameCells(address);
  if (!named.ok) return named;
  const anchor: Anchor = { kind: "name", name: named.value.name };
  store.dispatch({ kind: "anchored", address, anchor });
  return success(anchor);
}

/** Keeps a record in the place of the one that has its id. */
export const changeRecord = (work: Work, record: SheetRecord | ComparisonRecord) =>
  changeKept(work, (book) => success(withRecord(book, record)));

/** A live sheet that was turned into a kept one holds what its data said then; its cells are not told apart from others. */
export async function recordKept(work: Work, sheet: string): Promise<void> {
  const record = work.store.get().sheets.find((one) => one.sheet === sheet)?.record ?? null;
  if (record === null || record.kind === "comparison") return;
  const errand = { signal: new AbortController().signal, progress: () => undefined };
  const asked = await askAgain(work, record, { whose: `the sheet "${sheet}"`, errand });
  if (!asked.ok) {
    fail(work, asked.problem);
    return;
  }
  const fingerprint = await fingerprintOf(asked.value.question);
  const changed = await changeRecord(work, { ...record, kind: "kept", fingerprint, written: null });
  if (!changed.ok) {
    fail(work, changed.problem);
    return;
  }
  await checkSheets(work);
}
