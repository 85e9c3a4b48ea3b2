import { describe, expect, it } from "vitest";
import { lineHeight, page, pageWidths, pointsOf } from "../../src/sheet/columns.ts";
import { type Stretch, pageBreaksOf } from "../../src/sheet/pageBreaks.ts";

/** Points that a lying A4 page holds of a print as wide as it: 530 of height to 770 of width. */
const pageHeight =
  (530 / 770) * pageWidths.slice(0, page.columns).reduce((sum, characters) => sum + pointsOf(characters), 0);
const rowsOnPage = Math.floor(pageHeight / lineHeight);

describe("a new page", () => {
  it("begins with what would be cut and fits on one", () => {
    const above: Stretch = { rows: rowsOnPage - 5, parted: "seldom" };
    expect(pageBreaksOf([above, { rows: 5, parted: "seldom" }], [])).toEqual([]);
    expect(pageBreaksOf([above, { rows: 6, parted: "seldom" }], [])).toEqual([above.rows]);
  });

  it("counts the rows that are taller than usual", () => {
    const above: Stretch = { rows: rowsOnPage - 5, parted: "seldom" };
    const tall = [{ area: { row: above.rows, column: 0, rows: 1, columns: 1 }, rowHeight: 45 }];
    expect(pageBreaksOf([above, { rows: 5, parted: "seldom" }], tall)).toEqual([above.rows]);
  });

  it("does not begin with what is longer than a page, nor with a table whose first lines fit", () => {
    const above: Stretch = { rows: 10, parted: "seldom" };
    expect(pageBreaksOf([above, { rows: 3 * rowsOnPage, parted: "seldom" }], [])).toEqual([]);
    expect(pageBreaksOf([above, { rows: 3 * rowsOnPage, parted: "anywhere" }], [])).toEqual([]);
  });

  it("begins with a table that would have a few lines at the foot of one", () => {
    const above: Stretch = { rows: rowsOnPage - 4, parted: "seldom" };
    expect(pageBreaksOf([above, { rows: 3 * rowsOnPage, parted: "anywhere" }], [])).toEqual([above.rows]);
  });

  it("begins with pictures that a page in a wider font would cut, but not with a table", () => {
    const rowsInWiderFont = Math.floor((pageHeight * 1.29) / lineHeight);
    const above: Stretch = { rows: rowsInWiderFont - 3, parted: "anywhere" };
    expect(pageBreaksOf([above, { rows: 6, parted: "never" }], [])).toEqual([above.rows]);
    expect(pageBreaksOf([above, { rows: 6, parted: "seldom" }], [])).toEqual([]);
  });
});
