import { useSyncExternalStore } from 'react';

const WIDE = '(min-width: 64rem)';

function subscribe(changed: () => void) {
  const query = window.matchMedia(WIDE);
  query.addEventListener('change', changed);
  return () => query.removeEventListener('change', changed);
}

/** Whether target, rules and answer stand side by side; on a phone they lie behind each other. */
export function useWide(): boolean {
  return useSyncExternalStore(
    subscribe,
    () => window.matchMedia(WIDE).matches,
    () => true,
  );
}
