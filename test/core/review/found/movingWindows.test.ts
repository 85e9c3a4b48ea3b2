import { beforeAll, describe, expect, it } from "vitest";
import type { BookClaims } from "../../../../src/core/review/claimsOf.ts";
import type { BookCell } from "../../../../src/desk/book/bookData.ts";
import { bookOf, sheetOf } from "../../../support/deskBook.ts";
import { claimsIn, readOnDesk } from "../../../support/readBook.ts";

/** Formulas filled down over a moving window, and a few that cannot be read. */
const rows = Array.from({ length: 90 }, (_, row): BookCell[] => {
  const [first, last] = [row - 19, row];
  const window = `=SLOPE(A${first}:A${last},B${first}:B${last})`;
  const offset = `=SLOPE(A2:A90,OFFSET(B2,0,0,${row},1))`;
  return [
    (row * 7) % 13,
    (row * 5) % 11,
    row < 20 ? null : { value: 0.5 + row / 64, formula: window },
    row < 80 ? null : { value: 1, formula: offset },
  ];
});

describe("formulas filled down", () => {
  let found: BookClaims;
  beforeAll(async () => {
    found = claimsIn(
      await readOnDesk(bookOf(sheetOf("Rolling", [["Cups", "Price", "Slope", "All"], ...rows.slice(1)]))),
    );
  });

  it("are reviewed one by one up to fifty, and the rest is said", () => {
    expect(found.claims).toHaveLength(50);
    expect(found.unread).toContainEqual({
      cell: "Rolling!C71",
      why: "20 more regressions of the same columns over other rows, as far as Rolling!C90, are not reviewed one by one.",
    });
  });

  it("are one entry where none of them could be read", () => {
    expect(found.unread).toContainEqual({
      cell: "Rolling!D81:D90",
      why: "OFFSET works out at calculation which cells are used.",
    });
    expect(found.unread).toHaveLength(2);
  });
});
