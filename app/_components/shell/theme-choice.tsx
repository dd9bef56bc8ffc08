'use client';

import { useTheme } from 'next-themes';
import { useSyncExternalStore } from 'react';
import { Choice } from '../ui/choice';

const OPTIONS = [
  { value: 'light', label: 'Light' },
  { value: 'dark', label: 'Dark' },
  { value: 'system', label: 'System' },
] as const;

const never = () => () => {};

/** Which ground: the stored choice is known in the browser alone, so the server draws none. */
export function ThemeChoice() {
  const { theme, setTheme } = useTheme();
  const inBrowser = useSyncExternalStore(
    never,
    () => true,
    () => false,
  );
  const value = inBrowser ? (theme ?? 'system') : '';
  return <Choice label="Theme" value={value as 'light'} onChange={setTheme} options={OPTIONS} />;
}
