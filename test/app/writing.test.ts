import { beforeEach, describe, expect, it } from "vitest";
import { type PaneBench, paneBench } from "../support/paneBench.ts";

let bench: PaneBench;
let host: PaneBench["host"];
let pane: PaneBench["pane"];
let questions: PaneBench["questions"];
let state: PaneBench["state"];
let said: PaneBench["said"];
let settled: PaneBench["settled"];
let read: PaneBench["read"];
let answer: PaneBench["answer"];
let write: PaneBench["write"];

beforeEach(() => {
  bench = paneBench();
  ({ host, pane, questions, state, said, settled, read, answer, write } = bench);
});

describe("an answer as text", () => {
  it("is made when asked for, with the data's fingerprint, and belongs to that answer alone", async () => {
    await read();
    await answer();
    expect(state().answered?.memo).toBeNull();
    pane.commands.makeMemo();
    await expect.poll(() => state().answered?.memo).toMatch(/Fingerprint of the data \(SHA-256\): [0-9a-f]{64}/);
    expect(state().answered?.memo).toContain(state().answered?.answer.title);
    await answer();
    expect(state().answered?.memo).toBeNull();
  });

  it("is not made without an answer", async () => {
    await read();
    pane.commands.makeMemo();
    await settled();
    expect(state().answered).toBeNull();
  });
});

describe("writing", () => {
  it("writes the answer shown, live or kept, and says where", async () => {
    await read();
    await answer();
    await write("kept");
    expect(host.plans).toHaveLength(1);
    expect(host.plans[0]?.name).toContain("Repairs");
    expect(state().written).toEqual({ sheet: host.plans[0]?.name, kind: "kept", outdated: false });
    expect(said()).toContain("as values that stay");
  });

  it("does nothing without an answer", async () => {
    await read();
    await write("live");
    expect(host.plans).toHaveLength(0);
  });

  it("says why it could not write", async () => {
    await read();
    await answer();
    host.refusals.write = { code: "workbook-protected" };
    await write("live");
    expect(state().fault).toEqual({ kind: "problem", problem: { code: "workbook-protected" } });
    expect(state().written).toBeNull();
  });

  it("leaves a kept sheet out of date when cells change, a live one not", async () => {
    await read();
    await answer();
    await write("live");
    host.change(1, 1, 3);
    expect(state().written?.outdated).toBe(false);
    await answer();
    await write("kept");
    host.change(1, 1, 4);
    expect(state().written?.outdated).toBe(true);
  });

  it("leaves a kept sheet out of date when a changed set-up is answered", async () => {
    await read();
    await answer();
    await write("kept");
    pane.store.dispatch({ kind: "role chosen", column: "Advertising", role: "unused" });
    expect(state().written?.outdated).toBe(false);
    await answer();
    expect(state()).toMatchObject({ answered: { outdated: null }, written: { outdated: true } });
  });

  it("writes no sheet again that moves by itself", async () => {
    await read();
    await answer();
    await write("live");
    host.change(1, 1, 4);
    pane.commands.redo();
    await settled();
    expect(questions).toHaveLength(2);
    expect(host.plans).toHaveLength(1);
  });

  it("redoes answer and kept sheet in one go", async () => {
    await read();
    await answer();
    await write("kept");
    host.change(1, 1, 4);
    pane.commands.redo();
    await settled();
    expect(questions).toHaveLength(2);
    expect(host.plans).toHaveLength(1);
    expect(host.keeper.rewrites.map(({ over }) => over.sheet)).toEqual([host.plans[0]?.name]);
    expect(state().written).toMatchObject({ sheet: host.plans[0]?.name, outdated: false });
  });

  it("forgets answer and sheet when other data are read", async () => {
    await read();
    await answer();
    await write("kept");
    pane.commands.read({ kind: "address", address: "Months!A1:E20" });
    await settled();
    expect(state()).toMatchObject({ answered: null, written: null, section: "data" });
  });
});
