import { listInWords } from "../../answer/wording.ts";
import { addressOf } from "../../table/address.ts";
import { standsInCells } from "../forms.ts";
import type { Change, Facts, LineHypothesis } from "./change.ts";
import { type Frame, positionOf } from "./frame.ts";
import type { Run } from "./recipe.ts";

/** What was done, as a full sentence, and the cells it was done to. */
export interface Said {
  readonly sentence: string;
  readonly cells: readonly string[];
}

/** More cells than these are not listed. */
const mostCells = 10;

export function saidOf(changes: readonly Change[], frame: Frame): Said {
  const all = changes.map(({ facts }) => saidOfOne(facts, frame));
  return {
    sentence: all.map(({ sentence }) => sentence).join(" "),
    cells: [...new Set(all.flatMap(({ cells }) => cells))].slice(0, mostCells),
  };
}

/** The claimed cells of a run of rows, line by line; lines side by side are one range. */
export function cellsOfRun(frame: Frame, { from, to }: Run): string[] {
  const claimed = frame.lines.slice(0, frame.driverCount + 1).filter(({ line }) => standsInCells(line));
  const spans = claimed
    .map((line) => ({ line: line.line, start: positionOf(line, from, frame) }))
    .toSorted((a, b) => a.line.track - b.line.track);
  const joined: { line: (typeof spans)[number]["line"]; start: number; width: number }[] = [];
  for (const { line, start } of spans) {
    const last = joined.at(-1);
    const beside =
      last?.line.sheet === line.sheet &&
      last.line.runs === line.runs &&
      last.start === start &&
      last.line.track + last.width === line.track;
    if (last !== undefined && beside) last.width++;
    else joined.push({ line, start, width: 1 });
  }
  return joined.map(({ line: { sheet, runs, track }, start, width }) =>
    runs === "down"
      ? addressOf({ sheet, row: start, column: track, rows: to - from, columns: width })
      : addressOf({ sheet, row: track, column: start, rows: width, columns: to - from }),
  );
}

const nameOf = ({ lines }: Frame, line: number): string => lines[line]!.line.name;
const namesOf = (frame: Frame, lines: readonly number[]): string =>
  listInWords(lines.map((line) => nameOf(frame, line)));

/** All cells of a claimed line. */
function lineCells(frame: Frame, line: number): string {
  const { first, count, lines } = frame;
  const only = { ...frame, lines: [lines[line]!], driverCount: 0 };
  return cellsOfRun(only, { from: first, to: first + count })[0]!;
}

function saidOfOne(facts: Facts, frame: Frame): Said {
  if ("run" in facts) return ofRun(facts.hypothesis, facts.run, frame);
  switch (facts.hypothesis) {
    case "hidden-rows-left-out": {
      const cells = facts.runs.flatMap((run) => cellsOfRun(frame, run)).slice(0, mostCells);
      return { sentence: `The hidden rows were left out (${counted(facts.runs.length, "row")}).`, cells };
    }
    case "heading-row-counted":
    case "empty-rows-counted":
    case "total-row-counted":
      return ofCountedIn(facts, frame);
    default:
      return ofLines(facts, frame);
  }
}

const counted = (count: number, word: string): string => `${count} ${word}${count === 1 ? "" : "s"}`;

type RunFacts = Extract<Facts, { run: Run }>;

function ofRun(hypothesis: RunFacts["hypothesis"], run: Run, frame: Frame): Said {
  const cells = cellsOfRun(frame, run);
  const where = listInWords(cells);
  const size = run.to - run.from;
  const rows = (which: string): string =>
    size === 1 ? `The ${which} row (${where}) was` : `The ${which} ${size} rows (${where}) were`;
  const sentences: Readonly<Record<RunFacts["hypothesis"], () => string>> = {
    "rows-left-off-at-end": () => `${rows("last")} left off.`,
    "rows-left-off-at-start": () => `${rows("first")} left off.`,
    "extra-rows-at-end": () =>
      `${size === 1 ? "A row" : `${size} rows`} below the claimed ones (${where}) ${size === 1 ? "was" : "were"} counted in.`,
    "extra-rows-at-start": () =>
      `${size === 1 ? "A row" : `${size} rows`} above the claimed ones (${where}) ${size === 1 ? "was" : "were"} counted in.`,
    "row-left-out": () => `One row (${where}) was left out from among the others.`,
    "rows-left-out": () => `${size} rows (${where}) were left out from among the others.`,
    "repeat-left-out": () => `Rows that stand in the data twice (${where}) were counted once.`,
    "block-repeated": () =>
      `${size === 1 ? "One row" : `${size} rows`} (${where}) ${size === 1 ? "was" : "were"} counted twice.`,
  };
  return { sentence: sentences[hypothesis](), cells };
}

type CountedIn = Extract<Facts, { hypothesis: "heading-row-counted" | "empty-rows-counted" | "total-row-counted" }>;

function ofCountedIn(facts: CountedIn, frame: Frame): Said {
  switch (facts.hypothesis) {
    case "heading-row-counted": {
      const cells = cellsOfRun(frame, { from: facts.row, to: facts.row + 1 });
      return { sentence: `The row of headings (${listInWords(cells)}) was counted in as a row of zeros.`, cells };
    }
    case "empty-rows-counted": {
      const end = frame.first + frame.count;
      const cells = cellsOfRun(frame, { from: end, to: end + facts.count });
      return {
        sentence: `${counted(facts.count, "empty row")} ${facts.count === 1 ? "was" : "were"} counted in as zeros, as if the range went further down.`,
        cells,
      };
    }
    case "total-row-counted": {
      const cells = facts.row === null ? [] : cellsOfRun(frame, { from: facts.row, to: facts.row + 1 });
      const which = facts.summary === "sum" ? "the totals" : "the means";
      const where = cells.length === 0 ? ", which the sheet does not hold now," : ` (${listInWords(cells)})`;
      return { sentence: `A row with ${which} of the others${where} was counted in as a row of data.`, cells };
    }
  }
}

type OfLines = Exclude<Facts, RunFacts | CountedIn | { hypothesis: "hidden-rows-left-out" }>;

function ofLines(facts: OfLines, frame: Frame): Said {
  const lines = "lines" in facts ? facts.lines : "line" in facts ? [facts.line] : [];
  return {
    sentence: lineSentence(facts, frame),
    cells: lines.map((line) => lineCells(frame, line)).slice(0, mostCells),
  };
}

function lineSentence(facts: OfLines, frame: Frame): string {
  const names = "lines" in facts ? namesOf(frame, facts.lines) : "line" in facts ? nameOf(frame, facts.line) : "";
  switch (facts.hypothesis) {
    case "sorted-alone":
      return `${names} was sorted (${facts.order}) on its own, apart from the other columns.`;
    case "shifted":
      return shiftSentence(facts, names);
    case "drivers-exchanged":
      return `The figures of ${names} were exchanged.`;
    default:
      return "lines" in facts ? lineSentences[facts.hypothesis](names) : modelSentence(facts, frame, names);
  }
}

const lineSentences: Readonly<Record<LineHypothesis, (names: string) => string>> = {
  "empty-cells-as-zero": (names) => `Empty cells of ${names} were counted as zero.`,
  "text-as-zero": (names) => `Cells of ${names} that hold words were counted as zero.`,
  "text-numbers-read": (names) => `Numbers kept as text in ${names} were read as numbers.`,
  "text-numbers-as-zero": (names) => `Numbers kept as text in ${names} were counted as zero.`,
  logarithm: (names) => `The natural logarithm of ${names} was taken.`,
  "base-10-logarithm": (names) => `The logarithm to base 10 of ${names} was taken.`,
  "no-logarithm": (names) => `The logarithm of ${names} was not taken.`,
  changes: (names) => `The change of ${names} from row to row was taken in place of the value.`,
};

function shiftSentence({ shift, beyond }: Extract<Facts, { hypothesis: "shifted" }>, names: string): string {
  const way = shift > 0 ? "further down" : "further up";
  const reach = beyond ? ", beyond the claimed cells" : "";
  return `${names} was set against the other columns shifted: each row took the value ${counted(Math.abs(shift), "row")} ${way}${reach}.`;
}

type OfModel = Exclude<OfLines, Extract<Facts, { lines: readonly number[] }> | { hypothesis: "sorted-alone" }>;

function modelSentence(facts: OfModel, frame: Frame, names: string): string {
  switch (facts.hypothesis) {
    case "factor":
      return `${names} was ${facts.factor > 1 ? `multiplied by ${facts.factor.toLocaleString("en-US")}` : `divided by ${Math.round(1 / facts.factor).toLocaleString("en-US")}`}.`;
    case "no-constant":
      return "The regression was made without a constant.";
    case "with-constant":
      return "The regression was made with a constant.";
    case "reverse-order":
      return "The coefficients stand in reverse order: each beside the name of another driver, as LINEST lists them.";
    case "swapped":
      return `The outcome and ${names} changed places.`;
    case "driver-left-out":
      return `${names} was left out of the regression.`;
    case "another-driver":
      return `${names} was in the regression as a further driver.`;
    case "another-column":
      return `${nameOf(frame, facts.other)} was used in place of ${names}.`;
  }
}
