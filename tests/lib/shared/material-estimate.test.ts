import { expect, it } from 'vitest';
import { proposedEvaporation, proposedStrength } from '@/lib/shared/material-estimate';

const known = { vapourPressurePa: null, odourThresholdUgPerM3: null, strengthClass: 'strong' as const };

it('estimates from vapour pressure over threshold where both are known, linalool being 1', () => {
  // science: linalool 21 Pa over 5.8342 µg/m³ is the unit; limonene 200 Pa (rounded) over 813.15 ng/L, which are µg/m³.
  const limonene = proposedStrength({ ...known, vapourPressurePa: 200, odourThresholdUgPerM3: 813.15 });
  expect(limonene).toMatchObject({ strength: 0.068, spread: 16 });
  expect(limonene?.source).toContain('Abraham');
});

it('falls back to the words, ten times a class, when either figure is missing', () => {
  expect(proposedStrength({ ...known, vapourPressurePa: 200 })).toMatchObject({ strength: 10, spread: 10 });
  expect(proposedStrength({ ...known, strengthClass: 'odourless' })).toMatchObject({ strength: 0, spread: 1 });
});

it('estimates the evaporation from a vapour pressure and from nothing else', () => {
  expect(proposedEvaporation(null)).toBeNull();
  // k = h A P / (R T N0) with h 1 mm/s, A 10 cm², N0 20 mg of 150 g/mol at 25 °C: 0.0109 per hour and Pa.
  expect(proposedEvaporation(10)?.perHour).toBeCloseTo(0.11, 10);
});
