import { useTheme } from 'next-themes';
import { useMemo } from 'react';
import { ACTIONS } from './actions';
import { type PaletteItem, type PaletteSource, usePaletteSource } from './sources';

/** Everything of the house that the palette finds beside its screens. `allowed` holds the hrefs of ACTIONS. */
export function useHouseSources(allowed: readonly string[]): void {
  const { setTheme } = useTheme();
  usePaletteSource(useMemo(() => actions(allowed, setTheme), [allowed, setTheme]));
  usePaletteSource(MATERIALS);
  usePaletteSource(FACETS);
}

function actions(allowed: readonly string[], setTheme: (theme: string) => void): PaletteSource {
  const going = ACTIONS.filter(({ href }) => allowed.includes(href)).map(({ label, href }) => ({
    id: href,
    label,
    href,
  }));
  const theme = (name: string, label: string): PaletteItem => ({ id: name, label, run: () => setTheme(name) });
  const items = [
    ...going,
    theme('light', 'Light theme'),
    theme('dark', 'Dark theme'),
    theme('system', 'The system’s theme'),
  ];
  return { id: 'actions', label: 'Actions', find: () => items };
}

const PAUSE_MS = 120;
const MOST = 12;

// The schemas come with the first search: the shell, which stands on every screen, stays small.
/** The server searches: it knows synonyms and CAS numbers, and a house may have thousands of materials. */
const MATERIALS: PaletteSource = {
  id: 'materials',
  label: 'Materials',
  searched: true,
  find: async (query, signal) => {
    if (query.trim() === '') return [];
    await pause(signal);
    const response = await fetch(`/api/v1/materials?${new URLSearchParams({ q: query, limit: String(MOST) })}`, {
      signal,
    });
    const { materialPage } = await import('@/lib/shared/material');
    const { items } = materialPage.parse(await response.json());
    return items.map(({ id, name, botanicalName, kind, cas }) => ({
      ...{ id, label: name, href: `/materials/${id}` },
      detail: cas.find((number) => number === query.trim()) ?? botanicalName ?? kind,
    }));
  },
};

let facets: Promise<PaletteItem[]> | null = null;

/** The learner's question about one facet. The words of a house are few: they are fetched once. */
const FACETS: PaletteSource = {
  id: 'facets',
  label: 'Who smells of it',
  find: async (query) => {
    if (query.trim() === '') return [];
    facets ??= fetchFacets();
    return facets.catch((error: unknown) => {
      facets = null;
      throw error;
    });
  },
};

async function fetchFacets(): Promise<PaletteItem[]> {
  const response = await fetch('/api/v1/facets');
  const { facetList } = await import('@/lib/shared/facet');
  const { items } = facetList.parse(await response.json());
  return items.map(({ slug, name, family }) => ({
    id: slug,
    label: name,
    detail: family,
    href: `/map?smells=${slug}`,
  }));
}

/** Nobody types a whole word in a moment: only the last letter's search is sent. */
function pause(signal: AbortSignal): Promise<void> {
  return new Promise((resolve, reject) => {
    const timer = setTimeout(resolve, PAUSE_MS);
    signal.addEventListener('abort', () => {
      clearTimeout(timer);
      reject(signal.reason);
    });
  });
}
