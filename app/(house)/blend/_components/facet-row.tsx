import type { FacetView } from '@/lib/shared/facet';
import { facetColour } from '@/lib/shared/facet-colour';

const WEIGHTS: readonly [weight: number, words: string][] = [
  [0, 'no'],
  [0.5, '× ½'],
  [1, '× 1'],
  [2, '× 2'],
  [4, '× 4'],
];

interface FacetRowProps {
  facet: FacetView;
  intensity: number;
  weight: number;
  onWeight: (weight: number) => void;
  /** Missing where the profile is a material's own. */
  onIntensity?: (intensity: number) => void;
}

/** One bar, drawn by pulling it; underneath lies the browser's own slider, with its keys. */
export function FacetRow({ facet, intensity, weight, onWeight, onIntensity }: FacetRowProps) {
  return (
    <div className="grid min-h-7 grid-cols-[5.8rem_minmax(0,1fr)_3.1rem] items-center gap-x-2">
      <span className={weight === 0 ? 'truncate text-ink-faint line-through' : 'truncate'} title={facet.description}>
        {facet.name}
      </span>
      <span className="relative flex h-6 items-center gap-1.5">
        <span className="relative h-3.5 flex-1 border-l border-ink bg-[linear-gradient(to_right,transparent_calc(100%-1px),var(--grout)_0)] bg-[length:20%_100%] has-focus-visible:outline-2 has-focus-visible:outline-offset-4 has-focus-visible:outline-ink">
          <span
            aria-hidden="true"
            className="absolute inset-y-0 left-0 border border-l-0 border-ink"
            style={{
              width: `${intensity * 10}%`,
              background: facetColour(facet),
              opacity: weight === 0 ? 0.35 : 1,
              visibility: intensity > 0 ? 'visible' : 'hidden',
            }}
          />
          {onIntensity ? (
            <>
              <span
                aria-hidden="true"
                className="absolute -inset-y-1 w-2 -translate-x-1/2 rounded-strip border-[1.5px] border-ink bg-paper"
                style={{ left: `${intensity * 10}%` }}
              />
              <input
                type="range"
                min={0}
                max={10}
                step={0.1}
                value={intensity}
                aria-label={`${facet.name}, intensity`}
                onChange={(event) => onIntensity(Number(event.target.value))}
                className="absolute -inset-y-2 left-[-8px] w-[calc(100%+16px)] cursor-ew-resize touch-pan-y opacity-0"
              />
            </>
          ) : null}
        </span>
        <span className="figures w-6 text-right text-note">{intensity.toFixed(1)}</span>
      </span>
      <select
        aria-label={`How much ${facet.name} counts`}
        value={weight}
        onChange={(event) => onWeight(Number(event.target.value))}
        className={`min-h-6 w-full rounded-tile border bg-paper px-0.5 text-note ${weight === 1 ? 'border-grout text-ink-soft' : 'border-ink font-[560]'}`}
      >
        {WEIGHTS.map(([value, words]) => (
          <option key={value} value={value}>
            {words}
          </option>
        ))}
      </select>
    </div>
  );
}
