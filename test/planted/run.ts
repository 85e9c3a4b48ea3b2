/* eslint-disable no-console -- a command that prints a table */
import { mkdirSync, writeFileSync } from "node:fs";
import { join } from "node:path";
import { reviewClaim } from "../../src/core/review/reviewClaim.ts";
import type { BookData } from "../../src/desk/book/bookData.ts";
import { saveXlsx } from "../../src/desk/files/saveXlsx.ts";
import { type PlantedBook, pairs, singles, soundBooks } from "./books.ts";
import {
  type FormulaBook,
  bookOf,
  everyFormulaFault,
  formulaFaults,
  formulaPairs,
  positionFaults,
  readerFaults,
  soundFormulas,
  soundPositions,
  soundReaders,
  soundThroughZero,
} from "./formulas/books.ts";
import { judgeFormulas } from "./formulas/judge.ts";
import { judge, judgeBook } from "./judge.ts";
import { laidOut } from "./layouts.ts";
import { reviewBook, reviewTogether } from "./wholeBook.ts";

/** `--save DIR` writes the workbooks; `--books` takes each the whole way, through the desk and the search for reports. */
const isWhole = process.argv.includes("--books");
const at = process.argv.indexOf("--save");
const directory = at < 0 ? null : (process.argv[at + 1] ?? "planted");
if (directory !== null) mkdirSync(directory, { recursive: true });

interface Judged {
  readonly kind: string;
  readonly name: string;
  readonly book: BookData;
  readonly fault: string | null;
}

async function judgedPlanted(what: string, planted: PlantedBook): Promise<Judged> {
  const fault = isWhole
    ? judgeBook(planted, await reviewBook(planted.book))
    : judge(
        planted,
        reviewClaim(planted.claim, () => undefined),
      );
  return { kind: `${what}, ${planted.kind}`, name: planted.name, book: planted.book, fault };
}

async function* judgedFormulas(what: string, books: readonly FormulaBook[]): AsyncGenerator<Judged> {
  const together = isWhole ? [] : await reviewTogether(books);
  for (const [index, planted] of books.entries()) {
    const book = bookOf(planted);
    const fault = judgeFormulas(planted, together[index] ?? (await reviewBook(book)));
    yield { kind: `${what}, ${planted.kind}`, name: planted.name, book, fault };
  }
}

async function* all(): AsyncGenerator<Judged> {
  const typed = [...singles(), ...pairs(), ...soundBooks()];
  for (const planted of typed) {
    if (!isWhole || planted.expectedInBook !== null) yield await judgedPlanted("typed", planted);
  }
  // How a report lies on its sheet shows in books alone.
  for (const planted of isWhole ? laidOut() : []) yield await judgedPlanted("typed, brackets elsewhere", planted);
  const usual = [...(isWhole ? formulaFaults() : everyFormulaFault()), ...formulaPairs(), ...soundFormulas()];
  yield* judgedFormulas("formulas", usual);
  yield* judgedFormulas("formulas without a constant", soundThroughZero());
  yield* judgedFormulas("formulas without drivers", [...positionFaults(), ...soundPositions()].filter(isTaken));
  yield* judgedFormulas("results read in cells", [...readerFaults(), ...soundReaders()].filter(isTaken));
}

/** Book by book some of those that are many are enough. */
const isTaken = (_: unknown, index: number): boolean => !isWhole || index % 5 === 2;

const counts = new Map<string, { made: number; right: number }>();
let number = 0;
for await (const { kind, name, book, fault } of all()) {
  const count = counts.get(kind) ?? { made: 0, right: 0 };
  counts.set(kind, { made: count.made + 1, right: count.right + (fault === null ? 1 : 0) });
  if (fault !== null) console.log(`${kind}: ${name}\n    ${fault}`);
  number++;
  if (directory === null) continue;
  const file = `${String(number).padStart(3, "0")} ${name.replaceAll(/[^\w -]/g, "")}.xlsx`;
  writeFileSync(join(directory, file), await saveXlsx(book));
}

console.log("\n| workbooks | made | right |\n|---|---|---|");
for (const [kind, { made, right }] of counts) console.log(`| ${kind} | ${made} | ${right} |`);
