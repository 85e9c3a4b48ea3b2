/** An axis that ends on round numbers. */
export interface Scale {
  readonly minimum: number;
  readonly maximum: number;
  readonly ticks: readonly number[];
}

/** About so many steps are asked for; round numbers decide. */
const wantedSteps = 5;
const roundSteps = [1, 2, 2.5, 5, 10];

/** A scale over the values; ends that are given stay. */
export function scaleOf(
  values: readonly number[],
  given: { readonly minimum: number | null; readonly maximum: number | null },
): Scale {
  const low = given.minimum ?? Math.min(...values);
  const high = given.maximum ?? Math.max(...values);
  if (!Number.isFinite(low) || !Number.isFinite(high)) return { minimum: 0, maximum: 1, ticks: [0, 1] };
  const step = roundStep(high > low ? high - low : Math.abs(low) || 1);
  const minimum = given.minimum ?? Math.floor(low / step) * step;
  const maximum = given.maximum ?? Math.ceil(high / step) * step;
  const ends = maximum > minimum ? { minimum, maximum } : { minimum: minimum - step, maximum: maximum + step };
  return { ...ends, ticks: ticksOf(ends, step) };
}

function roundStep(span: number): number {
  const rough = span / wantedSteps;
  const power = 10 ** Math.floor(Math.log10(rough));
  return power * (roundSteps.find((step) => step >= rough / power - 1e-9) ?? 10);
}

function ticksOf({ minimum, maximum }: { minimum: number; maximum: number }, step: number): readonly number[] {
  const first = Math.ceil(minimum / step - 1e-9);
  const count = Math.floor(maximum / step + 1e-9) - first + 1;
  return Array.from({ length: count }, (_, index) => Number(((first + index) * step).toPrecision(12)));
}
