import type { BlendProblem } from '@/engine/contract';
import { solveBlend, traceFrontier } from '@/engine/index';
import { highsBlend } from '@/tests/support/oracles/highs';
import { quadprogBlend } from '@/tests/support/oracles/quadprog';
import { geometricMean, leastTimes, line, sortedTimes } from './clock';
import { blendProblem } from './problems';
import { scipyTime } from './scipy';

/**
 * `npm run bench`: the engine against named peers, on the same generated problems, in one process, runs interleaved,
 * the least of five, preparation included. Ratios count; the milliseconds are this machine's. `-- --long` adds the runs
 * that take minutes: quadprog at 1,000 materials and HiGHS at 5,000.
 */
const SEEDS = [1, 2, 5, 12, 15];
const long = process.argv.includes('--long');

const problems = (materials: number, more: { free?: boolean } = {}): BlendProblem[] =>
  SEEDS.map((seed) =>
    blendProblem({ materials, facets: materials > 30 ? 80 : 24, limits: materials > 30 ? 60 : 6, seed, ...more }),
  );

function againstPeer(name: string, materials: number, goal: number, peer: (problem: BlendProblem) => unknown): void {
  const slow = materials * (name === 'quadprog' ? 5 : 1) >= 5000;
  const ratios = problems(materials)
    .slice(0, slow ? 1 : SEEDS.length)
    .map((problem) => {
      // the compiler has to have seen both before either is timed
      for (let warm = 0; warm < (materials <= 200 ? 40 : 5); warm++) solveBlend(problem);
      for (let warm = 0; warm < (materials <= 30 ? 40 : 0); warm++) peer(problem);
      const [own] = leastTimes([() => solveBlend(problem)], slow ? 5 : 1);
      const [ours, theirs] = leastTimes([() => solveBlend(problem), () => peer(problem)], slow ? 1 : 5);
      return [Math.min(own!, ours!), theirs!] as const;
    });
  const ratio = geometricMean(ratios.map(([ours, theirs]) => theirs / ours));
  const ours = geometricMean(ratios.map(([time]) => time));
  line(
    `${materials} materials against ${name}`,
    `${ratio.toFixed(1)} x  (${ours.toFixed(2)} ms)`,
    `>= ${goal} x`,
    ratio >= goal,
  );
}

function againstScipy(materials: number, goal: number): void {
  const times = problems(materials, { free: true }).map((problem) => {
    const plain = { ...problem, candidates: problem.candidates.map(({ profileSd: _, ...rest }) => rest) };
    for (let warm = 0; warm < (materials <= 200 ? 40 : 5); warm++) solveBlend(plain);
    return [leastTimes([() => solveBlend(plain)])[0]!, scipyTime(plain)] as const;
  });
  if (times.some(([, theirs]) => theirs === null)) {
    console.log(`        ${materials} materials without rules on the mass: SciPy is not installed`);
    return;
  }
  const ratio = geometricMean(times.map(([ours, theirs]) => theirs! / ours));
  line(
    `${materials} materials, no rule on the mass, against SciPy nnls`,
    `${ratio.toFixed(1)} x`,
    `>= ${goal} x`,
    ratio >= goal,
  );
}

/** A slider in the browser's worker: the price at equal strength moves a little, and the problem is solved again. */
function slider(): void {
  const problem = blendProblem({ materials: 200, facets: 48, limits: 10, seed: 11 });
  const times = sortedTimes((round) => solveBlend({ ...problem, costPerImpact: 6 + 0.05 * (round % 60) }), 240);
  const p95 = times[Math.floor(0.95 * times.length)]!;
  line('200 materials x 48 facets with ten limits re-solve, p95', `${p95.toFixed(1)} ms`, '<= 16 ms', p95 <= 16);
}

function frontier(): void {
  const problem = blendProblem({ materials: 200, facets: 48, limits: 10, seed: 11 });
  for (let warm = 0; warm < 8; warm++) traceFrontier(problem, 50);
  for (let warm = 0; warm < 40; warm++) solveBlend(problem);
  const [one, fifty] = leastTimes([() => solveBlend(problem), () => traceFrontier(problem, 50)], 9);
  const ratio = fifty! / one!;
  line(
    'frontier of 50 prices, in single solves',
    `${ratio.toFixed(1)}  (${fifty!.toFixed(1)} ms)`,
    '<= 10',
    ratio <= 10,
  );
}

function fewest(): void {
  const problem = blendProblem({ materials: 200, facets: 48, limits: 10, seed: 11 });
  const start = performance.now();
  const run = { now: () => performance.now(), timeLimitMs: 20_000 };
  const { status, objective, bound, nodes } = solveBlend({ ...problem, maxMaterials: 5 }, run);
  const seconds = (performance.now() - start) / 1000;
  const found = `${status} in ${seconds.toFixed(1)} s, bound ${((100 * bound) / objective).toFixed(0)} %, ${nodes} nodes`;
  line('at most 5 of 200 materials', found, 'optimal in 3 s', status === 'optimal' && seconds <= 3);
}

function growth(): void {
  console.log('\nmaterials   ms      steps   lines   gap, of the scale');
  for (const materials of [30, 200, 1000, 5000, 20_000]) {
    const problem = problems(materials)[0]!;
    const [time] = leastTimes([() => solveBlend(problem)]);
    const { iterations, lines, objective, bound } = solveBlend(problem);
    const gap = ((objective - bound) / Math.max(objective, 1)).toExponential(0);
    console.log(
      [materials, time!.toFixed(1), iterations, lines.length, gap].map((one) => String(one).padEnd(8)).join(''),
    );
  }
}

againstPeer('quadprog', 30, 4, quadprogBlend);
againstPeer('quadprog', 200, 50, quadprogBlend);
if (long) againstPeer('quadprog', 1000, 5000, quadprogBlend);
againstPeer('HiGHS', 200, 3, highsBlend);
againstPeer('HiGHS', 1000, 4, highsBlend);
if (long) againstPeer('HiGHS', 5000, 8, highsBlend);
againstScipy(200, 1);
againstScipy(1000, 3);
againstScipy(5000, 8);
slider();
frontier();
fewest();
growth();
