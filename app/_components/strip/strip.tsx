import { useId } from 'react';
import { facetColour } from '@/lib/shared/facet-colour';
import { smellInWords } from '@/lib/shared/strip-bands';
import { Hatchings, hatchingFill } from '../hatchings';
import { type LaidBand, type Segment, type StripContent, stripSegments } from './segments';
import { BLANK_END, STRIP_SIZES, type StripSize } from './sizes';
import { StripLabels } from './strip-labels';

export interface StripProps extends StripContent {
  size: StripSize;
  /** How long it can be smelt on a blotter; said in words. */
  lastsHours?: number | null;
  /** Put before the words: "Rose oil: mostly rosy ...". */
  name?: string;
  /** Where the same words stand beside it, a screen reader need not hear them twice. */
  decorative?: boolean;
  /** Words beside the bands; by default on the page alone. */
  labels?: boolean;
  className?: string;
}

const LABEL_WIDTH = 190;

/**
 * The smelling strip: a material's facets as bands, thickness by share, tip (opening) above, held end blank.
 * It has no state and no script, so it is the same in a table, on a page and on paper.
 */
export function Strip({
  size,
  lastsHours,
  name,
  decorative,
  labels = size === 'page',
  className,
  ...content
}: StripProps) {
  const id = useId();
  const { width, height, most, hatched } = STRIP_SIZES[size];
  const segments = stripSegments(content, height * (1 - BLANK_END), most);
  const words = smellInWords(content.profile, content.facets, lastsHours);
  const full = labels ? width + LABEL_WIDTH : width;
  const spoken = decorative
    ? { 'aria-hidden': true }
    : { role: 'img', 'aria-label': name ? `${name}: ${words}` : words };
  return (
    // biome-ignore lint/a11y/noSvgWithoutTitle: named by aria-label, or hidden where the words stand beside it
    <svg
      width={full}
      height={height}
      viewBox={`0 0 ${full} ${height}`}
      className={className}
      style={{ flex: 'none', overflow: 'visible' }}
      {...spoken}
    >
      <clipPath id={`${id}-paper`}>
        <path d={paper(width, height)} />
      </clipPath>
      {hatched ? <Hatchings id={id} /> : null}
      <path d={paper(width, height)} style={{ fill: 'var(--paper)' }} />
      <g clipPath={`url(#${id}-paper)`}>
        {segments.map((segment) => (
          <SegmentBands key={segment.y} segment={segment} width={width} hatchId={hatched ? id : null} />
        ))}
      </g>
      <path
        d={paper(width, height)}
        fill="none"
        style={{ stroke: 'var(--ink)' }}
        strokeWidth={size === 'page' ? 1.25 : 1}
      />
      {labels ? <StripLabels segments={segments} x={width} length={height} /> : null}
    </svg>
  );
}

function SegmentBands({ segment, width, hatchId }: { segment: Segment; width: number; hatchId: string | null }) {
  const end = segment.y + segment.height;
  return (
    <>
      {segment.bands.map((band) => (
        <Band key={band.facet?.id ?? 'other'} band={band} width={width} hatchId={hatchId} />
      ))}
      <path d={`M0 ${end}H${width}`} style={{ stroke: 'var(--ink)' }} strokeWidth={width > 30 ? 1.25 : 1} />
    </>
  );
}

function Band({ band, width, hatchId }: { band: LaidBand; width: number; hatchId: string | null }) {
  const { facet, y, height } = band;
  const box = { x: 0, y, width, height };
  // Thin bands would be all line, so the line between bands fades with them.
  const line = { stroke: 'var(--ink)', strokeOpacity: height > 3 ? 0.55 : 0.2 };
  return (
    <>
      <rect {...box} style={{ fill: facet ? facetColour(facet) : 'var(--wash)' }} />
      {facet && hatchId ? <rect {...box} fill={hatchingFill(hatchId, facet)} /> : null}
      <path d={`M0 ${y}H${width}`} style={line} strokeWidth={width > 30 ? 1 : 0.6} />
    </>
  );
}

/** The outline: a round tip above, a cut end below. */
function paper(width: number, height: number): string {
  const inset = 0.5;
  const tip = width / 2 - inset;
  const foot = Math.min(2, width / 8);
  return [
    `M${inset} ${tip + inset}`,
    `a${tip} ${tip} 0 0 1 ${2 * tip} 0`,
    `V${height - inset - foot}`,
    `q0 ${foot} ${-foot} ${foot}`,
    `H${inset + foot}`,
    `q${-foot} 0 ${-foot} ${-foot}`,
    'Z',
  ].join('');
}
