/**
 * The innermost loops on pairs of doubles, in AssemblyScript. Addresses are in bytes; columns lie `stride` rows apart.
 * Rows are taken two at a time: where their number is odd, the row after the last holds zeros.
 * What each does is said in kernels.ts; scalar.ts does the same without vectors.
 */
const pair: usize = 16;

// @ts-ignore: decorator
@inline
function total(x: v128): f64 {
  return f64x2.extract_lane(x, 0) + f64x2.extract_lane(x, 1);
}

// @ts-ignore: decorator
@inline
function bytes(rows: i32): usize {
  return ((<usize>rows + 1) & ~1) << 3;
}

export function reflectRows(triangle: usize, block: usize, size: i32, rows: i32, stride: i32): void {
  const step = <usize>stride << 3;
  const length = bytes(rows);
  for (let j = 0; j < size; j++) {
    const v = block + <usize>j * step;
    let squares = f64x2.splat(0);
    for (let i: usize = 0; i < length; i += pair) {
      const x = v128.load(v + i);
      squares = f64x2.add(squares, f64x2.mul(x, x));
    }
    const square = total(squares);
    if (square == 0) continue;
    const at = triangle + (<usize>(j * size + j) << 3);
    const diagonal = load<f64>(at);
    const norm = Math.sqrt(square + diagonal * diagonal);
    const image = diagonal > 0 ? -norm : norm;
    const head = diagonal - image;
    const factor = 1 / (image * head);
    store<f64>(at, image);
    let c = j + 1;
    for (; c + 3 < size; c += 4) {
      applyToFour(at + (<usize>(c - j) << 3), v, block + <usize>c * step, length, step, head, factor);
    }
    for (; c < size; c++) applyToOne(at + (<usize>(c - j) << 3), v, block + <usize>c * step, length, head, factor);
  }
}

function applyToOne(top: usize, v: usize, x: usize, length: usize, head: f64, factor: f64): void {
  let products = f64x2.splat(0);
  for (let i: usize = 0; i < length; i += pair) {
    products = f64x2.add(products, f64x2.mul(v128.load(v + i), v128.load(x + i)));
  }
  const dot = (total(products) + head * load<f64>(top)) * factor;
  store<f64>(top, load<f64>(top) + dot * head);
  const both = f64x2.splat(dot);
  for (let i: usize = 0; i < length; i += pair) {
    v128.store(x + i, f64x2.add(v128.load(x + i), f64x2.mul(both, v128.load(v + i))));
  }
}

function applyToFour(top: usize, v: usize, x0: usize, length: usize, step: usize, head: f64, factor: f64): void {
  const x1 = x0 + step;
  const x2 = x1 + step;
  const x3 = x2 + step;
  let s0 = f64x2.splat(0);
  let s1 = s0;
  let s2 = s0;
  let s3 = s0;
  for (let i: usize = 0; i < length; i += pair) {
    const value = v128.load(v + i);
    s0 = f64x2.add(s0, f64x2.mul(value, v128.load(x0 + i)));
    s1 = f64x2.add(s1, f64x2.mul(value, v128.load(x1 + i)));
    s2 = f64x2.add(s2, f64x2.mul(value, v128.load(x2 + i)));
    s3 = f64x2.add(s3, f64x2.mul(value, v128.load(x3 + i)));
  }
  const dot0 = (total(s0) + head * load<f64>(top)) * factor;
  const dot1 = (total(s1) + head * load<f64>(top, 8)) * factor;
  const dot2 = (total(s2) + head * load<f64>(top, 16)) * factor;
  const dot3 = (total(s3) + head * load<f64>(top, 24)) * factor;
  store<f64>(top, load<f64>(top) + dot0 * head);
  store<f64>(top, load<f64>(top, 8) + dot1 * head, 8);
  store<f64>(top, load<f64>(top, 16) + dot2 * head, 16);
  store<f64>(top, load<f64>(top, 24) + dot3 * head, 24);
  s0 = f64x2.splat(dot0);
  s1 = f64x2.splat(dot1);
  s2 = f64x2.splat(dot2);
  s3 = f64x2.splat(dot3);
  for (let i: usize = 0; i < length; i += pair) {
    const value = v128.load(v + i);
    v128.store(x0 + i, f64x2.add(v128.load(x0 + i), f64x2.mul(s0, value)));
    v128.store(x1 + i, f64x2.add(v128.load(x1 + i), f64x2.mul(s1, value)));
    v128.store(x2 + i, f64x2.add(v128.load(x2 + i), f64x2.mul(s2, value)));
    v128.store(x3 + i, f64x2.add(v128.load(x3 + i), f64x2.mul(s3, value)));
  }
}

export function substitute(triangle: usize, block: usize, size: i32, rows: i32, stride: i32): void {
  const step = <usize>stride << 3;
  const line = <usize>size << 3;
  const length = bytes(rows);
  for (let j = 0; j < size; j++) {
    const to = block + <usize>j * step;
    const above = triangle + (<usize>j << 3);
    let i = 0;
    for (; i + 3 < j; i += 4) subtractFour(to, block + <usize>i * step, step, above + <usize>i * line, line, length);
    for (; i < j; i++) {
      const factor = f64x2.splat(load<f64>(above + <usize>i * line));
      const from = block + <usize>i * step;
      for (let t: usize = 0; t < length; t += pair) {
        v128.store(to + t, f64x2.sub(v128.load(to + t), f64x2.mul(factor, v128.load(from + t))));
      }
    }
    const divisor = f64x2.splat(load<f64>(above + <usize>j * line));
    for (let t: usize = 0; t < length; t += pair) v128.store(to + t, f64x2.div(v128.load(to + t), divisor));
  }
}

function subtractFour(to: usize, q0: usize, step: usize, above: usize, line: usize, length: usize): void {
  const q1 = q0 + step;
  const q2 = q1 + step;
  const q3 = q2 + step;
  const r0 = f64x2.splat(load<f64>(above));
  const r1 = f64x2.splat(load<f64>(above + line));
  const r2 = f64x2.splat(load<f64>(above + 2 * line));
  const r3 = f64x2.splat(load<f64>(above + 3 * line));
  for (let t: usize = 0; t < length; t += pair) {
    let sum = f64x2.mul(r0, v128.load(q0 + t));
    sum = f64x2.add(sum, f64x2.mul(r1, v128.load(q1 + t)));
    sum = f64x2.add(sum, f64x2.mul(r2, v128.load(q2 + t)));
    sum = f64x2.add(sum, f64x2.mul(r3, v128.load(q3 + t)));
    v128.store(to + t, f64x2.sub(v128.load(to + t), sum));
  }
}

export function addProducts(left: usize, count: i32, right: usize, next: usize, rows: i32, stride: i32, sums: usize, nextSums: usize): void {
  const step = <usize>stride << 3;
  const length = bytes(rows);
  for (let l = 0; l < count; l += 2) {
    const x0 = left + <usize>l * step;
    const x1 = l + 1 < count ? x0 + step : x0;
    let s00 = f64x2.splat(0);
    let s10 = s00;
    let s01 = s00;
    let s11 = s00;
    for (let i: usize = 0; i < length; i += pair) {
      const left0 = v128.load(x0 + i);
      const left1 = v128.load(x1 + i);
      const right0 = v128.load(right + i);
      const right1 = v128.load(next + i);
      s00 = f64x2.add(s00, f64x2.mul(left0, right0));
      s10 = f64x2.add(s10, f64x2.mul(left1, right0));
      s01 = f64x2.add(s01, f64x2.mul(left0, right1));
      s11 = f64x2.add(s11, f64x2.mul(left1, right1));
    }
    const at = <usize>l << 3;
    const twice = l + 1 < count;
    store<f64>(sums + at, load<f64>(sums + at) + total(s00));
    if (twice) store<f64>(sums + at, load<f64>(sums + at, 8) + total(s10), 8);
    if (next == right) continue;
    store<f64>(nextSums + at, load<f64>(nextSums + at) + total(s01));
    if (twice) store<f64>(nextSums + at, load<f64>(nextSums + at, 8) + total(s11), 8);
  }
}

export function multiply(x: usize, y: usize, product: usize, rows: i32): void {
  const length = bytes(rows);
  for (let i: usize = 0; i < length; i += pair) v128.store(product + i, f64x2.mul(v128.load(x + i), v128.load(y + i)));
}

export function addSquares(block: usize, size: i32, rows: i32, stride: i32, sums: usize): void {
  const step = <usize>stride << 3;
  const length = bytes(rows);
  for (let j = 0; j < size; j++) {
    const x = block + <usize>j * step;
    for (let i: usize = 0; i < length; i += pair) {
      const value = v128.load(x + i);
      v128.store(sums + i, f64x2.add(v128.load(sums + i), f64x2.mul(value, value)));
    }
  }
}

export function rotateRows(triangle: usize, floors: usize, block: usize, size: i32, rows: i32, raised: usize): void {
  const step = <usize>(size + 1) << 3;
  for (let i = 0; i < rows; i++) {
    const row = block + <usize>i * step;
    store<f64>(raised + (<usize>i << 3), rotateRow(triangle, floors, row, size) ? 1 : 0);
  }
}

function rotateRow(triangle: usize, floors: usize, row: usize, size: i32): bool {
  const step = <usize>(size + 1) << 3;
  for (let j = 0; j < size; j++) {
    const here = <usize>j << 3;
    const x = load<f64>(row + here);
    const above = triangle + <usize>j * step;
    const pivot = load<f64>(above + here);
    if (pivot == 0) {
      if (Math.abs(x) <= load<f64>(floors + here)) continue;
      // A positive pivot keeps every cosine positive, and with them the sign of the residuals.
      const sign: f64 = x < 0 ? -1 : 1;
      for (let l = here; l < step; l += 8) store<f64>(above + l, sign * load<f64>(row + l));
      return true;
    }
    if (x == 0) continue;
    const length = Math.sqrt(pivot * pivot + x * x);
    store<f64>(above + here, length);
    rotatePair(above, row, here + 8, step, pivot / length, x / length);
  }
  return false;
}

function rotatePair(above: usize, row: usize, from: usize, until: usize, cosine: f64, sine: f64): void {
  const c = f64x2.splat(cosine);
  const s = f64x2.splat(sine);
  let l = from;
  for (; l + 8 < until; l += pair) {
    const upper = v128.load(above + l);
    const lower = v128.load(row + l);
    v128.store(above + l, f64x2.add(f64x2.mul(c, upper), f64x2.mul(s, lower)));
    v128.store(row + l, f64x2.sub(f64x2.mul(c, lower), f64x2.mul(s, upper)));
  }
  if (l < until) {
    const upper = load<f64>(above + l);
    const lower = load<f64>(row + l);
    store<f64>(above + l, cosine * upper + sine * lower);
    store<f64>(row + l, cosine * lower - sine * upper);
  }
}

/** 2^27 + 1 splits a double into two halves of 26 bits. */
const split: f64 = 134217729;

export function subtractMultiple(high: usize, low: usize, x: usize, rows: i32, factor: f64, factorLow: f64): void {
  const scaled = split * factor;
  const head = scaled - (scaled - factor);
  const factors = f64x2.splat(factor);
  const factorLows = f64x2.splat(factorLow);
  const factorHeads = f64x2.splat(head);
  const factorTails = f64x2.splat(factor - head);
  const splits = f64x2.splat(split);
  const length = bytes(rows);
  for (let i: usize = 0; i < length; i += pair) {
    const value = v128.load(x + i);
    const product = f64x2.mul(value, factors);
    const c = f64x2.mul(splits, value);
    const valueHead = f64x2.sub(c, f64x2.sub(c, value));
    const valueTail = f64x2.sub(value, valueHead);
    let lost = f64x2.sub(f64x2.mul(valueHead, factorHeads), product);
    lost = f64x2.add(lost, f64x2.mul(valueHead, factorTails));
    lost = f64x2.add(lost, f64x2.mul(valueTail, factorHeads));
    lost = f64x2.add(lost, f64x2.mul(valueTail, factorTails));
    const before = v128.load(high + i);
    const after = f64x2.sub(before, product);
    const back = f64x2.sub(after, before);
    let rest = f64x2.sub(f64x2.sub(before, f64x2.sub(after, back)), f64x2.add(product, back));
    rest = f64x2.sub(f64x2.sub(rest, lost), f64x2.mul(value, factorLows));
    v128.store(low + i, f64x2.add(v128.load(low + i), rest));
    v128.store(high + i, after);
  }
}

export function addInnerProduct(sum: usize, x: usize, high: usize, low: usize, rows: i32): void {
  const splits = f64x2.splat(split);
  let sums = f64x2.splat(0);
  let rests = f64x2.splat(0);
  const length = bytes(rows);
  for (let i: usize = 0; i < length; i += pair) {
    const a = v128.load(x + i);
    const b = v128.load(high + i);
    const product = f64x2.mul(a, b);
    const c = f64x2.mul(splits, a);
    const aHead = f64x2.sub(c, f64x2.sub(c, a));
    const aTail = f64x2.sub(a, aHead);
    const d = f64x2.mul(splits, b);
    const bHead = f64x2.sub(d, f64x2.sub(d, b));
    const bTail = f64x2.sub(b, bHead);
    let lost = f64x2.sub(f64x2.mul(aHead, bHead), product);
    lost = f64x2.add(lost, f64x2.mul(aHead, bTail));
    lost = f64x2.add(lost, f64x2.mul(aTail, bHead));
    lost = f64x2.add(lost, f64x2.mul(aTail, bTail));
    const after = f64x2.add(sums, product);
    const back = f64x2.sub(after, sums);
    rests = f64x2.add(rests, f64x2.add(f64x2.sub(sums, f64x2.sub(after, back)), f64x2.sub(product, back)));
    rests = f64x2.add(rests, f64x2.add(lost, f64x2.mul(a, v128.load(low + i))));
    sums = after;
  }
  addWide(sum, f64x2.extract_lane(sums, 0));
  addWide(sum, f64x2.extract_lane(sums, 1));
  store<f64>(sum, load<f64>(sum, 8) + total(rests), 8);
}

/** Adds to a sum of two words without loss. */
function addWide(sum: usize, value: f64): void {
  const before = load<f64>(sum);
  const after = before + value;
  const back = after - before;
  store<f64>(sum, load<f64>(sum, 8) + (before - (after - back) + (value - back)), 8);
  store<f64>(sum, after);
}
