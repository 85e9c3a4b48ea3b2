import type { PlanStyle } from "../sheet/plan.ts";

/** How a style looks; what is not said stays as the workbook's own theme has it. */
interface Look {
  readonly bold?: boolean;
  readonly italic?: boolean;
  /** In points. */
  readonly size?: number;
  readonly color?: string;
  readonly fill?: string;
  /** Colour of a thin line above, and of one below. */
  readonly above?: string;
  readonly below?: string;
  readonly vertical?: "Top" | "Center";
}

const ink = "#1F2937";
const quiet = "#4B5563";
const line = "#9CA3AF";

/** Text on its fill keeps a contrast of 7 to 1 or more. */
const looks: Readonly<Record<PlanStyle, Look>> = {
  title: { bold: true, size: 16, color: ink },
  banner: { bold: true, color: ink, fill: "#DBEAFE" },
  heading: { bold: true, size: 12, color: ink, above: line },
  "table heading": { bold: true, color: ink, fill: "#F3F4F6", below: line, vertical: "Top" },
  label: { color: quiet, vertical: "Top" },
  note: { italic: true, color: quiet, vertical: "Top" },
  sentence: { color: ink, vertical: "Top" },
  "in force": { bold: true, color: ink, fill: "#DBEAFE" },
  caution: { color: "#78350F", fill: "#FEF3C7", vertical: "Top" },
  "to fill in": { below: line },
};

export function dress(range: Excel.Range, style: PlanStyle): void {
  const { bold, italic, size, color, fill, above, below, vertical } = looks[style];
  const { font } = range.format;
  if (bold !== undefined) font.bold = bold;
  if (italic !== undefined) font.italic = italic;
  if (size !== undefined) font.size = size;
  if (color !== undefined) font.color = color;
  if (fill !== undefined) range.format.fill.color = fill;
  if (vertical !== undefined) range.format.verticalAlignment = vertical;
  if (above !== undefined) rule(range, "EdgeTop", above);
  if (below !== undefined) rule(range, "EdgeBottom", below);
}

function rule(range: Excel.Range, edge: "EdgeTop" | "EdgeBottom", color: string): void {
  const border = range.format.borders.getItem(edge);
  border.style = "Continuous";
  border.color = color;
}
