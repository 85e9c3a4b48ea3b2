import type { Claim, Quantity, ReportedNumber } from "../claim.ts";
import { addressAt } from "../cellsOfBook.ts";
import type { Gathered } from "../found/gatherClaims.ts";
import type { CellPlace } from "../cellsOfBook.ts";
import { withBrackets } from "./readInBrackets.ts";
import type { ReportBlock, ReportedTerm } from "./reportBlock.ts";

/** The group whose formulas give a block its coefficients; null where they are typed, or come from several. */
export function groupBehind({ terms }: ReportBlock, groups: readonly Gathered[]): Gathered | null {
  const behind = new Set(terms.flatMap((term) => groupOf(term, groups)));
  return behind.size === 1 ? [...behind][0]! : null;
}

const groupOf = ({ numbers }: ReportedTerm, groups: readonly Gathered[]): Gathered[] =>
  groups.filter((group) => numbers.some(({ place }) => quantityAt(group, place) !== null));

function quantityAt({ cells }: Gathered, at: CellPlace): Quantity | null {
  const cell = cells.find(
    ({ place }) => place.sheet === at.sheet && place.row === at.row && place.column === at.column,
  );
  return cell?.measure.quantity ?? null;
}

/**
 * The claim of formulas with the numbers that stand beside them under headings: ratios and p-values worked out from
 * their cells, or typed there.
 */
export function withBlock(claim: Claim, group: Gathered, block: ReportBlock): Claim {
  const whole = withNumbers(claim, group, block);
  if (block.model === null) return whole;
  const counted = block.terms.flatMap((reported) => {
    const term = termCounted(reported, group);
    return term === undefined || reported.inBrackets === null ? [] : [{ term, inBrackets: reported.inBrackets }];
  });
  return withBrackets(whole, counted, block.model.brackets);
}

function withNumbers(claim: Claim, group: Gathered, { terms, summaries, level }: ReportBlock): Claim {
  const known = new Set(claim.reported.map(({ cell }) => cell));
  const ofTerms = terms.flatMap((term) => {
    const counted = termCounted(term, group);
    return counted === undefined
      ? []
      : term.numbers.map(({ word, place, shown }) => ({ quantity: { kind: word, term: counted }, place, shown }));
  });
  const ofWhole = summaries.map(({ word, place, shown }) => ({ quantity: { kind: word }, place, shown }));
  const further = [...ofTerms, ...ofWhole].flatMap(({ quantity, place, shown }): ReportedNumber[] =>
    known.has(addressAt(place)) ? [] : [{ quantity, ...shown, cell: addressAt(place) }],
  );
  if (further.length === 0) return claim;
  return { ...claim, ...(level !== null && { level }), reported: [...claim.reported, ...further] };
}

/** Which driver a line of the block is about, told by a cell of it that a formula fills. */
function termCounted({ numbers }: ReportedTerm, group: Gathered): number | null | undefined {
  for (const { place } of numbers) {
    const quantity = quantityAt(group, place);
    if (quantity !== null && "term" in quantity) return quantity.term;
  }
  return undefined;
}
