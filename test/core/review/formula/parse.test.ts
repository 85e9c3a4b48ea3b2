import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Book } from "../../../../src/core/review/book.ts";
import { type BookClaims, claimsOf } from "../../../../src/core/review/claimsOf.ts";
import { parseFormula } from "../../../../src/core/review/formula/parse.ts";
import type { Formula } from "../../../../src/core/review/formula/tree.ts";
import { toCellColumn } from "../../../support/cellColumns.ts";

/** A formula written out with brackets around everything. */
function inBrackets(formula: Formula | null): string {
  if (formula === null) return "no formula";
  switch (formula.kind) {
    case "spill":
      return `${inBrackets(formula.of)}#`;
    case "call":
      return `${formula.name}(${formula.arguments.map(inBrackets).join(",")})`;
    case "prefix":
      return `(${formula.sign}${inBrackets(formula.of)})`;
    case "percent":
      return `(${inBrackets(formula.of)}%)`;
    case "operation":
      return `(${inBrackets(formula.left)}${formula.sign}${inBrackets(formula.right)})`;
    case "array":
      return `{${formula.rows.map((row) => row.map(inBrackets).join(",")).join(";")}}`;
    default:
      return leafInWords(formula);
  }
}

type Leaf = Exclude<Formula, { kind: "spill" | "call" | "prefix" | "percent" | "operation" | "array" }>;

function leafInWords(formula: Leaf): string {
  switch (formula.kind) {
    case "number":
    case "boolean":
      return String(formula.value);
    case "text":
      return `"${formula.value}"`;
    case "error":
      return formula.sign;
    case "missing":
      return "_";
    case "cells": {
      const { sheet, row, column, rows, columns } = formula.area;
      return `[${sheet} ${row},${column} ${rows}x${columns}]`;
    }
    case "name":
      return `${formula.sheet === null ? "" : `${formula.sheet}!`}${formula.name}`;
    case "structured":
      return `${formula.table}<${formula.inside}>`;
  }
}

describe("a formula", () => {
  it.each([
    ["=1+2*3^2", "(1+(2*(3^2)))"],
    ["=-2^2", "((-2)^2)"],
    ["=2^3^2", "((2^3)^2)"],
    ["=10-4-3", "((10-4)-3)"],
    ["=5%+.5", "((5%)+0.5)"],
    ['="a""b"&1=2', '(("a"b"&1)=2)'],
    ["=$B$2", "[ 1,1 1x1]"],
    ["=Sheet1!B2:C$4", "[Sheet1 1,1 3x2]"],
    ["='It''s data'!A1", "[It's data 0,0 1x1]"],
    ["='[Other book.xlsx]Data'!A1", "[[Other book.xlsx]Data 0,0 1x1]"],
    ["=B:C", "[ 0,1 1048576x2]"],
    ["=$3:4", "[ 2,0 2x16384]"],
    ["=_xlfn.HSTACK(A1,,TRUE)", "HSTACK([ 0,0 1x1],_,true)"],
    ["=LOG10(A1)", "LOG10([ 0,0 1x1])"],
    ["={1,2;-3,4}", "{1,2;(-3),4}"],
    ["=Sales[Price]", "Sales<Price>"],
    ["=Sales[[#Data],[Rain '[mm']]]", "Sales<[#Data],[Rain '[mm']]>"],
    ["=@Sheet1!Prices", "(@Sheet1!Prices)"],
    ["=A1#", "[ 0,0 1x1]#"],
    ["=INDEX(A:A,2):B4", "(INDEX([ 0,0 1048576x1],2):[ 1,1 3x1])".replace("[ 1,1 3x1]", "[ 3,1 1x1]")],
    ["=SUM((A1,B2))", "SUM(([ 0,0 1x1],[ 1,1 1x1]))"],
    ["=IF(A1=#N/A,1.5E-3,x_1)", "IF(([ 0,0 1x1]=#N/A),0.0015,x_1)"],
    ["= SUM ( A1 ) ", "SUM([ 0,0 1x1])"],
    ["=SLOPE(A1:A9", "no formula"],
    ["=1+", "no formula"],
    ["={1,2;3}", "no formula"],
    ["=A1 B2", "no formula"],
  ])("%s is read", (text, meant) => {
    expect(inBrackets(parseFormula(text))).toBe(meant);
  });

  it("is given up where it is nested beyond all reason", () => {
    expect(parseFormula(`=${"(".repeat(5000)}1${")".repeat(5000)}`)).toBeNull();
    expect(parseFormula(`=${"-".repeat(5000)}1`)).toBeNull();
  });
});

const pieces = [
  "SLOPE(",
  "LINEST(",
  "INDEX(",
  "LET(",
  "TREND(",
  "LOGEST(",
  "ROUND(",
  "IF(",
  "T.DIST.2T(",
  "CHOOSE(",
  "TRANSPOSE(",
  "A1:A9",
  "B1:B9",
  "$C$1:$C$9",
  "B:C",
  "Data!A:A",
  "Other!A1",
  "3:5",
  "fit",
  "loop",
  "Sales[Price]",
  "[@Price]",
  "1",
  "2.5",
  "{1,2}",
  "{3;1}",
  "TRUE",
  '"x"',
  "#N/A",
  "+",
  "-",
  "*",
  "/",
  "^",
  "&",
  "%",
  ",",
  ",,",
  ")",
  "))",
  ":",
  "#",
  "@",
  " ",
  "(",
  "=",
];

const random = fc.array(fc.constantFrom(...pieces), { maxLength: 24 }).map((parts) => `=${parts.join("")}`);

/** A sheet of three columns of numbers, with formulas in a fourth. */
const bookWith = (formulas: readonly string[]): Book => ({
  names: [
    { name: "fit", refersTo: "LINEST(Data!$A$1:$A$9,Data!$B$1:$C$9,TRUE,TRUE)", sheet: null },
    { name: "loop", refersTo: "loop+1", sheet: null },
  ],
  calculation: "automatic",
  sheets: [
    {
      sheet: "Data",
      firstRow: 0,
      firstColumn: 0,
      rowCount: 12,
      columns: [3, 5, 7, 11].map((step) =>
        toCellColumn(Array.from({ length: 12 }, (_, row) => ((row * step) % 13) / 4)),
      ),
      visible: true,
      hiddenRows: [],
      hiddenColumns: [],
      formulas: formulas.map((formula, row) => ({
        row,
        column: 3,
        formula,
        rows: 1 + (row % 3),
        columns: 1 + (row % 2),
      })),
      readers: [],
      calculated: [null, null, null, new Uint8Array(12).fill(1)],
      formats: [],
      tables: [
        {
          name: "Sales",
          area: { sheet: "Data", row: 0, column: 0, rows: 12, columns: 3 },
          headings: true,
          totals: false,
        },
      ],
    },
  ],
});

/** Formulas that are well formed, most of them regressions taken further. */
const { formula: wellFormed } = fc.letrec<{ formula: string }>((tie) => {
  const range = fc.constantFrom("A1:A9", "B1:B9", "C1:C9", "Data!A:A", "Sales[5]", "LN(C1:C9)", "B1:B9^2", "2*A1:A9");
  const wide = fc.constantFrom("B1:C9", "B1:B9^{1,2}", "CHOOSE({1,2},B1:B9,C1:C9)", "HSTACK(B1:B9,LN(C1:C9))", "B1:B9");
  const small = fc.constantFrom("0", "1", "2", "3", "-1", "{1,2}", "TRUE", "", "B2");
  const call = (name: string, ...given: readonly fc.Arbitrary<string>[]): fc.Arbitrary<string> =>
    fc.tuple(...given).map((parts) => `${name}(${parts.join(",")})`);
  const inner = tie("formula");
  return {
    formula: fc.oneof(
      { depthSize: "small" },
      call("SLOPE", range, range),
      call("LINEST", range, wide, small, small),
      call("LOGEST", range, wide, small, small),
      call("FORECAST", small, range, range),
      call("TREND", range, wide, wide),
      call("INDEX", inner, small, small),
      call("ROUND", inner, small),
      call("IFERROR", inner, small),
      call("ABS", inner),
      call("EXP", inner),
      call("T.DIST.2T", inner, small),
      call("TRANSPOSE", inner),
      call("CHOOSECOLS", inner, small),
      fc.tuple(inner, inner).map(([a, b]) => `LET(a,${a},b,a+${b},b/a)`),
      fc.tuple(inner, fc.constantFrom("+", "-", "*", "/", "^"), inner).map(([a, sign, b]) => `(${a})${sign}(${b})`),
      fc.constantFrom("1", "2.5", "B3", "fit", "-3%"),
    ),
  };
});

describe("whatever stands in the formulas of a book", () => {
  const answered = (formulas: readonly string[]): BookClaims => {
    const found = claimsOf(bookWith(formulas), { pointed: null, sheet: null }, () => undefined);
    if (!found.ok) throw new Error(found.problem.code);
    for (const { value, halfUnit } of found.value.claims.flatMap(({ reported }) => reported)) {
      expect(Number.isFinite(value)).toBe(true);
      expect(halfUnit).toBeGreaterThan(0);
    }
    return found.value;
  };

  it("is answered where it is well formed, and much of it is read", () => {
    let read = 0;
    fc.assert(
      fc.property(fc.array(wellFormed, { minLength: 1, maxLength: 8 }), (formulas) => {
        read += answered(formulas.map((formula) => `=${formula}`)).claims.length;
      }),
      { seed: 20240611, numRuns: 1000 },
    );
    expect(read).toBeGreaterThan(500);
  });

  it("is answered where it is not", () => {
    fc.assert(
      fc.property(fc.array(random, { maxLength: 12 }), (formulas) => {
        answered(formulas.map((formula, index) => (index % 2 === 0 ? `=SLOPE(A1:A9,${formula.slice(1)}` : formula)));
      }),
      { seed: 20240612, numRuns: 500 },
    );
  });

  it("is answered for any text at all", () => {
    fc.assert(
      fc.property(fc.string({ unit: "binary", maxLength: 60 }), (text) => {
        answered([`=SLOPE(${text}`, `=${text}LINEST(`]);
      }),
      { seed: 7, numRuns: 500 },
    );
  });
});
