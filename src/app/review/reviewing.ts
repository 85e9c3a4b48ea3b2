import type { Asked, Pointed } from "../../core/review/claimsOf.ts";
import type { Errand } from "../errand.ts";
import { type Work, fail } from "../work.ts";
import { findRegressions } from "./findRegressions.ts";
import { reviewEach } from "./reviewEach.ts";
import { type Pointing, cellsReviewed, pointedFrom } from "./reviewState.ts";

/** Lists every regression of the workbook and reviews one after the other. */
export const reviewBook = (work: Work): Promise<void> => review(work, { pointed: null, sheet: null });

/** Reviews what the selected cells report; where it cannot be read, what is missing can be said beside their address. */
export async function reviewSelection(work: Work): Promise<void> {
  const errand = work.errands.start("reading");
  const block = await work.host.read({ kind: "selection" }, errand);
  if (errand.signal.aborted) return;
  if (!block.ok) {
    fail(work, block.problem);
    return;
  }
  const { address } = block.value;
  work.store.dispatch({ kind: "pointing changed", pointing: { reported: address, outcome: "", drivers: "" } });
  await reviewPointed(work);
}

/** Reviews what is pointed at, with what is said of its data. */
export async function reviewPointed(work: Work): Promise<void> {
  const pointed: Pointed = pointedFrom(work.store.get().pointing);
  await review(work, { pointed, sheet: null });
}

/** Reviews the same again, as the cells stand now. */
export async function reviewAgain(work: Work): Promise<void> {
  const { review: inHand } = work.store.get();
  if (inHand !== null) await review(work, inHand.asked);
}

/** Reviews what is still to be reviewed, after a round that was cut short. */
export async function reviewRest(work: Work): Promise<void> {
  await finish(work, work.errands.start("reviewing"));
}

async function review(work: Work, asked: Asked): Promise<void> {
  const errand = work.errands.start("reviewing");
  const found = await findRegressions(work, asked, errand);
  if (errand.signal.aborted) return;
  if (!found.ok) {
    fail(work, found.problem);
    return;
  }
  work.store.dispatch({ kind: "regressions found", asked, found: found.value });
  const inHand = work.store.get().review;
  if (inHand !== null) await work.watchReviewed(cellsReviewed(inHand));
  await finish(work, errand);
}

async function finish(work: Work, errand: Errand): Promise<void> {
  const regressions = work.store.get().review?.regressions ?? [];
  const waiting = regressions.flatMap(({ claim, review }, index) => (review === null ? [{ claim, index }] : []));
  const claims = waiting.map(({ claim }) => claim);
  const done = await reviewEach(claims, { analyst: work.analyst, errand }, (review, at) => {
    const index = waiting[at]?.index;
    if (!errand.signal.aborted && index !== undefined)
      work.store.dispatch({ kind: "regression reviewed", index, review });
  });
  if (errand.signal.aborted) return;
  if (done.ok) work.store.dispatch({ kind: "review finished" });
  else fail(work, done.problem);
}

/** Puts the address of the selected cells into a field. */
export async function pointAtSelection(work: Work, field: keyof Pointing): Promise<void> {
  const errand = work.errands.start("reading");
  const block = await work.host.read({ kind: "selection" }, errand);
  if (errand.signal.aborted) return;
  if (block.ok) work.store.dispatch({ kind: "cells pointed at", field, address: block.value.address });
  else fail(work, block.problem);
}
