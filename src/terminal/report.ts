import { alignedLines } from "../core/answer/alignedLines.ts";
import type { Answer } from "../core/answer/answer.ts";
import { choiceText, verdictLines } from "../core/answer/tables.ts";
import { listInWords } from "../core/answer/wording.ts";
import { cautionLine } from "../sheet/plainWordsSection.ts";
import { driverTexts, pValueText } from "../sheet/tableTexts.ts";
import { wrapped } from "./wrapped.ts";

const mostListed = 10;

/** What a person reads in the terminal: the verdict, the drivers, what was left out. */
export function report(answer: Answer, closing: readonly string[]): string {
  const verdict = verdictLines(answer).map(wrapped);
  return [
    answer.title,
    "",
    ...verdict,
    "",
    choiceText(answer),
    "",
    ...table(answer),
    "",
    ...leftOut(answer),
    ...answer.notes,
    ...closing,
    cautionLine,
  ]
    .filter((line, index, lines) => line !== "" || lines[index - 1] !== "")
    .join("\n");
}

/** Drivers in columns, figures to what the standard error in force supports; `--json` has every digit. */
function table(answer: Answer): string[] {
  const cells = driverTexts(answer);
  const normal = normalColumn(answer);
  const place = (cells[0] ?? []).indexOf("p-value") + 1;
  return alignedLines(normal === null ? cells : cells.map((row, i) => row.toSpliced(place, 0, normal[i] ?? "")));
}

/** The p-value by the normal law of large samples, beside the one in force where they look different; null where none does. */
function normalColumn({ inference: { inForce }, options: { level } }: Answer): string[] | null {
  const shown = (p: number): string => pValueText(p, level);
  const values = inForce.pValueNormal.map((p, row) => (shown(p) === shown(inForce.pValue[row] ?? p) ? "" : shown(p)));
  return values.every((value) => value === "") ? null : ["by the normal", ...values];
}

function leftOut({ leftOut: rows, leftOutCount }: Answer): string[] {
  if (leftOutCount === 0) return [];
  const listed = rows.slice(0, mostListed).map(({ cell, because }) => `${cell} (${because})`);
  const more = leftOutCount - listed.length;
  const all = more > 0 ? [...listed, `${more} more`] : listed;
  return [wrapped(`${leftOutCount} ${leftOutCount === 1 ? "row" : "rows"} left out: ${listInWords(all)}.`)];
}
