import { describe, expect, it } from "vitest";
import { lineHeight, page, pageWidths, pointsOf } from "../../src/sheet/columns.ts";
import { pageBreaksOf } from "../../src/sheet/pageBreaks.ts";

/** Points that a lying A4 page holds of a print as wide as it: 530 of height to 770 of width. */
const pageHeight =
  (530 / 770) * pageWidths.slice(0, page.columns).reduce((sum, characters) => sum + pointsOf(characters), 0);
const rowsOnPage = Math.floor(pageHeight / lineHeight);

describe("a new page", () => {
  it("begins with what would be cut and fits on one", () => {
    const above = { rows: rowsOnPage - 5, whole: true };
    expect(pageBreaksOf([above, { rows: 5, whole: true }], [])).toEqual([]);
    expect(pageBreaksOf([above, { rows: 6, whole: true }], [])).toEqual([above.rows]);
  });

  it("counts the rows that are taller than usual", () => {
    const above = { rows: rowsOnPage - 5, whole: true };
    const tall = [{ area: { row: above.rows, column: 0, rows: 1, columns: 1 }, rowHeight: 45 }];
    expect(pageBreaksOf([above, { rows: 5, whole: true }], tall)).toEqual([above.rows]);
  });

  it("does not begin with what is longer than a page, nor with a table whose first lines fit", () => {
    const above = { rows: 10, whole: true };
    expect(pageBreaksOf([above, { rows: 3 * rowsOnPage, whole: true }], [])).toEqual([]);
    expect(pageBreaksOf([above, { rows: 3 * rowsOnPage, whole: false }], [])).toEqual([]);
  });

  it("begins with a table that would have a few lines at the foot of one", () => {
    const above = { rows: rowsOnPage - 4, whole: true };
    expect(pageBreaksOf([above, { rows: 3 * rowsOnPage, whole: false }], [])).toEqual([above.rows]);
  });
});
