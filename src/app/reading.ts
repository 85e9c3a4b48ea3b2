import { takeInHand } from "./dataInHand.ts";
import type { WhereToRead } from "./host.ts";
import { carrySetup, proposeSetup } from "./proposal.ts";
import { type Work, fail } from "./work.ts";

/** Reads data and watches their cells. Choices for the same columns of the same place are kept; all else is guessed. */
export async function readData(work: Work, where: WhereToRead): Promise<void> {
  const errand = work.errands.start("reading");
  const block = await work.host.read(where, errand);
  if (errand.signal.aborted) return;
  const taken = block.ok ? takeInHand(block.value) : block;
  if (!taken.ok) {
    fail(work, taken.problem);
    return;
  }
  const data = taken.value;
  const before = work.store.get();
  const again = before.setup !== null && before.data?.address === data.address;
  const setup = again ? carrySetup(before.setup, data.columns) : proposeSetup(data.columns);
  work.store.dispatch({ kind: "read", data, setup });
  await work.watch([data.address]);
}

/** Lists the places that data can be chosen from; a host that cannot tell leaves the list empty. */
export async function listPlaces({ host, store }: Pick<Work, "host" | "store">): Promise<void> {
  const places = await host.listPlaces();
  if (places.ok) store.dispatch({ kind: "places found", places: places.value });
}
