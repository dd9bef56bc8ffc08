import { memo, useState } from 'react';
import { Button } from '@/app/_components/ui/button';
import { TextField } from '@/app/_components/ui/field';
import type { BlendRequest } from '@/lib/shared/blend-input';
import type { FacetView } from '@/lib/shared/facet';
import { fuzzyFilter } from '@/lib/shared/fuzzy';
import { groupedBy } from '@/lib/shared/grouped-by';
import { FacetRow } from './facet-row';

interface FacetPanelProps {
  request: BlendRequest;
  facets: readonly FacetView[];
  /** Of the target, in the order of `facets`. */
  profile: readonly number[];
  onChange: (next: BlendRequest) => void;
  /** Takes the material's profile over as a drawing. */
  onDraw: () => void;
}

/** The target's facets by family, with how much each counts; of a drawing, also how intense it shall be. */
export const FacetPanel = memo(function FacetPanel({ request, facets, profile, onChange, onDraw }: FacetPanelProps) {
  const [query, setQuery] = useState('');
  const [showsAll, setShowsAll] = useState(false);
  const { target, importance } = request;
  const isDrawn = target.kind === 'drawn';
  const rows = facets.map((facet, index) => ({
    facet,
    intensity: profile[index] ?? 0,
    weight: importance[facet.id] ?? 1,
  }));
  const counts = ({ facet, intensity, weight }: (typeof rows)[number]) =>
    intensity > 0 || weight !== 1 || (isDrawn && facet.id in target.intensities);
  const shown = query
    ? fuzzyFilter(query, rows, ({ facet }) => `${facet.name} ${facet.family}`)
    : rows.filter((row) => showsAll || counts(row));
  const families = groupedBy(shown, ({ facet }) => facet.family);

  return (
    <section aria-label="Facets of the target" className="grid gap-3">
      <div className="flex items-end justify-between gap-2">
        <h3 className="font-[560]">{isDrawn ? 'Drawn, facet by facet' : 'What counts'}</h3>
        {isDrawn ? null : (
          <Button size="small" onClick={onDraw}>
            Draw from here
          </Button>
        )}
      </div>
      <TextField
        label={<span className="sr-only">Find a facet</span>}
        placeholder="Find a facet"
        type="search"
        value={query}
        onChange={(event) => setQuery(event.target.value)}
      />
      <div className="narrow grid grid-cols-[5.8rem_minmax(0,1fr)_3.1rem] gap-x-2 text-note text-ink-soft">
        <span>Facet</span>
        <span>0–10</span>
        <span>Counts</span>
      </div>
      {[...families].map(([family, list]) => (
        <fieldset key={family} className="grid gap-1">
          <legend className="narrow mb-1 text-note text-ink-soft">{family}</legend>
          {list.map(({ facet, intensity, weight }) => (
            <FacetRow
              key={facet.id}
              facet={facet}
              intensity={intensity}
              weight={weight}
              onWeight={(next) => onChange({ ...request, importance: withWeight(importance, facet.id, next) })}
              onIntensity={
                isDrawn
                  ? (next) =>
                      onChange({
                        ...request,
                        target: { ...target, intensities: { ...target.intensities, [facet.id]: next } },
                      })
                  : undefined
              }
            />
          ))}
        </fieldset>
      ))}
      {families.size === 0 ? (
        <p className="text-ink-soft">{query ? 'No facet by that name.' : 'Nothing drawn yet.'}</p>
      ) : null}
      {query ? null : (
        <Button size="small" look="quiet" className="justify-self-start" onClick={() => setShowsAll(!showsAll)}>
          {showsAll ? 'Only those that are there' : `All ${facets.length} facets`}
        </Button>
      )}
    </section>
  );
});

function withWeight(importance: BlendRequest['importance'], id: string, weight: number): BlendRequest['importance'] {
  const { [id]: _, ...others } = importance;
  return weight === 1 ? others : { ...others, [id]: weight };
}
