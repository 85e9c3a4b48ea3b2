import type { BookData } from "../../src/desk/book/bookData.ts";
import { bookOf, sheetOf } from "./deskBook.ts";

const money = { numberFormat: "#,##0.00", bold: true } as const;
const day = { numberFormat: "yyyy-mm-dd" } as const;

/** Invented tubes, with a result that holds every kind of value, and two of functions that LibreOffice 7.4 lacks. */
export const spilledBook: BookData = bookOf(
  sheetOf("Rye's tubes", [
    ["Week", "Tubes", "Price"],
    [{ value: 44200, style: day }, 40, 5.25],
    [{ value: 44207, style: day }, 44, 5],
    [{ value: 44214, style: day }, 39, 5.5],
    [
      { value: "", formula: "=FOOTING.ANSWER($B$2:$B$4,$C$2:$C$4,$A$2)", spill: "A5:D7" },
      "coefficient",
      { value: 4.1875, style: money },
      true,
    ],
    [{ value: 44221.5, style: day }, { error: "#N/A" }, false, -0.0625],
    ["  ", "#DIV/0!", 'say "=1+1"', ""],
    [
      { value: 39, formula: "=SORT(B2:B4)", spill: "A8:A10" },
      { value: 2, formula: "=SUM(A5#)" },
      { value: 10.5, formula: "=C2:C4*2", spill: "C8:C10" },
      { value: 5, formula: "=FOOTING.LAGS(96)" },
    ],
    [40, null, 10],
    [44, null, 11],
  ]),
  sheetOf("Other", [[{ value: 78, formula: "=SORT('Rye''s tubes'!A8#*2)", spill: "A1:A3" }], [80], [88]]),
);
