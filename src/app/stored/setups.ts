import { type Result, failure, success } from "../../core/problem/result.ts";
import { bringSetup } from "../carrying.ts";
import { namePrefix } from "../keeper.ts";
import { type Work, fail } from "../work.ts";
import { anchorOf, isUsed, readOrigin } from "./anchors.ts";
import { changeKept, failIfNot } from "./keeping.ts";
import { type Anchor, type StoredBook, type StoredSetup, sameName } from "./storedBook.ts";

const named = ({ setups }: StoredBook, name: string): StoredSetup | undefined =>
  setups.find((setup) => sameName(setup.name, name));

/** Stores the set-up in hand under a name; the one that was opened under that name is stored anew. */
export async function storeSetup(work: Work, wanted: string): Promise<void> {
  const name = wanted.trim();
  const { data, setup, opened, kept } = work.store.get();
  if (data === null || setup === null) return;
  const refused = name === "" ? failure({ code: "setup-unnamed" }) : null;
  if (refused !== null) {
    fail(work, refused.problem);
    return;
  }
  const anchor = await anchorOf(work, data);
  if (!anchor.ok) {
    fail(work, anchor.problem);
    return;
  }
  const entry: StoredSetup = { name, anchor: anchor.value, address: data.address, setup };
  const before = named(kept.book, name);
  const changed = await changeKept(work, (book) => {
    const taken = named(book, name);
    const isOwn = opened !== null && sameName(opened, name);
    return taken !== undefined && !isOwn
      ? failure({ code: "setup-name-taken", name: taken.name })
      : success(withSetup(book, entry));
  });
  if (!failIfNot(work, changed) || !changed.ok) return;
  work.store.dispatch({ kind: "setup stored", name });
  if (before !== undefined) await forgetUnused(work, changed.value, before.anchor);
}

/** A name that Footing gave to cells goes when nothing that is kept needs it any more. */
async function forgetUnused(work: Work, book: StoredBook, anchor: Anchor): Promise<void> {
  const isOwn = anchor.kind === "name" && anchor.name.startsWith(namePrefix);
  if (!isOwn || isUsed(book, anchor)) return;
  // The data in hand may still go by that name; they get another one when it is needed.
  work.store.dispatch({ kind: "anchor lost", anchor });
  failIfNot(work, await work.host.forgetName(anchor.name));
}

/** In the order of their names, as a list is searched. */
const withSetup = (book: StoredBook, entry: StoredSetup): StoredBook => ({
  ...book,
  setups: [...book.setups.filter(({ name }) => !sameName(name, entry.name)), entry].toSorted((a, b) =>
    a.name.localeCompare(b.name, "en"),
  ),
});

/** Reads the data of a stored set-up again, wherever they have moved, and takes up what was chosen. */
export async function openSetup(work: Work, name: string): Promise<void> {
  const entry = named(work.store.get().kept.book, name);
  if (entry === undefined) {
    fail(work, { code: "setup-gone", name });
    return;
  }
  const errand = work.errands.start("reading");
  const data = await readOrigin(work.host, entry, { whose: `the set-up "${entry.name}"`, errand });
  if (errand.signal.aborted) return;
  if (!data.ok) {
    if (data.problem.code === "setup-data-gone") work.store.dispatch({ kind: "setup waits", setup: entry });
    fail(work, data.problem);
    return;
  }
  const carried = bringSetup(entry.setup, data.value);
  work.store.dispatch({ kind: "setup opened", name: entry.name, data: data.value, ...carried });
  await work.watch([data.value.address]);
}

export interface Renaming {
  readonly from: string;
  readonly to: string;
}

export async function renameSetup(work: Work, { from, to }: Renaming): Promise<void> {
  const changed = await changeKept(work, (book) => renamed(book, { from, to: to.trim() }));
  if (failIfNot(work, changed)) work.store.dispatch({ kind: "setup renamed", from, to: to.trim() });
}

function renamed(book: StoredBook, { from, to }: Renaming): Result<StoredBook> {
  const entry = named(book, from);
  if (entry === undefined) return failure({ code: "setup-gone", name: from });
  if (to === "") return failure({ code: "setup-unnamed" });
  const taken = named(book, to);
  if (taken !== undefined && taken !== entry) return failure({ code: "setup-name-taken", name: taken.name });
  const rest = { ...book, setups: book.setups.filter((one) => one !== entry) };
  return success(withSetup(rest, { ...entry, name: to }));
}

/** Takes a set-up out of the workbook, and the name of its cells with it where nothing else needs that. */
export async function removeSetup(work: Work, name: string): Promise<void> {
  const entry = named(work.store.get().kept.book, name);
  const changed = await changeKept(work, (book) =>
    success({ ...book, setups: book.setups.filter((setup) => !sameName(setup.name, name)) }),
  );
  if (!failIfNot(work, changed) || !changed.ok) return;
  work.store.dispatch({ kind: "setup removed", name });
  if (entry !== undefined) await forgetUnused(work, changed.value, entry.anchor);
}
