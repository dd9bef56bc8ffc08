import 'server-only';
import { and, eq, inArray } from 'drizzle-orm';
import { db } from '@/db/connection';
import { materialFacets } from '@/db/schema';
import type { Member } from '@/lib/auth/member';
import { listFacets } from '@/lib/facets/queries';
import { PHASES, type Phase } from '@/lib/shared/material-words';

export interface FacetEntry {
  facetId: string;
  phase: 'all' | Phase;
  intensity: number;
  sd: number;
}

export interface Smell {
  /** As entered. */
  entries: FacetEntry[];
  /** In the order of the house's facets. */
  profile: number[];
  profileSd: number[];
  /** Only phases in which something differs; each is the whole profile with what differs put in. */
  phases?: Partial<Record<Phase, number[]>>;
}

/** What these materials smell of, by material; one without any entry has a profile of zeros. */
export async function smellsOf(ctx: Member, materialIds: readonly string[]): Promise<(materialId: string) => Smell> {
  const facets = await listFacets(ctx);
  const places = new Map(facets.map(({ id }, place) => [id, place]));
  const rows =
    materialIds.length === 0
      ? []
      : await db
          .select()
          .from(materialFacets)
          .where(and(eq(materialFacets.teamId, ctx.teamId), inArray(materialFacets.materialId, [...materialIds])));
  const entries = new Map<string, FacetEntry[]>();
  for (const { materialId, facetId, phase, intensity, sd } of rows) {
    const list = entries.get(materialId) ?? [];
    list.push({ facetId, phase: phase as FacetEntry['phase'], intensity: Number(intensity), sd: Number(sd) });
    entries.set(materialId, list);
  }
  return (materialId) => smellOf(entries.get(materialId) ?? [], places);
}

export function smellOf(entries: FacetEntry[], places: ReadonlyMap<string, number>): Smell {
  const ordered = entries.toSorted((a, b) => (places.get(a.facetId) ?? 0) - (places.get(b.facetId) ?? 0));
  const zeros = () => new Array<number>(places.size).fill(0);
  const fill = (vector: number[], phase: FacetEntry['phase'], of: 'intensity' | 'sd') => {
    for (const entry of ordered) if (entry.phase === phase) vector[places.get(entry.facetId) ?? 0] = entry[of];
    return vector;
  };
  const profile = fill(zeros(), 'all', 'intensity');
  const differing = PHASES.filter((phase) => ordered.some((entry) => entry.phase === phase));
  return {
    entries: ordered,
    profile,
    profileSd: fill(zeros(), 'all', 'sd'),
    ...(differing.length > 0 && {
      phases: Object.fromEntries(differing.map((phase) => [phase, fill([...profile], phase, 'intensity')])),
    }),
  };
}
