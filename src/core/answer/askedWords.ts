import type { JointFigure } from "../inference/joint.ts";
import type { AskedEstimate } from "./asked.ts";
import type { Answer, AskedJoint } from "./answer.ts";
import { confidenceInWords, decimalsFor, listInWords, numberInWords, pValueInWords } from "./wording.ts";

type Asked = Pick<Answer, "estimates" | "joint" | "options">;

/** One sentence for each number that was asked for, then one for the equations tested together. */
export const askedSentences = ({ estimates, joint, options }: Asked): string[] => [
  ...estimates.map((estimate) => estimateSentence(estimate, options.level)),
  ...(joint.asked === null ? [] : [jointSentence(joint.asked, options.level)]),
];

/** A number that was asked for, with its interval and what may be said of the value it is held against. */
export function estimateSentence({ text, against, side, estimate }: AskedEstimate, level: number): string {
  if (estimate === null) return `${text}: cannot be had, because what it is divided by is zero.`;
  const { value, low, high, pValue, caution } = estimate;
  const decimals = decimalsFor((high - low) / 2);
  const [middle, from, to] = [value, low, high].map((number) => numberInWords(number, decimals));
  const p = pValueInWords(pValue, level);
  const shown = pValue < level;
  const judged =
    side === "both"
      ? `it ${shown ? "differs from" : "is compatible with"} ${against} (${p})`
      : `that it is ${side} ${against} ${shown ? "is shown" : "cannot be shown"} (one-sided ${p})`;
  const sentence = `${text}: the estimate is ${middle ?? ""} (between ${from ?? ""} and ${to ?? ""}, ${confidenceInWords(level)}); ${judged}.`;
  return caution === null ? sentence : `${sentence} ${caution}`;
}

/** What the data say of restrictions that were tested together, under the standard errors in force. */
export function jointSentence({ texts, inForce }: AskedJoint, level: number): string {
  const together = `${listInWords(texts)}${texts.length > 1 ? ", taken together" : ""}`;
  if (inForce.kind === "not-applicable") return `${together}: cannot be tested, because ${inForce.because}.`;
  const { figure } = inForce;
  const judged = figure.pValue < level ? "the data speak against it" : "compatible with the data";
  return `${together}: ${judged} (${figureInWords(figure)}, ${pValueInWords(figure.pValue, level)}).`;
}

const figureInWords = ({ law, df, statistic }: JointFigure): string =>
  `${law}(${df.join(", ")}) = ${numberInWords(statistic, 2)}`;
