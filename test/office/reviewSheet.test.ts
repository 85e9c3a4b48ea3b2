import { afterEach, beforeEach, expect, it } from "vitest";
import { planReview } from "../../src/sheet/reviewSheet.ts";
import { bookOf, sheetOf } from "../support/deskBook.ts";
import { type DeskHost, errand, openDeskHost } from "../support/deskHost.ts";
import { bookReviewFixture, claimFixture, claimReviewFixture } from "../support/reviewFixture.ts";

const facts = { date: "1 December 2026", version: "0.0.0", fingerprints: ["ab".repeat(32), "cd".repeat(32)] };
const book = bookOf(
  sheetOf("Handover", [
    ["Driver", "Coefficient"],
    ["Price", 1.5],
  ]),
  sheetOf("Repairs review", [["mine"]]),
);

let at: DeskHost;
beforeEach(async () => {
  at = await openDeskHost(book);
});
afterEach(() => at.desk.close());

it("stands beside the user's sheets, not among the result sheets, and is no data of the next review", async () => {
  const written = await at.host.write(planReview(bookReviewFixture, facts), errand());
  expect(written).toEqual({ ok: true, value: { sheet: "Repairs review 2" } });
  expect(await at.host.resultSheets()).toEqual({ ok: true, value: [] });
  const read = await at.host.readBook(errand());
  expect(read.ok && read.value.sheets.map(({ sheet }) => sheet)).toEqual(["Handover", "Repairs review"]);
  const { sheets } = at.desk.snapshot();
  expect(sheets[1]!.rows).toEqual([["mine"]]);
});

it("executes nothing of what the data hold", async () => {
  const name = '=HYPERLINK("x","y")';
  const claim = { ...claimFixture, outcome: { ...claimFixture.outcome, name } };
  const review = { ...claimReviewFixture, claim, verdict: "=1+1" };
  await at.host.write(planReview({ claims: [review], unread: [], craft: [] }, facts), errand());
  const { sheets } = at.desk.snapshot();
  const text = JSON.stringify(sheets.at(-1)!.rows);
  expect(text).not.toContain('"formula":');
  expect(text).toContain("=1+1");
  expect(text).toContain("=HYPERLINK");
});
