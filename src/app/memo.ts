import { memoOf } from "../sheet/memo.ts";
import { sheetFactsOf } from "./sheetFacts.ts";
import type { Work } from "./work.ts";
import { madeOf } from "./writing.ts";

/** Puts the answer shown into plain text, for a memo. */
export async function makeMemo({ store, edition }: Pick<Work, "store" | "edition">): Promise<void> {
  const { answered } = store.get();
  if (answered === null) return;
  const facts = sheetFactsOf(answered.question, await madeOf(answered, edition));
  const text = memoOf(answered.answer, facts);
  if (store.get().answered?.answer === answered.answer) store.dispatch({ kind: "memo made", text });
}
