import { Matrix } from 'ml-matrix';
import { describe, expect, it } from 'vitest';
import { nnls } from '@/engine/solve/nnls';
import { filip, filipCertified, filipResidual } from './filip';

/** Longley (1967) as certified by NIST StRD: y, then x1 to x6. */
const longley = [
  [60323, 83.0, 234289, 2356, 1590, 107608, 1947],
  [61122, 88.5, 259426, 2325, 1456, 108632, 1948],
  [60171, 88.2, 258054, 3682, 1616, 109773, 1949],
  [61187, 89.5, 284599, 3351, 1650, 110929, 1950],
  [63221, 96.2, 328975, 2099, 3099, 112075, 1951],
  [63639, 98.1, 346999, 1932, 3594, 113270, 1952],
  [64989, 99.0, 365385, 1870, 3547, 115094, 1953],
  [63761, 100.0, 363112, 3578, 3350, 116219, 1954],
  [66019, 101.2, 397469, 2904, 3048, 117388, 1955],
  [67857, 104.6, 419180, 2822, 2857, 118734, 1956],
  [68169, 108.4, 442769, 2936, 2798, 120445, 1957],
  [66513, 110.8, 444546, 4681, 2637, 121950, 1958],
  [68655, 112.6, 482704, 3813, 2552, 123366, 1959],
  [69564, 114.2, 502601, 3931, 2514, 125368, 1960],
  [69331, 115.7, 518173, 4806, 2572, 127852, 1961],
  [70551, 116.9, 554894, 4007, 2827, 130081, 1962],
];

const expectRelative = (found: ArrayLike<number>, wanted: number[], tolerance: number) => {
  for (const [i, value] of wanted.entries()) {
    expect(Math.abs(found[i]! - value), `entry ${i}: ${found[i]}`).toBeLessThanOrEqual(tolerance * Math.abs(value));
  }
};

/** A fit with weights of any sign, as the fit of columns turned to the sign of the certified weight. */
const certifiedFit = (columns: number[][], y: number[], certified: number[]) => {
  const turned = columns.map((row) => row.map((value, j) => value * Math.sign(certified[j]!)));
  const fit = nnls(new Matrix(turned), y);
  return { ...fit, weights: fit.x.map((weight, j) => weight * Math.sign(certified[j]!)) };
};

describe('NIST statistical reference datasets', () => {
  it('reaches the certified values of Longley', () => {
    const certified = [
      -3482258.63459582, 15.0618722713733, -0.035819179292591, -2.02022980381683, -1.03322686717359,
      -0.0511041056535807, 1829.15146461355,
    ];
    const rows = longley.map(([, ...x]) => [1, ...x]);
    const fit = certifiedFit(
      rows,
      longley.map(([y]) => y!),
      certified,
    );
    expectRelative(fit.weights, certified, 1e-8);
    expectRelative([fit.residualNorm ** 2], [836424.055505915], 1e-9);
  });

  it('fits Longley without negative weights (value recomputed, the same with columns of unit length)', () => {
    const fit = nnls(
      new Matrix(longley.map(([, ...x]) => [1, ...x])),
      longley.map(([y]) => y!),
    );
    expectRelative(fit.x, [51683.4687, 0, 0.0343934719, 0, 0.11479548, 0, 0], 1e-8);
    expectRelative([fit.residualNorm], [2441.2062149], 1e-10);
  });

  it('finds the powers behind Wampler1 and Wampler2', () => {
    const powers = Array.from({ length: 21 }, (_, x) => [0, 1, 2, 3, 4, 5].map((k) => x ** k));
    const wampler1 = powers.map((row) => row.reduce((sum, v) => sum + v, 0));
    const wampler2 = powers.map((row) => row.reduce((sum, v, k) => sum + v * 10 ** -k, 0));
    expectRelative(nnls(new Matrix(powers), wampler1).x, [1, 1, 1, 1, 1, 1], 1e-8);
    expectRelative(nnls(new Matrix(powers), wampler2).x, [1, 0.1, 0.01, 1e-3, 1e-4, 1e-5], 1e-8);
  });

  it('reaches the certified values of Filip, whose powers are dependent but for their last digits', () => {
    const powers = filip.map(([, x]) => filipCertified.map((_, k) => x ** k));
    const fit = certifiedFit(
      powers,
      filip.map(([y]) => y),
      filipCertified,
    );
    expect(fit.status).toBe('optimal');
    expectRelative(fit.weights, filipCertified, 1e-5);
    expectRelative([fit.residualNorm ** 2], [filipResidual], 1e-7);
  });

  it('fits the yarn mixture of the NIST handbook, section 5.5.4.2, with and without negative terms', () => {
    const yarn: [number, number, number, number[]][] = [
      [1, 0, 0, [11.0, 12.4]],
      [0.5, 0.5, 0, [15.0, 14.8, 16.1]],
      [0, 1, 0, [8.8, 10.0]],
      [0, 0.5, 0.5, [10.0, 9.7, 11.8]],
      [0, 0, 1, [16.8, 16.0]],
      [0.5, 0, 0.5, [17.7, 16.4, 16.6]],
    ];
    const rows = yarn.flatMap(([a, b, c, seen]) => seen.map(() => [a, b, c, a * b, a * c, b * c]));
    const seen = yarn.flatMap(([, , , values]) => values);
    const published = [11.7, 9.4, 16.4, 19, 11.4, -9.6];
    const free = certifiedFit(rows, seen, published);
    expectRelative(free.weights, published, 1e-10);
    expect(free.residualNorm / 3).toBeCloseTo(0.85375, 5);
    const fit = nnls(new Matrix(rows), seen);
    expectRelative(fit.x, [11.7, 8.37142857, 15.37142857, 21.05714286, 13.45714286, 0], 1e-9);
  });
});
