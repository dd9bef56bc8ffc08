import { useId } from 'react';
import type { FacetTone } from '@/lib/shared/facet';
import { facetColour } from '@/lib/shared/facet-colour';
import { smellInWords } from '@/lib/shared/strip-bands';
import { Hatchings, hatchingFill } from '../hatchings';
import { ChartTable } from './chart-table';
import { type Petal, petalPath, petals } from './petals';

export interface PolarProps {
  facets: readonly FacetTone[];
  profile: ArrayLike<number>;
  /** Whose shape it is; begins the description. */
  name: string;
  /** Standard deviation between noses, drawn as a whisker on each petal. */
  spread?: ArrayLike<number>;
}

const RADIUS = 150;
const HEART = 8;
const MARGIN = 74;
const SIDE = 2 * (RADIUS + MARGIN);
const reach = (intensity: number) => HEART + (Math.min(10, intensity) / 10) * (RADIUS - HEART);

/** One shape, looked at alone: a flower with a petal for each facet, as long as it is intense. */
export function Polar({ facets, profile, name, spread }: PolarProps) {
  const id = useId();
  const shape = petals(facets, profile);
  const halfWidth = Math.min(26, (Math.PI * RADIUS * 0.74) / Math.max(3, shape.length));
  const sdOf = (facet: FacetTone) => spread?.[facets.indexOf(facet)] ?? 0;
  return (
    <figure>
      <svg
        viewBox={`${-SIDE / 2} ${-SIDE / 2} ${SIDE} ${SIDE}`}
        role="img"
        aria-label={`${name}: ${smellInWords(profile, facets)}`}
        className="mx-auto block w-full max-w-[29rem] overflow-visible"
      >
        <Hatchings id={id} />
        {[2.5, 5, 7.5, 10].map((ring) => (
          <circle
            key={ring}
            r={reach(ring)}
            fill="none"
            style={{ stroke: 'var(--grout)' }}
            strokeDasharray={ring === 10 ? undefined : '2 4'}
          />
        ))}
        {shape.map((petal) => (
          <PetalShape key={petal.facet.id} petal={petal} halfWidth={halfWidth} hatchId={id} sd={sdOf(petal.facet)} />
        ))}
        <circle r={HEART * 0.6} style={{ fill: 'var(--paper)', stroke: 'var(--ink)' }} />
        {shape.map((petal) => (
          <PetalWord key={petal.facet.id} petal={petal} />
        ))}
      </svg>
      <ChartTable
        caption={`${name}, intensity of each facet from 0 to 10`}
        head={spread ? ['Facet', 'Intensity', 'Spread'] : ['Facet', 'Intensity']}
        rows={shape.map(({ facet, intensity }) => [
          facet.name,
          intensity.toFixed(1),
          ...(spread ? [`± ${sdOf(facet).toFixed(1)}`] : []),
        ])}
      />
    </figure>
  );
}

function PetalShape({
  petal,
  halfWidth,
  hatchId,
  sd,
}: {
  petal: Petal;
  halfWidth: number;
  hatchId: string;
  sd: number;
}) {
  const { facet, intensity, angle } = petal;
  const outline = petalPath(reach(intensity), halfWidth);
  return (
    <g transform={`rotate(${angle})`}>
      <path d={outline} style={{ fill: facetColour(facet) }} fillOpacity="0.92" />
      <path d={outline} fill={hatchingFill(hatchId, facet)} style={{ stroke: 'var(--ink)' }} strokeWidth="1" />
      <path
        d={`M0 ${-HEART}V${-reach(intensity) * 0.62}`}
        style={{ stroke: 'var(--ink)' }}
        strokeWidth="0.6"
        strokeOpacity="0.5"
      />
      {sd > 0 ? (
        <path
          d={`M0 ${-reach(Math.max(0, intensity - sd))}V${-reach(intensity + sd)}`}
          style={{ stroke: 'var(--ink)' }}
          strokeWidth="1.6"
        />
      ) : null}
    </g>
  );
}

function PetalWord({ petal }: { petal: Petal }) {
  const turn = (petal.angle * Math.PI) / 180;
  const x = Math.sin(turn) * (RADIUS + 12);
  const y = -Math.cos(turn) * (RADIUS + 12);
  const anchor = Math.abs(x) < 24 ? 'middle' : x > 0 ? 'start' : 'end';
  return (
    <text x={x} y={y} dy="0.34em" textAnchor={anchor} style={{ fill: 'var(--ink)', fontSize: 13 }}>
      {petal.facet.name}
    </text>
  );
}
