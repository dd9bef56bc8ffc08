'use client';

import { curveMonotoneX, line } from 'd3-shape';
import { useId } from 'react';
import { classNames } from '../ui/class-names';
import { ChartTable } from './chart-table';
import { roundScale, type Scale } from './frontier-scale';

export interface FrontierChartPoint {
  id: string;
  price: number;
  distance: number;
}

export interface FrontierProps {
  /** Cheapest first. */
  points: readonly FrontierChartPoint[];
  selectedId: string | null;
  onSelect: (id: string) => void;
  /** E.g. "EUR per kg", or "EUR per 1,000 units of impact". */
  priceUnit: string;
  label?: string;
}

const amount = new Intl.NumberFormat('en-GB', { maximumFractionDigits: 2 });

/**
 * Price against closeness, as a line whose points can be picked: one tab stop, arrows go along the line. The points
 * are radio buttons laid over the drawing, so they keep their size on a phone.
 */
export function Frontier({
  points,
  selectedId,
  onSelect,
  priceUnit,
  label = 'Price against closeness',
}: FrontierProps) {
  const group = useId();
  if (points.length === 0) return null;
  const x = roundScale(
    points.map((point) => point.price),
    4,
  );
  const y = roundScale(
    points.map((point) => point.distance),
    4,
    true,
  );
  return (
    <figure>
      <div className="grid grid-cols-[auto_1fr] gap-x-2">
        <span className="narrow col-start-2 pb-2 text-note text-ink-soft">
          Distance, in points of the 0–10 scale; lower is closer
        </span>
        <Ticks scale={y} side="left" />
        <div className="relative h-56 border-b border-l border-ink">
          <Curve points={points} x={x} y={y} />
          <div role="radiogroup" aria-label={label}>
            {points.map((point) => (
              <label
                key={point.id}
                className="absolute grid size-7 -translate-x-1/2 translate-y-1/2 place-items-center rounded-strip has-focus-visible:outline-2 has-focus-visible:outline-ink"
                style={{ left: `${x.at(point.price)}%`, bottom: `${y.at(point.distance)}%` }}
              >
                <input
                  type="radio"
                  name={group}
                  checked={point.id === selectedId}
                  onChange={() => onSelect(point.id)}
                  aria-label={`${amount.format(point.price)} ${priceUnit}, distance ${amount.format(point.distance)}`}
                  className="peer absolute inset-0 appearance-none rounded-strip outline-none"
                />
                <span className="pointer-events-none size-2.5 rounded-strip border-[1.5px] border-ink bg-paper peer-checked:size-4 peer-checked:bg-ink" />
              </label>
            ))}
          </div>
        </div>
        <span />
        <Ticks scale={x} side="below" />
        <span className="narrow col-start-2 text-note text-ink-soft">{priceUnit}</span>
      </div>
      <ChartTable
        caption={label}
        head={[`Price, ${priceUnit}`, 'Distance']}
        rows={points.map((point) => [amount.format(point.price), point.distance.toFixed(2)])}
      />
    </figure>
  );
}

function Curve({ points, x, y }: { points: readonly FrontierChartPoint[]; x: Scale; y: Scale }) {
  const path = line<FrontierChartPoint>()
    .x((point) => x.at(point.price))
    .y((point) => 100 - y.at(point.distance))
    .curve(curveMonotoneX)([...points]);
  return (
    <svg
      viewBox="0 0 100 100"
      preserveAspectRatio="none"
      aria-hidden="true"
      className="absolute inset-0 size-full overflow-visible"
    >
      {y.ticks.slice(1).map((tick) => (
        <path
          key={tick}
          d={`M0 ${100 - y.at(tick)}H100`}
          style={{ stroke: 'var(--grout)' }}
          vectorEffect="non-scaling-stroke"
        />
      ))}
      <path
        d={path ?? ''}
        fill="none"
        style={{ stroke: 'var(--ink)' }}
        strokeWidth="1.5"
        vectorEffect="non-scaling-stroke"
      />
    </svg>
  );
}

function Ticks({ scale, side }: { scale: Scale; side: 'left' | 'below' }) {
  return (
    <div
      aria-hidden="true"
      className={classNames('figures relative text-note text-ink-soft', side === 'below' ? 'h-5' : 'w-7')}
    >
      {scale.ticks.map((tick) => (
        <span
          key={tick}
          className={classNames(
            'absolute whitespace-nowrap',
            side === 'below' ? 'top-1 -translate-x-1/2' : 'right-0 translate-y-1/2',
          )}
          style={side === 'below' ? { left: `${scale.at(tick)}%` } : { bottom: `${scale.at(tick)}%` }}
        >
          {amount.format(tick)}
        </span>
      ))}
    </div>
  );
}
