'use server';
import { cookies, headers } from 'next/headers';
import { redirect } from 'next/navigation';
import type { z } from 'zod';
import { isSameOrigin } from '@/lib/auth/origin';
import { endSession, SESSION_COOKIE } from '@/lib/auth/session';
import { Forbidden, Invalid, TooMany } from '@/lib/errors';
import { signUp as openHouse, signIn as openSession, signInAsDemo } from '@/lib/people/commands';
import { signInInput, signUpInput } from '@/lib/shared/people-input';
import type { Role } from '@/lib/shared/permissions';

/** What a form at the door shows again: sentences by field, and what was typed, passwords left out. */
export interface DoorState {
  errors: Record<string, string>;
  values: Record<string, string>;
}

export async function signIn(_: DoorState, form: FormData): Promise<DoorState> {
  return enter(form, signInInput, openSession);
}

export async function signUp(_: DoorState, form: FormData): Promise<DoorState> {
  return enter(form, signUpInput, openHouse);
}

export async function demoSignIn(form: FormData): Promise<void> {
  await demandOwnOrigin();
  await keep(await signInAsDemo(String(form.get('role')) as Role));
  redirect('/materials');
}

export async function signOut(): Promise<void> {
  await demandOwnOrigin();
  const jar = await cookies();
  const token = jar.get(SESSION_COOKIE)?.value;
  if (token) await endSession(token);
  jar.delete({ name: SESSION_COOKIE, path: '/', secure: true });
  redirect('/sign-in');
}

/** Own origin, parsed, done; a refusal comes back as sentences beside what was typed. */
async function enter<T>(form: FormData, schema: z.ZodType<T>, open: (input: T) => Promise<string>): Promise<DoorState> {
  await demandOwnOrigin();
  const typed = Object.fromEntries(
    [...form].filter(([name, value]) => typeof value === 'string' && !name.startsWith('$')),
  );
  const parsed = schema.safeParse(typed);
  if (!parsed.success)
    return again(typed, Object.fromEntries(parsed.error.issues.map((i) => [String(i.path[0] ?? 'form'), i.message])));
  try {
    await keep(await open(parsed.data));
  } catch (error) {
    if (error instanceof Invalid) return again(typed, error.fields);
    if (error instanceof TooMany) return again(typed, { form: error.message });
    throw error;
  }
  redirect('/materials');
}

function again(typed: Record<string, FormDataEntryValue>, errors: Record<string, string>): DoorState {
  const { password: _, ...rest } = typed;
  return { errors, values: rest as Record<string, string> };
}

/** Whoever comes in anew ends the session that this browser had before. */
async function keep(token: string): Promise<void> {
  const jar = await cookies();
  const before = jar.get(SESSION_COOKIE)?.value;
  if (before) await endSession(before);
  jar.set(SESSION_COOKIE, token, { httpOnly: true, secure: true, sameSite: 'lax', path: '/' });
}

/** Next lets a request without an Origin through to its actions; we don't. */
async function demandOwnOrigin(): Promise<void> {
  if (!isSameOrigin(await headers())) throw new Forbidden('A change must come from Stillroom’s own pages.');
}
