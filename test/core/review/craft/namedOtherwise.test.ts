import { beforeAll, describe, expect, it } from "vitest";
import type { Book } from "../../../../src/core/review/book.ts";
import type { BookCell } from "../../../../src/desk/book/bookData.ts";
import { bookOf, sheetOf } from "../../../support/deskBook.ts";
import { claimsIn, readOnDesk } from "../../../support/readBook.ts";

/** Cups are 3 + 2 Price - 5 Rain to the last digit. */
const data: BookCell[][] = [
  ["Day", "Cups", "Price", "Rain"],
  ...Array.from({ length: 14 }, (_, day): BookCell[] => {
    const [price, rain] = [2 + ((day * 5) % 9) / 8, (day * 3) % 7];
    return [day + 1, 3 + 2 * price - 5 * rain, price, rain];
  }),
];

const linest = "LINEST(D!$B$2:$B$15,D!$C$2:$D$15,TRUE,TRUE)";
const taken = (value: number, row: number, column: number): BookCell => ({
  value,
  formula: `=INDEX(${linest},${row},${column})`,
});
const spilled = [{ value: -5, formula: `=LINEST(D!B2:B15,D!C2:D15)`, spill: "A2:C2" }, 2, 3] as const;

const reports: Readonly<Record<string, BookCell[][]>> = {
  right: [["Rain", "Price", "Constant"], [...spilled]],
  reversed: [["Price", "Rain", "Constant"], [...spilled]],
  down: [
    ["Intercept", taken(-5, 1, 1)],
    ["Price", taken(2, 1, 2)],
    ["Rain", taken(3, 1, 3)],
  ],
  apart: [["Price"], [null], [taken(-5, 1, 1)]],
  slopeError: [
    ["Driver", "Coefficient", "Standard error"],
    [
      "Price",
      { value: 2.5, formula: "=SLOPE(D!B2:B15,D!C2:C15)" },
      { value: 11.5, formula: "=STEYX(D!B2:B15,D!C2:C15)" },
    ],
  ],
  ofRegression: [["Standard error", { value: 11.5, formula: "=STEYX(D!B2:B15,D!C2:C15)" }]],
};

describe("what the numbers of formulas are called", () => {
  let book: Book;
  beforeAll(async () => {
    book = await readOnDesk(
      bookOf(sheetOf("D", data), ...Object.entries(reports).map(([name, rows]) => sheetOf(name, rows))),
    );
  });
  const told = (sheet: string) =>
    claimsIn(book, { sheet })
      .craft.filter(({ code }) => code === "named-otherwise")
      .map(({ cells, what, rank }) => [...cells, what, rank]);

  it("is told where LINEST is read from the first driver to the last", () => {
    expect(told("right")).toEqual([]);
    expect(told("reversed")).toEqual([
      [
        "reversed!A2",
        'The number is called "Price", but its formula gives the coefficient of Rain.',
        "changes the conclusion",
      ],
      [
        "reversed!B2",
        'The number is called "Rain", but its formula gives the coefficient of Price.',
        "changes the conclusion",
      ],
    ]);
  });

  it("is told of the constant too, and leaves alone what is called rightly", () => {
    expect(told("down")).toEqual([
      [
        "down!B1",
        'The number is called "Intercept", but its formula gives the coefficient of Rain.',
        "changes the conclusion",
      ],
      ["down!B3", 'The number is called "Rain", but its formula gives the constant.', "changes the conclusion"],
    ]);
  });

  it("is not guessed from words that stand apart", () => {
    expect(told("apart")).toEqual([]);
  });

  it("is told where the error of the regression stands as that of a slope", () => {
    expect(told("slopeError")).toEqual([
      [
        "slopeError!C2",
        'The number is called "Standard error", but its formula gives the standard error of the regression.',
        "changes a number",
      ],
    ]);
    expect(told("ofRegression")).toEqual([]);
  });
});
