import { beforeEach, describe, expect, it } from "vitest";
import { type PaneBench, paneBench } from "../support/paneBench.ts";

let bench: PaneBench;
beforeEach(() => {
  bench = paneBench();
});

const asked = (command: "keep" | "recalculate"): Promise<void> => {
  bench.pane.commands[command]();
  return bench.settled();
};

describe("the sheet in front", () => {
  it("has its functions calculated again, and that is said", async () => {
    await asked("recalculate");
    expect(bench.state().sheetDone).toBe("The functions on the sheet Months are being calculated again.");
    expect(bench.said()).toBe(bench.state().sheetDone);
  });

  it("becomes a kept sheet, which the pane then knows it as", async () => {
    await bench.read();
    await bench.answer();
    await bench.write("live");
    await asked("keep");
    const { written, sheetDone, busy } = bench.state();
    expect(written).toMatchObject({ kind: "kept", outdated: false });
    expect(sheetDone).toBe(`The sheet ${written!.sheet} is kept now: it holds values that stay.`);
    expect(bench.said()).toBe(sheetDone);
    expect(busy).toBeNull();
  });

  it("is out of date once a cell changes after it was kept, the first change or a later one", async () => {
    await bench.read();
    await bench.answer();
    await bench.write("live");
    bench.host.change(1, 1, 3);
    await asked("keep");
    expect(bench.state().written?.outdated).toBe(false);
    bench.host.change(2, 1, 4);
    expect(bench.state().written?.outdated).toBe(true);
  });

  it("stays as it is where the spreadsheet refuses, and the reason stands in the pane", async () => {
    await bench.read();
    await bench.answer();
    await bench.write("live");
    const problem = { code: "values-missing", cells: ["Answer!B9"], values: ["#BUSY!"], count: 1 } as const;
    bench.host.refusals.keep = problem;
    await asked("keep");
    expect(bench.state()).toMatchObject({
      fault: { kind: "problem", problem },
      written: { kind: "live" },
      sheetDone: "",
    });
    bench.host.refusals.recalculate = { code: "excel-busy" };
    await asked("recalculate");
    expect(bench.state().fault).toEqual({ kind: "problem", problem: { code: "excel-busy" } });
  });

  it("shows what is under way while values take the place of formulas", async () => {
    const seen: (string | undefined)[] = [];
    bench.pane.store.subscribe(() => seen.push(bench.state().busy?.with));
    await asked("keep");
    expect(seen).toContain("keeping");
  });
});
