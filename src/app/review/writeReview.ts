import { planReview } from "../../sheet/reviewSheet.ts";
import { type Work, fail } from "../work.ts";
import { reviewFactsOf } from "./reviewFacts.ts";
import { reviewShown } from "./reviewState.ts";

/** Writes the reviews that are shown to a new sheet. */
export async function writeReview(work: Work): Promise<void> {
  const { review } = work.store.get();
  if (review === null) return;
  const shown = reviewShown(review);
  if (shown.claims.length === 0) return;
  const errand = work.errands.start("writing");
  const claims = shown.claims.map(({ claim }) => claim);
  const facts = await reviewFactsOf(claims, work.edition);
  const written = await work.host.write(planReview(shown, facts), errand);
  if (errand.signal.aborted) return;
  if (written.ok) work.store.dispatch({ kind: "review written", sheet: written.value.sheet });
  else fail(work, written.problem);
}
