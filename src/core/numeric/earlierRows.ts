/** Where rows stand in time: whole periods that ascend, within each group where there are groups (whose rows stand together). */
export interface TimeLine {
  readonly positions: Int32Array;
  readonly groups: Int32Array | null;
}

/**
 * For each row the row `lag` periods before it, in the same group; -1 where that period has no row.
 * @param lag - whole number of periods, at least 0.
 */
export function earlierRows({ positions, groups }: TimeLine, lag: number): Int32Array<ArrayBuffer> {
  const earlier = new Int32Array(positions.length).fill(-1);
  let candidate = 0;
  for (let row = 0; row < positions.length; row++) {
    const wanted = positions[row]! - lag;
    if (groups !== null && groups[candidate] !== groups[row]) candidate = firstOfGroup(groups, row, candidate);
    while (candidate < row && positions[candidate]! < wanted) candidate += 1;
    if (positions[candidate] === wanted) earlier[row] = candidate;
  }
  return earlier;
}

function firstOfGroup(groups: Int32Array, row: number, from: number): number {
  let first = from;
  while (groups[first] !== groups[row]) first += 1;
  return first;
}

/** The values of the rows that `rows` names, 0 where it names none. */
export function valuesAt(values: Float64Array, rows: Int32Array): Float64Array<ArrayBuffer> {
  const found = new Float64Array(rows.length);
  for (let i = 0; i < rows.length; i++) {
    const row = rows[i]!;
    found[i] = row < 0 ? 0 : values[row]!;
  }
  return found;
}
