import type { FormatWindow } from "../core/review/book.ts";

/** The formats of some rows, each different one kept once. */
export function formatWindow(numberFormat: readonly (readonly string[])[], firstRow: number): FormatWindow {
  const width = numberFormat[0]?.length ?? 0;
  const known = new Map<string, number>();
  const indices = new Uint16Array(numberFormat.length * width);
  numberFormat.forEach((line, row) =>
    line.forEach((format, column) => {
      const index = known.get(format) ?? known.size;
      known.set(format, index);
      indices[row * width + column] = index;
    }),
  );
  return { firstRow, rowCount: numberFormat.length, indices, formats: [...known.keys()] };
}
