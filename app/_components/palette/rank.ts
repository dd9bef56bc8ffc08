import { fuzzyScore } from '@/lib/shared/fuzzy';
import type { PaletteItem } from './sources';

export interface FoundGroup {
  id: string;
  label: string;
  items: readonly PaletteItem[];
  /** Somebody else searched: whatever came fits, in its order. */
  searched: boolean;
}

export type Hit = PaletteItem & { group: string };

const MOST_PER_GROUP = 12;
/** From here on a name holds the query whole; below, only its letters in order. */
const WHOLE = 600;

/**
 * One list of hits, its groups together: the group with the best hit first. Where some name holds the query whole,
 * those that only have its letters somewhere are left out.
 */
export function rankHits(query: string, groups: readonly FoundGroup[]): Hit[] {
  const scored = groups.map((group) => ({ group, hits: scoredItems(query, group) }));
  const best = Math.max(...scored.flatMap(({ hits }) => hits.map(({ score }) => score)), 0);
  const kept = scored
    .map(({ group, hits }) => ({
      group,
      hits: hits.filter(({ score }) => group.searched || best < WHOLE || score >= WHOLE).slice(0, MOST_PER_GROUP),
    }))
    .filter(({ hits }) => hits.length > 0);
  if (query.trim() !== '') kept.sort((a, b) => (b.hits[0]?.score ?? 0) - (a.hits[0]?.score ?? 0));
  return kept.flatMap(({ group, hits }) => hits.map(({ item }) => ({ ...item, group: group.label })));
}

function scoredItems(query: string, { items, searched }: FoundGroup) {
  const scored = items.map((item) => ({ item, score: fuzzyScore(query, `${item.label} ${item.detail ?? ''}`) }));
  if (searched) return scored.map(({ item, score }) => ({ item, score: score ?? 0 }));
  return scored
    .filter((each): each is { item: PaletteItem; score: number } => each.score !== null)
    .sort((a, b) => b.score - a.score);
}
