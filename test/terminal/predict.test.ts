import { describe, expect, it } from "vitest";
import { shelf, terminal } from "../support/terminal.ts";

const count = 30;
const cells = (value: (i: number) => number | string): (number | string)[] =>
  Array.from({ length: count }, (_, i) => value(i));
const repairs = cells((i) => 10 + 3 * ((i * 7) % 11) + ((i * 29) % 19) / 4);
const price = cells((i) => (i * 7) % 11);
const rain = cells((i) => (i * 13) % 17);
/** The data in columns A to C; new rows stand apart in E and F, rain first. */
const lines = Array.from({ length: count }, (_, i) => {
  const apart = i === 0 ? ",rain ,Price" : i === 1 ? ",4,5" : i === 2 ? ",,5" : i === 3 ? ",40,5" : ",,";
  return `${repairs[i]},${price[i]},${rain[i]},${apart}`;
});
const book = ["Repairs,Price,Rain,,,", ...lines].join("\n");
const ask = (...more: string[]) =>
  terminal(
    ["answer", "repairs.csv", "--outcome", "A1:A31", "--drivers", "B1:B31,C1:C31", "--errors", "classical", ...more],
    shelf({ "repairs.csv": book }),
  );

interface Told {
  readonly coefficients: readonly number[];
  readonly predictions: {
    readonly rows: readonly {
      row: number;
      prediction: { value: number; low: number; single: { low: number } | null } | null;
    }[];
    readonly because: string | null;
  };
}

describe("the drivers in columns", () => {
  it("have the p-value by the normal law beside the one in force where the second digit differs", async () => {
    const headingsOf = async (...more: string[]) => {
      const { out } = await ask(...more);
      return out.split("\n").find((line) => line.startsWith("driver"));
    };
    expect(await headingsOf()).toMatch(/ratio +p-value +by the normal +low +high/);
    expect(await headingsOf("--policy", "textbook", "--errors", "white")).toMatch(/ratio +p-value +low +high/);
  });
});

describe("--predict", () => {
  it("predicts rows of a range by their headings, in full precision under --json", async () => {
    const { out, err } = await ask("--predict", "E2:F5", "--json");
    expect(err).toBe("");
    const { coefficients, predictions } = JSON.parse(out) as Told;
    const [constant = 0, price = 0, rain = 0] = coefficients;
    expect(predictions.rows.map(({ row }) => row)).toEqual([3, 4, 5]);
    const [first, second, third] = predictions.rows.map(({ prediction }) => prediction);
    expect(first!.value).toBeCloseTo(constant + 5 * price + 4 * rain, 10);
    expect(second).toBeNull();
    expect(third!.value).toBeCloseTo(constant + 5 * price + 40 * rain, 10);
    expect(first!.single!.low).toBeLessThan(first!.low);
    expect(predictions.because).toBeNull();
  });

  it("prints a line a row, and says what lacks or lies far out", async () => {
    const { out } = await ask("--predict", "E2:F5");
    const from = out.split("\n").indexOf("Predictions");
    const [headings, first, second, third] = out.split("\n").slice(from + 1);
    expect(headings).toMatch(/^row +expected +mean from +to +single row from +to$/);
    expect(first).toMatch(/^3( +-?[\d.]+){5}$/);
    expect(second).toMatch(/^4 +a driver is missing$/);
    expect(third).toMatch(/^5( +-?[\d.]+){5} +farther out than every row used$/);
  });

  it("says why it cannot, and what it does not find", async () => {
    const robust = await ask("--policy", "always-robust", "--predict", "E2:F5");
    expect(robust.out).toContain(
      "No interval for a single new row: whether the spread of the errors is even was not asked.",
    );
    expect((await ask("--predict", "Plans")).err).toContain("Plans");
    expect((await ask("--predict", "E2:E5")).err).toContain("Price");
    expect((await ask()).out).not.toContain("Predictions");
  });
});
