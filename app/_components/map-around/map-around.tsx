import Link from 'next/link';
import type { FacetTone } from '@/lib/shared/facet';
import type { Phase } from '../strip/segments';
import { Strip } from '../strip/strip';
import { lengthOfImpact, type Place, ringPlaces } from './ring';

export interface AroundMaterial {
  id: string;
  name: string;
  /** Intensities in the order of `facets`. */
  profile: ArrayLike<number>;
  phases?: Partial<Record<Phase, ArrayLike<number>>>;
}

export interface MapAroundProps {
  facets: readonly FacetTone[];
  target: AroundMaterial;
  /** The chosen materials with their share of the blend's impact, 0..1. */
  nodes: readonly (AroundMaterial & { impact: number })[];
  /** Which of them are alike, and how much (0..1); the target may be among them. */
  links?: readonly { a: string; b: string; similarity: number }[];
  /** Where a name leads; by default to the material's page. */
  hrefOf?: (id: string) => string;
}

const twoDigits = new Intl.NumberFormat('en-GB', { maximumSignificantDigits: 2 });
const MIDDLE: Place = { x: 50, y: 50 };

/**
 * The target and what stands in for it: each chosen material hangs on the target by a line as thick as its share of the
 * impact, and thin lines join those that smell alike. Plain markup without script: the words are its table twin.
 */
export function MapAround({ facets, target, nodes, links = [], hrefOf = materialHref }: MapAroundProps) {
  const ordered = [...nodes].sort((a, b) => b.impact - a.impact || (a.id < b.id ? -1 : 1));
  const places = ringPlaces(ordered.length);
  const placeOf = new Map<string, Place>(ordered.map(({ id }, index) => [id, places[index] ?? MIDDLE]));
  placeOf.set(target.id, MIDDLE);
  const largest = ordered[0]?.impact ?? 0;
  return (
    <figure className="relative h-[34rem] w-full sm:h-[27rem]">
      <figcaption className="sr-only">
        {target.name} and the {ordered.length} materials that stand in for it, by their share of the impact.
      </figcaption>
      <Threads ordered={ordered} links={links} placeOf={placeOf} target={target.id} />
      <At place={MIDDLE}>
        <Strip size="line" facets={facets} profile={target.profile} phases={target.phases} decorative />
        <span className="max-w-36 bg-paper px-1 text-center font-[600]">{target.name}</span>
      </At>
      <ul>
        {ordered.map((node) => (
          <li key={node.id}>
            <At place={placeOf.get(node.id) ?? MIDDLE}>
              <span style={{ zoom: lengthOfImpact(node.impact, largest) }}>
                <Strip size="line" facets={facets} profile={node.profile} phases={node.phases} decorative />
              </span>
              <Link
                href={hrefOf(node.id)}
                className="max-w-28 bg-paper px-1 text-center leading-tight hover:underline sm:max-w-36"
              >
                {node.name}
              </Link>
              <span className="figures bg-paper px-1 text-note text-ink-soft">
                {twoDigits.format(100 * node.impact)}&nbsp;% <span className="sr-only">of the impact</span>
              </span>
            </At>
          </li>
        ))}
      </ul>
    </figure>
  );
}

const materialHref = (id: string) => `/materials/${id}`;

function At({ place, children }: { place: Place; children: React.ReactNode }) {
  return (
    <span
      className="absolute grid -translate-x-1/2 -translate-y-1/2 justify-items-center gap-0.5"
      style={{ left: `${place.x}%`, top: `${place.y}%` }}
    >
      {children}
    </span>
  );
}

interface ThreadsProps extends Required<Pick<MapAroundProps, 'links'>> {
  ordered: MapAroundProps['nodes'];
  placeOf: ReadonlyMap<string, Place>;
  target: string;
}

function Threads({ ordered, links, placeOf, target }: ThreadsProps) {
  const among = links.filter(({ a, b }) => a !== target && b !== target && placeOf.has(a) && placeOf.has(b));
  return (
    <svg className="absolute inset-0 size-full" viewBox="0 0 100 100" preserveAspectRatio="none" aria-hidden="true">
      {among.map(({ a, b }) => (
        <Thread key={`${a} ${b}`} from={placeOf.get(a)} to={placeOf.get(b)} width={1} colour="var(--grout)" />
      ))}
      {ordered.map(({ id, impact }) => (
        <Thread key={id} from={MIDDLE} to={placeOf.get(id)} width={1 + 11 * impact} colour="var(--ink)" />
      ))}
    </svg>
  );
}

function Thread({ from, to, width, colour }: { from?: Place; to?: Place; width: number; colour: string }) {
  if (!from || !to) return null;
  return (
    <line
      x1={from.x}
      y1={from.y}
      x2={to.x}
      y2={to.y}
      vectorEffect="non-scaling-stroke"
      strokeWidth={width}
      style={{ stroke: colour }}
    />
  );
}
