import { type Segment, spreadLabels } from './segments';

const GAP = 17;
const PHASE_WORDS = { opening: 'Opening', heart: 'Heart', dry: 'Dry phase' } as const;

/** The words beside a large strip, each led to its band by a line, and the phases named at the far edge. */
export function StripLabels({ segments, x, length }: { segments: Segment[]; x: number; length: number }) {
  const bands = segments.flatMap((segment) => segment.bands.map((band) => ({ ...band, segment: segment.y })));
  const wanted = bands.map(({ y, height }) => y + height / 2);
  const placed = spreadLabels(wanted, Math.min(GAP, length / Math.max(1, bands.length)), length - 8);
  return (
    <g className="figures" style={{ fontSize: 13 }}>
      {bands.map((band, index) => {
        const at = wanted[index] ?? 0;
        const to = placed[index] ?? at;
        return (
          <g key={`${band.segment}-${band.facet?.id ?? 'other'}`}>
            <path d={`M${x + 1} ${at}h5L${x + 18} ${to}h6`} fill="none" style={{ stroke: 'var(--rule)' }} />
            <text x={x + 29} y={to} dy="0.34em" style={{ fill: band.facet ? 'var(--ink)' : 'var(--ink-soft)' }}>
              {band.facet?.name ?? 'other'}
            </text>
            <text x={x + 186} y={to} dy="0.34em" textAnchor="end" style={{ fill: 'var(--ink-soft)' }}>
              {Math.round(band.share * 100)}&thinsp;%
            </text>
          </g>
        );
      })}
      {segments.map(({ phase, y }) =>
        phase ? (
          <text
            key={phase}
            x={-10}
            y={y + 6}
            transform={`rotate(-90 -10 ${y + 6})`}
            textAnchor="end"
            style={{ fill: 'var(--ink-soft)', fontSize: 12 }}
          >
            {PHASE_WORDS[phase]}
          </text>
        ) : null,
      )}
    </g>
  );
}
