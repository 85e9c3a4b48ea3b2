import { quantityIn } from "./arithmetic.ts";
import { chosenLines, indexOf, taken, turned } from "./blockFunctions.ts";
import { type Measure, type Step, type Value, after, cornerOf, each, known, measured, unknown } from "./values.ts";
import { whyUnread } from "./whyUnread.ts";

type Arguments = readonly (Value | undefined)[];
type ValueFunction = (given: Arguments) => Value;

const lost = unknown(whyUnread.goesIntoArithmetic);

const same: ValueFunction = ([of]) => of ?? lost;

/** The functions through which a regression's results can be followed, with their arguments evaluated. */
export const valueFunctions: Readonly<Record<string, ValueFunction>> = {
  IFERROR: same,
  IFNA: same,
  N: same,
  VALUE: same,
  SINGLE: ([of]) => cornerOf(of ?? lost),
  IF: ([, ...branches]) => branchOf(branches),
  INDEX: ([of, first, second]) => indexOf(of ?? lost, first, second),
  TRANSPOSE: ([of]) => turned(of ?? lost),
  CHOOSEROWS: ([of, ...which]) => chosenLines(of ?? lost, which.filter(isGiven), "rows"),
  CHOOSECOLS: ([of, ...which]) => chosenLines(of ?? lost, which.filter(isGiven), "columns"),
  TAKE: ([of, rows, columns]) => taken(of ?? lost, rows, columns),
  ROUND: ([of, digits]) => rounded(of, digits, 0.5),
  ROUNDUP: ([of, digits]) => rounded(of, digits, 1),
  ROUNDDOWN: ([of, digits]) => rounded(of, digits, 1),
  TRUNC: ([of, digits]) => rounded(of, digits, 1),
  ABS: ([of]) => each(of ?? lost, size),
  EXP: ([of]) => stepped(of, { kind: "back", from: Math.log }),
  LN: ([of]) => stepped(of, { kind: "back", from: Math.exp }),
  SQRT: ([of]) => stepped(of, { kind: "back", from: (shown) => shown ** 2 }),
  "T.INV.2T": () => ({ kind: "quantile" }),
  TINV: () => ({ kind: "quantile" }),
  "T.DIST.2T": ([ratio]) => each(ratio ?? lost, pValue),
  TDIST: ([ratio, , tails]) => (isNumber(tails, 2) ? each(ratio ?? lost, pValue) : lost),
  "T.DIST.RT": ([ratio]) => each(ratio ?? lost, halfPValue),
  "F.DIST.RT": ([f]) => each(f ?? lost, pValueOfF),
  FDIST: ([f]) => each(f ?? lost, pValueOfF),
};

const isGiven = (value: Value | undefined): value is Value => value !== undefined;

const isNumber = (value: Value | undefined, number: number): boolean =>
  value?.kind === "known" && value.value === number;

/** IF(there are enough rows, the result, ""): the branch with the regression is the one that is meant. */
function branchOf(branches: Arguments): Value {
  const telling = branches.filter(
    (value) => value !== undefined && ["measure", "combination", "block"].includes(value.kind),
  );
  return (telling.length === 1 ? telling[0] : undefined) ?? lost;
}

function stepped(value: Value | undefined, step: Step): Value {
  return each(value ?? lost, (one) => {
    const measure = quantityIn(one);
    return measure === null ? lost : after(measure, step);
  });
}

function rounded(value: Value | undefined, digits: Value | undefined, share: number): Value {
  const places = digits === undefined ? 0 : digits.kind === "known" ? digits.value : null;
  if (places === null) return lost;
  const unit = 10 ** -Math.trunc(places);
  return each(value ?? lost, (one) =>
    one.kind === "known"
      ? known(Math.round(one.value / unit) * unit)
      : stepped(one, { kind: "rounded", half: share * unit }),
  );
}

const neverNegative = new Set([
  "standard-error",
  "p-value",
  "r-squared",
  "sigma",
  "f",
  "f-p-value",
  "residual-sum-of-squares",
]);

/** The size of a ratio is what p-values are made of; of other numbers that can be negative the sign is lost. */
function size(value: Value): Value {
  const measure = quantityIn(value);
  if (measure === null) return lost;
  return neverNegative.has(measure.quantity.kind) ? measure : { kind: "size", of: measure };
}

const ratioIn = (value: Value): Measure | null => {
  const of = value.kind === "size" ? value.of : value;
  return of.kind === "measure" && of.quantity.kind === "ratio" && of.steps.length === 0 ? of : null;
};

function pValue(value: Value): Value {
  const ratio = ratioIn(value);
  if (ratio === null || ratio.quantity.kind !== "ratio") return lost;
  return measured(ratio.regression, { kind: "p-value", term: ratio.quantity.term });
}

/** One tail of the size of a ratio is half a p-value. */
function halfPValue(value: Value): Value {
  const whole = value.kind === "size" ? pValue(value) : lost;
  return whole.kind === "measure" ? after(whole, { kind: "back", from: (shown) => 2 * shown }) : lost;
}

function pValueOfF(value: Value): Value {
  const isF = value.kind === "measure" && value.quantity.kind === "f" && value.steps.length === 0;
  return isF ? measured(value.regression, { kind: "f-p-value" }) : lost;
}
