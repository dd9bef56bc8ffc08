import { expect, it } from 'vitest';
import { dayWords, estimateWords, moneyWords, packWords, percentWords } from '@/lib/shared/number-words';

it('says money with its currency, and tells a small price from nothing', () => {
  expect(moneyWords('1234.5', 'EUR')).toBe('€1,234.50');
  expect(moneyWords('0.0042', 'EUR')).toBe('€0.0042');
  expect(moneyWords('0', 'EUR')).toBe('€0.00');
  expect(moneyWords('12000.4', 'CHF')).toMatch(/^CHF\s12,000$/);
});

it('says shares, packs, estimates and days with their units and no digits that are not known', () => {
  expect(percentWords('0.35500000')).toBe('35.5 %');
  expect(percentWords('0.00003')).toBe('0.003 %');
  expect(packWords('25.000000', 'g')).toBe('25 g');
  expect(packWords('2500', 'mL')).toBe('2.5 L');
  expect(estimateWords(1234)).toBe('1,200');
  expect(dayWords('2026-03-09')).toBe('9 March 2026');
});
