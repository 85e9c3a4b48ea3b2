import { afterEach, afterAll, beforeAll, describe, expect, it } from "vitest";
import type { NodeDesk } from "../../../src/desk/client/openDesk.ts";
import { bookOf, sheetOf } from "../../support/deskBook.ts";
import { codeOf, load, set, testDesk } from "../../support/desk.ts";

let desk: NodeDesk;
beforeAll(async () => {
  const wide = Array.from({ length: 60_000 }, (_, row) => [row, `text of row ${row}, long enough to weigh something`]);
  desk = await testDesk({ book: bookOf(sheetOf("Data", [[1], [2]]), sheetOf("Wide", wide)) });
});
afterAll(() => desk.close());
afterEach(() =>
  Object.assign(desk.switches, { editing: false, chartSelected: false, otherWorkbook: false, profile: "desktop" }),
);

const inBatch = (work: (context: Excel.RequestContext) => unknown) => () =>
  desk.Excel.run(async (context) => {
    work(context);
    await context.sync();
  });

describe("while a cell is being edited", () => {
  it("every request is refused", async () => {
    desk.startEditing();
    expect(await codeOf(() => load(desk, "Data!A1", "values"))).toBe("InvalidOperationInCellEditMode");
  });

  it("a request that is willing to wait is done afterwards", async () => {
    desk.startEditing();
    let done = false;
    const waiting = desk.Excel.run({ delayForCellEdit: true }, async (context) => {
      context.workbook.worksheets.getItem("Data").getRange("C1").values = [["late"]];
      await context.sync();
      done = true;
    });
    await new Promise((resolve) => setTimeout(resolve, 60));
    expect(done).toBe(false);
    desk.finishEditing();
    await waiting;
    expect(desk.value("Data!C1")).toBe("late");
  });
});

describe("without a selection of cells", () => {
  const selections: Record<string, (workbook: Excel.Workbook) => unknown> = {
    getSelectedRange: (workbook) => workbook.getSelectedRange().load("address"),
    getSelectedRanges: (workbook) => workbook.getSelectedRanges().load("address"),
    getActiveCell: (workbook) => workbook.getActiveCell().load("address"),
  };

  it.each(Object.keys(selections))(
    "%s is refused: a chart is selected, or another workbook is in front",
    async (name) => {
      const reading = inBatch(({ workbook }) => selections[name]?.(workbook));
      desk.switches.chartSelected = true;
      expect(await codeOf(reading)).toBe("InvalidSelection");
      Object.assign(desk.switches, { chartSelected: false, otherWorkbook: true });
      expect(await codeOf(reading)).toBe("InvalidSelection");
      desk.switches.otherWorkbook = false;
      expect(await codeOf(reading)).toBe("none");
    },
  );

  it("with another workbook in front, sheets are neither added nor shown nor is anything selected", async () => {
    desk.switches.otherWorkbook = true;
    expect(await codeOf(inBatch(({ workbook }) => workbook.worksheets.add("New")))).toBe("GeneralException");
    expect(await codeOf(inBatch(({ workbook }) => workbook.worksheets.getItem("Data").activate()))).toBe(
      "GeneralException",
    );
    expect(await codeOf(inBatch(({ workbook }) => workbook.worksheets.getItem("Data").getRange("A1").select()))).toBe(
      "GeneralException",
    );
  });

  it("several areas are no range", async () => {
    desk.select("Data!A1:A2", "Data!C1");
    expect(await codeOf(inBatch(({ workbook }) => workbook.getSelectedRange().load("address")))).toBe(
      "InvalidSelection",
    );
    const address = await desk.Excel.run(async (context) => {
      const ranges = context.workbook.getSelectedRanges();
      ranges.load("address");
      await context.sync();
      return ranges.address;
    });
    expect(address).toBe("Data!A1:A2,Data!C1");
  });
});

describe("what one message may carry", () => {
  const rows = Array.from({ length: 90_000 }, (_, row) => [`${row} `.repeat(12)]);

  it("is limited on the web: too large a request is refused whole", async () => {
    desk.switches.profile = "web";
    expect(await codeOf(() => set(desk, "Data!E1:E90000", { values: rows }))).toBe("RequestPayloadSizeLimitExceeded");
    expect(desk.value("Data!E1")).toBe("");
  });

  it("is limited on the web: too large an answer is not given", async () => {
    desk.switches.profile = "web";
    expect(await codeOf(() => load(desk, "Wide!A1:B60000", "formulas"))).toBe("none");
    expect(await codeOf(() => loadTwice("Wide", "A1:B60000"))).toBe("ResponsePayloadSizeLimitExceeded");
  });

  it("is not limited on the desktop", async () => {
    expect(await codeOf(() => set(desk, "Data!E1:E90000", { values: rows }))).toBe("none");
    expect(await codeOf(() => loadTwice("Wide", "A1:B60000"))).toBe("none");
  });

  const loadTwice = (sheet: string, cells: string) =>
    desk.Excel.run(async (context) => {
      const range = context.workbook.worksheets.getItem(sheet).getRange(cells);
      range.load("values,formulas,text");
      await context.sync();
    });
});
