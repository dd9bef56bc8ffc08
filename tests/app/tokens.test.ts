import { readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { oklchToLinearSrgb } from '@/lib/shared/facet-colour';

const css = readFileSync(path.join(import.meta.dirname, '../../app/globals.css'), 'utf8');
type Theme = 'light' | 'dark';

/** The lightness of each token in both themes, read from the file that the browser reads. */
const tokens = Object.fromEntries(
  [...css.matchAll(/--([a-z-]+): light-dark\(oklch\(([\d.]+) \S+ \S+?\), oklch\(([\d.]+) /g)].map((m) => [
    m[1] ?? '',
    { light: Number(m[2]), dark: Number(m[3]) },
  ]),
);

/** Relative luminance contrast, WCAG 2.2. */
function contrast(a: string, b: string, theme: Theme): number {
  const [low = 0, high = 0] = [a, b]
    .map((name) => oklchToLinearSrgb(tokens[name]?.[theme] ?? Number.NaN, 0, 0)[1])
    .sort((x, y) => x - y);
  return (high + 0.05) / (low + 0.05);
}

describe('the tokens', () => {
  it('hold no hue: colour belongs to smell', () => {
    const chromas = [...css.matchAll(/oklch\([\d.]+ ([\d.]+)/g)].map((m) => Number(m[1]));
    expect(chromas.length).toBeGreaterThan(20);
    expect(chromas.filter((chroma) => chroma !== 0)).toEqual([]);
    expect(css).not.toMatch(/#[0-9a-f]{3,8}\b|rgba?\(|hsla?\(|\b(red|green|blue|orange|purple)\b/i);
  });

  for (const theme of ['light', 'dark'] as const) {
    for (const ink of ['ink', 'ink-soft', 'ink-faint'])
      for (const ground of ['bench', 'paper', 'wash'])
        it(`keep ${ink} readable on ${ground} in the ${theme} theme (4.5:1)`, () => {
          expect(contrast(ink, ground, theme)).toBeGreaterThanOrEqual(4.5);
        });

    it(`keep text readable on ink in the ${theme} theme`, () => {
      expect(contrast('on-ink', 'ink', theme)).toBeGreaterThanOrEqual(7);
      expect(contrast('on-ink', 'ink-hover', theme)).toBeGreaterThanOrEqual(7);
    });

    it(`edge what can be used at 3:1 in the ${theme} theme`, () => {
      expect(contrast('rule', 'paper', theme)).toBeGreaterThanOrEqual(3);
      expect(contrast('rule', 'bench', theme)).toBeGreaterThanOrEqual(3);
    });
  }
});
