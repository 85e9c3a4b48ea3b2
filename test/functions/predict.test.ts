import { describe, expect, it } from "vitest";
import { registerFunctions } from "../../src/functions/register.ts";
import { inlineAnalyst } from "../../src/worker/inlineAnalyst.ts";
import { call, functionsRuntime } from "../support/functionsRuntime.ts";

const n = 40;
const outcome = Array.from({ length: n }, (_, i) => [4 + 2 * ((i * 7) % 11) + ((i * 29) % 19) / 3]);
const even = Array.from({ length: n }, (_, i) => [(i * 7) % 11]);
/** The same line with errors that grow with the driver. */
const uneven = even.map(([x = 0], i) => [4 + 2 * x + (((i * 29) % 19) - 9) * x ** 2]);

const desk = functionsRuntime();
registerFunctions(desk.runtime, inlineAnalyst);
const predict = (y: unknown, settings: string): Promise<unknown> =>
  call(desk, "PREDICT", y, even, [[5], [""], [30]], null, settings, null);

describe("PREDICT", () => {
  it("gives the interval of the mean, or the wider one of a single row, blank where a driver is missing", async () => {
    const mean = (await predict(outcome, "errors: classical")) as (number | "")[][];
    const single = (await predict(outcome, "errors: classical; predict for: single row")) as (number | "")[][];
    expect(mean[1]).toEqual(["", "", ""]);
    expect(single[1]).toEqual(["", "", ""]);
    for (const row of [0, 2]) {
      const [value, low, high] = single[row] as number[];
      const [sameValue, innerLow, innerHigh] = mean[row] as number[];
      expect(value).toBe(sameValue);
      expect(low).toBeLessThan(innerLow!);
      expect(high).toBeGreaterThan(innerHigh!);
      expect((low! + high!) / 2).toBeCloseTo(value!, 10);
    }
  });

  it("says why there is none for a single row under uneven spread", async () => {
    expect(await predict(uneven, "predict for: single row")).toMatchObject({
      error: "#N/A",
      message: expect.stringContaining("the spread of the errors is uneven") as string,
    });
    expect(await predict(uneven, "")).toHaveLength(3);
  });
});
