'use client';

import dynamic from 'next/dynamic';
import { useEffect, useMemo, useRef, useState } from 'react';
import { Strip } from '@/app/_components/strip/strip';
import { LoadingState } from '@/app/_components/ui/states';
import type { RelatedMap } from '@/lib/shared/related';
import { smellInWords } from '@/lib/shared/strip-bands';
import { emphasisOf } from '../_client/emphasis';
import { materialsInWords } from '../_client/in-words';
import { likenessOf, useMapState } from '../_client/map-state';
import type { MapMaterial, MapView } from '../_client/model';
import { useInks } from '../_client/use-inks';
import { useLayout } from '../_client/use-layout';
import { useMedia } from '../_client/use-media';
import type { GraphHandle } from './graph-canvas';
import { ZoomButtons } from './zoom-buttons';

// A canvas can't be drawn on the server, and its library is fetched only where a graph is looked at.
const GraphCanvas = dynamic(() => import('./graph-canvas'), { ssr: false });

interface GraphProps {
  map: RelatedMap;
  all: readonly MapMaterial[];
  view: MapView;
  /** What the list beside it stands on. */
  active: string | null;
  onSelect: (id: string | null) => void;
}

interface Hovered {
  id: string;
  at: { x: number; y: number };
}

export function Graph({ map, all, view, active, onSelect }: GraphProps) {
  const [state] = useMapState();
  const { frame, size } = useSize();
  const inks = useInks();
  const still = useMedia('(prefers-reduced-motion: reduce)');
  const handle = useRef<GraphHandle>(null);
  const [hovered, setHovered] = useState<Hovered | null>(null);
  // One layout for the whole house, so that filters don't move anything; one of its own for a material and its kin.
  const focused = state.focus !== null;
  const layout = useLayout({
    key: focused ? `${state.by} ${state.focus} ${likenessOf(state)} ${view.materials.length}` : state.by,
    ids: (focused ? view.materials : all).map(({ id }) => id),
    links: focused ? view.links : map.links,
  });
  const pointed = hovered?.id ?? active ?? view.selected?.id ?? null;
  const emphasis = useMemo(() => emphasisOf(view, pointed), [view, pointed]);
  const material = hovered ? view.byId.get(hovered.id) : undefined;
  return (
    <figure
      aria-label={`Map of ${materialsInWords(view.materials.length)}. The list beside it and the table say the same.`}
      className="relative h-[62dvh] min-h-[26rem] md:sticky md:top-0 md:h-[calc(100dvh-14rem)]"
    >
      <div ref={frame} className="absolute inset-0 overflow-hidden" aria-hidden="true">
        {layout && inks && size ? (
          <GraphCanvas
            {...{ handle, view, layout, emphasis, inks, still, onSelect }}
            facets={map.facets}
            width={size.width}
            height={size.height}
            onPoint={(id, at) => setHovered(id && at ? { id, at } : null)}
          />
        ) : (
          <LoadingState>Laying out the map</LoadingState>
        )}
        {material && hovered && size ? <Slip material={material} map={map} at={hovered.at} width={size.width} /> : null}
      </div>
      <ZoomButtons handle={handle} />
    </figure>
  );
}

/** What a strip on the map is, while the pointer stands on it. */
function Slip({
  material,
  map,
  at,
  width,
}: {
  material: MapMaterial;
  map: RelatedMap;
  at: Hovered['at'];
  width: number;
}) {
  const toLeft = at.x > width / 2;
  return (
    <div
      className="pointer-events-none absolute z-10 flex w-60 gap-3 rounded-tile border border-ink bg-paper p-3 shadow-lift"
      style={{ left: at.x + (toLeft ? -24 : 24), top: Math.max(8, at.y - 40), translate: toLeft ? '-100%' : undefined }}
    >
      <Strip size="line" facets={map.facets} profile={material.profile} phases={material.phases} decorative />
      <span className="min-w-0">
        <span className="block font-[600]">{material.name}</span>
        {material.botanicalName ? <span className="latin block text-ink-soft">{material.botanicalName}</span> : null}
        <span className="mt-1 block text-ink-soft">{smellInWords(material.profile, map.facets)}</span>
      </span>
    </div>
  );
}

/** The canvas needs its size in px. */
function useSize() {
  const frame = useRef<HTMLDivElement>(null);
  const [size, setSize] = useState<{ width: number; height: number } | null>(null);
  useEffect(() => {
    const element = frame.current;
    if (!element) return;
    const watcher = new ResizeObserver(() => setSize({ width: element.clientWidth, height: element.clientHeight }));
    watcher.observe(element);
    return () => watcher.disconnect();
  }, []);
  return { frame, size };
}
