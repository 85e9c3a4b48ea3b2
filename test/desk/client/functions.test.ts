import { afterAll, beforeAll, beforeEach, describe, expect, it } from "vitest";
import type { NodeDesk } from "../../../src/desk/client/openDesk.ts";
import type { FunctionMetadata, FunctionsMetadata, ParameterMetadata } from "../../../src/desk/workbook/metadata.ts";
import { bookOf, sheetOf } from "../../support/deskBook.ts";
import { load, testDesk } from "../../support/desk.ts";

const matrix: ParameterMetadata = { name: "data", type: "any", dimensionality: "matrix" };
const scalar = (type: string): ParameterMetadata => ({ name: "value", type, dimensionality: "scalar", optional: true });

const functionOf = (id: string, more: Partial<FunctionMetadata> = {}): FunctionMetadata => ({
  id,
  name: id,
  parameters: [matrix],
  ...more,
});

const functions: FunctionsMetadata = {
  allowErrorForDataTypeAny: true,
  allowCustomDataForDataTypeAny: true,
  functions: [
    functionOf("SEEN", { parameters: [matrix, { ...matrix, optional: true }, scalar("any")] }),
    functionOf("NUMBER", { parameters: [scalar("number")] }),
    functionOf("TEXT", { parameters: [scalar("string")] }),
    functionOf("FLAG", { parameters: [scalar("boolean")] }),
    functionOf("MANY", { parameters: [{ name: "rest", type: "any", repeating: true }] }),
    functionOf("SUM3", { parameters: [matrix] }),
    functionOf("BLOCK"),
    functionOf("FAIL", { parameters: [scalar("any")] }),
    functionOf("SLOW", { options: { cancelable: true } }),
    functionOf("WHERE", { options: { requiresAddress: true, requiresParameterAddresses: true } }),
    functionOf("UNASSOCIATED"),
  ],
};

const calls: unknown[][] = [];
const record = (...args: unknown[]): number => {
  calls.push(args.slice(0, -1));
  return calls.length;
};

let desk: NodeDesk;
beforeAll(async () => {
  const rows = [
    ["y", "x"],
    [1, true],
    [null, "text"],
    [{ error: "#DIV/0!" }, { value: "", formula: '=""' }],
    [0, 45293],
  ];
  const data = sheetOf("Data", rows);
  desk = await testDesk({ book: bookOf(data, sheetOf("Out", []), sheetOf("Chain", [[1], [2], [3]])), functions });
  associate();
});
afterAll(() => desk.close());
beforeEach(() => {
  calls.length = 0;
});

interface Invocation {
  readonly address?: string;
  readonly parameterAddresses?: readonly string[];
  onCanceled?: () => void;
}

const cancelled: string[] = [];
const open: ((value: number) => void)[] = [];

function associate(): void {
  const { CustomFunctions } = desk;
  const { Error: CellError, ErrorCode } = CustomFunctions;
  for (const id of ["SEEN", "NUMBER", "TEXT", "FLAG", "MANY"]) CustomFunctions.associate(id, record);
  CustomFunctions.associate("SUM3", (data: number[][]) => {
    calls.push([data]);
    return data.flat().reduce((sum, value) => sum + value, 0);
  });
  CustomFunctions.associate("BLOCK", () => [
    [1, null, "text"],
    [true, new CellError(ErrorCode.notAvailable, "said beside it"), ""],
  ]);
  CustomFunctions.associate("FAIL", async (kind: string) => {
    await Promise.resolve();
    if (kind === "thrown") throw new Error("our own fault");
    if (kind === "nan") return Number.NaN;
    if (kind === "infinite") return Number.POSITIVE_INFINITY;
    // eslint-disable-next-line @typescript-eslint/only-throw-error -- it is an error; its types do not say so
    throw new CellError(kind === "value" ? ErrorCode.invalidValue : ErrorCode.divisionByZero, "what is wrong");
  });
  CustomFunctions.associate("SLOW", (data: number[][], invocation: Invocation) => {
    calls.push([data]);
    invocation.onCanceled = () => cancelled.push(JSON.stringify(data));
    return new Promise((resolve) => open.push(resolve));
  });
  CustomFunctions.associate("WHERE", (_data: unknown, { address, parameterAddresses }: Invocation) => [
    [address, ...(parameterAddresses ?? [])],
  ]);
}

/** Types a formula and waits for its result. */
async function result(formula: string, cell = "Out!A1"): Promise<unknown> {
  desk.edit(cell, formula);
  await desk.settle();
  return desk.value(cell);
}

const error = { type: "Error", basicValue: "#DIV/0!", code: "#DIV/0!" };

describe("the arguments of a function", () => {
  it.each([[""], [0], [null]] as const)("arrive as they stand in the cells, blanks as %j", async (blank) => {
    desk.arrival.blank = blank;
    await result("=FOOTING.SEEN(Data!A1:B5)");
    const [[data]] = calls as [[unknown[][]]];
    expect(data[1]).toEqual([1, true]);
    expect(data[2]).toEqual([blank, "text"]);
    expect(data[3]?.[0]).toMatchObject(error);
    expect(data[3]?.[1]).toBe("");
    expect(data[4]).toEqual([0, 45293]);
    desk.arrival.blank = null;
  });

  it("are null where they are left out, in the middle and at the end", async () => {
    await result('=FOOTING.SEEN(Data!A2:A2,,"last")');
    await result("=FOOTING.SEEN(Data!A2:A2)");
    expect(calls).toEqual([
      [[[1]], null, "last"],
      [[[1]], null, null],
    ]);
  });

  it("are blocks for a parameter that is one, however small, and values for one that is none", async () => {
    await result("=FOOTING.SEEN(Data!A2,5,Data!B3)");
    await result("=FOOTING.SEEN({1,2;3,4},Data!A2:B2*1,1+1)");
    expect(calls).toEqual([
      [[[1]], [[5]], "text"],
      [
        [
          [1, 2],
          [3, 4],
        ],
        [[1, 1]],
        2,
      ],
    ]);
  });

  it("are converted for a declared type, or the call is not made", async () => {
    expect(await result('=FOOTING.NUMBER("12.5")')).toBe(1);
    await result("=FOOTING.NUMBER(Data!A3)");
    await result("=FOOTING.TEXT(12)");
    await result("=FOOTING.TEXT(TRUE)");
    await result('=FOOTING.FLAG("TRUE")');
    expect(calls).toEqual([[12.5], [0], ["12"], ["TRUE"], [true]]);
    expect(await result('=FOOTING.NUMBER("twelve")')).toBe("#VALUE!");
    expect(await result("=FOOTING.NUMBER(Data!A4)")).toBe("#DIV/0!");
    expect(await result("=FOOTING.NUMBER(Data!A2:A3)")).toBe("#VALUE!");
    expect(calls).toHaveLength(5);
  });

  it("are one list where the last parameter repeats", async () => {
    await result("=FOOTING.MANY(1,Data!B3,TRUE)");
    expect(calls).toEqual([[[1, "text", true]]]);
  });

  it("keep the call from being made when there are too few or too many", async () => {
    expect(await result("=FOOTING.SEEN()")).toBe("#VALUE!");
    expect(await result("=FOOTING.NUMBER(1,2)")).toBe("#VALUE!");
    expect(calls).toEqual([]);
  });

  it("come with their addresses where the function asks for them", async () => {
    desk.edit("Out!F1", "=FOOTING.WHERE(Data!A1:B2)");
    await desk.settle();
    expect(desk.values("Out!F1:G1")).toEqual([["Out!F1", "Data!A1:B2"]]);
    desk.edit("Out!F1", "");
  });

  it("without leave, an error among the cells keeps the call from being made", async () => {
    const strict = await testDesk({
      book: bookOf(sheetOf("Data", [[1], [{ error: "#N/A" }]])),
      functions: { functions: [functionOf("SEEN")] },
    });
    let made = 0;
    strict.CustomFunctions.associate("SEEN", () => (made += 1));
    strict.edit("Data!C1", "=FOOTING.SEEN(A1:A2)");
    await strict.settle();
    expect([strict.value("Data!C1"), made]).toEqual(["#N/A", 0]);
    strict.close();
  });
});

describe("the result of a function", () => {
  it("spills; null shows as 0, an error element as an error", async () => {
    await result("=FOOTING.BLOCK(1)", "Out!C5");
    expect(desk.values("Out!C5:E6")).toEqual([
      [1, 0, "text"],
      [true, "#N/A", ""],
    ]);
    expect(desk.error("Out!D6")).toBe("#N/A");
    expect(await load(desk, "Out!E6:F6", "valueTypes")).toEqual([["String", "Empty"]]);
  });

  it("is #SPILL! while something stands in the way", async () => {
    desk.edit("Out!D5", "in the way");
    await desk.settle();
    expect(desk.values("Out!C5:D6")).toEqual([
      ["#SPILL!", "in the way"],
      ["", ""],
    ]);
    desk.edit("Out!D5", "");
    await desk.settle();
    expect(desk.value("Out!C5")).toBe(1);
    desk.edit("Out!C5", "");
    await desk.settle();
    expect(desk.value("Out!D6")).toBe("");
  });

  it.each([
    ["value", "#VALUE!", "what is wrong"],
    ["other", "#DIV/0!", ""],
    ["thrown", "#VALUE!", ""],
    ["nan", "#VALUE!", ""],
    ["infinite", "#NUM!", ""],
  ])("that fails with %j is %s, with its message where Excel shows one", async (kind, sign, message) => {
    expect(await result(`=FOOTING.FAIL("${kind}")`)).toBe(sign);
    expect(desk.error("Out!A1")).toBe(sign);
    expect(desk.message("Out!A1")).toBe(message);
  });

  it("is #NAME? for a function that nobody knows, #VALUE! for one that is declared and not there", async () => {
    expect(await result("=FOOTING.UNASSOCIATED(1)")).toBe("#VALUE!");
    expect(await result("=FOOTING.UNKNOWN(1)")).toBe("#NAME?");
  });

  it("passes through formulas around it; failures do not end the calculation of others", async () => {
    desk.edit("Out!H1", '=IFERROR(FOOTING.FAIL("thrown"),"caught")');
    desk.edit("Out!H2", "=FOOTING.SUM3(Chain!A1:A3)*10+FOOTING.SUM3(Chain!A1:A2)");
    desk.edit("Out!H3", "=H2+1");
    await desk.settle();
    expect(desk.values("Out!H1:H3")).toEqual([["caught"], [63], [64]]);
  });
});

describe("recalculation", () => {
  it("calls what depends on the edited cell and nothing else", async () => {
    desk.edit("Chain!C1", "=FOOTING.SUM3(A1:A2)");
    desk.edit("Chain!C2", "=FOOTING.SUM3(A2:A3)");
    desk.edit("Chain!D1", "=C1+C2");
    await desk.settle();
    expect(desk.value("Chain!D1")).toBe(8);
    calls.length = 0;
    desk.edit("Chain!A1", "10");
    await desk.settle();
    expect(desk.value("Chain!D1")).toBe(17);
    // Twice the first two cells, for this formula and the one of the test before; never the last two alone.
    expect(calls.map((call) => JSON.stringify(call)).sort()).toEqual([
      "[[[10],[2],[3]]]",
      "[[[10],[2]]]",
      "[[[10],[2]]]",
    ]);
    calls.length = 0;
    desk.edit("Chain!H9", "1");
    await desk.settle();
    expect(calls).toEqual([]);
  });

  it("calls again when asked to calculate everything", async () => {
    calls.length = 0;
    await desk.Excel.run(async (context) => {
      context.workbook.application.calculate("Full");
      await context.sync();
    });
    await desk.settle();
    expect(calls.length).toBeGreaterThan(1);
  });

  it("shows #BUSY! while a call is out, cancels it when its input changes, and takes the later result", async () => {
    desk.edit("Chain!F1", "=FOOTING.SLOW(A2:A2)");
    await desk.host.calculated();
    await new Promise((resolve) => setTimeout(resolve, 50));
    expect(desk.value("Chain!F1")).toBe("#BUSY!");
    desk.edit("Chain!A2", "20");
    await desk.host.calculated();
    await new Promise((resolve) => setTimeout(resolve, 50));
    expect(cancelled).toEqual(["[[2]]"]);
    open[0]?.(1);
    open[1]?.(2);
    await desk.settle();
    expect(desk.value("Chain!F1")).toBe(2);
  });
});

describe("saved results", () => {
  const saved = sheetOf("Saved", [
    [1, null, { value: 99, formula: "=FOOTING.SUM3(A1:A2)" }],
    [2, null, { value: 7, formula: "=FOOTING.BLOCK(A1)", spill: "C2:D3" }, 8],
    [{ value: 3, formula: "=SUM(A1:A2)" }, null, 9, 10],
    [{ value: null, formula: "=A3*2" }, null, { value: { error: "#BUSY!" }, formula: "=FOOTING.SUM3(A1:A2)" }],
  ]);

  it("stand on opening: only formulas without a settled value are calculated", async () => {
    const made: unknown[] = [];
    const reopened = await testDesk({ book: bookOf(saved), functions });
    reopened.CustomFunctions.associate("SUM3", (data: number[][]) => {
      made.push(data);
      return data.flat().reduce((sum, value) => sum + value, 0);
    });
    await reopened.settle();
    expect(reopened.values("Saved!A1:D4")).toEqual([
      [1, "", 99, ""],
      [2, "", 7, 8],
      [3, "", 9, 10],
      [6, "", 3, ""],
    ]);
    expect(made).toEqual([[[1], [2]]]);
    reopened.CustomFunctions.associate("BLOCK", () => [[5]]);
    reopened.edit("Saved!A1", "4");
    await reopened.settle();
    expect(reopened.values("Saved!C1:D4")).toEqual([
      [6, ""],
      [5, ""],
      ["", ""],
      [6, ""],
    ]);
    reopened.close();
  });
});
