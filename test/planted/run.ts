/* eslint-disable no-console -- a command that prints a table */
import { mkdirSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { reviewClaim } from "../../src/core/review/reviewClaim.ts";
import { saveXlsx } from "../../src/desk/files/saveXlsx.ts";
import { type PlantedBook, pairs, singles, soundBooks } from "./books.ts";
import { judge } from "./judge.ts";

const at = process.argv.indexOf("--save");
const directory = at < 0 ? null : (process.argv[at + 1] ?? "planted");
if (directory !== null) mkdirSync(directory, { recursive: true });

const books = [...singles(), ...pairs(), ...soundBooks()];
const results = new Map<PlantedBook, string | null>();
for (const [index, planted] of books.entries()) {
  const fault = judge(
    planted,
    reviewClaim(planted.claim, () => undefined),
  );
  results.set(planted, fault);
  if (fault !== null) console.log(`${planted.kind} ${planted.name}\n    ${fault}`);
  if (directory === null) continue;
  const name = `${String(index + 1).padStart(3, "0")} ${planted.name.replaceAll(/[^\w -]/g, "")}.xlsx`;
  writeFileSync(join(directory, name), await saveXlsx(planted.book));
}

console.log("\n| workbooks | made | right |\n|---|---|---|");
for (const kind of ["single", "pair", "sound"] as const) {
  const made = books.filter((book) => book.kind === kind);
  const right = made.filter((book) => results.get(book) === null);
  console.log(`| ${kind} | ${made.length} | ${right.length} |`);
}
