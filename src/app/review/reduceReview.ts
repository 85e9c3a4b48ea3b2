import { summaryOf } from "../../core/review/reviewWords.ts";
import { announce } from "../spoken.ts";
import type { PaneState } from "../state.ts";
import type { ReviewAction } from "./actions.ts";
import { shownWords } from "./listing.ts";
import { type ReviewInHand, reviewShown, takeInHand } from "./reviewState.ts";

type Of<Kind extends ReviewAction["kind"]> = Extract<ReviewAction, { kind: Kind }>;

export const reviewChanges: {
  readonly [Kind in ReviewAction["kind"]]: (state: PaneState, action: Of<Kind>) => PaneState;
} = {
  "regressions found": (state, { asked, found }) => {
    const review = takeInHand(asked, found);
    return announce(arrived({ ...state, review }), foundWords(review));
  },
  "regression reviewed": (state, { index, review }) =>
    withReview(state, (inHand) => ({
      ...inHand,
      regressions: inHand.regressions.map((regression, at) => (at === index ? { ...regression, review } : regression)),
    })),
  "reviewed cell changed": (state, { cell }) =>
    state.review === null || state.review.changedCell !== null
      ? state
      : announce(
          withReview(state, (inHand) => ({ ...inHand, changedCell: cell })),
          `${cell} has changed. The review is out of date.`,
        ),
  "review finished": (state) => announce({ ...state, busy: null }, finishedWords(state.review)),
  "regression opened": (state, { index }) => arrived(withReview(state, (inHand) => ({ ...inHand, open: index }))),
  "regressions listed": (state, { listing }) => {
    const listed = withReview(state, (inHand) => ({ ...inHand, listing: { ...inHand.listing, ...listing } }));
    const isNarrowed = listing.onlyFindings !== undefined && listed.review !== null;
    return isNarrowed ? announce(listed, shownWords(listed.review)) : listed;
  },
  "pointing changed": (state, { pointing }) => ({ ...state, pointing: { ...state.pointing, ...pointing } }),
  "cells pointed at": (state, { field, address }) =>
    announce({ ...state, busy: null, pointing: { ...state.pointing, [field]: address } }, `${address} is taken.`),
  "review written": (state, { sheet }) =>
    announce(
      withReview({ ...state, busy: null, fault: null }, (inHand) => ({ ...inHand, written: sheet })),
      `The review is written to the sheet ${sheet}.`,
    ),
  "regression taken over": (state, { data, setup }) =>
    announce(
      {
        ...arrived(state),
        ...{ section: "data", data, setup, lost: [], opened: null, waiting: null },
        ...{ answered: null, written: null, busy: null, fault: null },
      },
      `The data of the regression are in hand, from ${data.address}.`,
    ),
};

const arrived = (state: PaneState): PaneState => ({ ...state, arrivals: state.arrivals + 1 });

const withReview = (state: PaneState, change: (review: ReviewInHand) => ReviewInHand): PaneState =>
  state.review === null ? state : { ...state, review: change(state.review) };

function foundWords({ regressions, unread }: ReviewInHand): string {
  const { length } = regressions;
  const found =
    length === 0 ? "No regression was found." : `${length} ${length === 1 ? "regression" : "regressions"} found.`;
  return unread.length === 0 ? found : `${found} Could not be read: ${unread.length}.`;
}

function finishedWords(review: ReviewInHand | null): string {
  if (review === null) return "";
  const { claims } = reviewShown(review);
  const [only] = claims;
  if (only === undefined) return foundWords(review);
  return claims.length === 1 ? `The review is ready. ${only.verdict}` : summaryOf(claims);
}
