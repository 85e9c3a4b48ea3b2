import type { Problem } from "../../core/problem/problem.ts";
import { type Result, failure, success } from "../../core/problem/result.ts";
import { type DataInHand, takeInHand } from "../dataInHand.ts";
import type { Errand } from "../errand.ts";
import type { Host, WhereToRead } from "../host.ts";
import type { Work } from "../work.ts";
import { rowsBelow } from "./below.ts";
import type { Anchor, Origin, StoredBook } from "./storedBook.ts";

/** The anchor of the data in hand, or a new name for their cells. */
export async function anchorOf({ host, store }: Work, data: DataInHand): Promise<Result<Anchor>> {
  if (data.anchor !== null) return success(data.anchor);
  const named = await host.nameCells(data.address);
  if (!named.ok) return named;
  const anchor: Anchor = { kind: "name", name: named.value.name };
  store.dispatch({ kind: "anchored", address: data.address, anchor });
  return success(anchor);
}

const whereIs = ({ kind, name }: Anchor): WhereToRead => ({ kind: "place", place: { kind, name, address: "" } });

/**
 * Reads the data that something stored goes back to.
 * @param whose - "the set-up X", for the fault that tells that they are gone.
 */
export async function readOrigin(
  host: Host,
  { anchor, address }: Origin,
  { whose, errand }: { readonly whose: string; readonly errand: Errand },
): Promise<Result<DataInHand>> {
  const block = await host.read(whereIs(anchor), errand);
  if (!block.ok)
    return failure(
      goneOr(block.problem, { code: "setup-data-gone", setup: whose, place: inWords(anchor), last: address }),
    );
  const data = await takeInHand(block.value);
  if (!data.ok) return data;
  // A table takes in what is written below it; a name does not.
  const below = anchor.kind === "table" ? null : await rowsBelow(host, data.value.address, errand);
  return success({ ...data.value, anchor, below });
}

const goneOr = (problem: Problem, gone: Problem): Problem => (problem.code === "unknown-place" ? gone : problem);

const inWords = ({ kind, name }: Anchor): string => (kind === "table" ? `the table ${name}` : `the name ${name}`);

/** Whether anything stored goes back to an anchor. */
export const isUsed = ({ setups, sheets, comparisons }: StoredBook, anchor: Anchor): boolean =>
  [...setups, ...sheets, ...comparisons.flatMap(({ models }) => models)].some(
    (one) => one.anchor.kind === anchor.kind && one.anchor.name === anchor.name,
  );
