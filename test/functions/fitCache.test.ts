import { describe, expect, it } from "vitest";
import { type Result, failure, success } from "../../src/core/problem/result.ts";
import { fitCache } from "../../src/functions/fitCache.ts";

/** Work that is finished from outside, and tells how often it was begun and whether it was stopped. */
function workshop() {
  const jobs: { finish: (result: Result<number>) => void; fail: (fault: Error) => void; signal: AbortSignal }[] = [];
  const work = (signal: AbortSignal) =>
    new Promise<Result<number>>((resolve, reject) => jobs.push({ finish: resolve, fail: reject, signal }));
  return { jobs, work };
}

const calm = () => new AbortController().signal;

describe("shared work", () => {
  it("is begun once for all who ask the same, before and after it is done", async () => {
    const share = fitCache<number>(5);
    const { jobs, work } = workshop();
    const asked = [share("a", calm(), work), share("a", calm(), work)];
    jobs[0]!.finish(success(7));
    expect(await Promise.all(asked)).toEqual([success(7), success(7)]);
    expect(await share("a", calm(), work)).toEqual(success(7));
    expect(jobs).toHaveLength(1);
  });

  it("goes on when one of several gives up, and stops when the last does", async () => {
    const share = fitCache<number>(5);
    const { jobs, work } = workshop();
    const [one, other] = [new AbortController(), new AbortController()];
    const [first, second] = [share("a", one.signal, work), share("a", other.signal, work)];
    one.abort();
    expect(await first).toEqual(failure({ code: "cancelled" }));
    expect(jobs[0]!.signal.aborted).toBe(false);
    other.abort();
    expect(await second).toEqual(failure({ code: "cancelled" }));
    expect(jobs[0]!.signal.aborted).toBe(true);
    const again = share("a", calm(), work);
    jobs[1]!.finish(success(3));
    expect(await again).toEqual(success(3));
  });

  it("gives the others their result when one gave up", async () => {
    const share = fitCache<number>(5);
    const { jobs, work } = workshop();
    const one = new AbortController();
    const [first, second] = [share("a", one.signal, work), share("a", calm(), work)];
    one.abort();
    jobs[0]!.finish(success(11));
    expect(await second).toEqual(success(11));
    expect(await first).toEqual(failure({ code: "cancelled" }));
  });

  it("keeps problems of the data, but neither those of the moment nor faults", async () => {
    const share = fitCache<number>(5);
    const { jobs, work } = workshop();
    const settle = async (finish: (job: (typeof jobs)[number]) => void) => {
      const asked = share("a", calm(), work).catch((fault: unknown) => fault);
      finish(jobs.at(-1)!);
      await asked;
    };
    await settle(({ fail }) => fail(new Error("ours")));
    await settle(({ finish }) => finish(failure({ code: "time-limit", seconds: 2 })));
    await settle(({ finish }) => finish(failure({ code: "no-outcome" })));
    expect(jobs).toHaveLength(3);
    expect(await share("a", calm(), work)).toEqual(failure({ code: "no-outcome" }));
    expect(jobs).toHaveLength(3);
  });

  it("forgets the result that was not asked for longest", async () => {
    const share = fitCache<string>(2);
    const begun: string[] = [];
    const ask = (key: string) =>
      share(key, calm(), () => {
        begun.push(key);
        return Promise.resolve(success(key));
      });
    for (const key of ["a", "b", "a", "c", "a", "b"]) await ask(key);
    expect(begun).toEqual(["a", "b", "c", "b"]);
  });
});
