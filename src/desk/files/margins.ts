import type { PageMargins } from "../book/bookData.ts";

const pointsPerInch = 72;

export const inInches = (margins: PageMargins): PageMargins => scaled(margins, 1 / pointsPerInch);

/** What a file leaves out is what spreadsheets take. */
export const inPoints = ({ left = 0.7, right = 0.7, top = 0.75, bottom = 0.75 }: Partial<PageMargins>): PageMargins =>
  scaled({ left, right, top, bottom }, pointsPerInch);

const scaled = ({ left, right, top, bottom }: PageMargins, factor: number): PageMargins => ({
  left: left * factor,
  right: right * factor,
  top: top * factor,
  bottom: bottom * factor,
});
