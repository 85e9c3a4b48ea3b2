import type { Answer } from "../../core/answer/answer.ts";
import { listInWords } from "../../core/answer/wording.ts";

type Shape = Answer["shape"];

const brief = new Intl.NumberFormat("en-US", { maximumSignificantDigits: 3 });
const shown = (value: number): string => brief.format(value).replace("-", "−");

const mostNamed = 5;

/** What the picture of the residuals' correlations shows, for those who do not see it: the lags outside the bounds. */
export function correlationsInWords({ values, bound }: NonNullable<Shape["correlations"]>): string {
  const outside = values
    .map((value, index) => ({ lag: index + 1, value }))
    .filter(({ value }) => Math.abs(value) > bound);
  const named = outside.slice(0, mostNamed).map(({ lag, value }) => `lag ${lag} (${shown(value)})`);
  const more = outside.length - named.length;
  const list = listInWords(more > 0 ? [...named, `${more} more`] : named);
  const found = outside.length === 0 ? "none is outside the bounds" : `outside the bounds: ${list}`;
  return `Correlations of the residuals with their own past at lags 1 to ${values.length}, bounds ±${shown(bound)}; ${found}.`;
}

/** What the picture of quantiles shows: how far the ends lie from where a normal law would put them. */
export function quantilesInWords({ residuals, normal }: Shape["quantiles"]): string {
  const last = residuals.length - 1;
  const end = (index: number): string =>
    `${shown(residuals[index] ?? 0)} where a normal law has ${shown(normal[index] ?? 0)}`;
  return `Residuals in order against a normal law of the same spread: the smallest is ${end(0)}, the largest ${end(last)}.`;
}
