/** The drivers of a large file; the outcome before them is "Cost". */
export const largeDrivers = ["Hours", "Distance", "Weight", "Stops", "Age", "Load"] as const;

/** Invented numbers from a small generator (Park and Miller 1988), so that the file is the same at every run. */
function* numbers(seed: number): Generator<number, never> {
  for (let state = seed; ;) {
    state = (state * 48_271) % 2_147_483_647;
    yield state / 2_147_483_647;
  }
}

/** A .csv of one outcome and six drivers with an uneven spread, headings above. */
export function largeFile(rows: number): Buffer {
  const draw = numbers(20_260_901);
  const next = (): number => draw.next().value;
  const lines = Array.from({ length: rows }, () => {
    const values = largeDrivers.map(() => next() * 10);
    const cost =
      values.reduce((sum, value, index) => sum + value * (index + 1), 50) + (next() + next() - 1) * (5 + values[0]!);
    return [cost, ...values].map((value) => value.toFixed(4)).join(",");
  });
  return Buffer.from([["Cost", ...largeDrivers].join(","), ...lines].join("\n"));
}
