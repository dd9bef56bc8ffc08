import type { Metadata } from 'next';
import { requireMember } from '@/lib/auth/current';
import { getBlend } from '@/lib/blends/queries';
import { NotFound } from '@/lib/errors';
import { listFacets } from '@/lib/facets/queries';
import type { BlendRequest } from '@/lib/shared/blend-input';
import { may } from '@/lib/shared/permissions';
import { BlendScreen } from './_components/blend-screen';

export const metadata: Metadata = { title: 'Blend' };

interface Search {
  searchParams: Promise<Record<string, string | string[] | undefined>>;
}

/** The address holds the target and the product category alone: never a name or a price of a formula. */
export default async function BlendPage({ searchParams }: Search) {
  const member = await requireMember('blend.solve');
  const { from } = await searchParams;
  const facets = await listFacets(member);
  const start = typeof from === 'string' ? await requestOf(member, from) : null;
  return (
    <BlendScreen facets={facets} currency={member.currency} maySave={may(member.roles, 'blend.save')} start={start} />
  );
}

/** Going on from a saved blend; an id that is not there begins anew. */
async function requestOf(member: Parameters<typeof getBlend>[0], id: string): Promise<BlendRequest | null> {
  try {
    return (await getBlend(member, id)).request;
  } catch (error) {
    if (error instanceof NotFound) return null;
    throw error;
  }
}
