import type { PageFooter } from "../book/bookData.ts";
import { recordOf } from "../workbook/book.ts";
import { asText } from "./arguments.ts";
import { hold, type OnSheet } from "./held.ts";
import type { Host } from "./host.ts";
import type { Family } from "./model.ts";

/** One footer for all pages; the stand-in keeps no headers, nor others for first, odd and even pages. */
export const headersFooters: Family<OnSheet> = {
  read: { State: () => "Default" },
  part: { DefaultForAllPages: (state) => hold("HeaderFooter", state) },
  lacks: ["UseSheetMargins", "UseSheetScale"],
};

const none: PageFooter = { left: "", center: "", right: "" };

const readPart =
  (part: keyof PageFooter) =>
  ({ sheet }: OnSheet, { book }: Host): string =>
    (recordOf(book, sheet).footer ?? none)[part];

const writePart =
  (part: keyof PageFooter) =>
  ({ sheet }: OnSheet, { book }: Host, value: unknown): void => {
    const record = recordOf(book, sheet);
    record.footer = { ...(record.footer ?? none), [part]: asText(value) };
  };

export const headerFooter: Family<OnSheet> = {
  read: { LeftFooter: readPart("left"), CenterFooter: readPart("center"), RightFooter: readPart("right") },
  write: { LeftFooter: writePart("left"), CenterFooter: writePart("center"), RightFooter: writePart("right") },
  lacks: ["LeftHeader", "CenterHeader", "RightHeader"],
};
