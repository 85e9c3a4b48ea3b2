import { createRoot } from "react-dom/client";
import { detailsOf } from "../../../src/app/faultDetails.ts";
import { type Pane, createPane } from "../../../src/app/pane.ts";
import type { Problem } from "../../../src/core/problem/problem.ts";
import { failure, success } from "../../../src/core/problem/result.ts";
import type { BookClaims } from "../../../src/core/review/claimsOf.ts";
import { listedFunctions } from "../../../src/functions/listed.ts";
import { Outside, type WhyOutside } from "../../../src/taskpane/Outside.tsx";
import { PaneApp } from "../../../src/taskpane/PaneApp.tsx";
import { inlineAnalyst } from "../../../src/worker/inlineAnalyst.ts";
import { type FakeHost, fakeHost } from "../../support/fakeHost.ts";
import { bookReviewFixture } from "../../support/reviewFixture.ts";
import { repairMonths } from "../../support/repairs.ts";

/** What a test can reach of the page beside what a person can. */
export interface PaneStage {
  readonly host: FakeHost;
  readonly pane: Pane;
  /** Answers wait from when it is set until it is called. */
  hold: "next" | (() => void) | null;
  /** What the next answers are instead. */
  refusal: Problem | null;
  /** What is found when regressions are looked for. */
  listed: BookClaims;
  hostIsDark: boolean | null;
  /** Shows what stands in place of the pane where no spreadsheet answers. */
  readonly leave: (why: WhyOutside) => void;
}

declare global {
  interface Window {
    stage: PaneStage;
  }
}

const months = 96;
const shops = ["North", "South", "West"];

/** Months with a category, two numbers kept as text, a blank and a mark for a missing value. */
function stageRows(): ReturnType<typeof repairMonths> {
  const rows = repairMonths(months).map((cells, row) => [...cells, row === 0 ? "Shop" : shops[((row * row) % 5) % 3]!]);
  rows[14]![3] = "12.5";
  rows[20]![3] = "13.1";
  rows[30]![2] = null;
  rows[31]![2] = "n/a";
  return rows;
}

const host = fakeHost("Months", stageRows());
host.places.push(
  { kind: "table", name: "MonthsTable", address: "Months!A1:F97" },
  { kind: "name", name: "First_years", address: "Months!A1:F49" },
  { kind: "sheet", name: "Months", address: "Months!A1:F97" },
);

const pane = createPane({
  host,
  analyst: {
    analyse: async (question, errand) => {
      errand.progress({ what: "Fitting", share: 0.4 });
      if (window.stage.hold === "next") await new Promise<void>((resolve) => (window.stage.hold = resolve));
      const { refusal } = window.stage;
      return refusal === null ? inlineAnalyst.analyse(question, errand) : failure(refusal);
    },
    listClaims: () => Promise.resolve(success(window.stage.listed)),
    review: async (claim, errand) => {
      errand.progress({ what: "Trying what explains the numbers", share: 0.5 });
      if (window.stage.hold === "next") await new Promise<void>((resolve) => (window.stage.hold = resolve));
      const found = bookReviewFixture.claims.find((review) => review.claim.origin.kind === claim.origin.kind);
      return found === undefined ? failure({ code: "cancelled" }) : success({ ...found, claim });
    },
  },
  edition: { today: () => "1 December 2026", version: "0.1.0" },
  guard: (work) =>
    void work().catch((fault: unknown) =>
      pane.store.dispatch({ kind: "failed", fault: { kind: "bug", details: detailsOf(fault) } }),
    ),
});

const { claims, unread, craft } = bookReviewFixture;
const listed: BookClaims = { claims: claims.map(({ claim }) => claim), unread, craft };
const root = createRoot(document.getElementById("pane")!);
const hostIsDark = (): boolean | null => window.stage.hostIsDark;
const leave = (why: WhyOutside): void => root.render(<Outside why={why} hostIsDark={hostIsDark} />);
window.stage = { host, pane, hold: null, refusal: null, listed, hostIsDark: null, leave };
root.render(<PaneApp pane={pane} hostIsDark={hostIsDark} functions={listedFunctions} />);
