/**
 * e^x to within one unit in the last place, by + - * / alone.
 *
 * The language leaves `Math.exp` to each implementation, and Node and Chromium differ in one value of ten: an answer
 * found in a browser could not be compared with the server's bit for bit. The method and its constants are those of
 * fdlibm's e_exp.c (Sun Microsystems 1993): x = k ln 2 + r, a rational approximation in r^2, then scaling by 2^k.
 */
export function exponential(x: number): number {
  if (Number.isNaN(x) || x > OVERFLOW) return Number.isNaN(x) ? x : Number.POSITIVE_INFINITY;
  if (x < UNDERFLOW) return 0;
  const k = Math.round(x * Math.LOG2E);
  const high = x - k * LN2_HIGH;
  const low = k * LN2_LOW;
  const r = high - low;
  const t = r * r;
  const c = r - t * (P1 + t * (P2 + t * (P3 + t * (P4 + t * P5))));
  return scaled(1 - (low - (r * c) / (2 - c) - high), k);
}

const OVERFLOW = 709.782712893384;
const UNDERFLOW = -745.1332191019411;
/** ln 2 in two parts, the first short enough that its multiples by k are exact. */
const LN2_HIGH = 0.6931471803691238;
const LN2_LOW = 1.9082149292705877e-10;
const P1 = 0.16666666666666602;
const P2 = -0.0027777777777015593;
const P3 = 6.613756321437934e-5;
const P4 = -1.6533902205465252e-6;
const P5 = 4.1381367970572385e-8;

/** value times 2^k, in steps that are exact (the last rounds once where the result is subnormal). */
function scaled(value: number, k: number): number {
  let result = value;
  let left = k;
  for (; left > 1000; left -= 1000) result *= TWO_TO_1000;
  for (; left < -1000; left += 1000) result /= TWO_TO_1000;
  let factor = 1;
  let square = 2;
  for (let rest = Math.abs(left); rest > 0; rest = Math.floor(rest / 2)) {
    if (rest % 2 === 1) factor *= square;
    square *= square;
  }
  return left < 0 ? result / factor : result * factor;
}

const TWO_TO_1000 = Number(2n ** 1000n);
