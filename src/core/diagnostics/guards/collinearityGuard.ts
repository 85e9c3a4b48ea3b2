import type { Collinearity, TermInflation } from "./collinearity.ts";
import { type Guard, namesInWords } from "./guard.ts";

/** Variance inflation from which a term is named (Marquardt 1970). */
const harmfulInflation = 10;
/** From here the design is so near to dependent that cells' own rounding shows in the coefficients. */
const extremeCondition = 1e7;
const mostNamed = 5;

/** Which terms nearly make one another up, in words. */
export function collinearityGuard({ terms, conditionNumber }: Collinearity): Guard {
  const harmful = terms.filter(({ inflation }) => inflation >= harmfulInflation);
  if (harmful.length === 0) {
    return {
      guard: "collinearity",
      finding: "nothing found",
      sentences: ["No driver is nearly made up of the others."],
    };
  }
  const worst = harmful.toSorted((one, other) => other.inflation - one.inflation).slice(0, mostNamed);
  const more = harmful.length - worst.length;
  return {
    guard: "collinearity",
    finding: conditionNumber > extremeCondition ? "look into it" : "worth knowing",
    sentences: [
      ...worst.map(sentenceOf),
      ...(more > 0 ? [`${more} more drivers are nearly made up of the others.`] : []),
      "What these drivers explain together is known better than what each explains alone; leaving one out changes what the others mean.",
    ],
  };
}

function sentenceOf({ term, inflation, madeOf }: TermInflation): string {
  const others = madeOf.length === 0 ? "the other drivers" : namesInWords(madeOf.slice(0, mostNamed));
  const wider = Math.sqrt(inflation);
  const times = wider < 10 ? wider.toFixed(1) : String(Math.round(wider));
  return `${term} is nearly made up of ${others}: its standard error is ${times} times what it would be if they did not move together.`;
}
