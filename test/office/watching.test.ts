import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { bookOf, sheetOf } from "../support/deskBook.ts";
import { type DeskHost, openDeskHost } from "../support/deskHost.ts";

const rows = Array.from({ length: 12 }, (_, row) => [row === 0 ? "x" : row, row === 0 ? "y" : row * 3]);

/** Longer than the quiet that the host waits for. */
const laterMilliseconds = 700;
const later = () => new Promise((resolve) => setTimeout(resolve, laterMilliseconds));

describe("watching cells", () => {
  let at: DeskHost;
  beforeEach(async () => {
    at = await openDeskHost(
      bookOf(
        sheetOf("Data", rows),
        sheetOf("Sums", [["total"], [{ value: 66, formula: "=SUM(Data!A2:A12)" }], [5]]),
        sheetOf("Other", [[1]]),
      ),
    );
  });
  afterEach(() => at.desk.close());

  const watch = async (...addresses: string[]) => {
    const changed: string[] = [];
    const watching = await at.host.watch(addresses, (address) => void changed.push(address));
    if (!watching.ok) throw new Error(watching.problem.code);
    return { changed, stop: watching.value };
  };

  it("tells once of many edits inside, by the cell that came first, and of none outside", async () => {
    const { changed, stop } = await watch("Data!A1:A12", "Data!B1:B5");
    at.desk.edit("Data!A3", 7);
    at.desk.edit("Data!A4", 8);
    at.desk.edit("Data!B9", 8);
    at.desk.edit("Other!A1", 8);
    await vi.waitFor(() => expect(changed).toEqual(["Data!A3"]), 3000);
    at.desk.edit("Data!B5", 1);
    await vi.waitFor(() => expect(changed).toEqual(["Data!A3", "Data!B5"]), 3000);
    await stop();
  });

  it("hears of a formula that came to another value", async () => {
    const { changed, stop } = await watch("Sums!A2");
    at.desk.edit("Data!A3", 7);
    await vi.waitFor(() => expect(changed).toEqual(["Sums!A2"]), 3000);
    await stop();
  });

  it("stops when told to, whatever is still to be said", async () => {
    const { changed, stop } = await watch("Data!A1:A12");
    at.desk.edit("Data!A3", 7);
    await stop();
    at.desk.edit("Data!A4", 7);
    await later();
    expect(changed).toEqual([]);
  });

  it("says what it cannot watch", async () => {
    const problem = async (address: string) => {
      const watching = await at.host.watch(["Data!A1:A3", address], () => undefined);
      return watching.ok ? null : watching.problem;
    };
    expect(await problem("Dat!A1")).toEqual({ code: "unknown-place", place: "Dat", nearest: "Data" });
    expect(await problem("Data!A0")).toEqual({ code: "bad-address", address: "Data!A0" });
  });
});

describe("going to cells", () => {
  it("shows the sheet and selects the cells", async () => {
    const { desk, host } = await openDeskHost(bookOf(sheetOf("Data", rows), sheetOf("It's here", [[1], [2]])));
    const selected = () =>
      desk.Excel.run(async (context) => {
        const range = context.workbook.getSelectedRange().load("address");
        await context.sync();
        return range.address;
      });
    expect(await host.goTo("'It''s here'!A2")).toEqual({ ok: true, value: null });
    expect(await selected()).toBe("'It''s here'!A2");
    expect(await host.goTo("Data!A2:B4")).toEqual({ ok: true, value: null });
    expect(await selected()).toBe("Data!A2:B4");
    expect(await host.goTo("B9")).toEqual({ ok: true, value: null });
    expect(await selected()).toBe("Data!B9");
    expect(await host.goTo("Dta!A1")).toMatchObject({ problem: { code: "unknown-place", nearest: "Data" } });
    expect(await host.goTo("nowhere")).toEqual({ ok: false, problem: { code: "bad-address", address: "nowhere" } });
    desk.switches.otherWorkbook = true;
    expect(await host.goTo("Data!A1")).toEqual({ ok: false, problem: { code: "other-workbook" } });
    desk.close();
  });
});
