import type { Answer } from "../../core/answer/answer.ts";
import {
  confidenceInWords,
  decimalsFor,
  listInWords,
  numberInWords,
  pValueInWords,
} from "../../core/answer/wording.ts";
import type { ErrorsChoice } from "../../core/covariance/choice.ts";
import type { InferenceTable } from "../../core/inference/inference.ts";
import { referenceInWords } from "../../core/answer/tables.ts";
import { lawAt } from "../../core/inference/ratioLaw.ts";

/** One kind of standard errors beside the others, for one term. */
export interface KindFigures {
  readonly kind: ErrorsChoice["kind"];
  readonly label: string;
  readonly inForce: boolean;
  readonly standardError: number;
  readonly ratio: number;
  readonly pValue: number;
  readonly pValueNormal: number;
  readonly low: number;
  readonly high: number;
  readonly reference: string;
}

/** The kinds that the answer has, in the trade's order. The kind in force shows the figures in force. */
export function kindFigures({ inference, decision }: Answer, index: number): readonly KindFigures[] {
  const kinds: readonly (readonly [ErrorsChoice["kind"], string, InferenceTable | null])[] = [
    ["classical", "classical", inference.classical],
    ["white", "White", inference.white],
    ["newey-west", "Newey-West", inference.neweyWest],
    ["grouped", "grouped", inference.grouped],
  ];
  return kinds.flatMap(([kind, label, own]) => {
    if (own === null) return [];
    const inForce = kind === decision.inForce.errors.kind;
    return [{ kind, label, inForce, ...figuresAt(inForce ? inference.inForce : own, index) }];
  });
}

const figuresAt = (table: InferenceTable, index: number) => ({
  standardError: table.standardErrors[index]!,
  ratio: table.ratio[index]!,
  pValue: table.pValue[index]!,
  pValueNormal: table.pValueNormal[index]!,
  low: table.low[index]!,
  high: table.high[index]!,
  reference: referenceInWords(lawAt(table, index)),
});

/** Figures of one term are all written to what the standard error in force supports. */
export function writerFor({ low, high }: Pick<KindFigures, "low" | "high">): (value: number) => string {
  const decimals = decimalsFor((high - low) / 2);
  return (value) => numberInWords(value, decimals).replace("-", "−");
}

/** Decimals that show so many significant digits of a value. */
const decimalsOf = (value: number, digits: number): number =>
  value > 0 ? digits - 1 - Math.floor(Math.log10(value)) : digits - 1;

/** Three significant digits. */
export const standardErrorInWords = (value: number): string => numberInWords(value, Math.max(0, decimalsOf(value, 3)));

/** For figures that are to be worked out again from one another: to four digits of the standard error. */
export function workingWriter(standardError: number): (value: number) => string {
  const decimals = Math.max(0, decimalsOf(standardError, 4));
  return (value) => numberInWords(value, decimals).replace("-", "−");
}

/** What each kind's ratio is held against: "classical and White against t(92), Newey-West against fixed-b (...)". */
export function lawsInWords(kinds: readonly KindFigures[]): string {
  const laws = [...new Set(kinds.map(({ reference }) => reference))];
  const held = laws.map((law) => {
    const labels = kinds.filter(({ reference }) => reference === law).map(({ label }) => label);
    return `${listInWords(labels)} against ${law}`;
  });
  return `Ratios are held against a distribution: ${held.join(", ")}.`;
}

/** What the picture of the intervals shows, for those who do not see it. */
export function intervalsInWords(answer: Answer, index: number): string {
  const kinds = kindFigures(answer, index);
  const write = writerFor(answer.drivers[index]!);
  const intervals = kinds.map(
    ({ label, low, high, inForce }) => `${label}${inForce ? " (in force)" : ""} from ${write(low)} to ${write(high)}`,
  );
  return `${confidenceInWords(answer.options.level)} intervals of ${answer.terms[index] ?? ""}: ${intervals.join("; ")}.`;
}

/** "p = 0.034", held against the level at which an effect is called shown. */
export const pInWords = (pValue: number, { options }: Answer): string => pValueInWords(pValue, options.level);
