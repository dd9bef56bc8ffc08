'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useEffect, useRef } from 'react';
import { signOut } from '@/app/(door)/actions';
import { Button } from '../ui/button';
import { ThemeChoice } from './theme-choice';

export interface Person {
  name: string;
  house: string;
  /** "owner, perfumer". */
  roles: string;
  isDemo: boolean;
}

/** Who is at the bench, as a paper label; opens to the theme and the way out. */
export function PersonMenu({ person, placement }: { person: Person; placement: 'rail' | 'bar' }) {
  const menu = useRef<HTMLDetailsElement>(null);
  useCloseOutside(menu);
  return (
    <details ref={menu} className="group relative">
      {placement === 'rail' ? (
        <summary className="label-plate block list-none px-4 py-3 hover:bg-wash">
          <span className="block truncate font-[600]">{person.house}</span>
          <span className="block truncate text-ink-soft">{person.name}</span>
        </summary>
      ) : (
        <summary className="grid min-h-14 min-w-16 list-none place-content-center justify-items-center gap-0.5 text-note text-ink-soft group-open:text-ink">
          <span className="grid size-5 place-items-center rounded-tile border border-current font-[600]">
            {person.name.slice(0, 1)}
          </span>
          You
        </summary>
      )}
      <div className="absolute right-0 bottom-full z-40 mb-2 grid w-64 gap-4 rounded-tile border border-ink bg-paper p-4 text-ink shadow-lift md:right-auto md:left-0">
        <p>
          <span className="block font-[600]">{person.name}</span>
          <span className="text-ink-soft">
            {person.roles} at {person.house}
          </span>
          {person.isDemo ? (
            <span className="mt-1 block text-ink-soft">Demo data: prices and ratings are invented.</span>
          ) : null}
        </p>
        <ThemeChoice />
        <SignOut />
      </div>
    </details>
  );
}

function SignOut() {
  const queries = useQueryClient();
  return (
    <form action={signOut} onSubmit={() => queries.clear()}>
      <Button type="submit" className="w-full">
        Sign out
      </Button>
    </form>
  );
}

function useCloseOutside(menu: React.RefObject<HTMLDetailsElement | null>) {
  useEffect(() => {
    const close = (event: Event) => {
      const element = menu.current;
      if (!element?.open) return;
      if (event instanceof KeyboardEvent) {
        if (event.key !== 'Escape') return;
        element.open = false;
        element.querySelector('summary')?.focus();
      } else if (!element.contains(event.target as Node)) element.open = false;
    };
    document.addEventListener('pointerdown', close);
    document.addEventListener('keydown', close);
    return () => {
      document.removeEventListener('pointerdown', close);
      document.removeEventListener('keydown', close);
    };
  }, [menu]);
}
