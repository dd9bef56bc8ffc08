import 'server-only';
import type { Transaction } from '@/db/transaction';
import { readDemoLibrary } from './demo-files';
import { loadMaterials } from './load-materials';
import { loadQualities } from './load-qualities';
import { loadWords } from './load-words';

interface Start {
  teamId: string;
  /** sample: everything, with invented ratings and prices; facets: only the words and the limits. */
  begin: 'sample' | 'facets';
  /** The house's own, ISO 4217: the invented prices count in it, as the same numbers. */
  currency: string;
}

/**
 * Fills a house that has no library yet, within the caller's transaction: all of it or none.
 *
 * @returns the new ids by the keys of the files, empty for what was not wanted.
 */
export async function loadLibrary(tx: Transaction, { teamId, begin, currency }: Start) {
  const library = readDemoLibrary();
  const words = await loadWords(tx, teamId, library);
  if (begin === 'facets') {
    const none: ReadonlyMap<string, string> = new Map();
    return { ...words, materialIds: none, supplierIds: none, qualityIds: none };
  }
  const materialIds = await loadMaterials(tx, teamId, library, words.facetIds);
  const bought = await loadQualities(tx, { teamId, currency }, library, {
    materialIds,
    constituentIds: words.constituentIds,
  });
  return { ...words, materialIds, ...bought };
}

export type LoadedLibrary = Awaited<ReturnType<typeof loadLibrary>>;
