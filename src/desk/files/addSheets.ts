import type { BookData, CarriedSheets } from "../book/bookData.ts";
import { carriedParts } from "./carriedParts.ts";
import { standardFont, usualFontOf } from "./fonts.ts";
import { mergeStyles } from "./mergeStyles.ts";
import { pack, partOf, textOf, unpack, type Parts } from "./parts.ts";
import { readable, unreadable, whyNoXlsx, type Reading } from "./reading.ts";
import { toParts } from "./saveXlsx.ts";
import { spillMark } from "./spillMark.ts";
import { registerSheets } from "./registerSheets.ts";

const styles = "xl/styles.xml";
const metadata = "xl/metadata.xml";

/**
 * The workbook file with sheets added at its end. Nothing else is read and written anew: every other part
 * (sheets, charts, pivot tables, macros) stays as it was, to the byte.
 * @param added - what the sheets are called must not be in use in the workbook.
 */
export async function addSheets(original: Uint8Array, added: CarriedSheets): Promise<Reading<Uint8Array>> {
  const because = whyNoXlsx(original);
  if (because !== null) return unreadable(because);
  const parts = unpackOrNull(original);
  if (parts === null) return unreadable("it is damaged, or no Excel workbook (.xlsx)");
  if (parts["xl/workbook.xml"] === undefined) return unreadable("its parts stand in unusual places");
  return readable(pack(await withSheets(parts, added)));
}

/** Whatever trips over the container is the file's fault. */
function unpackOrNull(bytes: Uint8Array): Parts | null {
  try {
    return unpack(bytes);
  } catch {
    return null;
  }
}

async function withSheets(parts: Parts, { sheets, names }: CarriedSheets): Promise<Parts> {
  const looks = parts[styles] && textOf(parts[styles]);
  const book: BookData = { sheets, names: [], active: 0 };
  const added = await toParts(book, looks === undefined ? standardFont : usualFontOf(looks));
  const merged = looks === undefined ? null : mergeStyles(looks, textOf(added[styles]!));
  const carried = carriedParts(added, parts, {
    styleShift: merged?.shift ?? 0,
    spillMark: parts[metadata] === undefined ? 1 : spillMark(textOf(parts[metadata])),
  });
  const own = { ...carried, parts: { ...carried.parts, ...missingParts(parts, added) } };
  const restyled = merged === null ? {} : { [styles]: partOf(merged.part) };
  return registerSheets({ ...parts, ...own.parts, ...restyled }, { sheets, names }, own);
}

/** Parts of which a workbook has one, taken over where it has none yet. */
function missingParts(parts: Parts, added: Parts): Parts {
  const missing = [styles, metadata].filter((path) => parts[path] === undefined && added[path] !== undefined);
  return Object.fromEntries(missing.map((path) => [path, added[path]!]));
}
