import { stripSegments } from '@/app/_components/strip/segments';
import { BLANK_END, STRIP_SIZES } from '@/app/_components/strip/sizes';
import type { FacetView } from '@/lib/shared/facet';
import { facetColourOn, type Ground } from '@/lib/shared/facet-colour';
import type { MapMaterial } from './model';

/** Bands as shares of the strip's length, tip first, ready to be filled. */
export interface DrawnStrip {
  bands: { from: number; length: number; colour: string | null }[];
  /** What the strip is from far away. */
  lead: string | null;
}

export function drawnStrip(material: MapMaterial, facets: readonly FacetView[], ground: Ground): DrawnStrip {
  const { profile, phases } = material;
  const segments = stripSegments({ facets, profile, phases }, 1 - BLANK_END, STRIP_SIZES.node.most);
  const bands = segments.flatMap((segment) =>
    segment.bands.map(({ facet, y, height }) => ({
      ...{ from: y, length: height },
      colour: facet ? facetColourOn(facet, ground) : null,
    })),
  );
  return { bands, lead: bands[0]?.colour ?? null };
}

export interface Inks {
  ink: string;
  paper: string;
  wash: string;
}

export interface StripPlace {
  /** The middle of the strip, and its length, in the canvas's units. */
  x: number;
  y: number;
  length: number;
  /** One px of the screen in the canvas's units. */
  px: number;
  bold: boolean;
}

const RATIO = STRIP_SIZES.node.width / STRIP_SIZES.node.height;
/** Below this many px the bands can't be told apart: the strip is its strongest facet alone. */
const BANDS_FROM_PX = 13;

/** The smelling strip on a canvas: as in `app/_components/strip`, but drawn for hundreds at a time. */
export function drawStrip(ctx: CanvasRenderingContext2D, strip: DrawnStrip, place: StripPlace, inks: Inks): void {
  const { x, y, length, px, bold } = place;
  const width = stripWidth(length);
  const [left, top] = [x - width / 2, y - length / 2];
  const path = new Path2D();
  path.roundRect(left, top, width, length, [width / 2, width / 2, px, px]);
  if (length / px < BANDS_FROM_PX) {
    ctx.fillStyle = strip.lead ?? inks.wash;
    ctx.fill(path);
  } else {
    ctx.fillStyle = inks.paper;
    ctx.fill(path);
    ctx.save();
    ctx.clip(path);
    for (const { from, length: share, colour } of strip.bands) {
      ctx.fillStyle = colour ?? inks.wash;
      ctx.fillRect(left, top + from * length, width, share * length + 0.3 * px);
    }
    ctx.restore();
  }
  ctx.strokeStyle = inks.ink;
  ctx.lineWidth = (bold ? 2 : 0.8) * px;
  ctx.stroke(path);
}

export const stripWidth = (length: number): number => length * RATIO * 1.12;
