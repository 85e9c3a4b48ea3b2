import { describe, expect, it } from "vitest";
import { memory } from "../../../src/core/covariance/memory.ts";
import { orderedFit } from "../../support/referenceErrors.ts";

describe("memory", () => {
  it("keeps what was found apart by fit and by key", () => {
    const known = memory<number>();
    const [one, other] = [orderedFit("cars"), orderedFit("cars")];
    expect(known.find(one, "a")).toBeNull();
    expect(known.keep(one, "a", 4)).toBe(4);
    known.keep(one, "b", 7);
    expect([known.find(one, "a"), known.find(one, "b"), known.find(other, "a")]).toEqual([4, 7, null]);
  });
});
