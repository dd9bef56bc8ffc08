import fc from 'fast-check';
import { expect, it } from 'vitest';
import { solveBlend } from '@/engine';
import { RequestFault } from '@/lib/shared/blend-input';
import { buildBlendProblem } from '@/lib/shared/blend-problem';
import { candidate, INPUTS, LIBRARY, request } from '../../support/blend-inputs';

const idsOf = (built: ReturnType<typeof buildBlendProblem>) => built.problem.candidates.map(({ id }) => id);

function faultOf(work: () => unknown): Record<string, string> {
  try {
    work();
  } catch (error) {
    if (error instanceof RequestFault) return error.fields;
    throw error;
  }
  return {};
}

it('leaves out the target, what has no smell and what has no price, and says so', () => {
  const built = buildBlendProblem(request(), INPUTS);
  expect(idsOf(built)).toEqual(['alcohol', 'honey', 'leaf', 'oil']);
  expect(built.leftOut.map(({ id, reason }) => [id, reason])).toEqual([
    ['absolute', 'target'],
    ['solvent', 'odourless'],
    ['unpriced', 'no price'],
  ]);
});

it('takes the target and a solvent in when they are added', () => {
  const built = buildBlendProblem(request({ added: ['absolute', 'solvent'] }), INPUTS);
  expect(idsOf(built)).toEqual(['absolute', 'alcohol', 'honey', 'leaf', 'oil', 'solvent']);
});

it('leaves out incomplete compositions when asked, unless one is asked for by name', () => {
  expect(idsOf(buildBlendProblem(request({ leaveOutIncomplete: true }), INPUTS))).not.toContain('honey');
  const asked = request({ leaveOutIncomplete: true, required: ['honey'] });
  expect(idsOf(buildBlendProblem(asked, INPUTS))).toContain('honey');
});

it('measures the price at equal strength and the strength against the target', () => {
  const { problem } = buildBlendProblem(
    request({ ceiling: { basis: 'equal strength', amount: '2000' }, minStrength: 0.5 }),
    INPUTS,
  );
  expect(problem.costPerImpact).toBeCloseTo(2000 / 6, 12);
  expect(problem.minStrength).toBe(3);
  expect(problem).not.toHaveProperty('budgetPerKg');
});

it('divides a limit in the product by the concentrate', () => {
  const built = buildBlendProblem(request({ product: { category: '4', concentratePct: '20' } }), INPUTS);
  expect(built.problem.limits).toEqual([{ id: 'l1', terms: [{ constituentId: 'c1', factor: 1 }], max: 0.25 }]);
  expect(built.concentrate).toBe(0.2);
});

it('keeps a limit that no material could exceed for its verdict, not for the engine', () => {
  const built = buildBlendProblem(request({ product: { category: '4', concentratePct: '4' } }), INPUTS);
  expect(built.problem.limits).toEqual([]);
  expect(built.limits).toHaveLength(1);
});

it('says which limits have no figure for a category', () => {
  const built = buildBlendProblem(request({ product: { category: '9', concentratePct: '1' } }), INPUTS);
  expect(built.limits).toEqual([]);
  expect(built.limitsWithoutFigure).toEqual(['One']);
});

it.each([
  ['a target that is gone', request({ target: { kind: 'material', materialId: 'gone' } }), 'target.materialId'],
  ['a target without smell', request({ target: { kind: 'material', materialId: 'solvent' } }), 'target.materialId'],
  ['an empty drawing', request({ target: { kind: 'drawn', name: 'Nothing', intensities: {} } }), 'target.intensities'],
  ['an unknown facet', request({ target: { kind: 'drawn', name: 'X', intensities: { x: 3 } } }), 'target.intensities'],
  ['a required material without price', request({ required: ['unpriced'] }), 'required.0'],
  ['asked for and left out at once', request({ required: ['oil'], excluded: ['oil'] }), 'required.0'],
  [
    'kept shares above the whole',
    request({
      kept: [
        { materialId: 'oil', share: 0.7 },
        { materialId: 'honey', share: 0.4 },
      ],
    }),
    'kept',
  ],
  ['a facet nobody has', request({ importance: { unheard: 2 } }), 'importance.unheard'],
  ['nothing that matters', request({ importance: { rosy: 0, honeyed: 0, green: 0 } }), 'importance'],
  ['an unknown category', request({ product: { category: '99', concentratePct: '5' } }), 'product.category'],
  [
    'a course over time of a drawing',
    request({
      target: { kind: 'drawn', name: 'X', intensities: { rosy: 3 } },
      phases: { opening: 1, heart: 1, dry: 1 },
    }),
    'phases',
  ],
])('answers %s with a sentence for the field', (_, asked, field) => {
  expect(faultOf(() => buildBlendProblem(asked, INPUTS))[field]).toMatch(/\w.*\.$/);
});

it('builds the same problem whatever the order of the library', () => {
  fc.assert(
    fc.property(fc.shuffledSubarray(LIBRARY, { minLength: LIBRARY.length }), (candidates) => {
      expect(buildBlendProblem(request(), { ...INPUTS, candidates }).problem).toEqual(
        buildBlendProblem(request(), INPUTS).problem,
      );
    }),
  );
});

it('survives being frozen as JSON', () => {
  const { problem } = buildBlendProblem(
    request({ ceiling: { basis: 'per kg', amount: '800' }, product: { category: '4', concentratePct: '20' } }),
    INPUTS,
  );
  expect(solveBlend(JSON.parse(JSON.stringify(problem)))).toEqual(solveBlend(problem));
});

it('always keeps to what was asked: none left out by hand is used, all that is required is', () => {
  const others = ['alcohol', 'honey', 'leaf', 'oil'];
  fc.assert(
    fc.property(
      fc.subarray(others, { minLength: 1, maxLength: 3 }),
      fc.integer({ min: 0, max: 3 }),
      (excluded, pick) => {
        const free = others.filter((id) => !excluded.includes(id));
        const required = free.slice(pick, pick + 1);
        const { problem } = buildBlendProblem(request({ excluded, required, minStrength: null }), INPUTS);
        const solution = solveBlend(problem);
        for (const { id } of solution.lines) expect(excluded).not.toContain(id);
        if (solution.status === 'optimal')
          for (const id of required) expect(solution.lines.map((line) => line.id)).toContain(id);
      },
    ),
  );
});

it('lets a line be kept above the largest share that the house advises', () => {
  const { problem } = buildBlendProblem(request({ kept: [{ materialId: 'leaf', share: 0.05 }] }), INPUTS);
  const solution = solveBlend(problem);
  expect(solution.lines.find(({ id }) => id === 'leaf')?.share).toBeCloseTo(0.05, 9);
});

it('follows a material over its phases', () => {
  const fading = candidate('fading', { profile: [8, 0, 0], phases: { dry: [0, 6, 0] }, evaporation: 0.1, strength: 2 });
  const { problem } = buildBlendProblem(
    request({ target: { kind: 'material', materialId: 'fading' }, phases: { opening: 1, heart: 2, dry: 0 } }),
    { ...INPUTS, candidates: [...LIBRARY, fading] },
  );
  expect(problem.stages?.map(({ hours, weight }) => [hours, weight])).toEqual([
    [0.25, 1],
    [4, 2],
    [24, 0],
  ]);
  expect(problem.stages?.[2]?.target[1]).toBeCloseTo(6 * Math.exp(-2.4), 12);
  expect(problem.candidates[0]?.stageProfiles).toHaveLength(3);
});
