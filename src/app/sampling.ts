import { addressOf } from "../core/table/address.ts";
import { planSample, sampleArea } from "../sheet/sample/sampleSheet.ts";
import { readData } from "./reading.ts";
import { type Work, fail } from "./work.ts";

/** Puts invented data on a new sheet and reads them, for someone who has none at hand. */
export async function insertSample(work: Work): Promise<void> {
  const errand = work.errands.start("writing");
  const written = await work.host.write(planSample(), errand);
  if (errand.signal.aborted) return;
  if (written.ok) await readData(work, { kind: "address", address: addressOf({ ...sampleArea, ...written.value }) });
  else fail(work, written.problem);
}
