import { describe, expect, it } from "vitest";
import { withinLimits } from "../../src/app/timeLimit.ts";
import { failure, success } from "../../src/core/problem/result.ts";

const never = () => new Promise<never>(() => undefined);
const calm = () => new AbortController().signal;

describe("limits of a piece of work", () => {
  it("answers with the work's own result and leaves its signal alone", async () => {
    let seen: AbortSignal | undefined;
    const work = (signal: AbortSignal) => {
      seen = signal;
      return Promise.resolve(success(7));
    };
    expect(await withinLimits({ signal: calm(), seconds: 5 }, work)).toEqual(success(7));
    expect(seen?.aborted).toBe(false);
  });

  it("ends work that never settles, and tells it", async () => {
    let seen: AbortSignal | undefined;
    const work = (signal: AbortSignal) => {
      seen = signal;
      return never();
    };
    const result = await withinLimits({ signal: calm(), seconds: 0.02 }, work);
    expect(result).toEqual(failure({ code: "time-limit", seconds: 0.02 }));
    expect(seen?.aborted).toBe(true);
  });

  it("answers at once when the caller gives up, also before the work began", async () => {
    const controller = new AbortController();
    const result = withinLimits({ signal: controller.signal, seconds: 5 }, never);
    controller.abort();
    expect(await result).toEqual(failure({ code: "cancelled" }));
    let begun = false;
    const late = await withinLimits({ signal: controller.signal, seconds: 5 }, () => {
      begun = true;
      return never();
    });
    expect(late).toEqual(failure({ code: "cancelled" }));
    expect(begun).toBe(false);
  });

  it("passes a fault of ours on", async () => {
    const work = () => Promise.reject(new Error("ours"));
    await expect(withinLimits({ signal: calm(), seconds: 5 }, work)).rejects.toThrow("ours");
  });
});
