/** Sums over long columns, each with Neumaier's compensation (1974, Z. Angew. Math. Mech. 54, 39-51). */

export function sum(values: Float64Array): number {
  let total = 0;
  let lost = 0;
  for (let i = 0; i < values.length; i++) {
    const value = values[i]!;
    const next = total + value;
    lost += Math.abs(total) >= Math.abs(value) ? total - next + value : value - next + total;
    total = next;
  }
  return total + lost;
}

export const mean = (values: Float64Array): number => sum(values) / values.length;

/** sum of (x - centre)^2. */
export function sumOfSquares(values: Float64Array, centre = 0): number {
  let total = 0;
  let lost = 0;
  for (let i = 0; i < values.length; i++) {
    const square = (values[i]! - centre) ** 2;
    const next = total + square;
    lost += total >= square ? total - next + square : square - next + total;
    total = next;
  }
  return total + lost;
}

/** sum of x_i y_i. */
export function innerProduct(x: Float64Array, y: Float64Array): number {
  let total = 0;
  let lost = 0;
  for (let i = 0; i < x.length; i++) {
    const product = x[i]! * y[i]!;
    const next = total + product;
    lost += Math.abs(total) >= Math.abs(product) ? total - next + product : product - next + total;
    total = next;
  }
  return total + lost;
}

/** The product of each pair of entries. */
export function products(x: Float64Array, y: Float64Array): Float64Array<ArrayBuffer> {
  const result = new Float64Array(x.length);
  for (let i = 0; i < x.length; i++) result[i] = x[i]! * y[i]!;
  return result;
}

/** The least and the greatest entry; of an empty column Infinity and -Infinity. */
export function extremes(values: Float64Array): { readonly least: number; readonly greatest: number } {
  let least = Infinity;
  let greatest = -Infinity;
  for (let i = 0; i < values.length; i++) {
    const value = values[i]!;
    if (value < least) least = value;
    if (value > greatest) greatest = value;
  }
  return { least, greatest };
}
