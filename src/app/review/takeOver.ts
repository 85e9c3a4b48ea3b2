import { type Result, failure, success } from "../../core/problem/result.ts";
import type { Claim, ClaimedForm, ClaimedLine } from "../../core/review/claim.ts";
import { lineInWords, titleOf } from "../../core/review/reviewWords.ts";
import { type SheetArea, addressOf } from "../../core/table/address.ts";
import { cellKind } from "../../core/table/cells.ts";
import { type DataInHand, takeInHand } from "../dataInHand.ts";
import { proposeSetup } from "../proposal.ts";
import type { ColumnSetup, Setup } from "../setup.ts";
import { type Work, fail } from "../work.ts";

/** Reads the data of a regression into the Data section, with its outcome and its drivers, to make the answer oneself. */
export async function takeOverRegression(work: Work, claim: Claim): Promise<void> {
  const area = areaOfData(claim);
  if (!area.ok) {
    fail(work, area.problem);
    return;
  }
  const errand = work.errands.start("reading");
  const block = await work.host.read({ kind: "address", address: addressOf(area.value) }, errand);
  const taken = block.ok ? await takeInHand(block.value) : block;
  if (errand.signal.aborted) return;
  if (!taken.ok) {
    fail(work, taken.problem);
    return;
  }
  const data = { ...taken.value, notes: [...taken.value.notes, ...leftToTheUser(claim)] };
  work.store.dispatch({ kind: "regression taken over", data, setup: setupFor(claim, data) });
  await work.watch([data.address]);
}

/**
 * The columns of the data with their headings and with what stands before and after the claimed cells without a gap.
 * @returns Problem "regression-not-in-columns" where they lie across, or on several sheets: the pane reads columns of one sheet.
 */
export function areaOfData(claim: Claim): Result<SheetArea> {
  const { outcome, drivers, others } = claim;
  const apart = [outcome, ...drivers].find(({ sheet, runs }) => sheet !== outcome.sheet || runs !== "down");
  if (apart !== undefined) return failure({ code: "regression-not-in-columns", title: titleOf(claim) });
  const beside = others.filter(({ sheet, runs }) => sheet === outcome.sheet && runs === "down");
  const lines = [outcome, ...drivers, ...beside];
  const tracks = lines.map(({ track }) => track);
  const reaches = [outcome, ...drivers].map(reachOf);
  const row = Math.min(...reaches.map(({ first }) => first));
  const column = Math.min(...tracks);
  return success({
    sheet: outcome.sheet,
    row,
    column,
    rows: Math.max(...reaches.map(({ last }) => last)) - row + 1,
    columns: Math.max(...tracks) - column + 1,
  });
}

/** From the first to the last cell that adjoins the claimed ones without a blank between. */
function reachOf({ cells, first, from, count }: ClaimedLine): { readonly first: number; readonly last: number } {
  const isFilled = (position: number): boolean => (cells.kinds[position - first] ?? cellKind.blank) !== cellKind.blank;
  let top = from;
  let bottom = from + Math.max(1, count) - 1;
  while (isFilled(top - 1)) top--;
  while (isFilled(bottom + 1)) bottom++;
  return { first: top, last: bottom };
}

/** The transforms that the pane has for what a regression is made of; a cube, and positions, are left to the user. */
const transforms: Readonly<Record<ClaimedForm, ColumnSetup["transform"]>> = {
  "as it is": { kind: "none" },
  logarithm: { kind: "logarithm" },
  square: { kind: "square" },
  cube: { kind: "none" },
  position: { kind: "none" },
};

function setupFor({ outcome, drivers, constant }: Claim, { columns, source }: DataInHand): Setup {
  const proposed = proposeSetup(columns);
  const claimed = proposed.columns.map((entry, index): ColumnSetup => {
    const track = source.columns[index]?.place.column;
    if (track === outcome.track) return roled(entry, "outcome", outcome);
    const driver = drivers.find((line) => line.track === track);
    if (driver !== undefined) return roled(entry, "driver", driver);
    return entry.role === "outcome" || entry.role === "driver" ? { ...entry, role: "unused" } : entry;
  });
  return { ...proposed, columns: claimed, constant };
}

/** What the pane's set-up has no words for: a column that enters twice, a cube, and positions. */
const leftToTheUser = ({ drivers }: Claim): readonly string[] =>
  drivers
    .filter(
      ({ form, track }, index) =>
        form === "cube" || form === "position" || drivers.findIndex((line) => line.track === track) < index,
    )
    .map((line) => `The regression also has ${lineInWords(line)}, which was not taken over: add a column with it.`);

const roled = (entry: ColumnSetup, role: ColumnSetup["role"], { form }: ClaimedLine): ColumnSetup => ({
  ...entry,
  role,
  guessed: false,
  transform: transforms[form],
});
