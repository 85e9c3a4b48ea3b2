import type { BookSheet } from "../book.ts";
import { type CellPlace, isTextAt, overlap, wordsAt } from "../cellsOfBook.ts";
import { shownNumberAt } from "../found/shownNumber.ts";
import { bracketBlocks } from "./bracketReadings.ts";
import { levelIn } from "./intervals.ts";
import { type Label, labelsOf } from "./labels.ts";
import { isConstantName, summaryWordIn } from "./reportWords.ts";
import { summariesOf } from "./summaries.ts";
import { type Lie, cellAt, numbersUnder, spotOf, withSign } from "./termNumbers.ts";
import { type ReportBlock, type ReportedTerm, areaBetween } from "./reportBlock.ts";

/**
 * The blocks of a sheet: one driver a row under headings, one driver a column beside them, or models in columns or rows
 * with numbers or intervals in brackets under their coefficients or beside them.
 */
export function reportBlocks(sheet: BookSheet): readonly ReportBlock[] {
  const labels = labelsOf(sheet);
  const headings = labels.filter(({ term }) => term !== null);
  const found = [...linedUp(headings, "down"), ...linedUp(headings, "across")]
    .map((group) => readBlock(sheet, group))
    .filter((block) => block !== null);
  const { blocks, own } = bracketBlocks(sheet, labels, found);
  const others = labels.filter(({ place }) => !own.has(spotOf(place)));
  const headed = found.filter(({ area }) => !blocks.some((block) => overlap(area, block.area)));
  return summariesOf(sheet, [...headed, ...blocks], others);
}

interface Group {
  readonly lie: Lie;
  /** The coefficient's first. */
  readonly headings: readonly Label[];
}

/** Headings in one row, or below one another in one column, that belong together: a coefficient and what goes with it. */
function linedUp(labels: readonly Label[], lie: Lie): Group[] {
  const line = ({ place }: Label): number => (lie === "down" ? place.row : place.column);
  const along = ({ place }: Label): number => (lie === "down" ? place.column : place.row);
  const lines = new Map<number, Label[]>();
  for (const label of labels) lines.set(line(label), [...(lines.get(line(label)) ?? []), label]);
  return [...lines.values()].flatMap((together) => {
    const ordered = together.sort((one, other) => along(one) - along(other));
    const starts = ordered.flatMap(({ term }, index) => (term === "coefficient" ? [index] : []));
    return starts.flatMap((start, index) => {
      const headings = nearby(ordered.slice(start, starts[index + 1]), along);
      return headings.length > 1 ? [{ lie, headings }] : [];
    });
  });
}

/** Further apart than this, headings speak of something else. */
const farthestApart = 4;

function nearby(labels: readonly Label[], along: (label: Label) => number): Label[] {
  const end = labels.findIndex((label, index) => index > 0 && along(label) - along(labels[index - 1]!) > farthestApart);
  const kept = end < 0 ? labels : labels.slice(0, end);
  return kept.filter(({ term }, index) => kept.findIndex((other) => other.term === term) === index);
}

function readBlock(sheet: BookSheet, group: Group): ReportBlock | null {
  const first = group.headings[0]!.place;
  const names = placeOfNames(sheet, group);
  if (names === null) return null;
  const terms: ReportedTerm[] = [];
  let at = names.first;
  for (; terms.length < mostTerms; at++) {
    const term = termAt(sheet, group, { names: names.track, at });
    if (term !== null) terms.push(term);
    else if (terms.length > 0 || at > names.first) break;
  }
  if (!terms.some(({ isConstant }) => !isConstant)) return null;
  const last = group.headings.at(-1)!.place;
  const levels = new Set(group.headings.flatMap(({ place }) => levelIn(wordsAt(place)) ?? []));
  return {
    sheet,
    area: areaBetween(sheet, [
      ...[first, last, cellAt(sheet, group.lie, [names.track, at - 1])],
      ...terms.flatMap(({ numbers }) => numbers.map(({ place }) => place)),
    ]),
    terms,
    summaries: [],
    level: levels.size === 1 ? [...levels][0]! : null,
    model: null,
  };
}

const mostTerms = 200;

const lineOf = (lie: Lie, { row, column }: CellPlace): number => (lie === "down" ? column : row);
const positionOf = (lie: Lie, { row, column }: CellPlace): number => (lie === "down" ? row : column);

interface Names {
  /** The column of the names, or their row. */
  readonly track: number;
  /** Where the first driver stands. */
  readonly first: number;
}

/** Names stand left of the coefficients, or above them: nearest first; a blank line may part them from the headings. */
function placeOfNames(sheet: BookSheet, { lie, headings }: Group): Names | null {
  const coefficient = headings[0]!.place;
  const start = positionOf(lie, coefficient) + 1;
  for (
    let track = lineOf(lie, coefficient) - 1;
    track >= lineOf(lie, coefficient) - farthestApart && track >= 0;
    track--
  ) {
    for (const first of [start, start + 1]) {
      if (isTextAt(cellAt(sheet, lie, [track, first]))) return { track, first };
    }
  }
  return null;
}

interface TermPlace {
  readonly names: number;
  readonly at: number;
}

/** The driver at a position; null where there is none, or where a number of the whole regression stands. */
function termAt(sheet: BookSheet, { lie, headings }: Group, { names, at }: TermPlace): ReportedTerm | null {
  const name = wordsAt(cellAt(sheet, lie, [names, at]));
  if (name === "") return null;
  const coefficient = shownNumberAt(cellAt(sheet, lie, [lineOf(lie, headings[0]!.place), at]))?.value ?? null;
  const numbers = headings.flatMap(({ term, place }, index) => {
    const laid = { sheet, lie, isLast: index === headings.length - 1, coefficient };
    return numbersUnder(term!, [lineOf(lie, place), at], laid);
  });
  const isConstant = isConstantName(name);
  if (numbers[0]?.word !== "coefficient") return null;
  if (!isConstant && numbers.length === 1 && summaryWordIn(name) !== null) return null;
  return { name, isConstant, numbers: numbers.map((one) => withSign(one, numbers[0]!)), inBrackets: null };
}
