import { useId } from 'react';
import type { FacetTone } from '@/lib/shared/facet';
import { facetColour } from '@/lib/shared/facet-colour';
import { FacetSwatch } from '../facet-swatch';
import { Hatchings, hatchingFill } from '../hatchings';
import { classNames } from '../ui/class-names';
import { ChartTable } from './chart-table';
import { type CourseLayer, type CoursePoint, courseLayers, logHours } from './course-layers';

export interface CourseOverTimeProps {
  facets: readonly FacetTone[];
  /** At least two times after 0. */
  course: readonly CoursePoint[];
  name: string;
  most?: number;
}

const SIZE = { width: 720, height: 280 };
const TIMES: readonly [hours: number, words: string][] = [
  [0.05, '3 min'],
  [0.25, '15 min'],
  [1, '1 h'],
  [4, '4 h'],
  [24, '1 day'],
  [72, '3 days'],
  [168, '1 week'],
  [672, '4 weeks'],
];

export const timeInWords = (hours: number): string =>
  TIMES.find(([time]) => Math.abs(time - hours) < time * 1e-6)?.[1] ??
  (hours < 1
    ? `${Math.round(hours * 60)} min`
    : hours < 48
      ? `${Number(hours.toPrecision(2))} h`
      : `${Math.round(hours / 24)} days`);

/** How it smells as it dries down: stacked areas over the hours, logarithmic, because a nose comes back ever later. */
export function CourseOverTime({ facets, course, name, most = 7 }: CourseOverTimeProps) {
  const id = useId();
  const layers = courseLayers(course, facets, most, SIZE);
  const along = logHours(course);
  const last = Math.max(...course.map((point) => point.hours));
  const marks = TIMES.filter(
    ([hours]) => hours <= last && (along(hours) > 0 || hours === course.find((p) => p.hours > 0)?.hours),
  );
  return (
    <figure>
      <div className="relative">
        <svg
          viewBox={`0 0 ${SIZE.width} ${SIZE.height}`}
          role="img"
          aria-label={courseInWords(name, layers)}
          className="block w-full"
        >
          <Hatchings id={id} />
          {layers.map((layer) => (
            <Layer key={layer.facet?.id ?? 'other'} layer={layer} hatchId={id} />
          ))}
          {marks.map(([hours]) => (
            <path
              key={hours}
              d={`M${along(hours) * SIZE.width} 0V${SIZE.height}`}
              style={{ stroke: 'var(--ink)' }}
              strokeOpacity="0.25"
              strokeDasharray="1 4"
            />
          ))}
        </svg>
        {layers.map((layer) => (
          <LayerWord key={layer.facet?.id ?? 'other'} layer={layer} />
        ))}
      </div>
      <div aria-hidden="true" className="narrow relative h-6 border-t border-ink text-note text-ink-soft">
        {marks.map(([hours, words], index) => (
          <TimeWord
            key={hours}
            at={along(hours)}
            next={index + 1 < marks.length ? along(marks[index + 1]?.[0] ?? hours) : 2}
          >
            {words}
          </TimeWord>
        ))}
      </div>
      <ul className="mt-2 flex flex-wrap gap-x-4 gap-y-1">
        {layers.map(({ facet }) => (
          <li key={facet?.id ?? 'other'} className="inline-flex items-center gap-1.5">
            <FacetSwatch facet={facet} />
            {facet?.name ?? 'other'}
          </li>
        ))}
      </ul>
      <ChartTable
        caption={`${name} over time`}
        head={['Time', ...layers.map(({ facet }) => facet?.name ?? 'other')]}
        rows={course.map(({ hours }, row) => [
          timeInWords(hours),
          ...layers.map(({ values }) => (values[row] ?? 0).toFixed(1)),
        ])}
      />
    </figure>
  );
}

/** A word under its line, kept within the axis; where the next is near, a phone leaves this one out. */
function TimeWord({ at, next, children }: { at: number; next: number; children: string }) {
  const shift = at < 0.04 ? '' : at > 0.94 ? '-translate-x-full' : '-translate-x-1/2';
  return (
    <span
      className={classNames('absolute top-1 whitespace-nowrap', shift, next - at < 0.16 && 'max-sm:hidden')}
      style={{ left: `${at * 100}%` }}
    >
      {children}
    </span>
  );
}

function Layer({ layer: { facet, path }, hatchId }: { layer: CourseLayer; hatchId: string }) {
  return (
    <>
      <path d={path} style={{ fill: facet ? facetColour(facet) : 'var(--wash)' }} />
      <path
        d={path}
        fill={facet ? hatchingFill(hatchId, facet) : 'none'}
        style={{ stroke: 'var(--ink)' }}
        strokeWidth="0.9"
      />
    </>
  );
}

/** The word in its own layer, on a slip of paper, where the layer is thick enough to hold it. */
function LayerWord({ layer: { facet, label } }: { layer: CourseLayer }) {
  if (!facet || label.thickness < 34) return null;
  return (
    <span
      aria-hidden="true"
      className="absolute hidden -translate-x-1/2 -translate-y-1/2 rounded-tile border border-ink bg-paper px-1.5 text-note md:block"
      style={{ left: `${(label.x / SIZE.width) * 100}%`, top: `${(label.y / SIZE.height) * 100}%` }}
    >
      {facet.name}
    </span>
  );
}

/** "Rose over time: rosy first, honeyed at the end." */
function courseInWords(name: string, layers: CourseLayer[]): string {
  const largestAt = (row: number) =>
    layers
      .filter(({ facet }) => facet)
      .toSorted((a, b) => (b.values.at(row) ?? 0) - (a.values.at(row) ?? 0))[0]
      ?.facet?.name.toLowerCase();
  const first = largestAt(0);
  const end = largestAt(-1);
  if (!first) return `${name} over time: no smell`;
  return first === end
    ? `${name} over time: mostly ${first} throughout`
    : `${name} over time: mostly ${first} first, ${end} at the end`;
}
