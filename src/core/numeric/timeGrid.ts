/**
 * Moves the periods of each group so far along that nothing within `reach` periods belongs to another group.
 * @param positions - whole numbers, ascending within each group.
 * @param groups - group numbers, rows of one group together; null where there is one sequence.
 * @returns strictly ascending positions from 0.
 */
export function separated(positions: Int32Array, groups: Int32Array | null, reach: number): Float64Array<ArrayBuffer> {
  const apart = new Float64Array(positions.length);
  let shift = -(positions[0] ?? 0);
  for (let i = 1; i < positions.length; i++) {
    if (groups !== null && groups[i] !== groups[i - 1]) shift = apart[i - 1]! + reach + 1 - positions[i]!;
    apart[i] = positions[i]! + shift;
  }
  return apart;
}

/** The rows whose predecessor stands one period before them. */
export function rowsWithPredecessor(positions: Float64Array): Int32Array<ArrayBuffer> {
  const rows: number[] = [];
  for (let i = 1; i < positions.length; i++) if (positions[i]! - positions[i - 1]! === 1) rows.push(i);
  return Int32Array.from(rows);
}

/** The values on a grid with a place for every period, zeros where there is no row; themselves where none is missing. */
export function onGrid(values: Float64Array, positions: Float64Array): Float64Array {
  if (positions.at(-1) === positions.length - 1) return values;
  const grid = new Float64Array((positions.at(-1) ?? -1) + 1);
  for (let i = 0; i < values.length; i++) grid[positions[i]!] = values[i]!;
  return grid;
}

/** For each lag 0..most the sum of the products of values that many periods apart. */
export function laggedProducts(grid: Float64Array, most: number): Float64Array<ArrayBuffer> {
  return Float64Array.from({ length: most + 1 }, (_, lag) => {
    let sum = 0;
    for (let i = lag; i < grid.length; i++) sum += grid[i]! * grid[i - lag]!;
    return sum;
  });
}

/** The sequence with the most rows, and how many periods the widest sequence spans, gaps counted. */
export interface Extent {
  readonly rows: number;
  readonly span: number;
}

/** The extent of the groups, or of the whole where there are none. */
export function extentOf(positions: Int32Array, groups: Int32Array | null): Extent {
  let rows = 0;
  let span = 0;
  for (let i = 0, start = 0; i < positions.length; i++) {
    if (groups !== null && groups[i] !== groups[start]) start = i;
    rows = Math.max(rows, i - start + 1);
    span = Math.max(span, positions[i]! - positions[start]! + 1);
  }
  return { rows, span };
}
