import { expect, it } from "vitest";
import { isMissingInLibreOffice } from "../../../../src/desk/files/elements/missingFunctions.ts";

it.each([
  ["=FOOTING.ANSWER(A1:A9,B1:B9)", true],
  ["=TRANSPOSE(sort(A1:A9))", true],
  ["=LET(x,A1:A9,x*2)", true],
  ["=A1#*2", true],
  ["='Rye''s tubes'!A1#", true],
  ["=OTHER.FUNCTION(3)", true],
  ["=LINEST(B1:B9,A1:A9)", false],
  ["=NORM.S.DIST(A1:A9,TRUE)", false],
  ["=ERROR.TYPE(A1:A9)", false],
  ['=A1:A9&"SORT(A1#)"', false],
  ["='SORT(x'!A1:A9*2", false],
  ["=SUM(T[SORT(x)])*A1:A9", false],
])("%s", (formula, isMissing) => {
  expect(isMissingInLibreOffice(formula)).toBe(isMissing);
});
