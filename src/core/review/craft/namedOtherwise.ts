import { plainHeading } from "../../table/headingRow.ts";
import { type CellPlace, addressAt, isCalculatedAt, isSpilledAt, isTextAt, numberAt, wordsAt } from "../cellsOfBook.ts";
import type { Quantity } from "../claim.ts";
import type { Finding, Rank } from "../finding.ts";
import { standsInCells } from "../forms.ts";
import { headingOf } from "../found/claimedLines.ts";
import type { FormulaCell } from "../found/formulaCells.ts";
import type { Gathered } from "../found/gatherClaims.ts";
import { quantityInWords } from "../quantityWords.ts";
import { positionName } from "../reviewWords.ts";
import { isConstantName, summaryWordIn, termWordIn } from "../typed/reportWords.ts";
import { craftFinding } from "./craftFinding.ts";
import { found } from "./craftWords.ts";

/**
 * Numbers that stand under the name of another driver, or of another quantity, than their formula gives: LINEST gives
 * its coefficients from the last driver to the first.
 */
export function namedOtherwise(group: Gathered): Finding[] {
  const drivers = group.aligned
    .slice(1)
    .map((line, index) => (standsInCells(group.regression.drivers[index]!) ? (headingOf(line) ?? "") : positionName));
  return group.cells.flatMap((cell) => {
    if (cell.measure.quantity.kind === "prediction") return [];
    const labels = labelsOf(cell.place);
    const { quantity } = cell.measure;
    const given = quantityInWords(quantity, drivers);
    const other = otherTerm(quantity, labels, drivers);
    if (other !== null) {
      const what = found.namedOtherwise(other.label, given);
      const rank = rankOf(cell, other.term, group);
      return [craftFinding("namedOtherwise", { rank, cells: [addressAt(cell.place)], what })];
    }
    const label = otherKind(quantity, labels, drivers);
    if (label === null) return [];
    const what = found.namedOtherwise(label, given);
    return [craftFinding("namedOtherwise", { rank: "changes a number", cells: [addressAt(cell.place)], what })];
  });
}

/** The texts nearest to the left of a cell and above it, with nothing but results between. */
function labelsOf(place: CellPlace): readonly string[] {
  const steps: readonly ((at: CellPlace) => CellPlace)[] = [
    (at) => ({ ...at, column: at.column - 1 }),
    (at) => ({ ...at, row: at.row - 1 }),
  ];
  return steps.flatMap((step) => {
    let at = step(place);
    for (let steps = 0; steps < farthest && isResultAt(at); steps++) at = step(at);
    return isTextAt(at) ? [wordsAt(at)] : [];
  });
}

/** Names further away speak of something else. */
const farthest = 64;

const isResultAt = (at: CellPlace): boolean => numberAt(at) !== null && (isCalculatedAt(at) || isSpilledAt(at));

interface Other {
  readonly label: string;
  readonly term: number | null;
}

/** The driver, or the constant, that a label names in place of the one that the formula is about. */
function otherTerm(quantity: Quantity, labels: readonly string[], drivers: readonly string[]): Other | null {
  if (!("term" in quantity)) return null;
  const named = labels.flatMap((label): Other[] => {
    const term = drivers.findIndex((name) => plainHeading(name) === plainHeading(label));
    if (term >= 0) return [{ label, term }];
    return isConstantName(label) ? [{ label, term: null }] : [];
  });
  return named.some(({ term }) => term === quantity.term) ? null : (named[0] ?? null);
}

/** A coefficient of the other sign turns round what the report says of the driver. */
function rankOf({ place, measure }: FormulaCell, term: number | null, { cells }: Gathered): Rank {
  if (measure.quantity.kind !== "coefficient") return "changes a number";
  const own = cells.find(({ measure: { quantity } }) => quantity.kind === "coefficient" && quantity.term === term);
  const [shown, meant] = [place, own?.place].map((at) => (at === undefined ? null : numberAt(at)));
  const turned = shown != null && meant != null && Math.sign(shown) !== Math.sign(meant);
  return turned ? "changes the conclusion" : "changes a number";
}

/** What is commonly taken for what: each is told only where the label cannot be read in the right way. */
function otherKind({ kind }: Quantity, labels: readonly string[], drivers: readonly string[]): string | null {
  const ofDriver = labels.some((label) => drivers.some((name) => plainHeading(name) === plainHeading(label)));
  const isWrong = (label: string): boolean => {
    if (kind === "sigma") return ofDriver && termWordIn(label) === "standard-error";
    const summary = summaryWordIn(label);
    if (kind === "correlation") return summary === "r-squared";
    return kind === "r-squared" && (summary === "adjusted-r-squared" || summary === "correlation");
  };
  return labels.find(isWrong) ?? null;
}
