import { expect, it } from "vitest";
import { toBookFooter, toFileFooter } from "../../../src/desk/files/footers.ts";

// ISO/IEC 29500-1 18.3.1.39: &L, &C and &R begin the parts; text before any of them is centred.
it.each([
  ["&LRepairs&RPage &P of &N", { left: "Repairs", center: "", right: "Page &P of &N" }],
  ["&C&A", { left: "", center: "&A", right: "" }],
  ["Page &P", { left: "", center: "Page &P", right: "" }],
  ['&L&"Arial,Bold"&8Draft&C&D&R&F', { left: '&"Arial,Bold"&8Draft', center: "&D", right: "&F" }],
])("%s has its parts", (text, parts) => {
  expect(toBookFooter(text)).toEqual(parts);
  expect(toBookFooter(toFileFooter(parts))).toEqual(parts);
});

it("that says nothing is none", () => {
  expect(toBookFooter("")).toBeNull();
  expect(toBookFooter("&L&C")).toBeNull();
});
