import { describe, expect, it } from "vitest";
import { reviewClaim } from "../../src/core/review/reviewClaim.ts";
import { hypotheses } from "../../src/core/review/engine/change.ts";
import { type PlantedBook, pairs, singles, soundBooks } from "./books.ts";
import {
  type FormulaBook,
  bookOf,
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

const faultOf = (planted: PlantedBook): string | null =>
  judge(
    planted,
    reviewClaim(planted.claim, () => undefined),
  );

const wrongOf = (books: readonly PlantedBook[]): string[] =>
  books.flatMap((planted) => {
    const fault = faultOf(planted);
    return fault === null ? [] : [`${planted.name}: ${fault}`];
  });

describe("planted faults", () => {
  it("are made of every hypothesis, in six data sets at least", () => {
    const books = singles();
    const planted = new Set(
      books.flatMap(({ expected }) => expected.map((one) => ("hypothesis" in one ? one.hypothesis : ""))),
    );
    expect(hypotheses.filter((one) => !planted.has(one))).toEqual([]);
    expect(new Set(books.map(({ name }) => name.split(":")[0])).size).toBeGreaterThanOrEqual(6);
    expect(books.length).toBeGreaterThanOrEqual(60);
  });

  it("are each explained", () => {
    expect(wrongOf(singles())).toEqual([]);
  });

  it("are explained in nine of ten pairs", () => {
    const books = pairs();
    expect(wrongOf(books).length).toBeLessThanOrEqual(books.length / 10);
  });

  it("are not found where there are none", () => {
    const books = soundBooks();
    expect(books).toHaveLength(20);
    expect(wrongOf(books)).toEqual([]);
  });

  it("are found in workbooks as they are opened", async () => {
    const all = [...singles(), ...pairs(), ...soundBooks()].filter(({ expectedInBook }) => expectedInBook !== null);
    const wrong: string[] = [];
    for (const planted of all.filter((_, index) => index % 16 === 3)) {
      const fault = judgeBook(planted, await reviewBook(planted.book));
      if (fault !== null) wrong.push(`${planted.name}: ${fault}`);
    }
    expect(wrong).toEqual([]);
  });

  it("are found where brackets stand beside coefficients, above them names, and in intervals", async () => {
    const wrong: string[] = [];
    for (const planted of laidOut().filter((_, index) => index % 13 === 4)) {
      const fault = judgeBook(planted, await reviewBook(planted.book));
      if (fault !== null) wrong.push(`${planted.name}: ${fault}`);
    }
    expect(wrong).toEqual([]);
  });
});

describe("faults planted where formulas report", () => {
  const wrongAmong = async (books: readonly FormulaBook[]): Promise<string[]> => {
    const reviews = await reviewTogether(books);
    return books.flatMap((planted, index) => {
      const fault = judgeFormulas(planted, reviews[index]!);
      return fault === null ? [] : [`${planted.name}: ${fault}`];
    });
  };

  it("are each found", async () => {
    expect(await wrongAmong(formulaFaults())).toEqual([]);
  });

  it("are found where formulas name no drivers, and not where there are none", async () => {
    const some = [...positionFaults().filter((_, index) => index % 9 === 1), ...soundPositions()];
    expect(await wrongAmong(some)).toEqual([]);
  });

  it("are found where a table reads the results in cells, and not where there are none", async () => {
    const some = [...readerFaults().filter((_, index) => index % 17 === 1), ...soundReaders()];
    expect(await wrongAmong(some)).toEqual([]);
  });

  it("are both found in nine of ten pairs", async () => {
    const books = formulaPairs();
    expect((await wrongAmong(books)).length).toBeLessThanOrEqual(books.length / 10);
  });

  it("are not found where there are none", async () => {
    const books = soundFormulas();
    expect(books).toHaveLength(20);
    expect(soundThroughZero().length).toBeGreaterThan(1);
    expect(await wrongAmong([...books, ...soundThroughZero()])).toEqual([]);
  });

  it("are found in workbooks as they are opened", async () => {
    const wrong: string[] = [];
    for (const planted of [...formulaFaults(), ...soundFormulas()].filter((_, index) => index % 12 === 5)) {
      const fault = judgeFormulas(planted, await reviewBook(bookOf(planted)));
      if (fault !== null) wrong.push(`${planted.name}: ${fault}`);
    }
    expect(wrong).toEqual([]);
  });
});
