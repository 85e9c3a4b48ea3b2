import { describe, expect, it } from "vitest";
import { wholeListing } from "../../../src/app/review/reviewState.ts";
import { groupsOf, isLong, listedOf, shownWords } from "../../../src/app/review/listing.ts";
import type { FoundRegression, ReviewInHand } from "../../../src/app/review/reviewState.ts";
import type { Rank } from "../../../src/core/review/finding.ts";
import { success } from "../../../src/core/problem/result.ts";
import { paneBench } from "../../support/paneBench.ts";
import { claimReviewFixture, gravest, slight, smaller, soundReviewFixture } from "../../support/reviewFixture.ts";

const findings = { "changes the conclusion": gravest, "changes a number": smaller, "worth knowing": slight };

/** A regression at a place, with one finding of a rank, with none, or not reviewed yet. */
const found = (place: string, came: Rank | "sound" | "waiting"): FoundRegression => {
  const claim = { ...claimReviewFixture.claim, place };
  const review =
    came === "sound"
      ? { ...soundReviewFixture, claim }
      : came === "waiting"
        ? null
        : { ...claimReviewFixture, claim, findings: [findings[came]] };
  return { claim, review };
};

const regressions = [
  found("Prices!B2", "changes the conclusion"),
  found("'It''s costs'!A1:D4", "sound"),
  found("Prices!B3", "changes a number"),
  found("Prices!B4", "changes a number"),
  found("Prices!B5", "sound"),
  found("Prices!B6", "waiting"),
  found("'It''s costs'!A9", "worth knowing"),
  found("Weeks!A1", "sound"),
];

describe("the list of a workbook's regressions", () => {
  it("is parted by sheets, each with its counts, in the order in which they were found", () => {
    const groups = groupsOf({ regressions, listing: wholeListing });
    expect(groups.map(({ sheet, count, gravest: rank, words }) => [sheet, count, rank, words])).toEqual([
      [
        "Prices",
        5,
        "changes the conclusion",
        "1 changes the conclusion, 2 change a number, 1 nothing found, 1 not reviewed yet",
      ],
      ["It's costs", 2, "worth knowing", "1 worth knowing, 1 nothing found"],
      ["Weeks", 1, null, "1 nothing found"],
    ]);
    expect(groups.flatMap(({ entries }) => entries.map(({ index }) => index))).toEqual([0, 2, 3, 4, 5, 1, 6, 7]);
  });

  it("is narrowed to those with findings, its counts staying those of all", () => {
    const listing = { open: [], onlyFindings: true };
    expect(listedOf({ regressions, listing }).map(({ index }) => index)).toEqual([0, 2, 3, 6]);
    expect(
      groupsOf({ regressions, listing }).map(({ sheet, count, entries }) => [sheet, count, entries.length]),
    ).toEqual([
      ["Prices", 5, 3],
      ["It's costs", 2, 1],
    ]);
    const review = { regressions, listing } as unknown as ReviewInHand;
    expect(shownWords(review)).toBe("4 of 8 regressions shown. Not reviewed yet: 1.");
    expect(shownWords({ ...review, listing: wholeListing })).toBe("All 8 regressions shown.");
  });

  it("is long from thirteen on", () => {
    const many = (count: number) => ({ regressions: Array.from({ length: count }, () => regressions[0]!) });
    expect([isLong(many(12)), isLong(many(13))]).toEqual([false, true]);
  });

  it("keeps what is open and how it is narrowed while a regression is looked at, and says what is shown", async () => {
    const bench = paneBench();
    const claims = regressions.map(({ claim }) => claim);
    bench.listClaims = () => Promise.resolve(success({ claims, unread: [], craft: [] }));
    bench.reviewClaim = (claim) =>
      Promise.resolve(success(regressions.find((one) => one.claim === claim)?.review ?? claimReviewFixture));
    bench.pane.commands.review.book();
    await bench.settled();
    const { dispatch } = bench.pane.store;
    dispatch({ kind: "regressions listed", listing: { open: ["Prices"] } });
    dispatch({ kind: "regressions listed", listing: { onlyFindings: true } });
    expect(bench.said()).toBe("5 of 8 regressions shown.");
    dispatch({ kind: "regression opened", index: 2 });
    dispatch({ kind: "regression opened", index: null });
    expect(bench.state().review!.listing).toEqual({ open: ["Prices"], onlyFindings: true });
  });
});
