import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { cache, Suspense } from 'react';
import { ButtonLink } from '@/app/_components/ui/button';
import { ScreenHead, Tile } from '@/app/_components/ui/screen';
import { Skeleton } from '@/app/_components/ui/states';
import { requireMember } from '@/lib/auth/current';
import { NotFound } from '@/lib/errors';
import { listFacets } from '@/lib/facets/queries';
import { getMaterial } from '@/lib/materials/queries';
import { KIND_NAMES } from '@/lib/shared/material-words';
import { may } from '@/lib/shared/permissions';
import { Close } from './_components/close';
import { Contains } from './_components/contains';
import { Costs } from './_components/costs';
import { Course } from './_components/course';
import { Handling } from './_components/handling';
import { Identity } from './_components/identity';
import { PhaseTable } from './_components/phase-table';
import { ProfileSpread } from './_components/profile-spread';
import { Qualities } from './_components/qualities';
import { StripTile } from './_components/strip-tile';

type Props = { params: Promise<{ id: string }> };

const materialOf = cache(async (id: string) => {
  const ctx = await requireMember('material.read');
  try {
    return { ctx, material: await getMaterial(ctx, id) };
  } catch (error) {
    if (error instanceof NotFound) notFound();
    throw error;
  }
});

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { material } = await materialOf((await params).id);
  return { title: material.name };
}

/** One material: what it smells like first, then what it is, costs, contains, resembles, and how to handle it. */
export default async function MaterialPage({ params }: Props) {
  const { ctx, material } = await materialOf((await params).id);
  const facets = await listFacets(ctx);
  const smells = material.profile.some((intensity) => intensity > 0);
  return (
    <>
      <ScreenHead
        title={material.name}
        about={
          <span className="flex flex-wrap items-baseline gap-x-3">
            {material.botanicalName ? <span className="latin text-lead">{material.botanicalName}</span> : null}
            <span>{[KIND_NAMES[material.kind], material.plantPart].filter(Boolean).join(', ')}</span>
          </span>
        }
        actions={
          <>
            {may(ctx.roles, 'material.write') ? (
              <ButtonLink href={`/materials/${material.id}/edit`}>Edit</ButtonLink>
            ) : null}
            {may(ctx.roles, 'blend.solve') && smells ? (
              <ButtonLink look="solid" href={`/blend?target=${material.id}`}>
                Use as target in Blend
              </ButtonLink>
            ) : null}
          </>
        }
      />
      <div className="tiles lg:grid-cols-[21rem_minmax(0,1fr)]">
        <StripTile material={material} facets={facets} />
        <div className="tiles border-none lg:grid-cols-2">
          {smells ? (
            <Tile title="Profile" className="lg:col-span-2">
              <ProfileSpread facets={facets} profile={material.profile} sd={material.profileSd} />
            </Tile>
          ) : null}
          {material.phases ? (
            <Tile title="Opening, heart and dry phase">
              <PhaseTable facets={facets} profile={material.profile} phases={material.phases} />
            </Tile>
          ) : null}
          {smells && material.evaporationPerHour !== null ? (
            <Tile title="Over time on a blotter" className={material.phases ? '' : 'lg:col-span-2'}>
              <Course material={material} facets={facets} />
            </Tile>
          ) : null}
        </div>
      </div>
      <div className="tiles border-t-0 lg:grid-cols-2">
        {material.currency ? <Costs material={material} currency={material.currency} /> : null}
        <Contains material={material} mayRead={may(ctx.roles, 'constituent.read')} />
        <Identity material={material} />
        <Handling material={material} />
      </div>
      <div className="tiles border-t-0">
        {smells ? (
          <Suspense fallback={<Waiting />}>
            <Close ctx={ctx} material={material} facets={facets} />
          </Suspense>
        ) : null}
        <Qualities material={material} mayWrite={may(ctx.roles, 'material.write')} roles={ctx.roles} />
      </div>
    </>
  );
}

function Waiting() {
  return (
    <Tile title="Close to it">
      <div role="status" aria-label="Looking for what is close" className="grid gap-4">
        <Skeleton width="32ch" />
        <Skeleton width="26ch" />
      </div>
    </Tile>
  );
}
