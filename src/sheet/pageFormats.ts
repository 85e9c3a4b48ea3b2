import { page } from "./columns.ts";
import type { PlanFormat } from "./plan.ts";

/** Rows in one style from the first column of the page to its last. */
export const acrossPage = (row: number, style: NonNullable<PlanFormat["style"]>, rows = 1): PlanFormat => ({
  area: { row, column: page.first, rows, columns: page.columns },
  style,
});

export const headingFormat = (row: number): PlanFormat => acrossPage(row, "heading");
