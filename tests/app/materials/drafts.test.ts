import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  fractionText,
  materialDraft,
  materialOfDraft,
  NEW_MATERIAL,
  percentText,
} from '@/app/(house)/materials/_client/material-draft';
import { NEW_QUALITY, qualityDraft, qualityOfDraft } from '@/app/(house)/materials/_client/quality-draft';
import { materialInput } from '@/lib/shared/material';
import type { MaterialView, QualityView } from '@/lib/shared/material-view';
import { qualityInput } from '@/lib/shared/quality';

const id = (letter: string) => letter.repeat(26);
const written = materialInput.parse({
  ...{ name: 'Rose absolute', kind: 'absolute', botanicalName: 'Rosa × centifolia', synonyms: ['May rose', 'Absolue'] },
  ...{ cas: ['8007-01-0'], smell: 'A garden.', naturalShare: '1', strength: 5.5, strengthClass: 'strong' },
  ...{ strengthSource: 'estimate', vapourPressurePa: 0.0001, vapourPressureSource: 'measured', maxShare: '0.355' },
  facets: [{ facetId: id('a'), phase: 'dry', intensity: 2.25, sd: 0.75 }],
  cautions: [{ code: 'sensitiser', source: 'SDS' }],
});

describe('a draft', () => {
  it('of a material says again what it was made from', () => {
    const view = { ...written, qualities: [], revision: 1 } as unknown as MaterialView;
    expect(materialInput.parse(materialOfDraft(materialDraft(view)))).toEqual(written);
  });

  it('of a quality says again what it was made from', () => {
    const quality = qualityInput.parse({
      ...{ supplierId: id('s'), code: 'A1', form: 'paste', completeness: 'declared', compositionSource: 'SDS' },
      ...{ densityGPerMl: '0.875', warmToC: '45' },
      constituents: [
        { constituentId: id('c'), minFraction: '0.00012', typicalFraction: null, maxFraction: '0.3', source: 'SDS' },
      ],
      offers: [
        { id: id('o'), packAmount: '2.5', packUnit: 'mL', price: '12.5', currency: 'EUR', offeredOn: '2026-11-02' },
      ],
    });
    const view = { ...quality, supplier: { id: quality.supplierId, name: '' } } as unknown as QualityView;
    expect(qualityInput.parse(qualityOfDraft(qualityDraft(view)))).toEqual(quality);
  });

  it('passes on what is no number, for the schema to name', () => {
    const faults = (draft: object, schema: typeof materialInput | typeof qualityInput) =>
      schema.safeParse(draft).error?.issues.map(({ path, message }) => `${path.join('.')}: ${message}`);
    expect(
      faults(
        materialOfDraft({ ...NEW_MATERIAL, name: 'X Y', strength: 'much', naturalShare: 'all' }) as object,
        materialInput,
      ),
    ).toEqual([
      'naturalShare: Natural share must be a number; it was “all”.',
      'strength: Odour strength must be a number.',
    ]);
    expect(faults(qualityOfDraft({ ...NEW_QUALITY, code: 'A', densityGPerMl: '-0,9' }), qualityInput)).toEqual([
      'supplierId: Choose a supplier.',
      'densityGPerMl: Density must be above 0 g/mL; it was -0.9.',
    ]);
  });
});

it('keeps every digit of a share between per cent and fraction', () => {
  const share = fc.integer({ min: 0, max: 100_000_000 }).map((n) => (n / 1e8).toFixed(8));
  fc.assert(
    fc.property(share, (fraction) => {
      expect(Number(fractionText(percentText(fraction)))).toBe(Number(fraction));
      expect(fractionText(percentText(fraction).replace('.', ','))).toBe(fractionText(percentText(fraction)));
    }),
  );
});
