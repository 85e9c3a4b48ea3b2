import type { Combination } from "../inference/functionOf.ts";
import type { Token } from "./expressionTokens.ts";

/** above / below, both linear in the coefficients. */
export interface Arithmetic {
  readonly above: Combination;
  readonly below: Combination;
}

/** Tokens that are still to be read. */
interface Reading {
  readonly tokens: readonly Token[];
  readonly size: number;
  next: number;
}

/**
 * Works out sums, differences, products and quotients with the usual precedence.
 * @param size - k.
 * @returns null where the tokens are no arithmetic, or their value is no quotient of two linear forms.
 */
export function arithmeticOf(tokens: readonly Token[], size: number): Arithmetic | null {
  const reading: Reading = { tokens, size, next: 0 };
  const value = sumAt(reading);
  return reading.next === tokens.length ? value : null;
}

function sumAt(reading: Reading): Arithmetic | null {
  let value = productAt(reading);
  for (;;) {
    const sign = takeSign(reading, "+-");
    if (sign === null || value === null) return value;
    const other = productAt(reading);
    value = other === null ? null : sum(value, sign === "+" ? other : negative(other));
  }
}

function productAt(reading: Reading): Arithmetic | null {
  let value = factorAt(reading);
  for (;;) {
    const sign = takeSign(reading, "*/");
    if (sign === null || value === null) return value;
    const other = factorAt(reading);
    if (other === null) return null;
    value = sign === "*" ? product(value, other) : product(value, inverse(other));
  }
}

function factorAt(reading: Reading): Arithmetic | null {
  const sign = takeSign(reading, "+-(");
  if (sign === "+") return factorAt(reading);
  if (sign === "-") {
    const value = factorAt(reading);
    return value === null ? null : negative(value);
  }
  if (sign === "(") {
    const value = sumAt(reading);
    return takeSign(reading, ")") === null ? null : value;
  }
  const token = reading.tokens[reading.next];
  if (token?.kind !== "term" && token?.kind !== "number") return null;
  reading.next++;
  const { size } = reading;
  if (token.kind === "number") return over(linear(token.value, null, size));
  return over(linear(0, token.term, size));
}

function takeSign(reading: Reading, signs: string): string | null {
  const token = reading.tokens[reading.next];
  if (token?.kind !== "sign" || !signs.includes(token.sign)) return null;
  reading.next++;
  return token.sign;
}

const linear = (offset: number, term: number | null, size: number): Combination => ({
  offset,
  weights: Array.from({ length: size }, (_, j) => (j === term ? 1 : 0)),
});

const over = (above: Combination): Arithmetic => ({ above, below: linear(1, null, above.weights.length) });

const inverse = ({ above, below }: Arithmetic): Arithmetic => ({ above: below, below: above });

const negative = ({ above, below }: Arithmetic): Arithmetic => ({ above: times(above, -1), below });

const isNumber = ({ weights }: Combination): boolean => weights.every((weight) => weight === 0);

const times = ({ offset, weights }: Combination, factor: number): Combination => ({
  offset: offset * factor,
  weights: weights.map((weight) => weight * factor),
});

/** The product of two linear forms, one of them a number; null where neither is. */
function formProduct(one: Combination, other: Combination): Combination | null {
  if (isNumber(one)) return times(other, one.offset);
  return isNumber(other) ? times(one, other.offset) : null;
}

function product(one: Arithmetic, other: Arithmetic): Arithmetic | null {
  const [above, below] = [formProduct(one.above, other.above), formProduct(one.below, other.below)];
  return above === null || below === null || isZero(below) ? null : { above, below };
}

const isZero = (form: Combination): boolean => isNumber(form) && form.offset === 0;

/** a/b + c/d = (a d + c b) / (b d), where that stays linear above and below. */
function sum(one: Arithmetic, other: Arithmetic): Arithmetic | null {
  const left = formProduct(one.above, other.below);
  const right = formProduct(other.above, one.below);
  const below = formProduct(one.below, other.below);
  if (left === null || right === null || below === null) return null;
  const weights = left.weights.map((weight, j) => weight + right.weights[j]!);
  return { above: { offset: left.offset + right.offset, weights }, below };
}
