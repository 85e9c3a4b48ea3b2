/** Texts in columns, the first flush left and the others flush right, two blanks apart. */
export function alignedLines(rows: readonly (readonly string[])[]): string[] {
  const widths = (rows[0] ?? []).map((_, column) => Math.max(...rows.map((row) => (row[column] ?? "").length)));
  return rows.map((row) =>
    row
      .map((value, column) => (column === 0 ? value.padEnd(widths[column] ?? 0) : value.padStart(widths[column] ?? 0)))
      .join("  ")
      .trimEnd(),
  );
}
