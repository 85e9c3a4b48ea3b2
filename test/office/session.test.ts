import { afterEach, beforeEach, describe, expect, it, vi } from "vitest";
import { success } from "../../src/core/problem/result.ts";
import type { ExcelClient } from "../../src/office/client.ts";
import { inExcel, inFront, persist } from "../../src/office/session.ts";

const fault = (code: string, message = "as Excel says it") =>
  Object.assign(new Error(message), { code, debugInfo: { errorLocation: "Range.values" } });

const clientThatThrows = (thrown: Error): ExcelClient => ({
  run: () => Promise.reject(thrown),
  isSetSupported: () => true,
});

const attempt = (code: string) => inExcel(clientThatThrows(fault(code)), () => Promise.resolve(success(1)));

describe("what Excel refuses", () => {
  it.each([
    ["InvalidOperationInCellEditMode", { code: "cell-being-edited" }],
    ["InvalidSelection", { code: "other-workbook" }],
    ["InactiveWorkbook", { code: "other-workbook" }],
    ["ServiceNotAvailable", { code: "excel-busy" }],
    ["ActivityLimitReached", { code: "excel-busy" }],
    ["RequestAborted", { code: "excel-busy" }],
    ["ApiNotFound", { code: "excel-too-old", missing: "Range.values" }],
    ["AccessDenied", { code: "read-only" }],
    ["GeneralException", { code: "excel-refused", detail: "GeneralException, as Excel says it, Range.values" }],
    ["SomethingNew", { code: "excel-refused", detail: "SomethingNew, as Excel says it, Range.values" }],
  ])("%s becomes a problem that the user can mend", async (code, problem) => {
    expect(await attempt(code)).toEqual({ ok: false, problem });
  });

  it.each(["InvalidArgument", "PropertyNotLoaded", "InvalidObjectPath", "InvalidRequestContext", "ValueNotLoaded"])(
    "%s is a fault of ours and stays one",
    async (code) => {
      await expect(attempt(code)).rejects.toMatchObject({ code });
    },
  );

  it("leaves any other exception alone", async () => {
    const client = clientThatThrows(new TypeError("x is undefined"));
    await expect(inExcel(client, () => Promise.resolve(success(1)))).rejects.toThrow("x is undefined");
  });

  it("asks for the oldest usable Excel before it starts", async () => {
    const asked: string[] = [];
    const client: ExcelClient = {
      run: () => Promise.reject(new Error("not to be run")),
      isSetSupported: (set, version) => {
        asked.push(`${set} ${version}`);
        return false;
      },
    };
    const result = await inExcel(client, () => Promise.resolve(success(1)));
    expect(result).toEqual({ ok: false, problem: { code: "excel-too-old", missing: "ExcelApi 1.12" } });
    expect(asked).toEqual(["ExcelApi 1.12"]);
  });

  it("waits for a cell that is being edited, where Excel can", async () => {
    const options: unknown[] = [];
    const run = (given: unknown, work: (context: null) => Promise<unknown>) => {
      options.push(given);
      return work(null);
    };
    const client = { run: run as unknown as typeof Excel.run, isSetSupported: () => true };
    expect(await inExcel(client, () => Promise.resolve(success(5)))).toEqual(success(5));
    expect(options).toEqual([{ delayForCellEdit: true }]);
  });

  it("takes the untold failure of a sheet that cannot be shown for another workbook in front", async () => {
    await expect(inFront(() => Promise.reject(fault("GeneralException")))).rejects.toMatchObject({
      code: "InactiveWorkbook",
    });
    await expect(inFront(() => Promise.reject(fault("AccessDenied")))).rejects.toMatchObject({ code: "AccessDenied" });
    expect(await inFront(() => Promise.resolve(3))).toBe(3);
  });
});

describe("a reading while Excel is busy", () => {
  beforeEach(() => void vi.useFakeTimers());
  afterEach(() => void vi.useRealTimers());

  const failing = (times: number, code: string) => {
    let calls = 0;
    const read = () => (++calls <= times ? Promise.reject(fault(code)) : Promise.resolve(calls));
    return { read, calls: () => calls };
  };
  const settled = async (reading: Promise<number>) => {
    const outcome = reading.catch((thrown: unknown) => thrown);
    await vi.runAllTimersAsync();
    return outcome;
  };

  it("is repeated three times at most", async () => {
    expect(await settled(persist(failing(3, "ServiceNotAvailable").read))).toBe(4);
    const hopeless = failing(9, "ActivityLimitReached");
    expect(await settled(persist(hopeless.read))).toMatchObject({ code: "ActivityLimitReached" });
    expect(hopeless.calls()).toBe(4);
  });

  it("is not repeated for anything else", async () => {
    const denied = failing(1, "AccessDenied");
    expect(await settled(persist(denied.read))).toMatchObject({ code: "AccessDenied" });
    expect(denied.calls()).toBe(1);
  });
});
