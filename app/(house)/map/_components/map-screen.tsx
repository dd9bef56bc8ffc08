'use client';

import { useQuery } from '@tanstack/react-query';
import { useEffect, useMemo, useState } from 'react';
import { ButtonLink } from '@/app/_components/ui/button';
import { Choice } from '@/app/_components/ui/choice';
import { classNames } from '@/app/_components/ui/class-names';
import { Sheet } from '@/app/_components/ui/dialog';
import { ScreenHead } from '@/app/_components/ui/screen';
import { EmptyState, ErrorState, LoadingState } from '@/app/_components/ui/states';
import { announce } from '@/app/_components/ui/toast';
import type { RelatedMap } from '@/lib/shared/related';
import { answerInWords, mapInWords } from '../_client/in-words';
import { useMapState } from '../_client/map-state';
import { type MapView, materialsOf, viewOf } from '../_client/model';
import { mapQuery } from '../_client/queries';
import { useMedia } from '../_client/use-media';
import { FacetQuestion } from './facet-question';
import { Graph } from './graph';
import { MapControls } from './map-controls';
import { MapTable } from './map-table';
import { MaterialPanel } from './material-panel';
import { NodeList } from './node-list';

export function MapScreen({ mayBlend }: { mayBlend: boolean }) {
  const [state] = useMapState();
  const { data, isError, refetch } = useQuery(mapQuery(state.by));
  if (isError && !data) return <ErrorState onRetry={() => refetch()} />;
  if (!data) return <LoadingState>Fetching the map</LoadingState>;
  if (data.nodes.length === 0) return <EmptyMap />;
  return <Loaded map={data} mayBlend={mayBlend} />;
}

function EmptyMap() {
  return (
    <>
      <ScreenHead title="Map" />
      <EmptyState title="Nothing to draw yet" action={<ButtonLink href="/materials">Go to materials</ButtonLink>}>
        The map links materials that smell alike. Add some with their facets first.
      </EmptyState>
    </>
  );
}

function Loaded({ map, mayBlend }: { map: RelatedMap; mayBlend: boolean }) {
  const [state, setState] = useMapState();
  const [active, setActive] = useState<string | null>(null);
  const all = useMemo(() => materialsOf(map), [map]);
  const view = useMemo(() => viewOf(map, all, state), [map, all, state]);
  const narrow = useMedia('(max-width: 767px)');
  useSpokenChanges(view, state.by);
  const select = (at: string | null) => setState({ at }, { history: at ? 'push' : 'replace' });
  const panel = view.selected ? (
    <MaterialPanel material={view.selected} map={map} view={view} mayBlend={mayBlend} onSelect={select} />
  ) : null;
  // The table says all that the list does; what is picked from it still has its sheet, and its kin.
  const hasSide = state.view === 'graph' || panel !== null;
  return (
    <>
      <ScreenHead
        title="Map"
        about={mapInWords(view, state.by)}
        actions={
          <Choice
            label="Show as"
            hideLabel
            value={state.view}
            onChange={(next) => setState({ view: next })}
            options={[
              { value: 'graph', label: 'Graph' },
              { value: 'table', label: 'Table' },
            ]}
          />
        }
      />
      <FacetQuestion map={map} view={view} />
      <div
        className={classNames(
          'tiles md:grid-cols-[17rem_minmax(0,1fr)]',
          hasSide && 'xl:grid-cols-[17rem_minmax(0,1fr)_19rem]',
        )}
      >
        <MapControls map={map} all={all} view={view} />
        <div className="order-first min-h-[26rem] md:order-none">
          {state.view === 'table' ? (
            <MapTable map={map} view={view} onSelect={select} />
          ) : (
            <Graph map={map} all={all} view={view} active={active} onSelect={select} />
          )}
        </div>
        <aside aria-label="On the map" className="md:col-span-2 xl:col-span-1" hidden={!hasSide}>
          {narrow ? (
            <Sheet open={panel !== null} onOpenChange={(open) => !open && select(null)} title={view.selected?.name}>
              {panel}
            </Sheet>
          ) : (
            panel
          )}
          <NodeList view={view} map={map} onActive={setActive} onSelect={select} />
        </aside>
      </div>
    </>
  );
}

/** What changed is said once it has settled; the canvas itself is mute. */
function useSpokenChanges(view: MapView, by: string) {
  const answer = view.chosen.length > 0 ? answerInWords(view) : '';
  const words = `${mapInWords(view, by)}. ${answer}`;
  const [first] = useState(words);
  useEffect(() => {
    if (words === first) return;
    const timer = setTimeout(() => announce(words, { quiet: true }), 500);
    return () => clearTimeout(timer);
  }, [words, first]);
}
