'use client';

import { useEffect, useSyncExternalStore } from 'react';

export interface Announcement {
  id: number;
  words: string;
  /** One thing to do about it, e.g. { label: 'Undo', run }. It then stays until dismissed or done. */
  action?: { label: string; run: () => void };
  /** Heard, not seen: "Blend solved; distance 0.8". */
  quiet?: boolean;
}

const STAYS_MS = 6000;
let announcements: readonly Announcement[] = [];
let nextId = 1;
const listeners = new Set<() => void>();

function set(next: readonly Announcement[]) {
  announcements = next;
  for (const listener of listeners) listener();
}

/** Shows a slip at the foot of the screen and says it to a screen reader. At most three are kept. */
export function announce(words: string, options: Pick<Announcement, 'action' | 'quiet'> = {}): void {
  set([...announcements.slice(-2), { id: nextId++, words, ...options }]);
}

const dismiss = (id: number) => set(announcements.filter((announcement) => announcement.id !== id));
const subscribe = (listener: () => void) => {
  listeners.add(listener);
  return () => listeners.delete(listener);
};
const NONE: readonly Announcement[] = [];

/** Stands once, in the root layout. The region is there before the words are, or nothing would be said. */
export function Announcements() {
  const shown = useSyncExternalStore(
    subscribe,
    () => announcements,
    () => NONE,
  );
  return (
    <div
      role="status"
      aria-live="polite"
      className="pointer-events-none fixed inset-x-0 bottom-[calc(4.5rem+env(safe-area-inset-bottom))] z-[60] grid justify-items-center gap-2 px-4 md:bottom-6"
      data-print="no"
    >
      {shown.map((announcement) => (
        <Slip key={announcement.id} announcement={announcement} />
      ))}
    </div>
  );
}

function Slip({ announcement }: { announcement: Announcement }) {
  const { id, words, action, quiet } = announcement;
  const stays = Boolean(action);
  useEffect(() => {
    if (stays) return;
    const timer = setTimeout(() => dismiss(id), STAYS_MS);
    return () => clearTimeout(timer);
  }, [id, stays]);
  if (quiet) return <span className="sr-only">{words}</span>;
  return (
    <div className="pointer-events-auto flex max-w-full animate-appear items-center gap-3 rounded-tile bg-ink py-1.5 pr-1.5 pl-4 text-on-ink shadow-lift">
      <span className="py-1">{words}</span>
      {action ? (
        <button
          type="button"
          className="min-h-7 rounded-tile border border-current px-2.5 font-[560] outline-current"
          onClick={() => {
            action.run();
            dismiss(id);
          }}
        >
          {action.label}
        </button>
      ) : null}
      <button
        type="button"
        aria-label="Dismiss"
        className="grid size-7 place-items-center outline-current"
        onClick={() => dismiss(id)}
      >
        <svg viewBox="0 0 12 12" width="10" height="10" aria-hidden="true">
          <path d="m1 1 10 10M11 1 1 11" stroke="currentColor" strokeWidth="1.6" />
        </svg>
      </button>
    </div>
  );
}
