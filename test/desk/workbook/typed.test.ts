import { expect, it } from "vitest";
import { asTyped, staysText } from "../../../src/desk/workbook/typed.ts";

it.each([
  ["1e3", 1000, "0.00E+00"],
  ["005", 5, null],
  [" 12 ", 12, null],
  ["1,234.5", 1234.5, "#,##0.00"],
  ["(5)", -5, null],
  ["2024-01-02", 45293, "yyyy-mm-dd"],
  ["Jan-19", 43466, "mmm-yy"],
  ["10:30", 0.4375, "hh:mm"],
  ["$5.20", 5.2, "$#,##0.00"],
])("reads %j as the number %d with format %j", (text, value, format) => {
  expect(asTyped(text, "General")).toMatchObject({ cell: { v: value, t: 2 }, format });
});

it.each(["2019Q1", "1.2.3", "abc", "12 apples"])("keeps %j as text", (text) => {
  expect(asTyped(text, "General")).toMatchObject({ cell: { v: text, t: 1 }, format: null });
});

it("takes what was in the cell before away: formula, share in a filled formula, rich text", () => {
  expect(asTyped("x", "General").cell).toMatchObject({ f: null, si: null, p: null });
  expect(asTyped("=A1", "General").cell).toMatchObject({ f: "=A1", v: null });
});

it.each([["=A1"], [5], [true], ["#N/A"]])("keeps %j as text under a text format", (value) => {
  expect(asTyped(value, "@").cell).toMatchObject({ v: String(value).replace("true", "TRUE"), t: 4, f: null });
});

it("takes a sign of equality alone for text", () => {
  expect(asTyped("=", "General").cell).toMatchObject({ v: "=", f: null });
});

it.each([
  ["Price index", true],
  ["Kestrel & Vane: 2014 = 100", true],
  ["2019Q1", true],
  ["false", false],
  ["#N/A", false],
  ["005", false],
  ["Jan-19", false],
  ["=A1", false],
  ["'quoted", false],
  ["", false],
])("of a file's text %j knows whether entering it would give text again: %j", (text, stays) => {
  expect(staysText(text)).toBe(stays);
});
