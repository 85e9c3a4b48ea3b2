import { describe, expect, it } from "vitest";
import type { BookValue } from "../../../../src/desk/book/bookData.ts";
import {
  elementFormula,
  isKept,
  readElement,
  readStandIn,
  standInFormula,
} from "../../../../src/desk/files/elements/elementFormulas.ts";

describe("a part of a result", () => {
  it("is told by the formula, its row and its column, and read again", () => {
    const part = { whole: '=FOOTING.ERRORS(A1:A9,B1:C9,"white, HC3")', row: 2, column: 13 };
    expect(elementFormula(part)).toBe('=INDEX(FOOTING.ERRORS(A1:A9,B1:C9,"white, HC3"),2,13)');
    expect(readElement(elementFormula(part))).toEqual(part);
  });

  it.each(["=SUM(A1:A9)", "=INDEX(A1:A9,2)", "=INDEX(A1:A9,B1,C1)", "=1+INDEX(A1:A9,2,1)"])("is not %s", (formula) => {
    expect(readElement(formula)).toBeNull();
  });
});

describe("a part that stands in for its value", () => {
  const values: readonly BookValue[] = ["", "   ", "#N/A", true, false, { error: "#DIV/0!" }, { error: "#NAME?" }];
  it.each(values)("says %j and where it belongs", (value) => {
    expect(isKept(value)).toBe(false);
    const formula = standInFormula({ value, row: 3, column: 1 }, "$B$5")!;
    expect(formula).toContain("IF(ISERROR(CHOOSE(1,$B$5,3,1)),$B$5,");
    expect(readStandIn(formula)).toEqual({ value, row: 3, column: 1 });
  });

  it("is none any more with another text or number in it", () => {
    for (const said of ['"mine"', "12", "A1", '"a"&"b"']) {
      expect(readStandIn(`=IF(ISERROR(CHOOSE(1,$B$6,3,1)),$B$6,${said})`)).toBeNull();
    }
  });

  it("cannot spell an error that only some spreadsheets have", () => {
    expect(standInFormula({ value: { error: "#CALC!" }, row: 1, column: 1 }, "$B$5")).toBeNull();
  });
});
