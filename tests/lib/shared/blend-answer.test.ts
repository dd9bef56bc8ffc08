import { expect, it } from 'vitest';
import { certify, solveBlend } from '@/engine';
import type { BlendSolution } from '@/engine/contract';
import { answerOfSolution } from '@/lib/shared/blend-answer';
import { clashOf } from '@/lib/shared/blend-clash';
import type { BlendRequest } from '@/lib/shared/blend-input';
import { buildBlendProblem } from '@/lib/shared/blend-problem';
import { INPUTS, LIBRARY, request } from '../../support/blend-inputs';

function solved(asked: BlendRequest) {
  const built = buildBlendProblem(asked, INPUTS);
  const solution = solveBlend(built.problem);
  const context = { request: asked, built, currency: 'EUR' };
  return { solution, context, answer: answerOfSolution(solution, context, certify(built.problem, solution)) };
}

const priced = (amount: string) => request({ ceiling: { basis: 'equal strength', amount }, minStrength: 0.25 });

it('says what a little more money would bring, and is right to the first order', () => {
  const { answer } = solved(priced('1000'));
  expect(answer.heldBack[0]).toMatch(
    /^The price ceiling is what holds you back: 100 EUR\/kg more would bring it about 0\.\d\d points closer on the 0–10 facet scale\.$/,
  );
  const [first] = answer.reliefs;
  const gained = answer.expectedDistance - solved(priced('1000.5')).answer.expectedDistance;
  expect(gained).toBeGreaterThan(0);
  expect(Math.abs(first!.closer / 200 - gained)).toBeLessThan(0.05 * gained);
});

it('says that nothing holds it back when no rule costs anything', () => {
  const { answer } = solved(request({ minStrength: null, maxShares: [{ materialId: 'leaf', share: 1 }] }));
  expect(answer.heldBack).toEqual([
    'Your rules cost next to nothing: a little more room in any of them would not bring it noticeably closer.',
  ]);
});

it('proves it in one sentence, and claims no proof when time ran out', () => {
  const { solution, context, answer } = solved(priced('1000'));
  expect(answer.proof).toMatch(
    /^Proven: no blend of these materials within these rules comes closer than \d\.\d\d points/,
  );
  const stopped: BlendSolution = { ...solution, status: 'stopped', bound: solution.objective / 4 };
  expect(answerOfSolution(stopped, context).proof).toMatch(/^Not proven to be the closest/);
});

it('prices a blend against the target', () => {
  const { answer, solution } = solved(priced('1000'));
  expect(answer.costAtEqualStrength).toBeLessThanOrEqual(1000 * (1 + 1e-9));
  expect(answer.strengthOfTarget).toBeCloseTo(solution.strength / 6, 12);
  expect(answer.lines.reduce((sum, line) => sum + line.costPart, 0)).toBeCloseTo(answer.costPerKg, 9);
});

it('warns of a blend in which nothing leads', () => {
  const { solution, context } = solved(priced('1000'));
  const flat = { ...solution, lines: solution.lines.map((line) => ({ ...line, impact: 0.1 })) };
  expect(answerOfSolution(flat, context).cautions[0]).toMatch(/smells of everything and nothing/);
  expect(answerOfSolution(solution, context).cautions).toEqual([]);
});

it('says which rules clash, and offers ways out that work', () => {
  const asked = request({ ceiling: { basis: 'equal strength', amount: '90' }, minNatural: 1 });
  const { solution, answer, context } = solved(asked);
  expect(solution.status).toBe('infeasible');
  expect(answer.proof).toBe('Proven: no blend of these materials keeps all these rules.');
  const explained: BlendSolution = {
    ...solution,
    conflict: ['costPerImpact', 'minNatural'],
    relax: [{ rule: 'costPerImpact', from: 15, to: 225 }],
  };
  const clash = clashOf(explained, context)!;
  expect(clash.rules).toEqual(['the price ceiling of 90.00 EUR/kg at equal strength', 'at least 100 % natural']);
  expect(clash.ways[0]!.words).toBe('Raise the price ceiling to 1,360 EUR/kg at equal strength');
  expect(solved(clash.ways[0]!.request).solution.status).toBe('optimal');
});

it('turns a limit that clashes into the concentrate that would keep it', () => {
  const asked = request({
    minStrength: null,
    product: { category: '4', concentratePct: '20' },
    kept: [{ materialId: 'alcohol', share: 0.9 }],
  });
  const { solution, context } = solved(asked);
  expect(solution.status).toBe('infeasible');
  const clash = clashOf(
    { ...solution, conflict: ['limit:l1', 'kept:alcohol'], relax: [{ rule: 'limit:l1', from: 0.25, to: 0.9 }] },
    context,
  )!;
  expect(clash.ways.map(({ words }) => words)).toEqual([
    'Put 5.55 % concentrate into the product instead of 20 %, for One',
    'Leave the share of Alcohol open',
  ]);
  for (const { request: changed } of clash.ways) expect(solved(changed).solution.status).toBe('optimal');
});

it('never uses a word of the solver', () => {
  const { answer } = solved(priced('1000'));
  const words = [...answer.heldBack, answer.proof, ...answer.cautions].join(' ');
  expect(words).not.toMatch(/multiplier|slack|objective|infeasible|constraint|optim|residual/i);
  expect(LIBRARY.length).toBeGreaterThan(0);
});

it('offers no dose that no nose could bear as a way out', () => {
  const { solution, context } = solved(request({ minStrength: 9 }));
  const clash = clashOf(
    {
      ...solution,
      conflict: ['minStrength', 'share:leaf'],
      relax: [
        { rule: 'share:leaf', from: 0.02, to: 0.4 },
        { rule: 'minStrength', from: 54, to: 4 },
      ],
    },
    context,
  )!;
  expect(clash.rules[1]).toBe('at most 2 % of Leaf, its largest advisable share');
  expect(clash.ways.map(({ words }) => words)).toEqual(['Ask for 66.6 % as strong as Absolute only']);
});
