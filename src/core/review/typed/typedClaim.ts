import { addressOf } from "../../table/address.ts";
import { addressAt } from "../cellsOfBook.ts";
import type { Claim, ClaimedForm, Quantity, ReportedNumber } from "../claim.ts";
import { type Stretch, claimedLine } from "../found/claimedLines.ts";
import { othersBeside } from "../found/othersBeside.ts";
import type { ShownNumber } from "../found/shownNumber.ts";
import { type Reading, read, unread } from "../formula/reading.ts";
import type { CellPlace } from "../cellsOfBook.ts";
import type { DataColumn, DataTable } from "./dataTables.ts";
import { guessOutcome } from "./guessOutcome.ts";
import { textsBetween } from "./labels.ts";
import { type Match, bestTable, matchNames } from "./matchNames.ts";
import { type CountedBrackets, withBrackets } from "./readInBrackets.ts";
import type { ReportBlock } from "./reportBlock.ts";
import { assumptions, whyNoData } from "./typedWords.ts";

/** A line of data, and the form in which it enters. */
export interface DataLine {
  readonly stretch: Stretch;
  readonly form: ClaimedForm;
}

/** Data that someone names for a report; null for what is to be found. */
export interface GivenData {
  readonly outcome: DataLine | null;
  readonly drivers: readonly DataLine[] | null;
}

/** The claim that a block of numbers makes about data found by the names of its drivers, or given for it. */
export function typedClaim(block: ReportBlock, tables: readonly DataTable[], given: GivenData): Reading<Claim> {
  const data = dataFor(block, tables, given);
  if (!data.ok) return data;
  const { outcome, drivers, assumed } = data.value;
  const lines = [outcome, ...drivers];
  const [first, ...others] = lines.map(({ stretch }) => stretch) as [Stretch, ...Stretch[]];
  const constant = block.terms.some(({ isConstant }) => isConstant);
  const claim: Claim = {
    place: addressOf(block.area),
    origin: { kind: "typed" },
    outcome: claimedLine(outcome.stretch, outcome.form),
    drivers: drivers.map(({ stretch, form }) => claimedLine(stretch, form)),
    constant: true,
    reported: reportedBy(block),
    others: othersBeside([first, ...others]),
    ...(block.level !== null && { level: block.level }),
    assumed: [
      ...(constant ? assumed : [...assumed, assumptions.noConstant]),
      ...(block.level === null && hasBounds(block) ? [assumptions.levels] : []),
    ],
  };
  return read(block.model === null ? claim : withBrackets(claim, bracketsIn(block), block.model.brackets));
}

const hasBounds = ({ terms }: ReportBlock): boolean =>
  terms.some(({ numbers }) => numbers.some(({ word }) => word === "low" || word === "high"));

const driversOf = ({ terms }: ReportBlock) => terms.filter(({ isConstant }) => !isConstant);

function bracketsIn(block: ReportBlock): CountedBrackets[] {
  const drivers = driversOf(block);
  return block.terms.flatMap((term) => {
    const counted = term.isConstant ? null : drivers.indexOf(term);
    return term.inBrackets === null ? [] : [{ term: counted, inBrackets: term.inBrackets }];
  });
}

/** Every number of a block with what it is; the drivers are counted in the order in which they stand. */
export function reportedBy(block: ReportBlock): readonly ReportedNumber[] {
  const { terms, summaries } = block;
  const drivers = driversOf(block);
  const ofTerms = terms.flatMap((term) =>
    term.numbers.flatMap(({ word, place, shown }) =>
      numberAs({ kind: word, term: term.isConstant ? null : drivers.indexOf(term) }, place, shown),
    ),
  );
  return [...ofTerms, ...summaries.flatMap(({ word, place, shown }) => numberAs({ kind: word }, place, shown))];
}

const numberAs = (quantity: Quantity, place: CellPlace, shown: ShownNumber): ReportedNumber[] => [
  { quantity, ...shown, cell: addressAt(place) },
];

interface FoundData {
  readonly outcome: DataLine;
  readonly drivers: readonly DataLine[];
  readonly assumed: readonly string[];
}

function dataFor(block: ReportBlock, tables: readonly DataTable[], given: GivenData): Reading<FoundData> {
  const names = driversOf(block).map(({ name }) => name);
  if (given.drivers !== null && given.drivers.length !== names.length) {
    return unread(whyNoData.fewDrivers(names.length, given.drivers.length));
  }
  if (given.drivers !== null && given.outcome !== null) {
    return read({ outcome: given.outcome, drivers: given.drivers, assumed: [] });
  }
  return foundData(block, tables, { names, given });
}

interface Wanted {
  readonly names: readonly string[];
  readonly given: GivenData;
}

function foundData(block: ReportBlock, tables: readonly DataTable[], { names, given }: Wanted): Reading<FoundData> {
  const texts = textsAround(block);
  const isSpokenOf = (sheet: string): boolean => texts.some((text) => text.toLowerCase().includes(sheet.toLowerCase()));
  const wanted = given.drivers?.map(({ stretch }) => claimedLine(stretch, "as it is").name) ?? names;
  // Where tables fit alike, the one beside the report is meant sooner than one of another sheet.
  const nearFirst = tables.toSorted(
    (one, other) => Number(other.sheet === block.sheet) - Number(one.sheet === block.sheet),
  );
  const best = bestTable(wanted, nearFirst, isSpokenOf);
  if (best === null) return unread(whyNoData.noColumns(names));
  const missing = names.filter((_, index) => best.matches[index] === null);
  const { table } = best;
  if (missing.length > 0) return unread(whyNoData.missing(missing, table.sheet.sheet));
  const matches = best.matches.filter((match) => match !== null);
  const drivers = given.drivers ?? matches.map(({ column, form }) => lineIn(table, column.column, form));
  const renamed = matches.flatMap(({ column, score }, index) =>
    score < surelyMeant ? [assumptions.name(names[index]!, column.name)] : [],
  );
  const assumed = given.drivers === null ? [assumptions.data(rangeOf(table)), ...renamed] : [];
  if (given.outcome !== null) return read({ outcome: given.outcome, drivers, assumed });
  const outcome = guessOutcome(possibleOutcomes(block, table, names), { ...reportOf(block, matches), texts });
  if (outcome === null) return unread(whyNoData.noOutcome(table.sheet.sheet));
  return read({
    outcome: lineIn(table, outcome.column.column, outcome.form),
    drivers,
    assumed: [...assumed, assumptions.outcome(outcome.column.name, outcome.because)],
  });
}

/** Columns that are no drivers of other models beside this one. */
function possibleOutcomes({ model }: ReportBlock, table: DataTable, names: readonly string[]): readonly DataColumn[] {
  if (model === null || model.absent.length === 0) return table.columns;
  const { matches } = matchNames([...names, ...model.absent], table);
  const drivers = matches.flatMap((match) => (match !== null && match.score >= surelyMeant ? [match.column] : []));
  return table.columns.filter((column) => !drivers.includes(column));
}

/** From this likeness on a name is no other's. */
const surelyMeant = 3;

const lineIn = ({ sheet, firstRow, rowCount }: DataTable, column: number, form: ClaimedForm): DataLine => ({
  stretch: { sheet, runs: "down", track: column, from: firstRow, count: rowCount },
  form,
});

function rangeOf({ sheet, columns, firstRow, rowCount }: DataTable): string {
  const places = columns.map(({ column }) => column);
  const column = Math.min(...places);
  return addressOf({
    sheet: sheet.sheet,
    row: firstRow,
    column,
    rows: rowCount,
    columns: Math.max(...places) - column + 1,
  });
}

function reportOf(block: ReportBlock, drivers: readonly Match[]) {
  const coefficients = driversOf(block).map(({ numbers }) => numbers[0]!.shown.value);
  return { drivers, coefficients, headings: block.model?.headings ?? [] };
}

/** So many rows above and below a block may speak of it. */
const rowsAround = 12;

function textsAround({ sheet, area, terms, model }: ReportBlock): string[] {
  const names = new Set([...terms.map(({ name }) => name), ...(model?.absent ?? [])]);
  const [firstRow, lastRow] = [area.row - rowsAround, area.row + area.rows + rowsAround];
  const texts = textsBetween(sheet, { firstRow, lastRow, without: model?.beside ?? { lie: "columns", at: [] } });
  return texts.filter((text) => !names.has(text));
}
