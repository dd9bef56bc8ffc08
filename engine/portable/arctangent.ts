/**
 * The angle of the point (x, y) in the first quadrant, x and y >= 0 and not both 0, by + - * / alone, to within two
 * units in the last place. Like `exponential`, because implementations of `Math.atan2` differ in their last bit.
 *
 * The method and its constants are those of fdlibm's s_atan.c (Sun Microsystems 1993): the tangent is brought near 0 by
 * taking off one of four angles, then a polynomial.
 */
export function arctangent(y: number, x: number): number {
  return x === 0 ? ANGLES[3]![0]! : arctangentOf(y / x);
}

function arctangentOf(tangent: number): number {
  if (tangent < 7 / 16) return tangent - tangent * polynomial(tangent);
  const [[high, low], rest] = reduced(tangent);
  return high - (rest * polynomial(rest) - low - rest);
}

/** atan(1/2), atan(1), atan(3/2), atan(infinity), each in two parts. */
const ANGLES = [
  [0.4636476090008061, 2.2698777452961687e-17],
  [Math.PI / 4, 3.061616997868383e-17],
  [0.982793723247329, 1.3903311031230998e-17],
  [Math.PI / 2, 6.123233995736766e-17],
] as const;

function reduced(t: number): [readonly [high: number, low: number], rest: number] {
  if (t < 11 / 16) return [ANGLES[0], (2 * t - 1) / (2 + t)];
  if (t < 19 / 16) return [ANGLES[1], (t - 1) / (t + 1)];
  if (t < 39 / 16) return [ANGLES[2], (t - 1.5) / (1 + 1.5 * t)];
  return [ANGLES[3], -1 / t];
}

const COEFFICIENTS = [
  0.3333333333333293, -0.19999999999876483, 0.14285714272503466, -0.11111110405462356, 0.09090887133436507,
  -0.0769187620504483, 0.06661073137387531, -0.058335701337905735, 0.049768779946159324, -0.036531572744216916,
  0.016285820115365782,
];

/** 1 - atan(t) / t for a small t. */
function polynomial(t: number): number {
  const square = t * t;
  let sum = 0;
  for (let degree = COEFFICIENTS.length - 1; degree >= 0; degree--) sum = square * (COEFFICIENTS[degree]! + sum);
  return sum;
}
