import { strFromU8, strToU8, unzipSync, zipSync } from "fflate";

/** The parts of a workbook file by path, unpacked. */
export type Parts = Readonly<Record<string, Uint8Array>>;

export const unpack = (bytes: Uint8Array): Parts => unzipSync(bytes);
/** Unpacks only the parts whose path matches. */
export const partsMatching = (bytes: Uint8Array, path: RegExp): Parts =>
  unzipSync(bytes, { filter: ({ name }) => path.test(name) });
export const pack = (parts: Parts): Uint8Array => zipSync({ ...parts });

export const textOf = (part: Uint8Array): string => strFromU8(part);
export const partOf = (text: string): Uint8Array => strToU8(text);

/** The same parts, with those whose path matches changed as text. */
export function changeParts(parts: Parts, path: RegExp, change: (text: string) => string): Parts {
  const changed = Object.entries(parts).map(([name, part]) =>
    path.test(name) ? [name, partOf(change(textOf(part)))] : [name, part],
  );
  return Object.fromEntries(changed) as Parts;
}
