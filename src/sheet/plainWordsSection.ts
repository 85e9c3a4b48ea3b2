import type { Answer } from "../core/answer/answer.ts";
import { verdictLines } from "../core/answer/tables.ts";
import { wrappedHeight } from "./columns.ts";
import type { Figures } from "./figures.ts";
import type { SheetFacts } from "./facts.ts";
import { acrossPage } from "./pageFormats.ts";
import type { PlanFormat } from "./plan.ts";
import { type Section, section, text } from "./section.ts";

/** The caution every result carries. */
export const cautionLine =
  "A statistical check, not financial, legal or audit advice; have a qualified person look before money or a filing depends on it.";

/** In points: the title is larger than a standard row, and its letters wider than those that columns are measured in. */
const titleHeight = 28;
const titleLetters = 105;

export const titleSection = (answer: Answer, { date, version }: SheetFacts, { notSpilled }: Figures): Section =>
  section(
    [
      [text(answer.title)],
      [text(`${date}. Made with Footing ${version}.`)],
      [text(cautionLine)],
      ...(notSpilled === null ? [] : [[notSpilled]]),
    ],
    [
      {
        ...acrossPage(0, "title"),
        merge: true,
        wrap: true,
        rowHeight: titleHeight * Math.ceil(answer.title.length / titleLetters),
      },
      acrossPage(1, "note"),
      acrossPage(2, "caution"),
    ],
  );

/** Lines kept free below a live verdict, in case new figures call for another sentence. */
const spareLines = 2;

/** One sentence a row, joined across the page so that it wraps. */
export function verdictSection(answer: Answer, figures: Figures): Section {
  const lines = verdictLines(answer);
  const spare = figures.blocks.length === 0 ? 0 : spareLines;
  const rows = Array.from({ length: lines.length + spare }, (_, line) => [figures.verdict(line)]);
  const formats = rows.map((_, line): PlanFormat => ({
    ...acrossPage(line + 1, "sentence"),
    merge: true,
    wrap: true,
    rowHeight: wrappedHeight(lines[line] ?? ""),
  }));
  return section([[text("In plain words")], ...rows], [acrossPage(0, "heading"), ...formats]);
}
