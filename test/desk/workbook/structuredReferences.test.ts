import { describe, expect, it } from "vitest";
import { spellOut, type SpokenTable } from "../../../src/desk/workbook/structuredReferences.ts";

const sales: SpokenTable = {
  sheet: "My data",
  row: 2,
  column: 1,
  rows: 6,
  columns: 4,
  headings: ["Month", "Price, net", "Driver's [x] #1", "Rain\nin mm"],
};

const standpoint = (row: number) => ({
  row,
  tableCalled: (name: string) => (name === "" || name.toLowerCase() === "sales" ? sales : null),
});

const spelled = (formula: string, row = 4): string => spellOut(formula, standpoint(row));

describe("references to tables", () => {
  // As Excel documents its structured references, from memory.
  it.each([
    ["=SUM(Sales[Month])", "=SUM('My data'!$B$4:$B$8)"],
    ["=SUM(sales[MONTH])", "=SUM('My data'!$B$4:$B$8)"],
    ["=SUM(Sales[Price, net])", "=SUM('My data'!$C$4:$C$8)"],
    ["=SUM(Sales[[Price, net]])", "=SUM('My data'!$C$4:$C$8)"],
    ["=SUM(Sales[Driver''s '[x'] '#1])", "=SUM('My data'!$D$4:$D$8)"],
    ["=SUM(Sales[[#Data],[Month]:[Rain\nin mm]])", "=SUM('My data'!$B$4:$E$8)"],
    ["=A(Sales[[#Headers],[#Data],[Driver''s '[x'] '#1]:[Month]],1)", "=A('My data'!$B$3:$D$8,1)"],
    ["=Sales[[#All],[Month]]", "='My data'!$B$3:$B$8"],
    ["=Sales[[#Headers],[Month]]", "='My data'!$B$3"],
    ["=Sales[#Headers]", "='My data'!$B$3:$E$3"],
    ["=ROWS(Sales)", "=ROWS('My data'!$B$4:$E$8)"],
    ["=ROWS(Sales[])", "=ROWS('My data'!$B$4:$E$8)"],
    ["=Sales[@Month]*2", "='My data'!$B5*2"],
    ["=Sales[@[Price, net]]", "='My data'!$C5"],
    ["=Sales[[#This Row],[Month]:[Price, net]]", "='My data'!$B5:$C5"],
    ["=[@Month]+[Month]", "='My data'!$B5+'My data'!$B$4:$B$8"],
    ["=Sales[None]", "=#REF!"],
    ["=Sales[#Totals]", "=#REF!"],
  ])("%j is %j", (formula, cells) => {
    expect(spelled(formula)).toBe(cells);
  });

  it.each([
    '="Sales[Month]"&"Sales"',
    "='Sales'!A1+Sales!B2",
    "=SALES(A1)",
    "=Other[Month]",
    "=Sales.Total+MySales+Sales_2",
    "=SUM(A1:B2)",
    "='it''s Sales[Month]'!A1",
  ])("%j speaks of no table", (formula) => {
    expect(spelled(formula)).toBe(formula);
  });

  it("outside the table's rows there is no row of its own", () => {
    expect(spelled("=Sales[@Month]", 2)).toBe("=#REF!");
    expect(spelled("=Sales[@Month]", 8)).toBe("=#REF!");
  });
});
