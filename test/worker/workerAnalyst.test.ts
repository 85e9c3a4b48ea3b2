import { afterAll, beforeAll, describe, expect, it, vi } from "vitest";
import type { Answer } from "../../src/core/answer/answer.ts";
import { defaultOptions } from "../../src/core/answer/options.ts";
import type { Question } from "../../src/core/answer/question.ts";
import { failure, success } from "../../src/core/problem/result.ts";
import type { Book } from "../../src/core/review/book.ts";
import type { Source } from "../../src/core/table/source.ts";
import { inlineAnalystOf } from "../../src/worker/inlineAnalyst.ts";
import { inlineReviewerOf } from "../../src/worker/inlineReviewer.ts";
import { workerAnalyst } from "../../src/worker/workerAnalyst.ts";
import { claimFixture, claimReviewFixture } from "../support/reviewFixture.ts";
import { type Threads, threadsOf } from "../support/threadLine.ts";
import { toCellColumn } from "../support/cellColumns.ts";

const sourceOf = (...numbers: number[]): Source => ({
  rowCount: numbers.length,
  columns: [{ name: "y", place: { kind: "sheet", sheet: "S", column: 0, firstRow: 1 }, cells: toCellColumn(numbers) }],
});

const ask = (conduct: string, source = sourceOf(1, 2, 4)): Question => ({
  source,
  model: {
    outcome: { column: conduct, transform: { kind: "none" } },
    drivers: [],
    calendar: [],
    rows: { kind: "cases" },
    constant: true,
    textNumbers: [],
  },
  options: defaultOptions,
});

const emptyBook: Book = { sheets: [], names: [], calculation: "manual" };

const answerTitled = (title: string): Answer => ({ title }) as Answer;
const noFinding = () => success({ kind: "not-applicable", because: "in line" } as const);
const noReview = {
  listClaims: () => success({ claims: [], unread: [{ cell: "S!A1", why: "in line" }], craft: [] }),
  review: () => success({ ...claimReviewFixture, verdict: "in line" }),
};
const inline = {
  ...inlineAnalystOf({ analyse: () => success(answerTitled("in line")), inquire: noFinding }),
  ...inlineReviewerOf(noReview),
};
const errand = (signal = new AbortController().signal, progress: (what: string) => void = () => undefined) => ({
  signal,
  progress: ({ what }: { readonly what: string }) => progress(what),
});

describe("the analysis in a worker", () => {
  let threads: Threads;
  beforeAll(async () => {
    threads = await threadsOf("test/worker/threadTasks.ts");
  });
  afterAll(() => threads.close());
  const analyst = (seconds = 60) => workerAnalyst({ hire: threads.hire, fallback: inline, seconds });

  it("answers, says how far it has come, and sends the same data only once", async () => {
    const { analyse } = analyst();
    const source = sourceOf(3, 5, 9);
    const steps: string[] = [];
    threads.sent.length = 0;
    const first = await analyse(
      ask("sum", source),
      errand(undefined, (what) => void steps.push(what)),
    );
    const second = await analyse(ask("sum", source), errand());
    expect(first).toEqual(success({ title: "sum 17" }));
    expect(second).toEqual(first);
    expect(steps).toEqual(["counting"]);
    expect(threads.sent).toEqual(["keep", "compute", "compute"]);
  });

  it("lets the worker forget the data that was not used for longest", async () => {
    const { analyse } = analyst();
    const [a, b, c] = [sourceOf(1), sourceOf(2), sourceOf(3)];
    threads.sent.length = 0;
    for (const source of [a, b, a, c]) await analyse(ask("sum", source), errand());
    expect(threads.sent.filter((kind) => kind === "forget")).toHaveLength(1);
    expect(await analyse(ask("sum", a), errand())).toEqual(success({ title: "sum 1" }));
    expect(await analyse(ask("sum", b), errand())).toEqual(success({ title: "sum 2" }));
    expect(threads.sent.filter((kind) => kind === "keep")).toHaveLength(4);
  });

  it("answers an inquiry about the same data", async () => {
    const { analyse, inquire } = analyst();
    const source = sourceOf(3, 5, 9);
    threads.sent.length = 0;
    await analyse(ask("sum", source), errand());
    const found = await inquire(ask("sum", source), { kind: "row by row" }, errand());
    expect(found).toEqual(success({ kind: "not-applicable", because: "asked: row by row" }));
    expect(threads.sent).toEqual(["keep", "compute", "compute"]);
  });

  it("lists the regressions of a book and reviews one, without a source", async () => {
    const { listClaims, review } = analyst();
    const steps: string[] = [];
    threads.sent.length = 0;
    const listed = await listClaims(emptyBook, { pointed: null, sheet: "Handover" }, errand());
    const reviewed = await review(
      claimFixture,
      errand(undefined, (what) => void steps.push(what)),
    );
    expect(listed).toEqual(success({ claims: [], unread: [{ cell: "Handover!A1", why: "manual" }], craft: [] }));
    expect(reviewed).toEqual(success({ ...claimReviewFixture, verdict: "in the thread" }));
    expect(steps).toEqual(["trying"]);
    expect(threads.sent).toEqual(["compute", "compute"]);
  });

  it("stops a computation under way when its caller gives up, and goes on with the next", async () => {
    const { analyse } = analyst();
    const controller = new AbortController();
    const before = threads.hired();
    const endedBefore = threads.ended();
    const slow = analyse(
      ask("slow"),
      errand(controller.signal, (what) => {
        if (what === "still counting") controller.abort();
      }),
    );
    const waiting = analyse(ask("sum"), errand());
    expect(await slow).toEqual(failure({ code: "cancelled" }));
    expect(await waiting).toEqual(success({ title: "sum 7" }));
    expect(threads.hired()).toBe(before + 2);
    await vi.waitFor(() => expect(threads.ended()).toBe(endedBefore + 1), 5000);
  });

  it("takes a question off the line without touching the one under way", async () => {
    const { analyse } = analyst();
    const controller = new AbortController();
    const before = threads.hired();
    const running = analyse(ask("sum"), errand());
    const waiting = analyse(ask("slow"), errand(controller.signal));
    controller.abort();
    expect(await waiting).toEqual(failure({ code: "cancelled" }));
    expect(await running).toEqual(success({ title: "sum 7" }));
    expect(threads.hired()).toBe(before + 1);
  });

  it("ends what takes too long", async () => {
    const { analyse } = analyst(0.5);
    expect(await analyse(ask("slow"), errand())).toEqual(failure({ code: "time-limit", seconds: 0.5 }));
  });

  it("tells a fault of ours with its details and can be asked again", async () => {
    const { analyse } = analyst();
    const fault: unknown = await analyse(ask("throw"), errand()).catch((thrown: unknown) => thrown);
    expect(fault).toBeInstanceOf(Error);
    expect((fault as Error).message).toBe("told to throw");
    expect((fault as Error).stack).toContain("thread.mjs");
    expect(await analyse(ask("sum"), errand())).toEqual(success({ title: "sum 7" }));
  });

  it("survives a worker that dies", async () => {
    const { analyse } = analyst();
    await expect(analyse(ask("crash"), errand())).rejects.toThrow("The worker stopped: exit 3");
    expect(await analyse(ask("sum"), errand())).toEqual(success({ title: "sum 7" }));
  });
});

describe("where no worker can start", () => {
  it("computes in line when hiring throws", async () => {
    const hire = (): never => {
      throw new Error("not allowed here");
    };
    const { analyse, inquire, listClaims, review } = workerAnalyst({ hire, fallback: inline, seconds: 5 });
    expect(await analyse(ask("sum"), errand())).toEqual(success({ title: "in line" }));
    expect(await inquire(ask("sum"), { kind: "row by row" }, errand())).toEqual(noFinding());
    expect(await listClaims(emptyBook, { pointed: null, sheet: null }, errand())).toEqual(noReview.listClaims());
    expect(await review(claimFixture, errand())).toEqual(noReview.review());
  });

  it("computes in line when the script fails before it is ready, and does not try again", async () => {
    let tries = 0;
    const hire = () => {
      tries++;
      const line = { postMessage: () => undefined, terminate: () => undefined };
      const handlers: { onmessage: null; onmessageerror: null; onerror: ((event: object) => void) | null } = {
        onmessage: null,
        onmessageerror: null,
        onerror: null,
      };
      const whole = Object.assign(handlers, line);
      setTimeout(() => whole.onerror?.({}), 1);
      return whole;
    };
    const { analyse } = workerAnalyst({ hire, fallback: inline, seconds: 5 });
    const both = await Promise.all([analyse(ask("sum"), errand()), analyse(ask("sum"), errand())]);
    expect(both).toEqual([success({ title: "in line" }), success({ title: "in line" })]);
    expect(tries).toBe(1);
  });

  it("does not begin what was given up before", async () => {
    let begun = 0;
    const counted = inlineAnalystOf({
      analyse: () => {
        begun++;
        return success(answerTitled("in line"));
      },
      inquire: noFinding,
    });
    const controller = new AbortController();
    controller.abort();
    expect(await counted.analyse(ask("sum"), errand(controller.signal))).toEqual(failure({ code: "cancelled" }));
    expect(begun).toBe(0);
  });
});
