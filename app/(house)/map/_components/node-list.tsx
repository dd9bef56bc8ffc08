'use client';

import { useVirtualizer } from '@tanstack/react-virtual';
import { type KeyboardEvent, useEffect, useId, useMemo, useRef, useState } from 'react';
import { Strip } from '@/app/_components/strip/strip';
import { classNames } from '@/app/_components/ui/class-names';
import type { RelatedMap } from '@/lib/shared/related';
import { type ListEntry, listOf } from '../_client/list-entries';
import type { MapMaterial, MapView } from '../_client/model';

const ROW_HEIGHT = 52;

interface NodeListProps {
  view: MapView;
  map: RelatedMap;
  /** What the list stands on, to be lit on the map; null when the list is left. */
  onActive: (id: string | null) => void;
  onSelect: (id: string | null) => void;
}

/**
 * The map for the keyboard: one stop, arrows go along what is linked or found, strongest first, Enter opens, and the
 * left arrow goes back to the one before.
 */
export function NodeList({ view, map, onActive, onSelect }: NodeListProps) {
  const id = useId();
  const { title, entries } = useMemo(() => listOf(view), [view]);
  const [at, setAt] = useState(0);
  const trail = useRef<string[]>([]);
  const scroller = useRef<HTMLDivElement>(null);
  const rows = useVirtualizer({
    count: entries.length,
    getScrollElement: () => scroller.current,
    estimateSize: () => ROW_HEIGHT,
    overscan: 8,
    initialRect: { width: 300, height: 480 },
  });
  // biome-ignore lint/correctness/useExhaustiveDependencies: another list begins at its top
  useEffect(() => {
    setAt(0);
    scroller.current?.scrollTo({ top: 0 });
  }, [title, view.selected]);

  function goTo(next: number) {
    const place = Math.max(0, Math.min(entries.length - 1, next));
    setAt(place);
    rows.scrollToIndex(place);
    onActive(entries[place]?.material.id ?? null);
  }
  function open(entry: ListEntry | undefined) {
    if (!entry) return;
    if (view.selected) trail.current.push(view.selected.id);
    onActive(null);
    onSelect(entry.material.id);
  }
  function onKeyDown(event: KeyboardEvent) {
    const moves: Record<string, number> = {
      ArrowDown: at + 1,
      ArrowUp: at - 1,
      Home: 0,
      End: entries.length - 1,
      PageDown: at + 8,
      PageUp: at - 8,
    };
    const next = moves[event.key];
    if (next !== undefined) goTo(next);
    else if (event.key === 'Enter' || event.key === 'ArrowRight' || event.key === ' ') open(entries[at]);
    else if (event.key === 'ArrowLeft' || event.key === 'Escape') onSelect(trail.current.pop() ?? null);
    else return;
    event.preventDefault();
  }
  return (
    <section aria-labelledby={`${id}-title`} className="grid content-start">
      <h2 id={`${id}-title`} className="narrow px-5 pt-4 pb-2 text-ink-soft">
        {title}
      </h2>
      {entries.length === 0 ? (
        <p className="px-5 pb-4">Nothing on the map is that close. Loosen the likeness.</p>
      ) : null}
      <div
        ref={scroller}
        role="listbox"
        aria-labelledby={`${id}-title`}
        aria-activedescendant={entries[at] ? `${id}-${at}` : undefined}
        tabIndex={0}
        onKeyDown={onKeyDown}
        onFocus={() => onActive(entries[at]?.material.id ?? null)}
        onBlur={() => onActive(null)}
        className="group max-h-[24rem] overflow-auto focus-visible:outline-offset-[-2px] xl:max-h-[calc(100dvh-22rem)]"
      >
        <div className="relative" style={{ height: rows.getTotalSize() }}>
          {rows.getVirtualItems().map(({ index, start }) => {
            const entry = entries[index];
            return entry ? (
              <div
                key={entry.material.id}
                id={`${id}-${index}`}
                role="option"
                tabIndex={-1}
                aria-selected={entry.material.id === view.selected?.id}
                aria-setsize={entries.length}
                aria-posinset={index + 1}
                onClick={() => open(entry)}
                onKeyDown={undefined}
                onPointerEnter={() => onActive(entry.material.id)}
                onPointerLeave={() => onActive(null)}
                className={classNames(
                  'absolute inset-x-0 flex cursor-pointer items-center gap-3 px-5 hover:bg-wash',
                  index === at && 'group-focus-visible:bg-pressed',
                )}
                style={{ height: ROW_HEIGHT, transform: `translateY(${start}px)` }}
              >
                <Row entry={entry} map={map} />
              </div>
            ) : null;
          })}
        </div>
      </div>
    </section>
  );
}

function Row({ entry, map }: { entry: ListEntry; map: RelatedMap }) {
  const { name, profile, phases }: MapMaterial = entry.material;
  return (
    <>
      <Strip size="table" facets={map.facets} profile={profile} phases={phases} decorative />
      <span className="min-w-0">
        <span className="block truncate font-[560]">{name}</span>
        <span className="block truncate text-note text-ink-soft">{entry.note}</span>
      </span>
    </>
  );
}
