import { type Result, success } from "../../core/problem/result.ts";
import { type Work, fail } from "../work.ts";
import { type Kept, namespace, partText, readKept } from "./parts.ts";
import type { StoredBook } from "./storedBook.ts";

/** Reads what the workbook keeps, and shows it. */
export async function loadKept(work: Work): Promise<Result<Kept>> {
  const parts = await work.host.readParts(namespace);
  if (!parts.ok) return parts;
  const kept = readKept(parts.value);
  work.store.dispatch({ kind: "kept found", book: kept.book, leftAlone: kept.leftAlone });
  return success(kept);
}

/**
 * Changes what the workbook keeps, as it stands now and not as it was last read: the file may be open elsewhere too.
 * @param change - the book as it is to be, or the problem that forbids it.
 */
export async function changeKept(
  work: Work,
  change: (book: StoredBook) => Result<StoredBook>,
): Promise<Result<StoredBook>> {
  const parts = await work.host.readParts(namespace);
  if (!parts.ok) return parts;
  const { book, part, leftAlone } = readKept(parts.value);
  const changed = change(book);
  if (!changed.ok) return changed;
  const written = await work.host.writePart(part, partText(changed.value));
  if (!written.ok) return written;
  work.store.dispatch({ kind: "kept found", book: changed.value, leftAlone });
  return changed;
}

/** Shows the fault of a result that nothing else depends on. */
export function failIfNot(work: Work, result: Result<unknown>): boolean {
  if (!result.ok) fail(work, result.problem);
  return result.ok;
}
