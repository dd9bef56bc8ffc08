/** Kernels on lower triangles stored row by row, `stride` apart. Small and free of objects, so that they stay fast. */

/** v := L^-1 v */
export function forward(l: Float64Array, stride: number, size: number, v: Float64Array, at: number): void {
  for (let i = 0; i < size; i++) {
    const row = i * stride;
    v[at + i] = (v[at + i]! - product(l, row, v, at, i)) / l[row + i]!;
  }
}

/** v := L'^-1 v */
export function backward(l: Float64Array, stride: number, size: number, v: Float64Array): void {
  for (let i = size - 1; i >= 0; i--) {
    const row = i * stride;
    const value = v[i]! / l[row + i]!;
    v[i] = value;
    for (let j = 0; j < i; j++) v[j] = v[j]! - l[row + j]! * value;
  }
}

/**
 * Turns columns j and j + 1 of the rows from `from` to `to` so that entry (from, j + 1) vanishes (Givens); the cosine
 * and the sine are left in `turn`, for whatever else has to turn along.
 */
export function turnColumns(l: Float64Array, stride: number, j: number, to: number, turn: Float64Array): void {
  const first = j * stride + j;
  const a = l[first]!;
  const b = l[first + 1]!;
  const length = Math.sqrt(a * a + b * b);
  const c = a / length;
  const s = b / length;
  turn[0] = c;
  turn[1] = s;
  l[first] = length;
  l[first + 1] = 0;
  for (let at = first + stride; at < to * stride; at += stride) {
    const p = l[at]!;
    const q = l[at + 1]!;
    l[at] = c * p + s * q;
    l[at + 1] = c * q - s * p;
  }
}

/** Householder QR in place of `columns` columns of `size` entries each, `stride` apart; R's diagonal goes to `diagonal`. */
export function reflectColumns(
  q: Float64Array,
  stride: number,
  size: number,
  columns: number,
  diagonal: Float64Array,
): void {
  for (let k = 0; k < columns; k++) {
    const at = k * stride;
    const length = Math.sqrt(product(q, at + k, q, at + k, size - k));
    if (length === 0) {
      diagonal[k] = 0;
      continue;
    }
    const head = q[at + k]!;
    const pivot = head > 0 ? -length : length;
    diagonal[k] = pivot;
    // the reflector is stored so that I - h h' reflects: its head holds head - pivot over the root of what follows
    const scale = 1 / Math.sqrt(-pivot * (head - pivot));
    q[at + k] = (head - pivot) * scale;
    for (let i = k + 1; i < size; i++) q[at + i] = q[at + i]! * scale;
    for (let j = k + 1; j < columns; j++) reflectOne(q, at, k, size, q, j * stride);
  }
}

/** v := (I - h h') v, both from entry k on. */
export function reflectOne(q: Float64Array, at: number, k: number, size: number, v: Float64Array, to: number): void {
  const sum = product(q, at + k, v, to + k, size - k);
  if (sum !== 0) addTo(v, to + k, -sum, q, at + k, size - k);
}

/** sum of u_i v_i over `size` entries, from two places. Four sums at once: one would wait for itself at every step. */
export function product(u: Float64Array, from: number, v: Float64Array, at: number, size: number): number {
  let a = 0;
  let b = 0;
  let c = 0;
  let d = 0;
  let i = 0;
  for (; i + 3 < size; i += 4) {
    a += u[from + i]! * v[at + i]!;
    b += u[from + i + 1]! * v[at + i + 1]!;
    c += u[from + i + 2]! * v[at + i + 2]!;
    d += u[from + i + 3]! * v[at + i + 3]!;
  }
  for (; i < size; i++) a += u[from + i]! * v[at + i]!;
  return a + b + (c + d);
}

/** v[at...] += factor u[from...] */
export function addTo(v: Float64Array, at: number, factor: number, u: Float64Array, from: number, size: number): void {
  for (let i = 0; i < size; i++) v[at + i] = v[at + i]! + factor * u[from + i]!;
}
