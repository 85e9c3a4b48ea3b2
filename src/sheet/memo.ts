import { alignedLines } from "../core/answer/alignedLines.ts";
import type { Answer } from "../core/answer/answer.ts";
import { estimatesTable } from "../core/answer/askedTables.ts";
import { askedSentences } from "../core/answer/askedWords.ts";
import { findingInWords } from "../core/answer/findings.ts";
import { answerTable, choiceText } from "../core/answer/tables.ts";
import { decimalsFor, numberInWords, pValueInWords } from "../core/answer/wording.ts";
import type { SheetFacts } from "./facts.ts";
import { cautionLine } from "./plainWordsSection.ts";

type Part = readonly [heading: string, lines: readonly string[]];

/**
 * The answer as plain text for a memo: verdict, choice and why, drivers in columns, rows, how it was made, the caution.
 * Columns stand under one another in a type of even width.
 */
export function memoOf(answer: Answer, facts: SheetFacts): string {
  const { drivers, verdict, decision } = answer;
  const [opening = "", choice = ""] = verdict;
  const parts: readonly Part[] = [
    ["What holds", [...drivers.flatMap(({ sentence }) => sentence ?? []), opening]],
    ["Which standard errors, and why", [choice, `${choiceText(answer)}.`, ...whyLines(answer), ...decision.cautions]],
    ["Drivers", driverLines(answer)],
    ...askedParts(answer),
    ["Rows", rowLines(answer)],
    ["How this was made", madeLines(facts)],
  ];
  const body = parts.flatMap(([heading, lines]) => ["", heading.toUpperCase(), ...lines]);
  return [answer.title, `${facts.date}. Made with Footing ${facts.version}.`, ...body, "", cautionLine].join("\n");
}

const whyLines = ({ decision }: Answer): string[] => [
  `Policy: ${decision.policy.replace("-", " ")}.`,
  `Spread of the errors: ${findingInWords(decision, "spread")}.`,
  `Follow-on of the errors: ${findingInWords(decision, "follow-on")}.`,
  ...(decision.override === null ? [] : [`Fixed by hand, reason: ${decision.override}.`]),
];

/** What was asked of the coefficients beside the drivers, and its figures in columns; nothing where nothing was. */
function askedParts(answer: Answer): Part[] {
  const { estimates, options } = answer;
  const sentences = askedSentences(answer);
  if (sentences.length === 0) return [];
  const [headings = [], ...body] = estimatesTable(answer);
  const shown = body.map((row, index) => {
    const { low, high } = estimates[index]?.estimate ?? { low: 0, high: 0 };
    const write = writerFor({ low, high, level: options.level });
    return row.map((value, column) => (typeof value === "number" ? write(value, String(headings[column])) : value));
  });
  const table = estimates.length === 0 ? [] : alignedLines([headings.map(String), ...shown]);
  return [["Asked of the coefficients", [...sentences, ...table]]];
}

/** One line a term, figures to what the standard error in force supports; columns that hold nothing are left out. */
function driverLines(answer: Answer): string[] {
  const [headings = [], ...body] = answerTable(answer);
  const shown = body.map((row, index) => {
    const { low, high } = answer.drivers[index]!;
    const write = writerFor({ low, high, level: answer.options.level });
    return row.map((value, column) => (typeof value === "number" ? write(value, String(headings[column])) : value));
  });
  const columns = headings.flatMap((_, column) => (shown.some((row) => row[column] !== "") ? [column] : []));
  return alignedLines([headings.map(String), ...shown].map((row) => columns.map((column) => row[column] ?? "")));
}

interface Writing {
  readonly low: number;
  readonly high: number;
  readonly level: number;
}

const ratioDecimals = 2;

/** Standard errors have a digit more than the coefficient. */
function writerFor({ low, high, level }: Writing): (value: number, heading: string) => string {
  const decimals = decimalsFor((high - low) / 2);
  return (value, heading) => {
    switch (heading) {
      case "held against":
        return String(value);
      case "ratio":
        return numberInWords(value, ratioDecimals);
      case "p-value":
        return pValueInWords(value, level).replace(/^p (= )?/, "");
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

const mostRowsListed = 10;

function rowLines({ observations, leftOut, leftOutCount, notes }: Answer): string[] {
  const listed = leftOut.slice(0, mostRowsListed);
  const rest = leftOutCount - listed.length;
  return [
    `${observations.toLocaleString("en-US")} used, ${leftOutCount.toLocaleString("en-US")} left out${leftOutCount === 0 ? "." : ":"}`,
    ...listed.map(({ cell, because }) => `- ${cell}: ${because}`),
    ...(rest > 0 ? [`- and ${rest.toLocaleString("en-US")} more`] : []),
    ...notes,
  ];
}

const madeLines = ({ ranges, table, settings, fingerprint }: SheetFacts): string[] => [
  `Outcome: ${plain(ranges.outcome)}`,
  `Drivers: ${plain(ranges.drivers)}`,
  ...(ranges.key === null ? [] : [`Time or group of each row: ${plain(ranges.key)}`]),
  ...(table === null ? [] : [`Table: ${table.name}`]),
  ...settings.map(([name, value]) => `${name}: ${value}`),
  `Fingerprint of the data (SHA-256): ${fingerprint}`,
];

const plain = (range: string): string => range.replaceAll("$", "");
