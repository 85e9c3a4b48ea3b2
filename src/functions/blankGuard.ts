import type { Errand } from "../app/errand.ts";
import type { Host, PlacedBlock } from "../app/host.ts";
import { type Result, success } from "../core/problem/result.ts";
import { parseAddress } from "../core/table/address.ts";
import { cellKind } from "../core/table/cells.ts";
import { onceFor } from "./once.ts";
import { type RawCells, rawCells } from "./rawCells.ts";
import type { CallValues } from "./replies.ts";

/** The parameters whose blank cells matter. */
const overCells = ["outcome", "drivers", "key", "rows"] as const;

/** A call's values, and the addresses of those that are ranges, by the names of its parameters. */
export interface Handed {
  readonly values: CallValues;
  readonly addresses: Readonly<Record<string, string | null | undefined>>;
}

export type BlankGuard = (handed: Handed, signal: AbortSignal) => Promise<Result<CallValues>>;

/**
 * Older versions of Excel hand blank cells to functions as zeros, and nothing tells them apart but the sheet itself. So
 * as long as no blank has arrived as one, ranges in which zeros arrive are looked up there, and zeros that are blank
 * cells become blanks. What is no range, such as a calculation in an argument, cannot be looked up.
 * @param read - reads cells from the sheet, every blank as one.
 */
export function blankGuard(read: Host["read"]): BlankGuard {
  const looks = onceFor(lookOver);
  const underWay = new Map<string, ReturnType<Host["read"]>>();
  const known = { blanksArrive: false, blanksAreZeros: false };
  const readOnce = (address: string, errand: Errand): ReturnType<Host["read"]> => {
    const reading = underWay.get(address) ?? read({ kind: "address", address }, errand);
    underWay.set(address, reading);
    void reading.then(
      () => underWay.delete(address),
      () => underWay.delete(address),
    );
    return reading;
  };
  return async ({ values, addresses }, signal) => {
    const given = overCells.map((name) => ({ name, cells: rawCells(values[name]), address: addresses[name] ?? "" }));
    if (given.some(({ cells }) => looks(cells).blanks)) known.blanksArrive = true;
    if (known.blanksArrive) return success(values);
    const mended: Record<string, unknown> = { ...values };
    for (const { name, cells, address } of given) {
      if (address === "" || !looks(cells).zeros) continue;
      const block = await readOnce(address, { signal, progress: () => undefined });
      if (block.ok) {
        mended[name] = withBlanks(cells, { address, block: block.value });
        known.blanksAreZeros ||= mended[name] !== cells;
      } else if (known.blanksAreZeros) return block;
    }
    return success(mended);
  };
}

interface Look {
  readonly zeros: boolean;
  /** Blanks that arrived as such. An empty text may come from a formula, on any version. */
  readonly blanks: boolean;
}

function lookOver(cells: RawCells): Look {
  let zeros = false;
  for (const row of cells) {
    for (const cell of row) {
      if (cell === null || cell === undefined) return { zeros, blanks: true };
      if (cell === 0) zeros = true;
    }
  }
  return { zeros, blanks: false };
}

interface Looked {
  readonly address: string;
  readonly block: PlacedBlock;
}

/** The cells with null for every zero whose cell is blank, or lies outside of the cells in use. */
function withBlanks(cells: RawCells, { address, block }: Looked): RawCells {
  const area = parseAddress(address);
  if (area === null) return cells;
  const isBlank = (row: number, column: number): boolean => {
    const kinds = block.columns[area.column + column - block.firstColumn]?.kinds;
    return (kinds?.[area.row + row - block.firstRow] ?? cellKind.blank) === cellKind.blank;
  };
  let count = 0;
  const mended = cells.map((line, row) =>
    line.map((cell, column) => {
      if (cell !== 0 || !isBlank(row, column)) return cell;
      count += 1;
      return null;
    }),
  );
  return count > 0 ? mended : cells;
}
