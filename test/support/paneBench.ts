import type { Analyst, Reviewer } from "../../src/app/analyst.ts";
import { type Pane, createPane } from "../../src/app/pane.ts";
import type { PaneState } from "../../src/app/state.ts";
import type { Question } from "../../src/core/answer/question.ts";
import { success } from "../../src/core/problem/result.ts";
import { answerFixture } from "./answerFixture.ts";
import { type FakeHost, fakeHost } from "./fakeHost.ts";
import { claimFixture, claimReviewFixture } from "./reviewFixture.ts";
import { repairMonths } from "./repairs.ts";

/** The pane without its looks, over a spreadsheet in memory and an analyst that does as it is told. */
export interface PaneBench {
  readonly host: FakeHost;
  readonly pane: Pane;
  /** What the next questions are answered with. */
  analyse: Analyst["analyse"];
  /** What is found when regressions are looked for, and what is said of each. */
  listClaims: Reviewer["listClaims"];
  reviewClaim: Reviewer["review"];
  /** What was asked so far. */
  readonly questions: Question[];
  /** Work under way, faults of ours not caught. */
  readonly work: Promise<void>[];
  readonly state: () => PaneState;
  readonly said: () => string;
  /** Lets all that was asked of the pane come to its end. */
  readonly settled: () => Promise<void>;
  readonly read: () => Promise<void>;
  readonly answer: () => Promise<void>;
  readonly write: (kind: "live" | "kept") => Promise<void>;
}

const months = 24;

export function paneBench(): PaneBench {
  const host = fakeHost("Months", repairMonths(months));
  const questions: Question[] = [];
  const work: Promise<void>[] = [];
  const analyst: Analyst & Reviewer = {
    analyse: (question, errand) => {
      questions.push(question);
      return bench.analyse(question, errand);
    },
    listClaims: (book, asked, errand) => bench.listClaims(book, asked, errand),
    review: (claim, errand) => bench.reviewClaim(claim, errand),
  };
  const edition = { today: () => "1 December 2026", version: "0.1.0" };
  const pane = createPane({ host, analyst, edition, guard: (task) => void work.push(task()) });
  const settled = async (): Promise<void> => {
    while (work.length > 0) await work.shift();
  };
  const carryOut = (command: () => void): Promise<void> => {
    command();
    return settled();
  };
  const bench: PaneBench = {
    host,
    pane,
    analyse: () => Promise.resolve(success(answerFixture)),
    listClaims: () => Promise.resolve(success({ claims: [claimFixture], unread: [], craft: [] })),
    reviewClaim: () => Promise.resolve(success(claimReviewFixture)),
    questions,
    work,
    state: () => pane.store.get(),
    said: () => pane.store.get().said.text,
    settled,
    read: () => carryOut(() => pane.commands.read({ kind: "selection" })),
    answer: () => carryOut(pane.commands.answer),
    write: (kind) => carryOut(() => pane.commands.write(kind)),
  };
  return bench;
}
