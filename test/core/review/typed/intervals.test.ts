import { describe, expect, it } from "vitest";
import { levelIn, readInterval } from "../../../../src/core/review/typed/intervals.ts";

describe("an interval in one cell", () => {
  it.each([
    ["1.2, 5.0", 1.2, 5],
    ["1.2;5.0", 1.2, 5],
    ["1,2; 5,0", 1.2, 5],
    ["1,2, 5,0", 1.2, 5],
    ["1.2,5.0", 1.2, 5],
    ["-5.9 to -2.8", -5.9, -2.8],
    ["−5.9 – 2.8", -5.9, 2.8],
    ["-5.9 - 2.8", -5.9, 2.8],
    ["-5.9 ... 2.8", -5.9, 2.8],
    ["1.5 %, 4.2 %", 0.015, 0.042],
    ["12,345; 20,000", 12345, 20000],
  ])("%s", (text, low, high) => {
    const found = readInterval(text)!;
    expect([found.low.value, found.high.value]).toEqual([low, high]);
  });

  it("counts to the digits shown", () => {
    expect(readInterval("1.25, 5.0")!.low.halfUnit).toBeCloseTo(0.005, 12);
    expect(readInterval("1.25, 5.0")!.high.halfUnit).toBeCloseTo(0.05, 12);
  });

  it.each(["1,5", "1.234,5", "0.42", "5.0, 1.2", "1, 2, 3", "a to b", "12 March to 4 May", "", "p < 0.05, n = 3"])(
    "is not taken from %s",
    (text) => {
      expect(readInterval(text)).toBeNull();
    },
  );
});

describe("the level of an interval", () => {
  it.each([
    ["95 % CI", 0.05],
    ["CI (90%)", 0.1],
    ["99 % confidence interval", 0.01],
    ["Lower 95 %", 0.05],
    ["2.5 %", 0.05],
    ["97.5 %", 0.05],
    ["* p < 5 %; 90 % intervals in brackets", 0.1],
    ["95 per cent confidence limits", 0.05],
    ["Growth of 95 %", null],
    ["90 % and 95 % intervals", null],
    ["Confidence interval", null],
  ])("%s", (text, level) => {
    expect(levelIn(text)).toBe(level);
  });
});
