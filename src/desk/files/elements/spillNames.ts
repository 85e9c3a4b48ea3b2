import { type SheetArea, localAddressOf, parseAddress, quoteSheet } from "../../../core/table/address.ts";
import type { BookName } from "../../book/bookData.ts";
import { absolute } from "../absolute.ts";

/**
 * Names that say where a result lies which was saved cell by cell. Names, because every spreadsheet moves them with inserted
 * rows and keeps them when it saves; a sheet's own, so that they go where the sheet goes; with "_" before them, so that
 * the pane does not offer them as data.
 */
const start = "_Footing_spill_";
const pattern = new RegExp(`^${start}\\d+$`, "i");

export const isSpillName = ({ name }: BookName): boolean => pattern.test(name);

/** @param number - not in use for another of the sheet. */
export const spillName = (area: SheetArea, number: number): BookName => ({
  name: `${start}${number}`,
  refersTo: `${quoteSheet(area.sheet)}!${absolute(localAddressOf(area))}`,
  sheet: area.sheet,
});

/** The area of such a name; null where its cells were deleted. */
export const spillOf = ({ refersTo }: BookName): SheetArea | null => parseAddress(refersTo.replace(/^=/, ""));

/** Elements of a workbook part that define names, with these hidden: they are for programs and not for people. */
export const withHiddenSpillNames = (elements: string): string =>
  elements.replaceAll(`<definedName name="${start}`, `<definedName hidden="1" name="${start}`);
