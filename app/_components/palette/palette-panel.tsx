'use client';

import { useRouter } from 'next/navigation';
import { type KeyboardEvent, useEffect, useMemo, useState } from 'react';
import { Dialog } from 'react-aria-components/Dialog';
import { Modal, ModalOverlay } from 'react-aria-components/Modal';
import { classNames } from '../ui/class-names';
import { type FoundGroup, type Hit, rankHits } from './rank';
import { type PaletteItem, paletteSources } from './sources';

/**
 * The hits of every source, shown as they come: a slow one holds nobody up, one that fails leaves the others standing,
 * and what was found for the letters before stays until there is something newer.
 */
function useHits(query: string): { hits: Hit[]; isWaiting: boolean } {
  const [found, setFound] = useState<ReadonlyMap<string, FoundGroup & { query: string }>>(new Map());
  useEffect(() => {
    const asking = new AbortController();
    for (const { id, label, searched = false, find } of paletteSources()) {
      const keep = (items: readonly PaletteItem[]) =>
        asking.signal.aborted || setFound((before) => new Map(before).set(id, { id, label, items, searched, query }));
      Promise.resolve(find(query, asking.signal)).then(keep, () => keep([]));
    }
    return () => asking.abort();
  }, [query]);
  const groups = [...found.values()];
  const hits = useMemo(() => rankHits(query, [...found.values()]), [query, found]);
  return { hits, isWaiting: groups.length < paletteSources().length || groups.some((group) => group.query !== query) };
}

export function PalettePanel({ open, onOpenChange }: { open: boolean; onOpenChange: (open: boolean) => void }) {
  return (
    <ModalOverlay
      isOpen={open}
      onOpenChange={onOpenChange}
      isDismissable
      className="fixed inset-0 z-50 grid grid-cols-[minmax(0,1fr)] justify-items-center bg-veil px-3 pt-[12dvh] data-[entering]:animate-appear"
    >
      <Modal className="h-fit w-full max-w-xl rounded-tile border border-ink bg-paper text-ink shadow-lift">
        <Dialog aria-label="Find" className="outline-none">
          <Search onDone={() => onOpenChange(false)} />
        </Dialog>
      </Modal>
    </ModalOverlay>
  );
}

function Search({ onDone }: { onDone: () => void }) {
  const router = useRouter();
  const [query, setQuery] = useState('');
  const { hits, isWaiting } = useHits(query);
  const [active, setActive] = useState(0);

  function follow(hit: Hit | undefined) {
    if (!hit) return;
    onDone();
    if (hit.href) router.push(hit.href);
    hit.run?.();
  }
  function onKeyDown(event: KeyboardEvent) {
    const by = { ArrowDown: 1, ArrowUp: -1 }[event.key];
    if (by !== undefined) {
      event.preventDefault();
      setActive((index) => (index + by + hits.length) % Math.max(1, hits.length));
    } else if (event.key === 'Enter') follow(hits[active]);
  }
  return (
    <>
      <input
        // biome-ignore lint/a11y/noAutofocus: the palette was asked for to be typed into
        autoFocus
        role="combobox"
        aria-label="Find a material, a screen or an action"
        aria-expanded={hits.length > 0}
        aria-controls="palette-hits"
        aria-activedescendant={hits[active] ? `palette-hit-${active}` : undefined}
        autoComplete="off"
        spellCheck={false}
        placeholder="A material, a screen, an action"
        value={query}
        onChange={(event) => {
          setQuery(event.target.value);
          setActive(0);
        }}
        onKeyDown={onKeyDown}
        className="w-full border-b border-grout bg-transparent px-5 py-4 text-lead outline-none"
      />
      <div
        id="palette-hits"
        role="listbox"
        aria-label="Found"
        tabIndex={-1}
        hidden={hits.length === 0}
        className="max-h-[50dvh] overflow-auto py-2"
      >
        {hits.map((hit, index) => (
          <HitRow
            key={`${hit.group}-${hit.id}`}
            hit={hit}
            index={index}
            active={index === active}
            heads={hits[index - 1]?.group !== hit.group}
            onFollow={follow}
          />
        ))}
      </div>
      {hits.length === 0 ? (
        <p role="status" className="px-5 pt-1 pb-4 text-ink-soft">
          {isWaiting ? 'Looking' : 'Nothing by that name.'}
        </p>
      ) : null}
    </>
  );
}

function HitRow({
  hit,
  index,
  active,
  heads,
  onFollow,
}: {
  hit: Hit;
  index: number;
  active: boolean;
  heads: boolean;
  onFollow: (hit: Hit) => void;
}) {
  return (
    <>
      {heads ? (
        <p role="presentation" className="narrow px-5 pt-2 pb-1 text-note text-ink-soft">
          {hit.group}
        </p>
      ) : null}
      <div
        id={`palette-hit-${index}`}
        role="option"
        tabIndex={-1}
        aria-selected={active}
        ref={(element) => {
          if (active) element?.scrollIntoView({ block: 'nearest' });
        }}
        onMouseDown={(event) => event.preventDefault()}
        onClick={() => onFollow(hit)}
        onKeyDown={undefined}
        className={classNames(
          'flex min-h-10 items-center justify-between gap-4 px-5',
          active ? 'bg-ink text-on-ink' : 'hover:bg-wash',
        )}
      >
        <span className="truncate">{hit.label}</span>
        {hit.detail ? (
          <span className={classNames('truncate text-note', !active && 'text-ink-soft')}>{hit.detail}</span>
        ) : null}
      </div>
    </>
  );
}
