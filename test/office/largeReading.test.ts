import { describe, expect, it } from "vitest";
import type { BookCell } from "../../src/desk/book/bookData.ts";
import { bookOf, sheetOf } from "../support/deskBook.ts";
import { errand, openDeskHost } from "../support/deskHost.ts";

describe("reading more than Excel gives at once", () => {
  it("takes chunks, says how far it came, and can be stopped between them", async () => {
    const rows = Array.from({ length: 45_000 }, (_, row): BookCell[] => [row, row % 5 === 0 ? null : row / 8, -row]);
    const { desk, host } = await openDeskHost(bookOf(sheetOf("Data", rows)), { profile: "web" });
    const shares: (number | null)[] = [];
    const address = { kind: "address", address: "Data!A:C" } as const;
    const result = await host.read(
      address,
      errand(undefined, (share) => void shares.push(share)),
    );
    if (!result.ok) throw new Error(result.problem.code);
    const { columns, rowCount } = result.value;
    expect(rowCount).toBe(45_000);
    for (const row of [0, 19_999, 20_000, 39_999, 40_001, 44_999]) {
      expect([columns[0]!.numbers[row], columns[2]!.numbers[row]]).toEqual([row, row === 0 ? 0 : -row]);
      expect(columns[1]!.kinds[row]).toBe(row % 5 === 0 ? 0 : 1);
    }
    expect(shares.length).toBeGreaterThan(2);
    const controller = new AbortController();
    const stopped = await host.read(
      address,
      errand(controller.signal, (share) => {
        if (share !== 0) controller.abort();
      }),
    );
    expect(stopped).toEqual({ ok: false, problem: { code: "cancelled" } });
    desk.close();
  });

  it("halves a chunk that is too much for Excel on the web", async () => {
    const text = (row: number) => `${"a long remark about this row, ".repeat(14)}${row}`;
    const rows = Array.from({ length: 30_000 }, (_, row): BookCell[] => [text(row)]);
    const { desk, host } = await openDeskHost(bookOf(sheetOf("Data", rows)), { profile: "web" });
    const result = await host.read({ kind: "address", address: "Data!A1:A30000" }, errand());
    if (!result.ok) throw new Error(result.problem.code);
    const [column] = result.value.columns;
    for (const row of [0, 9999, 10_000, 20_000, 29_999]) {
      expect(column!.texts[column!.numbers[row]!]).toBe(text(row));
    }
    desk.close();
  });

  it("waits for the end of cell editing", async () => {
    const { desk, host } = await openDeskHost(bookOf(sheetOf("Data", [["x"], [1]])));
    desk.startEditing();
    let done = false;
    const reading = host.read({ kind: "address", address: "Data!A1:A2" }, errand()).then((result) => {
      done = true;
      return result;
    });
    await new Promise((resolve) => setTimeout(resolve, 100));
    expect(done).toBe(false);
    desk.finishEditing();
    expect(await reading).toMatchObject({ ok: true, value: { rowCount: 2 } });
    desk.close();
  });
});
