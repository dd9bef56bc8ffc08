import type { FacetTone } from './facet';

/*
 * The one way from a facet to a colour. The hue is the facet's; its lightness is moved to where a band can be told
 * from paper (light) or from near-black (dark); the chroma is what a watercolour of that depth would have, and never
 * more than sRGB holds there, so that every screen shows the same colour and nothing is clipped.
 */

type Tone = Pick<FacetTone, 'hueDeg' | 'lightness'>;

const GROUNDS = {
  light: { darkest: 0.48, lightest: 0.815, deepest: 0.15, palest: 0.1 },
  dark: { darkest: 0.52, lightest: 0.84, deepest: 0.14, palest: 0.095 },
} as const;
export type Ground = keyof typeof GROUNDS;

/** The lightnesses that `facetHues` gives out; they are spread over what each ground can carry. */
const GIVEN = { darkest: 0.46, lightest: 0.78 };

/** Lightness, chroma and hue of a facet on one ground. */
export function facetLch(tone: Tone, ground: Ground): { l: number; c: number; h: number } {
  const { darkest, lightest, deepest, palest } = GROUNDS[ground];
  const part = Math.min(1, Math.max(0, (tone.lightness - GIVEN.darkest) / (GIVEN.lightest - GIVEN.darkest)));
  const l = darkest + part * (lightest - darkest);
  const h = ((tone.hueDeg % 360) + 360) % 360;
  // A pale tone at full chroma glares beside a pale one whose hue has none to give, as yellow-green does beside violet.
  const most = deepest + part * (palest - deepest);
  return { l, c: Math.min(most, chromaInGamut(l, h)), h };
}

/** For a canvas, which must know its theme; elsewhere `facetColour` follows the theme by itself. */
export function facetColourOn(tone: Tone, ground: Ground): string {
  const { l, c, h } = facetLch(tone, ground);
  return `oklch(${l.toFixed(3)} ${c.toFixed(3)} ${h.toFixed(1)})`;
}

/** A CSS colour that follows the theme: for `style`, as in `{ '--facet': facetColour(tone) }` or `{ fill: ... }`. */
export function facetColour(tone: Tone): string {
  const known = colours.get(tone);
  if (known) return known;
  const colour = `light-dark(${facetColourOn(tone, 'light')}, ${facetColourOn(tone, 'dark')})`;
  colours.set(tone, colour);
  return colour;
}

/** A facet keeps its colour and is asked for it at every band of every strip. */
const colours = new WeakMap<Tone, string>();

/** The largest chroma at this lightness and hue that sRGB can show, by bisection to 1/2000. */
export function chromaInGamut(l: number, h: number): number {
  let inside = 0;
  let outside = 0.4;
  while (outside - inside > 0.0005) {
    const c = (inside + outside) / 2;
    if (isInSrgb(oklchToLinearSrgb(l, c, h))) inside = c;
    else outside = c;
  }
  return inside;
}

const isInSrgb = (rgb: readonly number[]): boolean => rgb.every((v) => v >= -1e-6 && v <= 1 + 1e-6);

/** OKLCH to linear sRGB by Ottosson's matrices (2020, as printed in CSS Color 4). */
export function oklchToLinearSrgb(l: number, c: number, h: number): [number, number, number] {
  const a = c * Math.cos((h * Math.PI) / 180);
  const b = c * Math.sin((h * Math.PI) / 180);
  const long = (l + 0.3963377774 * a + 0.2158037573 * b) ** 3;
  const medium = (l - 0.1055613458 * a - 0.0638541728 * b) ** 3;
  const short = (l - 0.0894841775 * a - 1.291485548 * b) ** 3;
  return [
    4.0767416621 * long - 3.3077115913 * medium + 0.2309699292 * short,
    -1.2684380046 * long + 2.6097574011 * medium - 0.3413193965 * short,
    -0.0041960863 * long - 0.7034186147 * medium + 1.707614701 * short,
  ];
}

/** The engraver's hatchings, a second cue beside the hue: one per tenth of the circle, neighbours unlike. */
export const HATCHINGS = ['plain', 'slant', 'dots', 'level', 'counter'] as const;
export type Hatching = (typeof HATCHINGS)[number];

export function facetHatching(tone: Tone): Hatching {
  const tenth = Math.floor((((tone.hueDeg % 360) + 360) % 360) / 36);
  return HATCHINGS[tenth % HATCHINGS.length] ?? 'plain';
}
