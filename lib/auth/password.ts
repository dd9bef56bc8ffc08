import 'server-only';
import { availableParallelism } from 'node:os';
import { hash, verify } from '@node-rs/argon2';
import { TooMany } from '@/lib/errors';
import { isCommonPassword } from './common-passwords';

export const MIN_PASSWORD = 15;
export const MAX_PASSWORD = 128;
/** What is left of a password when the words that anyone would guess are taken out must be at least this long. */
const MIN_OWN = 8;

/** Argon2id at the floor of the OWASP Password Storage Cheat Sheet: 19 MiB, two passes, one lane. */
const COST = { memoryCost: 19_456, timeCost: 2, parallelism: 1 } as const;

/** A hash of nothing in particular: verified when an address is unknown, so that both cases take as long. */
let decoy: Promise<string> | undefined;

/**
 * Why this password can't be taken, as a sentence; null when it can.
 *
 * It is taken exactly as typed: any characters, no composition rules. @param words house, product and own address.
 */
export function passwordFault(password: string, words: string[]): string | null {
  const length = [...password].length;
  if (length < MIN_PASSWORD)
    return `Use at least ${MIN_PASSWORD} characters: a phrase of four or five words is easy to remember. This has ${length}.`;
  if (length > MAX_PASSWORD) return `Use at most ${MAX_PASSWORD} characters; this has ${length}.`;
  if (isCommonPassword(password)) return 'This password is on a list of leaked passwords. Choose another phrase.';
  if (ownPart(password, words).length < MIN_OWN)
    return 'This is little more than the name of the house, the product or your address. Choose another phrase.';
  return null;
}

function ownPart(password: string, words: string[]): string {
  let rest = password.toLowerCase();
  for (const word of ['stillroom', ...words.map((w) => w.toLowerCase())]) {
    if (word.length >= 3) rest = rest.replaceAll(word, '');
  }
  return rest;
}

/** @returns an encoded Argon2id hash with its parameters and salt. */
export const hashPassword = (password: string): Promise<string> => queued(() => hash(password, COST));

/** Whether the password belongs to the hash; with no hash it takes as long and answers false. */
export async function verifyPassword(encoded: string | null, password: string): Promise<boolean> {
  decoy ??= hash('not anyone’s password', COST);
  const against = encoded ?? (await decoy);
  return (await queued(() => verify(against, password))) && encoded !== null;
}

/**
 * At most two hashes a core at once: each holds 19 MiB, the rest wait their turn, and of those only as many as are
 * served in some seconds. Whoever sends more keeps no one else from signing in for longer than that.
 */
const places = 2 * availableParallelism();
const MAX_WAITING = 40 * places;
const RETRY_S = 10;
let running = 0;
const waiting: (() => void)[] = [];

async function queued<T>(work: () => Promise<T>): Promise<T> {
  if (waiting.length >= MAX_WAITING)
    throw new TooMany('Very many people are at the door. Try again in a moment.', RETRY_S);
  if (running >= places) await new Promise<void>((resolve) => waiting.push(resolve));
  else running++;
  try {
    return await work();
  } finally {
    const next = waiting.shift();
    if (next) next();
    else running--;
  }
}
