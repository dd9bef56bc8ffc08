import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { casCheckDigit, casFault } from '@/lib/shared/cas';

const digits = fc
  .tuple(fc.integer({ min: 10, max: 9_999_999 }), fc.integer({ min: 0, max: 99 }))
  .map(([head, middle]) => [String(head), String(middle).padStart(2, '0')] as const);

describe('a CAS number', () => {
  // Numbers as printed in public registers; water's is the usual worked example of the check digit.
  it.each(['7732-18-5', '106-22-9', '78-70-6', '60-12-8', '8000-28-0', '1222-05-5'])('%s passes', (cas) => {
    expect(casFault(cas)).toBeNull();
  });

  it('passes with its own check digit and with no other', () => {
    fc.assert(
      fc.property(digits, ([head, middle]) => {
        const right = casCheckDigit(head + middle);
        for (let last = 0; last <= 9; last++)
          expect(casFault(`${head}-${middle}-${last}`) === null).toBe(last === right);
      }),
    );
  });

  it('fails when a single digit of the first part is mistyped, unless its place is one that the sum cannot see', () => {
    fc.assert(
      fc.property(digits, fc.nat(), fc.integer({ min: 1, max: 9 }), ([head, middle], at, by) => {
        const place = at % head.length;
        const wrong = [...head];
        wrong[place] = String((Number(head[place]) + by) % 10);
        if (wrong[0] === '0') return;
        const weight = head.length - place + 2;
        const change = Number(wrong[place]) - Number(head[place]);
        const cas = `${wrong.join('')}-${middle}-${casCheckDigit(head + middle)}`;
        expect(casFault(cas) === null).toBe((weight * change) % 10 === 0);
      }),
    );
  });

  it('says which digit was expected, and which shape', () => {
    expect(casFault('106-22-8')).toContain('would end in 9');
    expect(casFault('106229')).toContain('must look like');
    expect(casFault('')).toContain('must look like');
  });
});
