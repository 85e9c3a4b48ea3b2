/* eslint-disable no-console -- a command that prints a table */
import { mkdirSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { reviewClaim } from "../../src/core/review/reviewClaim.ts";
import { saveXlsx } from "../../src/desk/files/saveXlsx.ts";
import { type PlantedBook, pairs, singles, soundBooks } from "./books.ts";
import { judge, judgeBook } from "./judge.ts";
import { reviewBook } from "./wholeBook.ts";

/** `--save DIR` writes the workbooks; `--books` takes each the whole way, through the desk and the search for reports. */
const isWhole = process.argv.includes("--books");
const at = process.argv.indexOf("--save");
const directory = at < 0 ? null : (process.argv[at + 1] ?? "planted");
if (directory !== null) mkdirSync(directory, { recursive: true });

const claimFault = (planted: PlantedBook): string | null =>
  judge(
    planted,
    reviewClaim(planted.claim, () => undefined),
  );

const wholeFault = async (planted: PlantedBook): Promise<string | null> =>
  judgeBook(planted, await reviewBook(planted.book));

const planted = [...singles(), ...pairs(), ...soundBooks()];
const books = isWhole ? planted.filter(({ expectedInBook }) => expectedInBook !== null) : planted;
const results = new Map<PlantedBook, string | null>();
for (const [index, book] of books.entries()) {
  const fault = isWhole ? await wholeFault(book) : claimFault(book);
  results.set(book, fault);
  if (fault !== null) console.log(`${book.kind} ${book.name}\n    ${fault}`);
  if (directory === null) continue;
  const name = `${String(index + 1).padStart(3, "0")} ${book.name.replaceAll(/[^\w -]/g, "")}.xlsx`;
  writeFileSync(join(directory, name), await saveXlsx(book.book));
}

console.log("\n| workbooks | made | right |\n|---|---|---|");
for (const kind of ["single", "pair", "sound"] as const) {
  const made = books.filter((book) => book.kind === kind);
  const right = made.filter((book) => results.get(book) === null);
  console.log(`| ${kind} | ${made.length} | ${right.length} |`);
}
