import { describe, expect, it } from "vitest";
import { cells } from "./cells.ts";
import { falseAlarms } from "./falseAlarms.ts";

describe("the false-alarm rate of the decision", () => {
  it("is that of Newey-West where errors follow on, and the careful policy's is lower", () => {
    // Of 50,000 draws 12.8 % and 8.5 %; one standard error of 1,000 draws is 1.06 and 0.88 points. Classical standard
    // errors throughout would give 24 %, a level of 5 % kept would give 5.
    const cell = cells.find(({ rowCount }) => rowCount === 160)!;
    const found = falseAlarms(cell, { draws: 1000, seed: 20240611 });
    expect(found["textbook, looks at half"]).toBeGreaterThan(0.095);
    expect(found["textbook, looks at half"]).toBeLessThan(0.16);
    expect(found.careful).toBeGreaterThan(0.055);
    expect(found.careful).toBeLessThan(0.11);
  });
});
