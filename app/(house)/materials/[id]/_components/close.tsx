import Link from 'next/link';
import { FacetSwatch } from '@/app/_components/facet-swatch';
import { Strip } from '@/app/_components/strip/strip';
import { Tile } from '@/app/_components/ui/screen';
import type { Member } from '@/lib/auth/member';
import { listRelated } from '@/lib/materials/related';
import type { FacetView } from '@/lib/shared/facet';
import type { RelatedMaterial } from '@/lib/shared/material';
import type { MaterialView } from '@/lib/shared/material-view';
import { KIND_NAMES } from '@/lib/shared/material-words';
import { moneyWords } from '@/lib/shared/number-words';
import { smellInWords } from '@/lib/shared/strip-bands';

interface CloseProps {
  ctx: Member;
  material: MaterialView;
  facets: readonly FacetView[];
}

/** What smells alike, closest first, with the facets that both have. */
export async function Close({ ctx, material, facets }: CloseProps) {
  const related = await listRelated(ctx, material.id);
  return (
    <Tile
      title="Close to it"
      actions={
        <Link href={`/map?focus=${material.id}`} className="underline decoration-rule underline-offset-4">
          See it on the map
        </Link>
      }
    >
      {related.length === 0 ? (
        <p className="text-ink-soft">No other material of the house comes close.</p>
      ) : (
        <ul className="grid gap-x-8 gap-y-1 md:grid-cols-2 xl:grid-cols-4">
          {related.map((other) => (
            <Neighbour key={other.id} other={other} facets={facets} currency={material.currency} />
          ))}
        </ul>
      )}
      <p className="mt-4 text-note text-ink-soft">
        By what they smell of: 1.00 is the same proportions of facets, whatever the strength. Smell them side by side
        before you put one for the other.
      </p>
    </Tile>
  );
}

function Neighbour({
  other,
  facets,
  currency,
}: {
  other: RelatedMaterial;
  facets: readonly FacetView[];
  currency?: string;
}) {
  const shared = other.sharedFacetIds.flatMap((id) => facets.find((facet) => facet.id === id) ?? []);
  const cost = other.costAtEqualStrength?.value;
  return (
    <li className="relative flex gap-4 border-t border-grout py-3 hover:bg-wash">
      <Strip size="line" facets={facets} profile={other.profile} phases={other.phases} decorative />
      <div className="grid min-w-0 content-start gap-1">
        <p className="flex items-baseline gap-3">
          <Link href={`/materials/${other.id}`} className="min-w-0 font-[560] before:absolute before:inset-0">
            {other.name}
          </Link>
          <span className="figures ml-auto text-ink-soft">
            <span className="sr-only">similarity </span>
            {other.similarity.toFixed(2)}
          </span>
        </p>
        <p className="text-note text-ink-soft">
          {KIND_NAMES[other.kind]}
          {cost && currency ? `, ${moneyWords(cost, currency)} at equal strength` : null}
          <span className="sr-only">, {smellInWords(other.profile, facets, other.lastsHours)}</span>
        </p>
        <ul aria-label="Facets that both have" className="flex flex-wrap gap-x-3 gap-y-1 text-note">
          {shared.map((facet) => (
            <li key={facet.id} className="inline-flex items-center gap-1.5">
              <FacetSwatch facet={facet} className="size-2.5" />
              {facet.name}
            </li>
          ))}
        </ul>
      </div>
    </li>
  );
}
