import Link from 'next/link';
import type { ReactNode } from 'react';
import { Wordmark } from '../brand/wordmark';
import { Palette, PaletteBarButton, PaletteButton } from '../palette/palette';
import { type Person, PersonMenu } from './person-menu';
import { BarLinks, RailLinks } from './rail-links';

export interface HouseShellProps {
  person: Person;
  /** The hrefs of the rail that the member's roles allow. */
  allowed: readonly string[];
  /** The hrefs of the palette's actions that they allow. */
  actions: readonly string[];
  children: ReactNode;
}

/** Rail on the left, the bench on the right; on a phone the rail lies below the thumb. */
export function HouseShell({ person, allowed, actions, children }: HouseShellProps) {
  const home = allowed[0] ?? '/';
  return (
    <div className="md:grid md:min-h-dvh md:grid-cols-[13.5rem_minmax(0,1fr)] print:block">
      <a href="#screen" className="sr-only z-50 bg-ink p-3 text-on-ink focus:not-sr-only focus:absolute">
        Skip to the screen
      </a>
      <aside className="sticky top-0 hidden h-dvh flex-col border-r border-grout bg-paper md:flex" data-print="no">
        <Link href={home} aria-label="Stillroom, first screen" className="px-6 pt-7 pb-6">
          <Wordmark />
        </Link>
        <PaletteButton className="mx-4 mb-4" />
        <nav aria-label="Screens" className="min-h-0 flex-1 overflow-y-auto">
          <RailLinks allowed={allowed} />
        </nav>
        <div className="p-4">
          <PersonMenu person={person} placement="rail" />
        </div>
      </aside>
      <main
        id="screen"
        tabIndex={-1}
        className="min-w-0 bg-paper pb-[calc(3.5rem+env(safe-area-inset-bottom))] outline-none md:pb-0 print:pb-0"
      >
        {children}
      </main>
      <nav
        aria-label="Screens"
        className="fixed inset-x-0 bottom-0 z-30 flex border-t border-ink bg-paper pb-[env(safe-area-inset-bottom)] md:hidden"
        data-print="no"
      >
        <BarLinks allowed={allowed} />
        <PaletteBarButton />
        <PersonMenu person={person} placement="bar" />
      </nav>
      <Palette allowed={allowed} actions={actions} />
    </div>
  );
}
