import { describe, expect, it } from "vitest";
import { reviewing } from "../../../../src/core/review/reviewClaim.ts";
import { soundBooks } from "../../../planted/books.ts";

describe("a review in steps", () => {
  const [{ claim }] = soundBooks() as [ReturnType<typeof soundBooks>[number]];
  const reported = claim.reported.map((number) => ({ ...number, value: 1.37 * number.value + 3 }));

  it("says what it does and how far it is, and can be left at any step", () => {
    const steps = reviewing({ ...claim, reported });
    const seen: { readonly step: string; readonly share: number }[] = [];
    for (const step of steps) {
      seen.push(step);
      if (step.step === "Trying changes in pairs") break;
    }
    expect(seen.map(({ step }) => step)).toContain("Trying changes one by one");
    expect(seen.map(({ step }) => step)).not.toContain("Which standard errors");
    expect(steps.next()).toEqual({ done: true, value: undefined });
  });

  it("never goes back, and ends with a review", () => {
    const steps = reviewing({ ...claim, reported });
    let next = steps.next();
    let share = 0;
    while (next.done !== true) {
      expect(next.value.share).toBeGreaterThanOrEqual(share);
      expect(next.value.share).toBeLessThanOrEqual(1);
      share = next.value.share;
      next = steps.next();
    }
    expect(next.value.tried.length).toBeGreaterThan(5);
  });
});
