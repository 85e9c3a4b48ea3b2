import type { Combination } from "../inference/functionOf.ts";
import type { Side } from "../inference/ratioLaw.ts";
import { nearestName } from "../problem/nearestName.ts";
import { type Result, failure, success } from "../problem/result.ts";
import { type Arithmetic, arithmeticOf } from "./arithmetic.ts";
import { type TermName, type Token, tokensOf } from "./expressionTokens.ts";

/** A number made of the coefficients, above / below, and the value that it is held against. */
export interface Expression {
  readonly text: string;
  readonly above: Combination;
  /** null where nothing is divided by coefficients. */
  readonly below: Combination | null;
  readonly against: number;
  readonly side: Side;
}

/** The coefficients that an expression may be made of. */
export interface Coefficients {
  readonly names: readonly TermName[];
  /** k. */
  readonly size: number;
}

export interface Vocabulary extends Coefficients {
  /** The setting that the expression stands in. */
  readonly setting: string;
}

const sides = { "=": "both", ">": "above", "<": "below" } as const satisfies Record<string, Side>;

/**
 * Reads arithmetic of coefficients by the names of their terms: "Price + Rain", "Price / (1 - Lagged) = 2", "Price > 0".
 * Names are free of case; one with signs of arithmetic in it is known by its whole, or stands in double quotes. Behind
 * "=" stands the value it is held against, 0 where none does; ">" and "<" look for it on one side alone.
 * @returns Problem "unknown-coefficient" for a name that no term has, "unknown-value" for what is no sum of coefficients nor
 *   a quotient of two.
 */
export function readExpression(text: string, vocabulary: Vocabulary): Result<Expression> {
  const tokens = tokensOf(text, vocabulary.names);
  const stranger = tokens.find((token) => token.kind === "unknown");
  if (stranger !== undefined) {
    const known = vocabulary.names.map(({ name }) => name);
    const name = stranger.text;
    return failure({ code: "unknown-coefficient", name, nearest: nearestName(name, known) });
  }
  const expression = fromTokens(tokens, vocabulary.size);
  return expression === null ? failure(notUnderstood(text, vocabulary)) : success({ text: text.trim(), ...expression });
}

function fromTokens(tokens: readonly Token[], size: number): Omit<Expression, "text"> | null {
  const mark = tokens.findIndex((token) => token.kind === "sign" && token.sign in sides);
  const sign = tokens[mark];
  const side = sign?.kind === "sign" ? sides[sign.sign as keyof typeof sides] : "both";
  const left = arithmeticOf(mark < 0 ? tokens : tokens.slice(0, mark), size);
  const right = mark < 0 ? constant(0, size) : arithmeticOf(tokens.slice(mark + 1), size);
  if (left === null || right === null) return null;
  const held = heldAgainst(left, right);
  return held === null || isNumber(held.whole) || !Number.isFinite(held.against)
    ? null
    : { ...withoutNumberBelow(held.whole), against: held.against, side };
}

/** Coefficients on both sides of the sign: their difference is held against 0. Quotients cannot be brought together. */
function heldAgainst(left: Arithmetic, right: Arithmetic): { whole: Arithmetic; against: number } | null {
  if (isNumber(right)) return { whole: left, against: right.above.offset / right.below.offset };
  const whole = difference(left, right);
  return whole === null ? null : { whole, against: 0 };
}

function withoutNumberBelow({ above, below }: Arithmetic): Pick<Expression, "above" | "below"> {
  return isConstant(below) ? { above: scaled(above, 1 / below.offset), below: null } : { above, below };
}

const isNumber = ({ above, below }: Arithmetic): boolean => isConstant(above) && isConstant(below);

const isConstant = ({ weights }: Combination): boolean => weights.every((weight) => weight === 0);

const constant = (offset: number, size: number): Arithmetic => ({
  above: { offset, weights: Array<number>(size).fill(0) },
  below: { offset: 1, weights: Array<number>(size).fill(0) },
});

const scaled = ({ offset, weights }: Combination, factor: number): Combination => ({
  offset: offset * factor,
  weights: weights.map((weight) => weight * factor),
});

function difference(left: Arithmetic, right: Arithmetic): Arithmetic | null {
  if (!isConstant(left.below) || !isConstant(right.below)) return null;
  const [a, b] = [scaled(left.above, 1 / left.below.offset), scaled(right.above, 1 / right.below.offset)];
  const above = { offset: a.offset - b.offset, weights: a.weights.map((weight, j) => weight - b.weights[j]!) };
  return { above, below: constant(0, a.weights.length).below };
}

const notUnderstood = (value: string, { setting, names }: Vocabulary) =>
  ({
    code: "unknown-value",
    setting,
    value,
    allowed: [
      `sums of the coefficients ${names.map(({ name }) => name).join(", ")} with numbers before them, or a quotient of two, such as 2 * ${names.at(-1)?.name ?? "constant"} > 1`,
    ],
    nearest: null,
  }) as const;
