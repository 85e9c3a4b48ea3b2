import { type Carried, bringSetup, carrySetup, usedIn } from "./carrying.ts";
import { type DataInHand, takeInHand } from "./dataInHand.ts";
import type { DataPlace, WhereToRead } from "./host.ts";
import { proposeSetup } from "./proposal.ts";
import { namePrefix } from "./keeper.ts";
import type { PaneState } from "./state.ts";
import type { Anchor } from "./stored/storedBook.ts";
import { type Work, fail } from "./work.ts";

/** Reads data and watches their cells. Choices for the same columns of the same place are kept; all else is guessed. */
export async function readData(work: Work, where: WhereToRead): Promise<void> {
  const errand = work.errands.start("reading");
  const block = await work.host.read(where, errand);
  const taken = block.ok ? await takeInHand(block.value) : block;
  if (errand.signal.aborted) return;
  if (!taken.ok) {
    fail(work, taken.problem);
    return;
  }
  const data = { ...taken.value, anchor: taken.value.anchor ?? anchorFrom(where, taken.value, work.store.get()) };
  work.store.dispatch({ kind: "read", data, ...setupFor(data, work.store.get()) });
  await work.watch([data.address]);
}

/** A name that the user chose the data by, or the one they had when they were read before. */
function anchorFrom(where: WhereToRead, { address }: DataInHand, { data }: PaneState): Anchor | null {
  if (where.kind === "place" && where.place.kind === "name") return { kind: "name", name: where.place.name };
  return data?.address === address ? data.anchor : null;
}

function setupFor(data: DataInHand, before: PaneState): Carried & Pick<PaneState, "opened"> {
  const { waiting } = before;
  if (waiting !== null) {
    const brought = bringSetup(waiting.setup, data);
    const { name } = waiting;
    if (brought.lost.length < usedIn(waiting.setup).length) return { ...brought, opened: name === "" ? null : name };
  }
  if (before.setup === null || before.data?.address !== data.address) {
    return { setup: proposeSetup(data.columns), lost: [], opened: null };
  }
  const { setup, lost } = carrySetup(before.setup, data);
  const names = data.columns.map(({ name }) => name);
  const stillLost = before.lost.filter(({ column }) => !names.includes(column.column));
  return { setup, lost: [...stillLost, ...lost], opened: before.opened };
}

/** Lists the places that data can be chosen from; a host that cannot tell leaves the list empty. */
export async function listPlaces({ host, store }: Pick<Work, "host" | "store">): Promise<void> {
  const places = await host.listPlaces();
  if (places.ok) store.dispatch({ kind: "places found", places: places.value.filter(isOffered) });
}

/** The names that Footing gave itself are for Footing. */
const isOffered = ({ kind, name }: DataPlace): boolean => kind !== "name" || !name.startsWith(namePrefix);
