/** A straight scale from values to per cent of a picture's width or height. */
export interface Scale {
  readonly low: number;
  readonly high: number;
  readonly percent: (value: number) => number;
}

export function scaleOver(values: readonly number[], margin = 0.06): Scale {
  const first = Math.min(...values);
  const last = Math.max(...values);
  // One value alone still needs a width: a tenth of itself, or one.
  const alone = Math.abs(first) / 10 || 1;
  const room = last > first ? margin * (last - first) : alone / 2;
  const low = first - room;
  const high = last + room;
  return { low, high, percent: (value) => ((value - low) / (high - low)) * 100 };
}

/** A place on a scale as SVG takes it. */
export const percentOf = (scale: Scale, value: number): string => `${scale.percent(value).toFixed(2)}%`;

/** How the ticks of an axis are written: short, without rounding dust. */
export function tickLabel(tick: number): string {
  const size = Math.abs(tick);
  const isPlain = tick === 0 || (size >= plain.smallest && size < plain.largest);
  return (isPlain ? compact.format(tick) : tick.toExponential().replace("e", "E")).replace("-", "−");
}

const plain = { smallest: 1e-4, largest: 1e15 } as const;
const compact = new Intl.NumberFormat("en-US", { maximumSignificantDigits: 5, notation: "compact" });

const roundSteps = [1, 2, 2.5, 5, 10];

/** Round values inside the scale, about `wanted` of them. */
export function roundTicks({ low, high }: Scale, wanted: number): readonly number[] {
  const rough = (high - low) / wanted;
  const power = 10 ** Math.floor(Math.log10(rough));
  const step = power * (roundSteps.find((size) => size * power >= rough) ?? 10);
  const first = Math.ceil(low / step);
  const last = Math.floor(high / step);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, index) => tidy((first + index) * step));
}

/** The same for what is counted: half a lag, or half a month, is none. */
export const wholeTicks = (scale: Scale, wanted: number): readonly number[] =>
  roundTicks(scale, wanted).filter(Number.isInteger);

/** Takes off the rounding dust of a product, so that 0.30000000000000004 reads 0.3. */
const tidy = (value: number): number => Number(value.toPrecision(12));
