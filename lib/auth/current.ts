import 'server-only';
import { cookies } from 'next/headers';
import { notFound, redirect } from 'next/navigation';
import { cache } from 'react';
import { may, type Permission } from '@/lib/shared/permissions';
import type { Member } from './member';
import { memberOfToken, SESSION_COOKIE } from './session';

/** The member who asks, read once a request; null when nobody is signed in. */
export const currentMember = cache(async (): Promise<Member | null> => {
  const token = (await cookies()).get(SESSION_COOKIE)?.value;
  return token ? memberOfToken(token) : null;
});

/** For pages: the member, or the sign-in page; a screen that the roles do not allow is not there. */
export async function requireMember(permission: Permission): Promise<Member> {
  const member = await currentMember();
  if (!member) redirect('/sign-in');
  if (!may(member.roles, permission)) notFound();
  return member;
}
