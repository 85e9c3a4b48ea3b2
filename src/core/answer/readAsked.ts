import type { Design } from "../design/design.ts";
import { type Result, failure, success } from "../problem/result.ts";
import { type Coefficients, type Expression, type Vocabulary, readExpression } from "./expression.ts";
import type { TermName } from "./expressionTokens.ts";

/**
 * Reads what the setting "estimates" asks for.
 * @returns Problems of the expressions.
 */
export const readEstimates = (coefficients: Coefficients, texts: readonly string[]): Result<readonly Expression[]> =>
  expressionsOf({ ...coefficients, setting: "estimates" }, texts);

/**
 * Reads the equations of the setting "joint test".
 * @returns Problems of the expressions, "unknown-value" for one that is not linear or looks to one side.
 */
export function readJointTest(coefficients: Coefficients, texts: readonly string[]): Result<readonly Expression[]> {
  const read = expressionsOf({ ...coefficients, setting: "joint test" }, texts);
  if (!read.ok) return read;
  const strange = read.value.find(({ below, side }) => below !== null || side !== "both");
  if (strange === undefined) return read;
  const allowed = ["sums of coefficients, each equal to a number or another sum, such as Price = 0"];
  return failure({ code: "unknown-value", setting: "joint test", value: strange.text, allowed, nearest: null });
}

function expressionsOf(vocabulary: Vocabulary, texts: readonly string[]): Result<readonly Expression[]> {
  const found: Expression[] = [];
  for (const text of texts) {
    const read = readExpression(text, vocabulary);
    if (!read.ok) return read;
    found.push(read.value);
  }
  return success(found);
}

/** What expressions may speak of in a design. */
export const coefficientsOf = (design: Design): Coefficients => ({
  names: namesOf(design),
  size: design.terms.length,
});

/** Terms go by their own names, and by their column's where one term alone is made of it. */
function namesOf({ terms }: Design): TermName[] {
  const own = terms.map(({ name }, term) => ({ name, term }));
  const columns = terms.flatMap(({ meaning }, term) =>
    meaning.kind === "number" ? [{ name: meaning.column, term }] : [],
  );
  const single = columns.filter(
    ({ name }) =>
      columns.filter((other) => other.name === name).length === 1 && !own.some((other) => other.name === name),
  );
  return [...own, ...single];
}
