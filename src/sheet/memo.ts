import { alignedLines } from "../core/answer/alignedLines.ts";
import type { Answer } from "../core/answer/answer.ts";
import { askedSentences } from "../core/answer/askedWords.ts";
import { findingInWords } from "../core/answer/findings.ts";
import { choiceText } from "../core/answer/tables.ts";
import { capitalised } from "../core/answer/wording.ts";
import type { SheetFacts } from "./facts.ts";
import { cautionLine } from "./plainWordsSection.ts";
import { driverTexts, estimateTexts } from "./tableTexts.ts";

type Part = readonly [heading: string, lines: readonly string[]];

/**
 * The answer as plain text for a memo: verdict, choice and why, drivers in columns, guards, rows, how it was made, the
 * caution.
 * Columns stand under one another in a type of even width.
 */
export function memoOf(answer: Answer, facts: SheetFacts): string {
  const { drivers, verdict, decision } = answer;
  const [opening = "", choice = ""] = verdict;
  const parts: readonly Part[] = [
    ["What holds", [...drivers.flatMap(({ sentence }) => sentence ?? []), opening]],
    ["Which standard errors, and why", [choice, `${choiceText(answer)}.`, ...whyLines(answer), ...decision.cautions]],
    ["Drivers", alignedLines(driverTexts(answer))],
    ...askedParts(answer),
    ["Guards", guardLines(answer)],
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
  const { estimates } = answer;
  const sentences = askedSentences(answer);
  if (sentences.length === 0) return [];
  const table = estimates.length === 0 ? [] : alignedLines(estimateTexts(answer));
  return [["Asked of the coefficients", [...sentences, ...table]]];
}

/** What else to know before relying on it, the most pressing first. */
function guardLines({ guards }: Answer): string[] {
  const lines = (["look into it", "worth knowing"] as const).flatMap((wanted) =>
    guards.found.flatMap(({ finding, sentences }) =>
      finding === wanted ? sentences.map((sentence) => `${capitalised(wanted)}: ${sentence}`) : [],
    ),
  );
  return lines.length === 0 ? ["Nothing found."] : lines;
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
