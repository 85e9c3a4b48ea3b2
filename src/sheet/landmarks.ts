import type { Area, SheetPlan } from "./plan.ts";

/**
 * A place on a sheet that goes by a name: screen readers announce the headings of a table at each of its cells, and a
 * section is reached by name from the keyboard.
 */
export type Landmark =
  | { readonly kind: "section"; readonly name: string; readonly area: Area }
  /** Headings in its first row, names of its rows in its first column. */
  | { readonly kind: "table"; readonly area: Area };

/** Sections and tables from the top of the page down. */
export function landmarksOf({ blocks, formats }: SheetPlan): readonly Landmark[] {
  const headings = formats.filter(({ style }) => style === "heading" || style === "banner");
  const digits = String(headings.length).length;
  const sections = headings.map(({ area }, index): Landmark => {
    const number = String(index + 1).padStart(digits, "0");
    return { kind: "section", name: `Section_${number}_${nameFrom(textAt(blocks, area))}`, area };
  });
  const tables = formats.flatMap(({ area, heads = 0 }): Landmark[] =>
    heads === 0 ? [] : [{ kind: "table", area: { ...area, rows: heads + 1 } }],
  );
  return [...sections, ...tables].toSorted((one, other) => one.area.row - other.area.row);
}

function textAt(blocks: SheetPlan["blocks"], { row, column }: Area): string {
  const cells = blocks.map((block) => block.cells[row - block.row]?.[column - block.column]);
  return cells.map((cell) => (cell?.kind === "text" ? cell.text : "")).join("");
}

/** Excel's limit is 255 characters for the whole name. */
const longestName = 200;

/** The words before the first comma, with what no name may hold taken out: "Which standard errors, and why". */
const nameFrom = (heading: string): string =>
  heading
    .replace(/,.*$/, "")
    .replaceAll(/[^\p{L}\p{N}]+/gu, "_")
    .replaceAll(/^_|_$/g, "")
    .slice(0, longestName);
