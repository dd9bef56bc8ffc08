import type { Metadata } from 'next';
import Link from 'next/link';
import { redirect } from 'next/navigation';
import { currentMember } from '@/lib/auth/current';
import { SignUpForm } from './sign-up-form';

export const metadata: Metadata = { title: 'Open a house' };

export default async function SignUp() {
  if (await currentMember()) redirect('/materials');
  return (
    <>
      <div>
        <h1 className="text-head">Open a house</h1>
        <p className="mt-1 text-ink-soft">
          A house is a team with its own materials, prices and formulas. No other house can see that they exist.
        </p>
      </div>
      <SignUpForm />
      <p>
        Already have one?{' '}
        <Link href="/sign-in" className="font-[560] underline underline-offset-4">
          Sign in
        </Link>
      </p>
    </>
  );
}
