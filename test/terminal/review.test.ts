import { beforeAll, describe, expect, it } from "vitest";
import { success } from "../../src/core/problem/result.ts";
import type { Asked } from "../../src/core/review/claimsOf.ts";
import type { ClaimReview } from "../../src/core/review/claimReview.ts";
import { demoBook } from "../../src/desk/demo/demoBook.ts";
import { openXlsx } from "../../src/desk/files/openXlsx.ts";
import { saveXlsx } from "../../src/desk/files/saveXlsx.ts";
import { answerFixture } from "../support/answerFixture.ts";
import { digitsOf } from "../support/digits.ts";
import { bookReviewFixture, claimReviewFixture, smaller, soundReviewFixture } from "../support/reviewFixture.ts";
import { type Shelf, shelf, terminalWith, wholeAnalyst } from "../support/terminal.ts";

/** A reviewer who finds what the test gives it, so that what is printed can be told apart from what is found. */
function reviewer(reviews: readonly ClaimReview[]) {
  const asked: Asked[] = [];
  const analyst: typeof wholeAnalyst = {
    ...wholeAnalyst,
    listClaims: (_, what) => {
      asked.push(what);
      const { unread, craft } = bookReviewFixture;
      return Promise.resolve(
        success({ claims: reviews.map(({ claim }) => claim), unread: reviews.length === 0 ? [] : unread, craft }),
      );
    },
    review: (claim) => Promise.resolve(success(reviews.find((review) => review.claim === claim)!)),
  };
  return { asked, run: (line: readonly string[], files: Shelf) => terminalWith(["review", ...line], files, analyst) };
}

let book: Shelf;
beforeAll(async () => {
  book = shelf({ "book.xlsx": await saveXlsx(demoBook()), "values.csv": "Driver,Coefficient\nPrice,1.5\n" });
});

const both = reviewer(bookReviewFixture.claims);
const sound = reviewer([soundReviewFixture]);

describe("what a person reads of a review", () => {
  it("is each verdict with its findings, the numbers, and the caution", async () => {
    const { out, err } = await both.run(["book.xlsx"], book);
    expect(err).toBe("");
    expect(out).toContain("2 regressions reviewed");
    expect(out.replaceAll(/\s+/g, " ")).toContain(claimReviewFixture.verdict);
    expect(out).toMatch(/ {2}coefficient of Price index +Handover!B6 +-1\.234 +-1\.312 +differs +-1\.234\n/);
    expect(out.trimEnd()).toMatch(/have a qualified person look before money or a filing depends on it\.$/);
  });

  it("wraps sentences and leaves tables as they stand", async () => {
    const { out } = await both.run(["book.xlsx"], book);
    const sentences = out.split("\n").filter((line) => !line.startsWith("  ") && !line.startsWith("A statistical"));
    expect(Math.max(...sentences.map((line) => line.length))).toBeLessThanOrEqual(100);
  });
});

describe("the exit status", () => {
  it("is 3 where a finding changes a conclusion, 0 where none does", async () => {
    expect((await both.run(["book.xlsx"], book)).status).toBe(3);
    expect((await sound.run(["book.xlsx"], book)).status).toBe(0);
    const numbers = reviewer([{ ...claimReviewFixture, findings: [smaller] }]);
    expect((await numbers.run(["book.xlsx"], book)).status).toBe(0);
  });

  it("is 1 where the fault is Footing's own", async () => {
    const analyst = { ...wholeAnalyst, listClaims: () => Promise.reject(new Error("broken")) };
    const ran = await terminalWith(["review", "book.xlsx"], book, analyst);
    expect([ran.status, ran.out]).toEqual([1, ""]);
    expect(ran.err).toContain("broken");
  });
});

describe("what is asked of the book", () => {
  const askedBy = async (line: readonly string[], file = "book.xlsx"): Promise<Asked | undefined> => {
    const found = reviewer([soundReviewFixture]);
    expect((await found.run([file, ...line], book)).err).toBe("");
    return found.asked[0];
  };

  it("is everything, or one sheet", async () => {
    expect(await askedBy([])).toEqual({ pointed: null, sheet: null });
    expect(await askedBy(["--sheet", "handover "])).toEqual({ pointed: null, sheet: "Handover" });
  });

  it("is the cells pointed at, with what is said of their data", async () => {
    expect(await askedBy(["--reported", "Handover!A4:D8"])).toEqual({
      pointed: { reported: "Handover!A4:D8", outcome: null, drivers: null },
      sheet: null,
    });
    const told = ["--sheet", "Handover", "--reported", "A4:D8", "--outcome", "Repairs", "--drivers", "Price, Rain"];
    expect(await askedBy(told)).toEqual({
      pointed: { reported: "Handover!A4:D8", outcome: "Repairs", drivers: ["Price", "Rain"] },
      sheet: "Handover",
    });
    expect((await askedBy(["--reported", "A1:B2"], "values.csv"))?.pointed?.reported).toBe("values!A1:B2");
  });
});

describe("--json", () => {
  it("has every number in full precision, and the cells as addresses", async () => {
    const withAnswer = reviewer([{ ...claimReviewFixture, answer: answerFixture }]);
    const { out, status } = await withAnswer.run(["book.xlsx", "--json"], book);
    expect(status).toBe(3);
    const found = JSON.parse(out) as {
      changesConclusion: boolean;
      regressions: Record<string, unknown>[];
      craft: unknown[];
      unread: unknown[];
    };
    const [regression] = found.regressions;
    expect(found).toMatchObject({ changesConclusion: true, ...{ unread: bookReviewFixture.unread } });
    expect(regression).toMatchObject({
      place: "Handover!A4:C6",
      title: "Repairs explained by Price index",
      outcome: { name: "Repairs", range: "Months!B5:B9", form: "as it is" },
      errors: claimReviewFixture.errors,
      explanation: { hypotheses: ["rows-left-off-at-end"] },
      answer: { coefficients: answerFixture.coefficients },
    });
    expect((regression!["numbers"] as unknown[])[0]).toEqual({
      ...{ number: "coefficient of Price index", quantity: { kind: "coefficient", term: 0 }, cell: "Handover!B6" },
      ...{ shown: "-1.234", reported: -1.234, halfUnit: 0.0005, recomputed: -1.3119, agrees: false },
    });
    expect(found.craft).toHaveLength(1);
    expect(out).not.toContain('kinds": {');
  });
});

describe("--save", () => {
  it("keeps the workbook and adds the review sheet", async () => {
    const { out } = await both.run(["book.xlsx", "--save", "checked.xlsx"], book);
    expect(out).toContain('Sheet "Repairs review" is in checked.xlsx.');
    const kept = await openXlsx(book.files.get("checked.xlsx")!);
    if (!kept.ok) throw new Error(kept.because);
    const names = kept.value.sheets.map(({ name }) => name);
    expect(names).toEqual([...demoBook().sheets.map(({ name }) => name), "Repairs review"]);
    expect(JSON.stringify(kept.value.sheets.at(-1)!.rows)).toContain(claimReviewFixture.verdict);
  });
});

describe("faults of the input", () => {
  it.each([
    ["no book", [], "missing-option"],
    ["no such flag", ["book.xlsx", "--driver", "Price"], "unknown-setting"],
    ["a flag without its value", ["book.xlsx", "--reported"], "missing-option"],
    ["data without the cells that report", ["book.xlsx", "--outcome", "Repairs"], "missing-option"],
    ["reported cells on no sheet", ["book.xlsx", "--reported", "A4:D8"], "missing-option"],
    ["no such file", ["gone.xlsx"], "unreadable-file"],
    ["no such sheet", ["book.xlsx", "--sheet", "Handovr"], "unknown-place"],
    ["values alone", ["values.csv"], "no-formulas"],
    ["a copy over the workbook itself", ["book.xlsx", "--save", "./book.xlsx"], "unwritable-file"],
  ])("%s", async (_, line, code) => {
    const ran = await both.run([...line, "--json"], book);
    expect(ran.status).toBe(2);
    const { problem } = JSON.parse(ran.out) as { problem: { code: string; message: string } };
    expect(problem.code).toBe(code);
    expect(ran.err).toBe(`${problem.message}\n`);
  });

  it("a book without any regression, which must not pass as one without faults", async () => {
    const ran = await reviewer([]).run(["book.xlsx"], book);
    expect(ran.status).toBe(2);
    expect(ran.err).toContain("No regression was found in book.xlsx");
  });

  it("a book whose formulas cannot be read, each with the reason", async () => {
    const analyst = {
      ...wholeAnalyst,
      listClaims: () => Promise.resolve(success({ ...bookReviewFixture, claims: [] })),
    };
    const ran = await terminalWith(["review", "book.xlsx"], book, analyst);
    expect(ran.status).toBe(2);
    expect(ran.err).toContain("could be read: Sums!D9 (It reads its range with OFFSET).");
  });

  it("a command that there is not", async () => {
    const ran = await terminalWith(["reviw", "book.xlsx"], book, wholeAnalyst);
    expect(ran.status).toBe(2);
    expect(ran.err).toContain('Did you mean "review"?');
  });
});

describe("the demo's handed-over regression", () => {
  it("is found, explained by the row left off, and judged by the standard errors that the evidence calls for", async () => {
    const ran = await terminalWith(["review", "book.xlsx", "--sheet", "Handover", "--json"], book, wholeAnalyst);
    expect(ran.status).toBe(3);
    const { regressions } = JSON.parse(ran.out) as { regressions: Record<string, unknown>[] };
    expect(regressions).toHaveLength(1);
    const [handed] = regressions as [
      {
        explanation: { cells: string[]; numbers: { agrees: boolean }[] };
        errors: { kinds: string[]; allowed: boolean };
        consequences: { driver: string; changes: boolean }[];
        numbers: { number: string; recomputed: number }[];
      },
    ];
    expect(handed.explanation.cells).toEqual(["Months!B100:E100"]);
    expect(handed.explanation.numbers.map(({ agrees }) => agrees)).toEqual(handed.numbers.map(() => true));
    expect(handed.errors).toMatchObject({ kinds: ["classical"], allowed: false });
    const changed = handed.consequences.filter(({ changes }) => changes).map(({ driver }) => driver);
    expect(changed).toEqual(["Price index"]);
    // The same numbers by the other door: what `footing answer` makes of all rows.
    const line = ["--outcome", "Repairs", "--drivers", "Price index,Advertising,Rainy days", "--order", "Month"];
    const answered = await terminalWith(["answer", "book.xlsx", ...line, "--json"], book, wholeAnalyst);
    const { coefficients } = JSON.parse(answered.out) as { coefficients: number[] };
    const recomputed = handed.numbers.filter(({ number }) => /^(constant|coefficient)/.test(number));
    recomputed.forEach((number, index) =>
      expect(digitsOf(number.recomputed, coefficients[index]!)).toBeGreaterThan(11),
    );
    expect(recomputed).toHaveLength(4);
  });

  it("is the same where it is pointed at", async () => {
    const pointed = ["--reported", "Handover!A4:D8", "--outcome", "Repairs"];
    const drivers = ["--drivers", "Price index,Advertising,Rainy days"];
    const ran = await terminalWith(["review", "book.xlsx", ...pointed, ...drivers], book, wholeAnalyst);
    expect([ran.status, ran.err]).toEqual([3, ""]);
    expect(ran.out.replaceAll(/\s+/g, " ")).toContain("The last row (Months!B100:E100) was left off.");
    const wrong = ["--reported", "Handover!A4:D8", "--outcome", "Repiars", ...drivers];
    const faulty = await terminalWith(["review", "book.xlsx", ...wrong], book, wholeAnalyst);
    expect(faulty.status).toBe(2);
    expect(faulty.err).toContain("Repiars");
  });
});
