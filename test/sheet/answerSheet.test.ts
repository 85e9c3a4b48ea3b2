import { describe, expect, it } from "vitest";
import { analyse } from "../../src/core/answer/analyse.ts";
import type { Answer } from "../../src/core/answer/answer.ts";
import { defaultOptions } from "../../src/core/answer/options.ts";
import type { Question } from "../../src/core/answer/question.ts";
import { sheetFactsOf } from "../../src/app/sheetFacts.ts";
import { planAnswer } from "../../src/sheet/answerSheet.ts";
import type { Area, PlanBlock, SheetPlan } from "../../src/sheet/plan.ts";
import { toCellColumn } from "../support/cellColumns.ts";

const rowCount = 36;
/** Invented: a wave with a little of the driver in it. */
const driver = Array.from({ length: rowCount }, (_, row) => 20 + 7 * Math.sin(row * 1.7) + row * 0.31);
const other = Array.from({ length: rowCount }, (_, row) => 5 + 3 * Math.cos(row * 2.3));
const outcome = driver.map((value, row) => 100 + 1.25 * value - 0.5 * other[row]! + 4 * Math.sin(row * 0.9 + 1));

const heading = '=HYPERLINK("x")';

function question(leftOut: readonly number[] = []): Question {
  const column = (name: string, values: readonly (number | null)[], at: number) => ({
    name,
    place: { kind: "sheet", sheet: "My data", column: at, firstRow: 3 } as const,
    cells: toCellColumn(values),
  });
  const gaps = outcome.map((value, row) => (leftOut.includes(row) ? null : value));
  return {
    source: { rowCount, columns: [column(heading, gaps, 1), column("Price", driver, 2), column("Other", other, 4)] },
    model: {
      outcome: { column: heading, transform: { kind: "none" } },
      drivers: ["Price", "Other"].map((name) => ({
        column: name,
        as: "number",
        base: null,
        transform: { kind: "none" },
      })),
      calendar: [],
      rows: { kind: "time", order: null },
      constant: true,
      textNumbers: [],
    },
    options: { ...defaultOptions, policy: "textbook" },
  };
}

function answered(asked: Question): Answer {
  const answer = analyse(asked, () => undefined);
  if (!answer.ok) throw new Error(answer.problem.code);
  return answer.value;
}

const made = { date: "1 December 2026", version: "0.0.0", fingerprint: "ab".repeat(32), headingRow: 2, table: null };

const planOf = (kind: "live" | "kept", leftOut: readonly number[] = []): SheetPlan => {
  const asked = question(leftOut);
  return planAnswer(answered(asked), sheetFactsOf(asked, made), kind);
};

const areaOf = ({ row, column, cells }: PlanBlock): Area => ({
  row,
  column,
  rows: cells.length,
  columns: cells[0]?.length ?? 0,
});

const overlap = (a: Area, b: Area): boolean =>
  a.row < b.row + b.rows &&
  b.row < a.row + a.rows &&
  a.column < b.column + b.columns &&
  b.column < a.column + a.columns;

const textsOf = (plan: SheetPlan): string[] =>
  plan.blocks.flatMap(({ cells }) => cells.flat()).flatMap((cell) => (cell?.kind === "text" ? [cell.text] : []));

const formulasOf = (plan: SheetPlan): string[] =>
  plan.blocks.flatMap(({ cells }) => cells.flat()).flatMap((cell) => (cell?.kind === "formula" ? [cell.formula] : []));

describe.each(["kept", "live"] as const)("a %s sheet", (kind) => {
  const plan = planOf(kind, [4, 9]);

  it("is made of rectangles that do not overlap", () => {
    for (const { cells } of plan.blocks) expect(new Set(cells.map((row) => row.length)).size).toBe(1);
    const areas = plan.blocks.map(areaOf);
    areas.forEach((area, index) => expect(areas.slice(index + 1).filter((later) => overlap(area, later))).toEqual([]));
  });

  it("has the seven parts in their order", () => {
    const texts = textsOf(plan);
    const parts = [
      "In plain words",
      "Which standard errors, and why",
      "Drivers",
      "Pictures, when this sheet was made",
      "Evidence",
      "Guards, when this sheet was made",
      "How this was made",
    ];
    const places = parts.map((part) => texts.indexOf(part));
    expect(places).not.toContain(-1);
    expect(places).toEqual(places.toSorted((a, b) => a - b));
    expect(texts[0]).toBe(`${heading} explained by Price and Other`);
  });

  it("never executes text from the data", () => {
    expect(formulasOf(plan).filter((formula) => formula.includes("HYPERLINK"))).toEqual([]);
  });

  it("draws its charts from cells that it writes", () => {
    const series = plan.charts.flatMap((chart) => chart.series);
    // The tested value, three kinds and two names of drivers; then residuals over fitted values and through time.
    expect(plan.charts.map((chart) => chart.series.length)).toEqual([6, 1, 1]);
    const written = plan.blocks.map(areaOf);
    const inside = (area: Area): boolean =>
      written.some(
        (block) =>
          area.row >= block.row &&
          area.row + area.rows <= block.row + block.rows &&
          area.column >= block.column &&
          area.column < block.column + block.columns,
      );
    for (const { x, y } of series) expect([inside(x), inside(y), x.rows]).toEqual([true, true, y.rows]);
    expect(
      plan.charts.some((one, index) => plan.charts.slice(index + 1).some((next) => overlap(one.place, next.place))),
    ).toBe(false);
  });

  it("names ranges, rows left out with links, settings, fingerprint and version", () => {
    const texts = textsOf(plan);
    expect(texts).toContain("'My data'!$B$3:$B$39");
    expect(texts).toContain("'My data'!$C$3:$E$39");
    expect(texts).toContain(made.fingerprint);
    expect(texts).toContain("textbook");
    expect(texts).toContain("1, 3");
    expect(plan.links.map(({ target }) => target)).toEqual(expect.arrayContaining(["'My data'!B8", "'My data'!B13"]));
  });

  it("has a name that Excel takes", () => {
    expect(plan.name.length).toBeLessThanOrEqual(28);
    expect(plan.name).not.toMatch(/[\\/?*[\]:']/);
  });
});

describe("a live sheet", () => {
  const plan = planOf("live");

  it("makes four large calls over the source ranges and the settings that stand on it", () => {
    const calls = formulasOf(plan).filter((formula) => formula.includes("FOOTING."));
    expect(calls.map((call) => /FOOTING\.(\w+)/.exec(call)?.[1])).toEqual(["ANSWER", "EVIDENCE", "VERDICT", "CHOICE"]);
    const settings = /\$A\$(\d+):\$B\$(\d+)/.exec(calls[0]!)!;
    const [page] = plan.blocks;
    const rows = page!.cells.slice(Number(settings[1]) - 1, Number(settings[2]));
    const pairs = rows.map((row) => row.slice(0, 2).map((cell) => (cell?.kind === "text" ? cell.text : null)));
    expect(pairs).toEqual([
      ["rows", "time"],
      ["policy", "textbook"],
      ["columns", "1, 3"],
    ]);
  });

  it("shows the same as a kept one: a figure where that has a figure", () => {
    const [live, kept] = [plan.blocks[0]!.cells, planOf("kept").blocks[0]!.cells];
    const row = (cells: typeof live, label: string): number =>
      cells.findIndex(([first]) => first?.kind === "text" && first.text === label);
    const [liveDrivers, keptDrivers] = [row(live, "Drivers"), row(kept, "Drivers")];
    for (let down = 2; down < 5; down++) {
      const filled = (cells: typeof live, start: number): boolean[] =>
        cells[start + down]!.map((cell) => cell !== null);
      expect(filled(live, liveDrivers)).toEqual(filled(kept, keptDrivers));
    }
  });
});

describe("the four cases of a kind that was fixed by hand", () => {
  const asked = question();
  const fixed = { ...asked, options: { ...asked.options, fixed: { errors: "classical", reason: "as ever" } as const } };

  it.each(["live", "kept"] as const)("mark what the tests point at, not what is in force: %s", (kind) => {
    const textOf = (one: Question): string =>
      JSON.stringify(planAnswer(answered(one), sheetFactsOf(one, made), kind).blocks);
    expect(textOf(asked)).toContain("▶ Newey-West (in force)");
    expect(answered(fixed).decision.called.errors.kind).toBe("newey-west");
    expect(textOf(fixed)).toContain("▶ Newey-West (the tests point here)");
    expect(textOf(fixed)).not.toContain("(in force)");
  });
});
