import type { Answer } from "../core/answer/answer.ts";
import { estimatesTable } from "../core/answer/askedTables.ts";
import { type Grid, answerTable } from "../core/answer/tables.ts";
import { decimalsFor, numberInWords, pValueInWords } from "../core/answer/wording.ts";

type Texts = readonly (readonly string[])[];

/**
 * The table of drivers as texts, its headings first, one row a term: figures to what the standard error in force
 * supports; columns that hold nothing are left out.
 */
export function driverTexts(answer: Answer): Texts {
  const rows = texts(answerTable(answer), answer.drivers, answer.options.level);
  const [headings = [], ...body] = rows;
  const columns = headings.flatMap((_, column) => (body.some((row) => row[column] !== "") ? [column] : []));
  return rows.map((row) => columns.map((column) => row[column] ?? ""));
}

/** What was asked of the coefficients, likewise. */
export const estimateTexts = (answer: Answer): Texts =>
  texts(
    estimatesTable(answer),
    answer.estimates.map(({ estimate }) => estimate ?? { low: 0, high: 0 }),
    answer.options.level,
  );

interface Interval {
  readonly low: number;
  readonly high: number;
}

function texts([headings = [], ...body]: Grid, intervals: readonly Interval[], level: number): Texts {
  const shown = body.map((row, index) => {
    const write = writerFor(intervals[index]!, level);
    return row.map((value, column) => (typeof value === "number" ? write(value, String(headings[column])) : value));
  });
  return [headings.map(String), ...shown];
}

const ratioDecimals = 2;

/** Standard errors have a digit more than the coefficient. */
function writerFor({ low, high }: Interval, level: number): (value: number, heading: string) => string {
  const decimals = decimalsFor((high - low) / 2);
  return (value, heading) => {
    switch (heading) {
      case "held against":
        return String(value);
      case "ratio":
        return numberInWords(value, ratioDecimals);
      case "p-value":
        return pValueText(value, level);
      case "coefficient":
      case "estimate":
      case "low":
      case "high":
        return numberInWords(value, decimals);
      default:
        return numberInWords(value, decimals + 1);
    }
  };
}

/** A p-value as a table of texts shows it: "0.034", "under 0.0001". */
export const pValueText = (pValue: number, level: number): string =>
  pValueInWords(pValue, level).replace(/^p (= )?/, "");
