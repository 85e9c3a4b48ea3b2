import { beforeEach, describe, expect, it } from "vitest";
import { type PaneBench, paneBench } from "../support/paneBench.ts";
import type { PaneState } from "../../src/app/state.ts";
import { success } from "../../src/core/problem/result.ts";
import { answerFixture } from "../support/answerFixture.ts";
let bench: PaneBench;
let host: PaneBench["host"];
let pane: PaneBench["pane"];
let questions: PaneBench["questions"];
let work: PaneBench["work"];
let state: PaneBench["state"];
let said: PaneBench["said"];
let settled: PaneBench["settled"];
let read: PaneBench["read"];
let answer: PaneBench["answer"];

beforeEach(() => {
  bench = paneBench();
  ({ host, pane, questions, work, state, said, settled, read, answer } = bench);
});

const address = "Months!A1:E25";

describe("reading", () => {
  it("brings data, guessed roles and a word of it", async () => {
    await read();
    expect(state().data).toMatchObject({ address, changedCell: null, headingRow: 0 });
    expect(state().setup?.columns.map(({ role, guessed }) => `${role} ${guessed}`)).toEqual([
      "time true",
      "outcome true",
      "driver true",
      "driver true",
      "driver true",
    ]);
    expect(said()).toBe("Read 24 rows and 5 columns from Months!A1:E25.");
    expect(state().arrivals).toBe(1);
  });

  it("shows what is under way, and how far", async () => {
    const seen: (PaneState["busy"] | null)[] = [];
    pane.store.subscribe(() => seen.push(state().busy));
    await read();
    expect(seen).toContainEqual({ with: "reading", progress: { what: "Reading the cells", share: 0.25 } });
    expect(state().busy).toBeNull();
  });

  it("watches the cells it read, and those alone", async () => {
    await read();
    expect(host.watched()).toEqual([address]);
    pane.commands.read({ kind: "address", address: "Months!A1:E20" });
    await settled();
    expect(host.watched()).toEqual(["Months!A1:E20"]);
  });

  it("says why it could not read, and keeps what it had", async () => {
    await read();
    host.refusals.read = { code: "chart-selected" };
    await read();
    expect(state().fault).toEqual({ kind: "problem", problem: { code: "chart-selected" } });
    expect(state().data?.address).toBe(address);
    expect(state().busy).toBeNull();
  });

  it("can be cancelled; what comes late is dropped", async () => {
    let release: () => void = () => undefined;
    host.hold = () => new Promise((resolve) => void (release = resolve));
    pane.commands.read({ kind: "selection" });
    pane.commands.cancel();
    expect(state().busy).toBeNull();
    expect(said()).toBe("Cancelled.");
    release();
    await settled();
    expect(state().data).toBeNull();
    expect(state().fault).toBeNull();
  });

  it("drops what comes late from a host that heeds no signal", async () => {
    let release: () => void = () => undefined;
    host.heedless = true;
    host.hold = () => new Promise((resolve) => void (release = resolve));
    pane.commands.read({ kind: "selection" });
    pane.commands.cancel();
    release();
    await settled();
    expect(state().data).toBeNull();
  });

  it("takes a cancelling on the host's side for what it is", async () => {
    host.refusals.read = { code: "cancelled" };
    await read();
    expect(state()).toMatchObject({ busy: null, fault: null, said: { text: "Cancelled." } });
  });

  it("gives way to a second reading", async () => {
    const releases: (() => void)[] = [];
    host.hold = () => new Promise((resolve) => void releases.push(resolve));
    pane.commands.read({ kind: "address", address: "Months!A1:E10" });
    pane.commands.read({ kind: "address", address: "Months!A1:E20" });
    releases.toReversed().forEach((release) => release());
    await settled();
    expect(state().data?.address).toBe("Months!A1:E20");
  });

  it("keeps choices for the same cells, and guesses anew for others", async () => {
    await read();
    pane.store.dispatch({ kind: "role chosen", column: "Advertising", role: "unused" });
    await read();
    expect(state().setup?.columns[3]).toMatchObject({ column: "Advertising", role: "unused", guessed: false });
    pane.commands.read({ kind: "address", address: "Months!A1:E20" });
    await settled();
    expect(state().setup?.columns[3]).toMatchObject({ column: "Advertising", role: "driver", guessed: true });
  });

  it("leaves a column that is new among the same cells unused until it is given a role", async () => {
    await read();
    host.rows = host.rows.map((cells, row) =>
      cells.map((cell, column) => (row === 0 && column === 4 ? "Wet days" : cell)),
    );
    await read();
    expect(state().setup?.columns[4]).toMatchObject({ column: "Wet days", role: "unused", guessed: true });
  });
});

describe("answering", () => {
  it("shows no progress of work that has been given up", async () => {
    await read();
    const told: ((share: number) => void)[] = [];
    bench.analyse = (_, { progress }) => {
      told.push((share) => progress({ what: "Fitting", share }));
      return new Promise(() => undefined);
    };
    pane.commands.answer();
    pane.commands.answer();
    await Promise.resolve();
    told[1]?.(0.75);
    told[0]?.(0.25);
    expect(state().busy?.progress.share).toBe(0.75);
  });

  it("asks what the set-up says and brings the user to the answer", async () => {
    await read();
    await answer();
    expect(questions[0]?.model.outcome.column).toBe("Repairs");
    expect(state()).toMatchObject({ section: "answer", arrivals: 2, busy: null });
    expect(state().answered).toMatchObject({ answer: answerFixture, address, headingRow: 0, outdated: null });
    expect(said()).toContain("Price matters.");
  });

  it("stays where the user is when it is asked from elsewhere", async () => {
    await read();
    await answer();
    pane.store.dispatch({ kind: "shown", section: "evidence" });
    await answer();
    expect(state()).toMatchObject({ section: "evidence", arrivals: 2 });
  });

  it("says what stands in the way without asking", async () => {
    await read();
    pane.store.dispatch({ kind: "role chosen", column: "Repairs", role: "unused" });
    await answer();
    expect(state().fault).toEqual({ kind: "problem", problem: { code: "no-outcome" } });
    expect(questions).toHaveLength(0);
  });

  it("does nothing without data", async () => {
    await answer();
    expect(questions).toHaveLength(0);
    expect(state().fault).toBeNull();
  });

  it("passes the analyst's fault on", async () => {
    bench.analyse = () => Promise.resolve({ ok: false, problem: { code: "perfect-fit", column: "Repairs" } });
    await read();
    await answer();
    expect(state().fault).toEqual({ kind: "problem", problem: { code: "perfect-fit", column: "Repairs" } });
    expect(state().answered).toBeNull();
  });

  it("can be cancelled, which raises the signal", async () => {
    let raised = false;
    bench.analyse = (_, { signal }) =>
      new Promise((resolve) =>
        signal.addEventListener("abort", () => {
          raised = true;
          resolve({ ok: false, problem: { code: "cancelled" } });
        }),
      );
    await read();
    pane.commands.answer();
    await new Promise((resolve) => setTimeout(resolve, 0));
    expect(state().busy?.with).toBe("answering");
    pane.commands.cancel();
    await settled();
    expect(raised).toBe(true);
    expect(state()).toMatchObject({ busy: null, fault: null, answered: null, section: "data" });
  });

  it("lets a fault of ours through to the one who guards", async () => {
    await read();
    bench.analyse = () => Promise.reject(new Error("broken"));
    pane.commands.answer();
    await expect(work[0]).rejects.toThrow("broken");
  });

  it("is out of date as soon as the set-up changes, also while it is being found", async () => {
    await read();
    bench.analyse = () => {
      pane.store.dispatch({ kind: "setup changed", change: { constant: false } });
      return Promise.resolve(success(answerFixture));
    };
    await answer();
    expect(state().answered?.outdated).toEqual({ because: "set-up" });
  });
});

describe("cells that change", () => {
  it("make data and answer out of date, once", async () => {
    await read();
    await answer();
    host.change(5, 1, 77);
    host.change(6, 1, 78);
    expect(state().data?.changedCell).toBe("Months!B6");
    expect(state().answered?.outdated).toEqual({ because: "cells", cell: "Months!B6" });
    expect(said()).toBe("Months!B6 has changed. The answer is out of date.");
  });

  it("are read again before the next answer", async () => {
    await read();
    await answer();
    host.change(1, 1, 777);
    await answer();
    expect(questions[1]?.source.columns[1]?.cells.numbers[0]).toBe(777);
    expect(state()).toMatchObject({ section: "answer", data: { changedCell: null }, answered: { outdated: null } });
  });

  it("while the answer is being found leave it out of date", async () => {
    await read();
    bench.analyse = () => {
      host.change(3, 1, 5);
      return Promise.resolve(success(answerFixture));
    };
    await answer();
    expect(state().answered?.outdated).toEqual({ because: "cells", cell: "Months!B4" });
  });

  it("are watched for the latest data alone", async () => {
    await read();
    pane.commands.read({ kind: "address", address: "Months!A1:E20" });
    await settled();
    host.listeners[0]?.("Months!B2");
    expect(state().data?.changedCell).toBeNull();
    host.listeners[1]?.("Months!B3");
    expect(state().data?.changedCell).toBe("Months!B3");
  });

  it("stop the answer where they can no longer be read", async () => {
    await read();
    await answer();
    host.change(1, 1, 8);
    host.refusals.read = { code: "cell-being-edited" };
    await answer();
    expect(questions).toHaveLength(1);
    expect(state().fault).toEqual({ kind: "problem", problem: { code: "cell-being-edited" } });
  });
});

describe("the rest of the pane", () => {
  it("lists the places to choose from", async () => {
    const place = { kind: "table", name: "MonthsTable", address } as const;
    host.places.push(place);
    pane.commands.open();
    await settled();
    expect(state().places).toEqual([place]);
  });

  it("goes to a cell and says so; says why it cannot", async () => {
    pane.commands.goTo("Months!C14");
    await settled();
    expect(host.gone).toEqual(["Months!C14"]);
    expect(said()).toBe("Months!C14 is selected in the sheet.");
    host.refusals.goTo = { code: "unknown-place", place: "Months!C14", nearest: null };
    pane.commands.goTo("Months!C14");
    await settled();
    expect(state().fault).toMatchObject({ problem: { code: "unknown-place" } });
  });

  it("counts what is said, so that the same words can be heard twice", () => {
    pane.store.dispatch({ kind: "said", text: "Once." });
    const before = state().said.count;
    pane.store.dispatch({ kind: "said", text: "Once." });
    expect(state().said).toEqual({ text: "Once.", count: before + 1 });
  });

  it("takes a fault away when it is dismissed, and when the next work begins", async () => {
    pane.store.dispatch({ kind: "failed", fault: { kind: "bug", details: "x" } });
    pane.store.dispatch({ kind: "dismissed" });
    expect(state().fault).toBeNull();
    pane.store.dispatch({ kind: "failed", fault: { kind: "bug", details: "x" } });
    await read();
    expect(state().fault).toBeNull();
  });
});
