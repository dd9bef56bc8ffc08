'use client';

import { Strip } from '@/app/_components/strip/strip';
import { Choice } from '@/app/_components/ui/choice';
import { Combobox } from '@/app/_components/ui/combobox';
import { Slider } from '@/app/_components/ui/slider';
import { LEAST_ALIKE, type RelatedMap } from '@/lib/shared/related';
import { likenessOf, useMapState } from '../_client/map-state';
import type { MapMaterial, MapView } from '../_client/model';
import { Legend } from './legend';

interface MapControlsProps {
  map: RelatedMap;
  all: readonly MapMaterial[];
  view: MapView;
}

/** What is linked and what is shown. */
export function MapControls({ map, all }: MapControlsProps) {
  const [state, setState] = useMapState();
  return (
    <section aria-label="What the map shows" className="grid content-start gap-6 p-5 md:pl-8">
      <Combobox
        label="Find a material"
        items={all.map((each) => ({
          id: each.id,
          label: each.name,
          detail: each.botanicalName ?? undefined,
          of: each,
        }))}
        value={null}
        picksMany={false}
        onChange={(id) => id && setState({ at: id, family: [], nature: 'all', focus: null }, { history: 'push' })}
        placeholder="any of its letters"
        lead={({ of }) => <Strip size="node" facets={map.facets} profile={of.profile} phases={of.phases} decorative />}
      />
      <Choice
        label="Linked by shared"
        value={state.by}
        onChange={(by) => setState({ by, alike: null })}
        options={[
          { value: 'facets', label: 'facets' },
          { value: 'constituents', label: 'constituents' },
        ]}
      />
      <Slider
        label="At least this alike"
        value={likenessOf(state)}
        onChange={(alike) => setState({ alike })}
        min={LEAST_ALIKE}
        max={0.95}
        step={0.05}
        graduations={9}
        formatOptions={{ minimumFractionDigits: 2, maximumFractionDigits: 2 }}
        ends={['more links', 'closer kin']}
      />
      <Choice
        label="Origin"
        value={state.nature}
        onChange={(nature) => setState({ nature })}
        options={[
          { value: 'all', label: 'all' },
          { value: 'natural', label: 'natural' },
          { value: 'synthetic', label: 'synthetic' },
        ]}
      />
      <Legend map={map} all={all} />
    </section>
  );
}
