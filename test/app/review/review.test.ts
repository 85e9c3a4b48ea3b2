import { beforeEach, describe, expect, it } from "vitest";
import { pointedFrom, reviewShown } from "../../../src/app/review/reviewState.ts";
import { areaOfData } from "../../../src/app/review/takeOver.ts";
import { failure, success } from "../../../src/core/problem/result.ts";
import type { Claim, ClaimedLine } from "../../../src/core/review/claim.ts";
import { type PaneBench, paneBench } from "../../support/paneBench.ts";
import {
  bookReviewFixture,
  claimFixture,
  claimReviewFixture,
  soundReviewFixture,
} from "../../support/reviewFixture.ts";
import { toCellColumn } from "../../support/cellColumns.ts";

let bench: PaneBench;
beforeEach(() => {
  bench = paneBench();
});

const reviews = bookReviewFixture.claims;
const findAll = (): void => {
  const { unread, craft } = bookReviewFixture;
  bench.listClaims = () => Promise.resolve(success({ claims: reviews.map(({ claim }) => claim), unread, craft }));
  bench.reviewClaim = (claim) => Promise.resolve(success(reviews.find((review) => review.claim === claim)!));
};

const run = async (command: () => void): Promise<void> => {
  command();
  await bench.settled();
};

describe("reviewing a workbook", () => {
  it("lists what is found at once, and reviews one after the other", async () => {
    findAll();
    const seen: (string | null)[][] = [];
    const { reviewClaim } = bench;
    bench.reviewClaim = (claim, errand) => {
      seen.push(bench.state().review!.regressions.map(({ review }) => review?.verdict ?? null));
      errand.progress({ what: "trying", share: 0.5 });
      seen.push([bench.state().busy!.progress.what, String(bench.state().busy!.progress.share)]);
      return reviewClaim(claim, errand);
    };
    await run(bench.pane.commands.review.book);
    expect(seen).toEqual([
      [null, null],
      ["Handover!A4:C6: trying", "0.25"],
      [claimReviewFixture.verdict, null],
      ["Sums!D2: trying", "0.75"],
    ]);
    expect(bench.state()).toMatchObject({ busy: null, fault: null, review: { open: null } });
    expect(bench.said()).toContain("2 regressions reviewed: 1 has a finding");
  });

  it("opens a single regression by itself and says its verdict", async () => {
    await run(bench.pane.commands.review.book);
    expect(bench.state().review).toMatchObject({ open: 0, regressions: [{ review: claimReviewFixture }] });
    expect(bench.said()).toBe(`The review is ready. ${claimReviewFixture.verdict}`);
  });

  it("says that nothing was found, which is no fault", async () => {
    bench.listClaims = () => Promise.resolve(success({ claims: [], unread: [], craft: [] }));
    await run(bench.pane.commands.review.book);
    expect(bench.state()).toMatchObject({ busy: null, fault: null, review: { regressions: [] } });
    expect(bench.said()).toBe("No regression was found.");
  });

  it("keeps what was reviewed when it is cancelled, and goes on with the rest", async () => {
    findAll();
    const { reviewClaim } = bench;
    bench.reviewClaim = (claim, errand) => {
      if (claim === soundReviewFixture.claim) bench.pane.commands.cancel();
      return errand.signal.aborted ? Promise.resolve(failure({ code: "cancelled" })) : reviewClaim(claim, errand);
    };
    await run(bench.pane.commands.review.book);
    expect(bench.state().busy).toBeNull();
    expect(bench.state().review!.regressions.map(({ review }) => review !== null)).toEqual([true, false]);
    const goneOver: string[] = [];
    bench.reviewClaim = (claim, errand) => {
      goneOver.push(claim.place);
      return reviewClaim(claim, errand);
    };
    await run(bench.pane.commands.review.rest);
    expect(goneOver).toEqual([soundReviewFixture.claim.place]);
    expect(bench.state().review!.regressions.map(({ review }) => review)).toEqual(reviews);
  });

  it("passes on why the workbook cannot be read, or a regression not reviewed", async () => {
    bench.host.refusals.read = { code: "cell-being-edited" };
    await run(bench.pane.commands.review.book);
    expect(bench.state()).toMatchObject({
      busy: null,
      fault: { problem: { code: "cell-being-edited" } },
      review: null,
    });
    delete bench.host.refusals.read;
    bench.reviewClaim = () => Promise.resolve(failure({ code: "time-limit", seconds: 600 }));
    await run(bench.pane.commands.review.book);
    expect(bench.state()).toMatchObject({ busy: null, fault: { problem: { code: "time-limit" } } });
  });
});

describe("cells that change after a review", () => {
  it("make it out of date, once, until it is made again", async () => {
    await run(bench.pane.commands.review.book);
    expect(bench.host.watched()).toEqual(["Handover!A4:C6", "Months!B1:B10", "Months!C1:C10"]);
    bench.host.change(5, 1, 77);
    bench.host.change(6, 1, 78);
    expect(bench.state().review?.changedCell).toBe("Months!B6");
    expect(bench.said()).toBe("Months!B6 has changed. The review is out of date.");
    await run(bench.pane.commands.review.again);
    expect(bench.state().review).toMatchObject({ changedCell: null, regressions: [{ review: claimReviewFixture }] });
  });
});

describe("pointing at a report", () => {
  it("asks about the selected cells, and keeps their address where more has to be said", async () => {
    const asked: unknown[] = [];
    bench.listClaims = (_, what) => {
      asked.push(what);
      return Promise.resolve(failure({ code: "no-report", where: "Months!A1:E25" }));
    };
    await run(bench.pane.commands.review.selection);
    expect(asked).toEqual([{ pointed: { reported: "Months!A1:E25", outcome: null, drivers: null }, sheet: null }]);
    expect(bench.state()).toMatchObject({
      fault: { problem: { code: "no-report" } },
      pointing: { reported: "Months!A1:E25", outcome: "", drivers: "" },
    });
    bench.pane.store.dispatch({ kind: "pointing changed", pointing: { outcome: "Repairs", drivers: "Price, Rain" } });
    await run(bench.pane.commands.review.pointed);
    expect(asked[1]).toEqual({
      pointed: { reported: "Months!A1:E25", outcome: "Repairs", drivers: ["Price", "Rain"] },
      sheet: null,
    });
  });

  it("puts the selected cells into a field", async () => {
    await run(() => bench.pane.commands.review.point("outcome"));
    expect(bench.state()).toMatchObject({ busy: null, pointing: { outcome: "Months!A1:E25", drivers: "" } });
    expect(bench.said()).toBe("Months!A1:E25 is taken.");
  });

  it.each([
    ["headings", "Price, Rainy days", ["Price", "Rainy days"]],
    ["a block of columns", "Months!C5:E100", ["Months!C5:C100", "Months!D5:D100", "Months!E5:E100"]],
    ["a block of rows", "C3:Z4", ["C3:Z3", "C4:Z4"]],
    ["nothing", " , ", null],
  ])("takes drivers as %s", (_, drivers, expected) => {
    expect(pointedFrom({ reported: " A1 ", outcome: " ", drivers })).toEqual({
      ...{ reported: "A1", outcome: null, drivers: expected },
    });
  });
});

describe("writing a review", () => {
  it("writes all of them from the list, one where it is open", async () => {
    findAll();
    await run(bench.pane.commands.review.book);
    await run(bench.pane.commands.review.write);
    expect(bench.host.plans[0]!.name).toBe("Repairs review");
    expect(bench.state().review!.written).toBe("Repairs review");
    bench.pane.store.dispatch({ kind: "regression opened", index: 1 });
    await run(bench.pane.commands.review.write);
    const [title] = bench.host.plans[1]!.blocks[0]!.cells[0]!;
    expect(title).toEqual({ kind: "text", text: "Review: Repairs explained by Price index" });
    expect(bench.said()).toBe("The review is written to the sheet Repairs review 2.");
  });

  it("says why it cannot", async () => {
    await run(bench.pane.commands.review.book);
    bench.host.refusals.write = { code: "workbook-protected" };
    await run(bench.pane.commands.review.write);
    expect(bench.state()).toMatchObject({ busy: null, fault: { problem: { code: "workbook-protected" } } });
  });

  it("shows with one of several the craft of its own sheets alone", async () => {
    findAll();
    await run(bench.pane.commands.review.book);
    const { review } = bench.state();
    const elsewhere = { ...bookReviewFixture.craft[0]!, cells: ["Shops!B2"] };
    const shown = reviewShown({ ...review!, craft: [...review!.craft, elsewhere], open: 0 });
    expect(shown).toEqual({ claims: [claimReviewFixture], unread: [], craft: bookReviewFixture.craft });
  });
});

describe("taking a regression over", () => {
  const line = (name: string, track: number, more: Partial<ClaimedLine> = {}): ClaimedLine => ({
    ...claimFixture.outcome,
    name,
    track,
    cells: toCellColumn([name, ...Array.from({ length: 24 }, (_, row) => row + track)]),
    from: 1,
    count: 20,
    ...more,
  });
  const claim: Claim = {
    ...claimFixture,
    outcome: line("Repairs", 1),
    drivers: [line("Rainy days", 4), line("Price index", 2, { form: "logarithm" })],
    constant: false,
    others: [line("Month", 0)],
  };

  it("reads its data with what stands before and after, and gives its columns their roles", async () => {
    await run(() => bench.pane.commands.review.takeOver(claim));
    const { data, setup, section, answered } = bench.state();
    expect(data?.address).toBe("Months!A1:E25");
    expect(section).toBe("data");
    expect(answered).toBeNull();
    expect(setup?.constant).toBe(false);
    const roles = setup?.columns.map(({ column, role, transform }) => [column, role, transform.kind]);
    expect(roles).toEqual([
      ["Month", "time", "none"],
      ["Repairs", "outcome", "none"],
      ["Price index", "driver", "logarithm"],
      ["Advertising", "unused", "none"],
      ["Rainy days", "driver", "none"],
    ]);
    expect(bench.host.watched()).toEqual(["Months!A1:E25"]);
  });

  it("says what it cannot take over", async () => {
    const twice = { ...claim, drivers: [line("Price index", 2), line("Price index", 2, { form: "square" })] };
    await run(() => bench.pane.commands.review.takeOver(twice));
    expect(bench.state().data?.notes).toContain(
      "The regression also has the square of Price index, which was not taken over: add a column with it.",
    );
    await run(() => bench.pane.commands.review.takeOver({ ...claim, drivers: [line("Rain", 4, { sheet: "Rain" })] }));
    expect(bench.state().fault).toMatchObject({ problem: { code: "regression-not-in-columns" } });
  });

  it("stops at blanks and at the ends of the cells in use", () => {
    const cells = toCellColumn(["Title", null, "Repairs", 1, 2, 3, 4, null, 9]);
    const short = (name: string, track: number) => line(name, track, { cells, first: 2, from: 5, count: 3 });
    expect(areaOfData({ ...claim, outcome: short("Repairs", 1), drivers: [short("Price", 3)], others: [] })).toEqual(
      success({ sheet: "Months", row: 4, column: 1, rows: 5, columns: 3 }),
    );
  });
});
