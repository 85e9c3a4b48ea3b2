import { describe, expect, it } from "vitest";
import { withOwnNames } from "../../../src/desk/workbook/letNames.ts";
import { load, testDesk } from "../../support/desk.ts";
import { bookOf, sheetOf } from "../../support/deskBook.ts";

describe("names that LET gives", () => {
  const taken = new Set(["rate", "cups"]);
  it.each([
    ["=LET(rate,0.07,2*Rate)", "=LET(rate_in_let,0.07,2*Rate_in_let)"],
    ["=LET(y,Cups,SUM(y))", "=LET(y,Cups,SUM(y))"],
    ['=LET(y,SUM(1,2),cups,y+1,"cups, "&cups)', '=LET(y,SUM(1,2),cups_in_let,y+1,"cups, "&cups_in_let)'],
    ["=1+LET(x,LET(rate,1,rate),x)", "=1+LET(x,LET(rate_in_let,1,rate_in_let),x)"],
    ["=LET(rate,'Cups, rate'!A1,rate)", "=LET(rate_in_let,'Cups, rate'!A1,rate_in_let)"],
    ["=LET(rate", "=LET(rate"],
    ["=SUM(Rate)", "=SUM(Rate)"],
  ])("%s", (formula, told) => {
    expect(withOwnNames(formula, taken)).toBe(told);
  });

  it("come before those of the workbook, as in Excel, and the cell keeps its formula", async () => {
    const formula = "=LET(rate,A1,rate*2)";
    const book = {
      ...bookOf(sheetOf("D", [[21, { value: null, formula }]])),
      names: [{ name: "Rate", refersTo: "0.07" }],
    };
    const desk = await testDesk({ book });
    await desk.settle();
    expect(await load(desk, "D!B1", "values")).toEqual([[42]]);
    expect(await load(desk, "D!B1", "formulas")).toEqual([[formula]]);
    desk.close();
  });
});
