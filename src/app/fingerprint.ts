import type { Question } from "../core/answer/question.ts";
import { type CellColumn, cellKind } from "../core/table/cells.ts";
import type { Column, Source } from "../core/table/source.ts";

/**
 * SHA-256 of the columns that an answer rests on, as 64 hexadecimal digits: the same cells under the same headings give
 * the same text on every machine, wherever they stand. Columns are hashed one by one and their hashes hashed together,
 * so that a full sheet never needs a second copy of itself in memory.
 */
export async function fingerprint(columns: Source["columns"]): Promise<string> {
  const digests = new Uint8Array(columns.length * digestBytes);
  for (const [index, column] of columns.entries()) digests.set(await digestOf(column), index * digestBytes);
  return hexadecimal(await sha256(digests));
}

/** The fingerprint of the data behind a question: whatever else stands in the table leaves it as it is. */
export const fingerprintOf = (question: Question): Promise<string> => fingerprint(usedColumns(question));

/** Outcome, drivers, then what orders or groups the rows. */
function usedColumns({ source, model }: Question): readonly Column[] {
  const { rows } = model;
  const byRows = rows.kind === "cases" ? [] : rows.kind === "time" ? [rows.order] : [rows.by, rows.second, rows.order];
  const names = new Set([model.outcome.column, ...model.drivers.map(({ column }) => column), ...byRows]);
  return [...names].flatMap((name) => source.columns.filter((column) => column.name === name));
}

/** The part of a fingerprint that is shown: 16 digits tell any two data sets that one meets apart. */
export const shortFingerprint = (full: string): string => full.slice(0, 16);

/** SHA-256 of a text, as 64 hexadecimal digits. */
export const textFingerprint = async (text: string): Promise<string> =>
  hexadecimal(await sha256(new TextEncoder().encode(text)));

const digestBytes = 32;

const sha256 = async (bytes: Uint8Array<ArrayBuffer>): Promise<Uint8Array<ArrayBuffer>> =>
  new Uint8Array(await crypto.subtle.digest("SHA-256", bytes));

const hexadecimal = (bytes: Uint8Array): string =>
  Array.from(bytes, (byte) => byte.toString(16).padStart(2, "0")).join("");

/** The kinds, the numbers (little-endian, as on every machine that runs Excel), then the heading, the height and the texts. */
function digestOf({ name, cells }: Column): Promise<Uint8Array<ArrayBuffer>> {
  const { numbers, texts } = canonical(cells);
  const words = new TextEncoder().encode(JSON.stringify([name, numbers.length, texts]));
  const bytes = new Uint8Array(cells.kinds.length + numbers.byteLength + words.length);
  bytes.set(cells.kinds, 0);
  bytes.set(new Uint8Array(numbers.buffer), cells.kinds.length);
  bytes.set(words, cells.kinds.length + numbers.byteLength);
  return sha256(bytes);
}

/** Texts numbered by first appearance and zeros without a sign: two encodings of the same cells become one. */
function canonical({ kinds, numbers, texts }: CellColumn): { numbers: Float64Array<ArrayBuffer>; texts: string[] } {
  const plain = new Float64Array(numbers.length);
  const seen = new Map<string, number>();
  for (let row = 0; row < numbers.length; row++) {
    const kind = kinds[row]!;
    if (kind === cellKind.blank) continue;
    if (kind !== cellKind.text && kind !== cellKind.error) {
      plain[row] = numbers[row]! + 0;
      continue;
    }
    const text = texts[numbers[row]!]!;
    const index = seen.get(text) ?? seen.size;
    seen.set(text, index);
    plain[row] = index;
  }
  return { numbers: plain, texts: [...seen.keys()] };
}
