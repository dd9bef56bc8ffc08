import type { Metadata } from 'next';
import Link from 'next/link';
import { redirect } from 'next/navigation';
import { currentMember } from '@/lib/auth/current';
import { type DemoPerson, listDemoPeople } from '@/lib/people/queries';
import { DemoPeople } from './demo-people';
import { SignInForm } from './sign-in-form';

export const metadata: Metadata = { title: 'Sign in' };

export default async function SignIn() {
  if (await currentMember()) redirect('/materials');
  const people: DemoPerson[] = await listDemoPeople();
  return (
    <>
      <h1 className="text-head">Sign in</h1>
      <SignInForm />
      <p>
        No house yet?{' '}
        <Link href="/sign-up" className="font-[560] underline underline-offset-4">
          Open one
        </Link>
      </p>
      {people.length > 0 ? <DemoPeople people={people} /> : null}
    </>
  );
}
