import { type Area, type PlanFormat, type SheetPlan } from "../plan.ts";
import { number, text } from "../section.ts";
import { type Month, monthlyRepairs } from "./months.ts";

interface SampleColumn {
  readonly heading: string;
  readonly value: (month: Month) => number;
  readonly numberFormat: string;
  readonly width: number;
}

const columns: readonly SampleColumn[] = [
  { heading: "Month", value: ({ month }) => month, numberFormat: "mmm yyyy", width: 14 },
  { heading: "Repairs", value: ({ repairs }) => repairs, numberFormat: "#,##0", width: 13 },
  { heading: "Price index", value: ({ priceIndex }) => priceIndex, numberFormat: "0.0", width: 15 },
  { heading: "Advertising", value: ({ advertising }) => advertising, numberFormat: "0.0", width: 15 },
  { heading: "Rainy days", value: ({ rainyDays }) => rainyDays, numberFormat: "0", width: 14 },
];

/** Where the headings stand; the title, a note and a blank row are above. */
const headingRow = 3;
const months = monthlyRepairs();

/** The headings and all rows below them. */
export const sampleArea: Area = { row: headingRow, column: 0, rows: months.length + 1, columns: columns.length };

/** Invented months of a chain of bicycle-repair shops that does not exist, to try things on. */
export function planSample(): SheetPlan {
  const { rows } = sampleArea;
  return {
    name: "Sample months",
    holds: "data",
    blocks: [
      {
        row: 0,
        column: 0,
        cells: [
          [text("Kestrel & Vane: repairs by month")],
          [text("Invented figures, to try Footing on. Price index: 2014 = 100. Advertising in thousands.")],
          [],
          columns.map(({ heading }) => text(heading)),
          ...months.map((month) => columns.map(({ value }) => number(value(month)))),
        ],
      },
    ],
    formats: [
      { area: { row: 0, column: 0, rows: 1, columns: 1 }, style: "title", rowHeight: 24 },
      { area: { row: 1, column: 0, rows: 1, columns: 1 }, style: "note" },
      { area: { row: headingRow, column: 0, rows: 1, columns: columns.length }, style: "table heading" },
      { area: { row: headingRow, column: 1, rows: 1, columns: columns.length - 1 }, align: "right" },
      ...columns.map(({ numberFormat }, column): PlanFormat => ({
        area: { row: headingRow + 1, column, rows: rows - 1, columns: 1 },
        numberFormat,
      })),
    ],
    links: [],
    columnWidths: columns.map(({ width }) => width),
    frozenRows: headingRow + 1,
    charts: [],
    printArea: null,
  };
}
