import { describe, expect, it } from "vitest";
import type { SheetFacts } from "../../src/sheet/facts.ts";
import { memoOf } from "../../src/sheet/memo.ts";
import { cautionLine } from "../../src/sheet/plainWordsSection.ts";
import { answerFixture } from "../support/answerFixture.ts";

const facts: SheetFacts = {
  date: "1 December 2026",
  version: "0.1.0",
  fingerprint: "ab".repeat(32),
  ranges: { outcome: "Months!$B$1:$B$97", drivers: "Months!$C$1:$D$97", key: "Months!$A$1:$A$97" },
  table: null,
  settings: [["rows", "time"]],
};

describe("an answer as text for a memo", () => {
  const lines = memoOf(answerFixture, facts).split("\n");
  const under = (heading: string): string[] => {
    const start = lines.indexOf(heading) + 1;
    return lines.slice(start, lines.indexOf("", start));
  };

  it("begins with the title and the day, and ends with the caution", () => {
    expect(lines[0]).toBe(answerFixture.title);
    expect(lines[1]).toBe("1 December 2026. Made with Footing 0.1.0.");
    expect(lines.at(-1)).toBe(cautionLine);
  });

  it("says what holds for each driver before what was fitted", () => {
    const sentences = answerFixture.drivers.flatMap(({ sentence }) => sentence ?? []);
    expect(under("WHAT HOLDS")).toEqual([...sentences, answerFixture.verdict[0]]);
  });

  it("says which standard errors count, the tests behind them, and every caution", () => {
    const why = under("WHICH STANDARD ERRORS, AND WHY").join("\n");
    expect(why).toContain(answerFixture.verdict[1]);
    expect(why).toMatch(/Spread of the errors: .*, p .*, tested at 10 %\./);
    for (const caution of answerFixture.decision.cautions) expect(why).toContain(caution);
  });

  it("sets the drivers in columns as wide as what stands in them", () => {
    const table = under("DRIVERS");
    expect(table).toHaveLength(answerFixture.terms.length + 1);
    expect(table[0]).toMatch(
      /^driver +coefficient +classical +White +Newey-West +in force +ratio +p-value +low +high +conclusion$/,
    );
    const end = table[0]!.indexOf("coefficient") + "coefficient".length;
    for (const line of table.slice(1)) expect(line.slice(end - 1, end + 1)).toMatch(/^\d $/);
    expect(table.join("\n")).not.toMatch(/NaN|undefined|e-\d/);
  });

  it("says what the guards found, the most pressing first", () => {
    const found = [
      { guard: "time", finding: "worth knowing", sentences: ["One month has no row: May."] },
      { guard: "influence", finding: "nothing found", sentences: ["No single row."] },
      { guard: "breaks", finding: "look into it", sentences: ["The level changes.", "So do the slopes."] },
    ] as const;
    const guarded = memoOf({ ...answerFixture, guards: { ...answerFixture.guards, found } }, facts);
    expect(guarded).toContain(
      "\nGUARDS\nLook into it: The level changes.\nLook into it: So do the slopes.\nWorth knowing: One month has no row: May.\n\n",
    );
    const calm = memoOf({ ...answerFixture, guards: { ...answerFixture.guards, found: [found[1]] } }, facts);
    expect(calm).toContain("\nGUARDS\nNothing found.\n\n");
  });

  it("counts the rows, with the cell and the reason of those left out", () => {
    expect(under("ROWS")[0]).toBe(`${answerFixture.observations} used, 0 left out.`);
    const leftOut = Array.from({ length: 12 }, (_, index) => ({
      row: index + 2,
      cell: `Months!C${index + 2}`,
      because: "is empty",
    }));
    const many = memoOf({ ...answerFixture, leftOut, leftOutCount: 1200 }, facts);
    expect(many).toContain("1,200 left out:\n- Months!C2: is empty\n");
    expect(many).toContain("- and 1,190 more");
  });

  it("tells how to make it again", () => {
    expect(under("HOW THIS WAS MADE")).toEqual([
      "Outcome: Months!B1:B97",
      "Drivers: Months!C1:D97",
      "Time or group of each row: Months!A1:A97",
      "rows: time",
      `Fingerprint of the data (SHA-256): ${"ab".repeat(32)}`,
    ]);
  });
});
