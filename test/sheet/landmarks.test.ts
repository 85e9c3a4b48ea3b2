import { describe, expect, it } from "vitest";
import { type Landmark, landmarksOf } from "../../src/sheet/landmarks.ts";
import type { SheetPlan } from "../../src/sheet/plan.ts";
import { planReview } from "../../src/sheet/reviewSheet.ts";
import { planSample } from "../../src/sheet/sample/sampleSheet.ts";
import { bookReviewFixture } from "../support/reviewFixture.ts";

const facts = { date: "1 December 2026", version: "0.0.0", fingerprints: ["ab".repeat(32), "cd".repeat(32)] };
const review = planReview(bookReviewFixture, facts);

const sectionsOf = (plan: SheetPlan): string[] =>
  landmarksOf(plan).flatMap((landmark) => (landmark.kind === "section" ? [landmark.name] : []));

const textsIn = ({ blocks }: SheetPlan, { area }: Landmark): string[] =>
  blocks[0]!.cells
    .slice(area.row, area.row + area.rows)
    .map(([cell]) => (cell?.kind === "text" ? cell.text : String(cell?.kind)));

const plain = (name: string): SheetPlan => ({
  name: "Sheet",
  blocks: [{ row: 3, column: 0, cells: [[{ kind: "text", text: name }]] }],
  formats: [{ area: { row: 3, column: 0, rows: 1, columns: 4 }, style: "heading" }],
  links: [],
  columnWidths: [],
  frozenRows: 0,
  charts: [],
  printArea: null,
});

describe("landmarks of a review", () => {
  it("name each regression and each heading below it, in the order of the page", () => {
    const sections = sectionsOf(review);
    expect(sections.map((name) => name.slice(0, 11))).toEqual(
      sections.map((_, index) => `Section_${String(index + 1).padStart(2, "0")}_`),
    );
    const regressions = sections.filter((name) => name.includes("_explained_by_"));
    expect(regressions).toHaveLength(bookReviewFixture.claims.length);
    expect(sections.indexOf(regressions[0]!)).toBe(0);
    expect(new Set(sections).size).toBe(sections.length);
  });

  it("hold each table from its headings to the last of its rows", () => {
    const tables = landmarksOf(review).filter(({ kind }) => kind === "table");
    expect(tables.length).toBeGreaterThan(1);
    for (const table of tables) {
      const [heading, ...names] = textsIn(review, table);
      expect(["Number", "Driver"]).toContain(heading);
      expect(names).not.toContain("undefined");
      expect(
        textsIn(review, { ...table, area: { ...table.area, row: table.area.row + table.area.rows, rows: 1 } }),
      ).toEqual(["undefined"]);
    }
  });
});

describe("names of sections", () => {
  it("hold letters and digits of any script, up to the first comma", () => {
    expect(sectionsOf(plain("Which standard errors, and why"))).toEqual(["Section_1_Which_standard_errors"]);
    expect(sectionsOf(plain('Ремонты: "цена" (2024)'))).toEqual(["Section_1_Ремонты_цена_2024"]);
    expect(sectionsOf(plain("=A1 & 料金 "))).toEqual(["Section_1_A1_料金"]);
  });

  it("stay within Excel's limit", () => {
    expect(sectionsOf(plain("long ".repeat(80)))[0]!.length).toBeLessThan(256);
  });

  it("are none on a sheet of data", () => {
    expect(landmarksOf(planSample())).toEqual([]);
  });
});
