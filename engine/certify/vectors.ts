/** Vector arithmetic: all that the certificate shares with any method. */

export function dot(a: ArrayLike<number>, b: ArrayLike<number>): number {
  let sum = 0;
  for (let index = 0; index < a.length; index++) sum += a[index]! * b[index]!;
  return sum;
}

/** target += factor * vector */
export function addScaled(target: Float64Array, factor: number, vector: ArrayLike<number>): void {
  for (let index = 0; index < target.length; index++) target[index]! += factor * vector[index]!;
}
