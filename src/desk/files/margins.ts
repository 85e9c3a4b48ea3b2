import type { PageMargins } from "../book/bookData.ts";

const pointsPerInch = 72;

/** What a file leaves out is what spreadsheets take, in inches. */
const usual: PageMargins = { left: 0.7, right: 0.7, top: 0.75, bottom: 0.75, footer: 0.3 };

export const inInches = (margins: PageMargins): PageMargins => scaled(margins, 1 / pointsPerInch);

export const inPoints = (margins: Partial<PageMargins>): PageMargins => scaled({ ...usual, ...margins }, pointsPerInch);

const scaled = ({ left, right, top, bottom, footer }: PageMargins, factor: number): PageMargins => ({
  left: left * factor,
  right: right * factor,
  top: top * factor,
  bottom: bottom * factor,
  footer: footer * factor,
});
