import type { Answer } from "../../core/answer/answer.ts";
import { referenceInWords } from "../../core/answer/tables.ts";
import { errorsInWords } from "../../core/answer/verdict.ts";
import { confidenceInWords, numberInWords, pValueInWords } from "../../core/answer/wording.ts";
import { lawAt } from "../../core/inference/ratioLaw.ts";
import { counted } from "../../core/problem/spots.ts";
import { workingWriter, writerFor } from "./driverFigures.ts";

const ratioDecimals = 2;

/** How the figures in force of one term came about, step by step: rows, ratio, p-value, level, interval. */
export function derivationInWords(answer: Answer, index: number): readonly string[] {
  const { decision, inference, observations, fit, lags, options } = answer;
  const { coefficient, against, standardError, ratio, pValue, low, high } = answer.drivers[index]!;
  const { level } = options;
  const write = writerFor({ low, high });
  const degrees = counted(fit.degreesOfFreedom, "degree");
  const exact = workingWriter(standardError);
  const errors = `its ${errorsInWords(decision.inForce.errors, lags)} standard error ${exact(standardError)}`;
  const law = referenceInWords(lawAt(inference.inForce, index));
  const looked = against === 0 ? "an effect" : `a difference from ${against}`;
  const relation =
    pValue < level
      ? `below the level ${level}: ${looked} is shown`
      : `not below the level ${level}: ${looked} is not shown`;
  return [
    `${counted(observations, "row")}, ${counted(fit.columns, "coefficient")}: ${degrees} of freedom.`,
    `The coefficient ${exact(coefficient)}, less the tested value ${against}, divided by ${errors}, is the ratio ${minus(numberInWords(ratio, ratioDecimals))}.`,
    `Under ${law}, a ratio at least so far from zero on either side has ${pValueInWords(pValue, level)}. That is ${relation}.`,
    `The ${confidenceInWords(level)} interval from ${write(low)} to ${write(high)} comes from the same distribution.`,
  ];
}

const minus = (text: string): string => text.replace("-", "−");
