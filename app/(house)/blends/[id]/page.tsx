import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { ButtonLink } from '@/app/_components/ui/button';
import { ScreenHead } from '@/app/_components/ui/screen';
import { requireMember } from '@/lib/auth/current';
import { getBlend } from '@/lib/blends/queries';
import { NotFound } from '@/lib/errors';
import { may } from '@/lib/shared/permissions';
import { dayInWords } from '../_components/day';
import { SavedBlend } from '../_components/saved-blend';

export const metadata: Metadata = { title: 'Saved blend' };

export default async function SavedBlendPage({ params }: { params: Promise<{ id: string }> }) {
  const member = await requireMember('blend.read');
  const blend = await getBlend(member, (await params).id).catch((error: unknown) => {
    if (error instanceof NotFound) notFound();
    throw error;
  });
  return (
    <>
      <ScreenHead
        title={blend.name}
        about={
          <>
            {blend.solved.target.name}, blended by {blend.createdBy} on {dayInWords(blend.createdAt)}. It opens as it
            was saved.
            {blend.note ? <span className="mt-1 block text-ink">{blend.note}</span> : null}
          </>
        }
        actions={
          <>
            <ButtonLink href="/blends">Saved blends</ButtonLink>
            {may(member.roles, 'blend.solve') ? (
              <ButtonLink href={`/blend?from=${blend.id}`}>Go on from here</ButtonLink>
            ) : null}
          </>
        }
      />
      <SavedBlend blend={blend} />
    </>
  );
}
