import { describe, expect, it } from "vitest";
import { analyse } from "../../src/core/answer/analyse.ts";
import type { Answer } from "../../src/core/answer/answer.ts";
import { defaultOptions } from "../../src/core/answer/options.ts";
import { planAnswer } from "../../src/sheet/answerSheet.ts";
import { askedSection } from "../../src/sheet/askedSection.ts";
import type { SheetFacts } from "../../src/sheet/facts.ts";
import { memoOf } from "../../src/sheet/memo.ts";
import type { PlanCell } from "../../src/sheet/plan.ts";
import { monthsQuestion } from "../support/answersOfMonths.ts";

function answerTo(asked: Partial<typeof defaultOptions>): Answer {
  const answer = analyse({ ...monthsQuestion, options: { ...defaultOptions, ...asked } }, () => undefined);
  if (!answer.ok) throw new Error(answer.problem.code);
  return answer.value;
}

const asked = answerTo({ estimates: ["Price + Rain = 2", "Rain > 0"], jointTest: ["Price = 0", "Rain = Price"] });
const nothing = answerTo({});

const facts: SheetFacts = {
  date: "1 December 2026",
  version: "0.1.0",
  fingerprint: "ab".repeat(32),
  ranges: { outcome: "Months!$B$1:$B$49", drivers: "Months!$C$1:$D$49", key: null },
  table: null,
  settings: [],
};

const valueOf = (cell: PlanCell): string | number | null => {
  if (cell === null) return null;
  return cell.kind === "number" ? cell.number : cell.kind === "text" ? cell.text : cell.formula;
};
const valuesOf = (rows: readonly (readonly PlanCell[])[]) => rows.map((row) => row.map(valueOf));

const heading = "Asked of the coefficients, when this sheet was made";

describe("the figures of what was asked, on a result sheet", () => {
  it("stand one line a number, then the equations under each kind", () => {
    const rows = valuesOf(askedSection(asked).rows);
    expect(rows[0]).toEqual([heading]);
    const { value, standardError, ratio, pValue, low, high } = asked.estimates[0]!.estimate!;
    expect(rows[2]).toEqual(["Price + Rain = 2", value, standardError, ratio, pValue, low, high, 2]);
    expect(rows[3]!.at(-1)).toBe("above 0 (one-sided)");
    expect(rows[4]).toEqual(["Tested together: Price = 0 and Rain = Price"]);
    expect(rows.slice(6).map(([kind]) => String(kind).replace(" (in force)", ""))).toEqual([
      "classical",
      "White",
      "Newey-West",
    ]);
  });

  it("show as many digits as the standard error bears, and words where words stand", () => {
    const { rows, formats } = askedSection(asked);
    const at = (row: number, column: number) =>
      formats.find(({ area, style }) => area.row === row && area.column === column && style === undefined);
    expect(at(2, 1)).toMatchObject({ align: "right", numberFormat: at(2, 2)!.numberFormat });
    expect(at(2, 4)!.numberFormat).toContain("< 0.0001");
    expect(at(2, 7)).toMatchObject({ align: "left" });
    for (const { area } of formats) expect(area.row + area.rows).toBeLessThanOrEqual(rows.length);
  });

  it.each(["kept", "live"] as const)(
    "come after the drivers on a %s sheet, and move the charts down with them",
    (kind) => {
      const [plan, without] = [planAnswer(asked, facts, kind), planAnswer(nothing, facts, kind)];
      const first = (cells: readonly (readonly PlanCell[])[], text: string): number =>
        cells.findIndex(([cell]) => cell !== undefined && valueOf(cell) === text);
      const page = plan.blocks[0]!.cells;
      const places = ["Drivers", heading, "Pictures, when this sheet was made", "Evidence"].map((text) =>
        first(page, text),
      );
      expect(places).toEqual(places.toSorted((a, b) => a - b));
      expect(places).not.toContain(-1);
      expect(plan.charts.map(({ place }) => place.row)).toEqual(plan.charts.map(() => places[2]! + 1));
      const bare = without.blocks[0]!.cells;
      expect(first(bare, heading)).toBe(-1);
      expect(first(bare, "Pictures, when this sheet was made")).toBe(first(bare, "Drivers") + 6);
    },
  );
});

describe("what was asked, in the text for a memo", () => {
  const linesOf = (answer: Answer): string[] => {
    const lines = memoOf(answer, facts).split("\n");
    const start = lines.indexOf("ASKED OF THE COEFFICIENTS");
    return start < 0 ? [] : lines.slice(start + 1, lines.indexOf("", start));
  };

  it("is a sentence each, then the figures in columns", () => {
    const lines = linesOf(asked);
    expect(lines).toHaveLength(6);
    for (const sentence of lines.slice(0, 3)) expect(asked.verdict).toContain(sentence);
    expect(lines[3]).toMatch(/^asked for +estimate +standard error +ratio +p-value +low +high +held against$/);
    expect(lines[4]).toMatch(/^Price \+ Rain = 2 .* 2$/);
    expect(lines[5]).toMatch(/^Rain > 0 .*above 0 \(one-sided\)$/);
  });

  it("is not there where nothing was asked, and has no table where only equations were", () => {
    expect(linesOf(nothing)).toEqual([]);
    expect(linesOf(answerTo({ jointTest: ["Price = 0"] }))).toHaveLength(1);
  });
});
