import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { numberAsTyped, typedNumber } from '@/lib/shared/typed-number';

describe('typedNumber', () => {
  it.each([
    ['47.35', 47.35],
    ['47,35', 47.35],
    [' 1 234,5 ', 1234.5],
    ['1,234.5', 1234.5],
    ['1.234,5', 1234.5],
    ['1,234,567', 1234567],
    ['0,125', 0.125],
    ['12.500', 12.5],
    ['−3', -3],
    ['.5', 0.5],
    ['', null],
  ])('reads %j', (text, value) => {
    expect(typedNumber(text)).toEqual({ value });
  });

  it('asks where a comma could mean two things', () => {
    expect(typedNumber('1,234')).toEqual({ fault: 'Write 1234 or 1.234: the comma in 1,234 could mean either.' });
  });

  it.each(['abc', '1.2.3', '1,2,3', '1,23.45', '--2', '1e5', '.', ',', '12,34,567'])('refuses %j', (text) => {
    expect(typedNumber(text)).toHaveProperty('fault');
  });

  it('reads back what it writes', () => {
    fc.assert(
      fc.property(fc.integer({ min: -1e9, max: 1e9 }), fc.integer({ min: 0, max: 6 }), (whole, digits) => {
        const value = whole / 10 ** digits;
        expect(typedNumber(numberAsTyped(value, digits))).toEqual({ value });
      }),
    );
  });
});
