/** Kernels on lower triangles stored row by row, `stride` apart. Small and free of objects, so that they stay fast. */

/** v := L^-1 v */
export function forward(l: Float64Array, stride: number, size: number, v: Float64Array, at: number): void {
  for (let i = 0; i < size; i++) {
    let sum = v[at + i]!;
    const row = i * stride;
    for (let j = 0; j < i; j++) sum -= l[row + j]! * v[at + j]!;
    v[at + i] = sum / l[row + i]!;
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
    let sum = 0;
    for (let i = k; i < size; i++) sum += q[at + i]! * q[at + i]!;
    const length = Math.sqrt(sum);
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
  let sum = 0;
  for (let i = k; i < size; i++) sum += q[at + i]! * v[to + i]!;
  if (sum === 0) return;
  for (let i = k; i < size; i++) v[to + i] = v[to + i]! - sum * q[at + i]!;
}

/** sum of u_i v_i over `size` entries, from two places. */
export function product(u: Float64Array, from: number, v: Float64Array, at: number, size: number): number {
  let sum = 0;
  for (let i = 0; i < size; i++) sum += u[from + i]! * v[at + i]!;
  return sum;
}

/** v[at...] += factor u[from...] */
export function addTo(v: Float64Array, at: number, factor: number, u: Float64Array, from: number, size: number): void {
  for (let i = 0; i < size; i++) v[at + i] = v[at + i]! + factor * u[from + i]!;
}
