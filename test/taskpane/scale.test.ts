import { describe, expect, it } from "vitest";
import { percentOf, roundTicks, scaleOver, tickLabel, wholeTicks } from "../../src/taskpane/pictures/scale.ts";

describe("scales", () => {
  it("place the values between the margins", () => {
    const scale = scaleOver([10, 30, 20], 0.25);
    expect(scale.low).toBe(5);
    expect(scale.high).toBe(35);
    expect(scale.percent(20)).toBe(50);
    expect(percentOf(scale, 10)).toBe("16.67%");
  });

  it("give a single value a width", () => {
    expect(scaleOver([50])).toMatchObject({ low: 47.5, high: 52.5 });
    expect(scaleOver([0, 0])).toMatchObject({ low: -0.5, high: 0.5 });
  });

  it("have round ticks inside, without rounding dust", () => {
    expect(roundTicks(scaleOver([0, 1], 0), 4)).toEqual([0, 0.25, 0.5, 0.75, 1]);
    expect(roundTicks(scaleOver([0.05, 0.42], 0), 4)).toEqual([0.1, 0.2, 0.3, 0.4]);
    expect(roundTicks(scaleOver([-4200, 3900], 0), 3)).toEqual([0]);
  });
});

it("names whole numbers alone where something is counted", () => {
  expect(roundTicks(scaleOver([0, 10], 0), 4)).toEqual([0, 2.5, 5, 7.5, 10]);
  expect(wholeTicks(scaleOver([0, 10], 0), 4)).toEqual([0, 5, 10]);
});

it("writes ticks short, with a minus sign", () => {
  expect(tickLabel(-1500)).toBe("−1.5K");
  expect(tickLabel(0)).toBe("0");
  expect(tickLabel(0.25)).toBe("0.25");
  expect(tickLabel(0.00002)).toBe("2E−5");
  expect(tickLabel(2e14)).toBe("200T");
  expect(tickLabel(-2e26)).toBe("−2E+26");
});
