import { type SheetArea, addressOf } from "../../table/address.ts";
import type { Book } from "../book.ts";
import { addressAt } from "../cellsOfBook.ts";
import type { Claim, ReportedNumber } from "../claim.ts";
import { type Regression, keyOf } from "../formula/foundRegression.ts";
import { type Aligned, alignedLines } from "./alignedLines.ts";
import { areaOf, claimedLine } from "./claimedLines.ts";
import type { FormulaCell } from "./formulaCells.ts";
import { othersBeside } from "./othersBeside.ts";
import { reportedIn } from "./reportedIn.ts";

/** Cells that report the same regression: over the same cells, in the same forms. */
export interface Gathered {
  readonly aligned: Aligned;
  readonly regression: Regression;
  readonly cells: readonly FormulaCell[];
}

/** More predictions of one regression than these say nothing that the first do not say. */
const mostPredictions = 200;

/** One group for each regression, in the order in which their first cells stand. */
export function gathered(cells: readonly FormulaCell[], book: Book): readonly Gathered[] {
  const groups = new Map<string, { aligned: Aligned; regression: Regression; cells: FormulaCell[] }>();
  const aligned = memory((regression: Regression) => alignedLines(regression, book));
  for (const cell of cells) {
    const { regression } = cell.measure;
    const lines = aligned(regression);
    if (lines === null) continue;
    const key = keyOfLines(lines, regression);
    const group = groups.get(key);
    if (group === undefined) groups.set(key, { aligned: lines, regression, cells: [cell] });
    else group.cells.push(cell);
  }
  return joinedBySymmetry([...groups.values()]);
}

/** Long columns are cut once for each regression, not once for each cell that shows it. */
function memory(cut: (regression: Regression) => Aligned | null): (regression: Regression) => Aligned | null {
  const known = new Map<string, Aligned | null>();
  return (regression) => {
    const key = `${keyOf(regression)}|${regression.passesOver}`;
    const found = known.get(key);
    if (found !== undefined || known.has(key)) return found ?? null;
    const lines = cut(regression);
    known.set(key, lines);
    return lines;
  };
}

const keyOfLines = (lines: Aligned, { outcome, drivers, constant }: Regression): string =>
  [...lines.map((line, index) => `${addressOf(areaOf(line))} ${[outcome, ...drivers][index]!.form}`), constant].join(
    "|",
  );

const symmetric = new Set(["correlation", "r-squared"]);

/** A correlation says nothing of which is the outcome: where another formula says it, that one is followed. */
function joinedBySymmetry(groups: readonly Gathered[]): readonly Gathered[] {
  const undecided = groups.filter(
    ({ cells, aligned }) => aligned.length === 2 && cells.every(({ measure }) => symmetric.has(measure.quantity.kind)),
  );
  return groups
    .filter((group) => !undecided.includes(group) || hostOf(group, groups) === undefined)
    .map((group) => {
      const guests = undecided.filter((guest) => hostOf(guest, groups) === group);
      return { ...group, cells: [...group.cells, ...guests.flatMap(({ cells }) => cells)] };
    });
}

const hostOf = (guest: Gathered, groups: readonly Gathered[]): Gathered | undefined =>
  groups.find(
    (group) =>
      group !== guest &&
      keyOfLines(group.aligned, group.regression) ===
        keyOfLines(turnedRound(guest.aligned), turnedAbout(guest.regression)),
  );

const turnedRound = ([outcome, driver]: Aligned): Aligned => [driver!, outcome];

const turnedAbout = (regression: Regression): Regression => ({
  ...regression,
  outcome: regression.drivers[0]!,
  drivers: [regression.outcome],
});

/** The claim that a group of cells makes; null where none of its cells shows a number that can be led back. */
export function claimOf({ aligned, regression, cells }: Gathered): Claim | null {
  const reported = limited(cells.map(({ place, measure }) => reportedIn(place, measure)).filter((one) => one !== null));
  if (reported.length === 0) return null;
  const own = cells.filter(({ isReader }) => !isReader);
  const makers = own.length === 0 ? cells : own;
  const forms = [regression.outcome, ...regression.drivers].map(({ form }) => form);
  const [outcome, ...drivers] = aligned.map((line, index) => claimedLine(line, forms[index]!));
  return {
    place: placeOfCells(makers),
    origin: {
      kind: "formula",
      functions: [...new Set(cells.flatMap(({ functions }) => functions))],
      formula: makers[0]!.formula,
    },
    outcome: outcome!,
    drivers,
    constant: regression.constant,
    reported,
    others: othersBeside(aligned),
  };
}

function limited(reported: readonly ReportedNumber[]): readonly ReportedNumber[] {
  const first = reported.filter(({ quantity }) => quantity.kind === "prediction").slice(0, mostPredictions);
  const kept = new Set(first);
  return reported.filter((one) => one.quantity.kind !== "prediction" || kept.has(one));
}

/** The block around the cells where they fill most of it; else the first of them. */
function placeOfCells(cells: readonly FormulaCell[]): string {
  const [first] = cells;
  const sheet = first!.place.sheet;
  const here = cells.filter(({ place }) => place.sheet === sheet).map(({ place }) => place);
  const [rows, columns] = [here.map(({ row }) => row), here.map(({ column }) => column)];
  const block: SheetArea = {
    sheet: sheet.sheet,
    row: Math.min(...rows),
    column: Math.min(...columns),
    rows: Math.max(...rows) - Math.min(...rows) + 1,
    columns: Math.max(...columns) - Math.min(...columns) + 1,
  };
  const full = here.length * 3 >= block.rows * block.columns;
  return full ? addressOf(block) : addressAt(first!.place);
}
