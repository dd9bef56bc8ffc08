'use client';

import { Button } from '@/app/_components/ui/button';
import { Checkbox } from '@/app/_components/ui/switch';
import { facetColour } from '@/lib/shared/facet-colour';
import type { RelatedMap } from '@/lib/shared/related';
import { useMapState } from '../_client/map-state';
import type { MapMaterial } from '../_client/model';

/** Families with the colours of their facets; ticking some shows only the materials that lead with them. */
export function Legend({ map, all }: { map: RelatedMap; all: readonly MapMaterial[] }) {
  const [{ family }, setState] = useMapState();
  const families = [...new Set(map.facets.map((facet) => facet.family))];
  const toggle = (name: string) =>
    setState({ family: family.includes(name) ? family.filter((each) => each !== name) : [...family, name] });
  return (
    <fieldset>
      <legend className="mb-1.5 font-[560]">Families</legend>
      <ul className="grid">
        {families.map((name) => (
          <li key={name} className="flex items-center gap-2">
            <Checkbox label={name} checked={family.includes(name)} onChange={() => toggle(name)} className="flex-1" />
            <Colours facets={map.facets.filter((facet) => facet.family === name)} />
            <span className="figures w-6 text-right text-note text-ink-soft">
              {all.filter((each) => each.family === name).length}
            </span>
          </li>
        ))}
      </ul>
      {family.length > 0 ? (
        <Button look="quiet" size="small" className="mt-2" onClick={() => setState({ family: [] })}>
          Show all families
        </Button>
      ) : (
        <p className="mt-2 text-note text-ink-soft">None ticked: all are shown. Counted by the strongest facet.</p>
      )}
    </fieldset>
  );
}

function Colours({ facets }: { facets: RelatedMap['facets'] }) {
  return (
    <span aria-hidden="true" className="flex h-4 w-12 overflow-hidden rounded-[1px] border border-ink">
      {facets.map((facet) => (
        <span key={facet.id} className="flex-1" style={{ background: facetColour(facet) }} />
      ))}
    </span>
  );
}
