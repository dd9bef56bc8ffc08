import { useEffect } from 'react';

export interface PaletteItem {
  id: string;
  label: string;
  /** Shown softly behind the label. */
  detail?: string;
  /** Goes there, or runs. */
  href?: string;
  run?: () => void;
}

/** Where hits come from. `find` gets what was typed; it may ask the server, and `signal` says that nobody waits any more. */
export interface PaletteSource {
  id: string;
  /** The heading above its hits. */
  label: string;
  /** `find` has searched already: its hits are not filtered again. */
  searched?: boolean;
  find: (query: string, signal: AbortSignal) => readonly PaletteItem[] | Promise<readonly PaletteItem[]>;
}

const sources = new Map<string, PaletteSource>();

export const paletteSources = (): PaletteSource[] => [...sources.values()];

/** Adds a source while the component is there. The source must be the same object from render to render. */
export function usePaletteSource(source: PaletteSource): void {
  useEffect(() => {
    sources.set(source.id, source);
    return () => {
      sources.delete(source.id);
    };
  }, [source]);
}
