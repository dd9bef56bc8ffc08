'use client';

import dynamic from 'next/dynamic';
import { useEffect, useMemo, useState } from 'react';
import { Drawing, ENTRIES } from '../shell/entries';
import { classNames } from '../ui/class-names';
import { useHouseSources } from './house-sources';
import { type PaletteSource, usePaletteSource } from './sources';

// The list and its dialog are fetched when somebody first asks.
const PalettePanel = dynamic(() => import('./palette-panel').then((module) => module.PalettePanel), { ssr: false });

const OPEN = 'stillroom:palette';
export const openPalette = () => window.dispatchEvent(new Event(OPEN));

/** Listens for Ctrl-K and Cmd-K, and knows the screens; anything else is a source that a screen adds. */
export function Palette({ allowed, actions }: { allowed: readonly string[]; actions: readonly string[] }) {
  const [open, setOpen] = useState(false);
  const [wanted, setWanted] = useState(false);
  usePaletteSource(useMemo(() => screens(allowed), [allowed]));
  useHouseSources(actions);
  useEffect(() => {
    const show = () => {
      setWanted(true);
      setOpen(true);
    };
    const onKey = (event: KeyboardEvent) => {
      if (event.key.toLowerCase() !== 'k' || !(event.ctrlKey || event.metaKey) || event.altKey) return;
      event.preventDefault();
      show();
    };
    window.addEventListener(OPEN, show);
    window.addEventListener('keydown', onKey);
    return () => {
      window.removeEventListener(OPEN, show);
      window.removeEventListener('keydown', onKey);
    };
  }, []);
  return wanted ? <PalettePanel open={open} onOpenChange={setOpen} /> : null;
}

/** The same on a phone, as an entry of the bar below. */
export function PaletteBarButton() {
  return (
    <button
      type="button"
      onClick={openPalette}
      className="grid min-h-14 flex-1 place-content-center justify-items-center gap-0.5 text-note text-ink-soft"
    >
      <Drawing>
        <path d="M9 14a5 5 0 1 1 .01 0ZM12.5 12.5 17 17" />
      </Drawing>
      Find
    </button>
  );
}

export function PaletteButton({ className }: { className?: string }) {
  return (
    <button
      type="button"
      onClick={openPalette}
      aria-keyshortcuts="Control+K Meta+K"
      className={classNames(
        'flex min-h-9 items-center justify-between rounded-tile border border-rule px-3 text-ink-soft hover:border-ink hover:text-ink',
        className,
      )}
    >
      Find
      <kbd className="narrow font-sans text-note">Ctrl K</kbd>
    </button>
  );
}

function screens(allowed: readonly string[]): PaletteSource {
  const items = ENTRIES.filter(({ href }) => allowed.includes(href)).map(({ href, name }) => ({
    id: href,
    label: name,
    href,
  }));
  return { id: 'screens', label: 'Screens', find: () => items };
}
