import { type Cell, type CellColumn, cellKind } from "../../src/core/table/cells.ts";

/** Cells as a sheet lists them, brought into column form. */
export function toCellColumn(cells: readonly Cell[]): CellColumn {
  const kinds = new Uint8Array(cells.length);
  const numbers = new Float64Array(cells.length);
  const texts: string[] = [];
  const known = new Map<string, number>();
  const indexOf = (text: string): number => {
    const index = known.get(text) ?? texts.push(text) - 1;
    known.set(text, index);
    return index;
  };
  cells.forEach((cell, row) => {
    const [kind, number] = encode(cell, indexOf);
    kinds[row] = kind;
    numbers[row] = number;
  });
  return { kinds, numbers, texts };
}

function encode(cell: Cell, indexOf: (text: string) => number): readonly [number, number] {
  if (cell === null || cell === "") return [cellKind.blank, 0];
  if (typeof cell === "number") return [cellKind.number, cell];
  if (typeof cell === "boolean") return [cellKind.boolean, cell ? 1 : 0];
  if (typeof cell === "string") return [cellKind.text, indexOf(cell)];
  return "date" in cell ? [cellKind.date, cell.date] : [cellKind.error, indexOf(cell.error)];
}
