import { redirect } from 'next/navigation';
import type { ReactNode } from 'react';
import { currentMember } from '@/lib/auth/current';
import { may } from '@/lib/shared/permissions';
import { ACTIONS } from '../_components/palette/actions';
import { ENTRIES } from '../_components/shell/entries';
import { HouseShell } from '../_components/shell/house-shell';

/** The shell around every screen of a house. Each page still asks for its own permission: a layout is no lock. */
export default async function HouseLayout({ children }: { children: ReactNode }) {
  const member = await currentMember();
  if (!member) redirect('/sign-in');
  const allowed = ENTRIES.filter(({ permission }) => may(member.roles, permission)).map(({ href }) => href);
  const actions = ACTIONS.filter(({ permission }) => may(member.roles, permission)).map(({ href }) => href);
  const person = {
    name: member.userName,
    house: member.teamName,
    roles: new Intl.ListFormat('en-GB', { type: 'unit' }).format(member.roles),
    isDemo: member.isDemo,
  };
  return (
    <HouseShell person={person} allowed={allowed} actions={actions}>
      {children}
    </HouseShell>
  );
}
