import 'server-only';
import { createHash } from 'node:crypto';
import { and, eq, isNull, lt } from 'drizzle-orm';
import { db } from '@/db/connection';
import { ERRNO, errnoOf } from '@/db/database-error';
import { idempotencyKeys } from '@/db/schema';
import type { Member } from '@/lib/auth/member';
import { Conflict, Invalid } from '@/lib/errors';
import { log } from '@/lib/log';

/** A claim whose worker died is free again after this: longer than the longest wait for a solver and its solve. */
const ABANDONED_MS = 10 * 60_000;
const KEPT_MS = 24 * 3_600_000;
const WAIT_MS = 10_000;
const POLL_MS = 60;

interface Claim {
  ctx: Member;
  operation: string;
  key: string | null;
  /** Address and body: a key stands for one whole request. */
  request: string;
  status: number;
}

interface Settled {
  status: number;
  answer: unknown;
}

/**
 * Runs the work once for a key of a person, and gives every repeat the first answer.
 *
 * The key is claimed by a committed insert; a repeat waits for the first one's answer. Work that throws frees the key.
 * Work that was done keeps it even when its answer could not be stored: a repeat then hears so, and nothing is done twice.
 *
 * @throws Invalid without a key, or when the key came before with another request; Conflict when the first is still at work.
 */
export async function answerOnce(claim: Claim, work: () => Promise<unknown>): Promise<Settled> {
  const { key } = claim;
  if (!key || key.length > 128)
    throw new Invalid({ 'Idempotency-Key': 'Send an Idempotency-Key of 1 to 128 characters.' });
  const bodyHash = createHash('sha256').update(claim.request).digest('hex');
  const keyed = { ...claim, key, claimedAt: new Date() };
  if (!(await take(keyed, bodyHash))) return firstAnswer(keyed, bodyHash);
  let answer: unknown;
  try {
    answer = await work();
  } catch (error) {
    await db.delete(idempotencyKeys).where(ownClaim(keyed));
    throw error;
  }
  await keepAnswer(keyed, answer).catch((error) =>
    log.error({ event: 'answer_not_kept', operation: claim.operation, err: error }),
  );
  return { status: claim.status, answer };
}

interface Keyed extends Claim {
  key: string;
  claimedAt: Date;
}

const mine = ({ ctx, operation, key }: Keyed) =>
  and(
    eq(idempotencyKeys.teamId, ctx.teamId),
    eq(idempotencyKeys.userId, ctx.userId),
    eq(idempotencyKeys.operation, operation),
    eq(idempotencyKeys.key, key),
  );

/** Still the claim that this request made: one that was abandoned may be another's by now. */
const ownClaim = (claim: Keyed) => and(mine(claim), eq(idempotencyKeys.createdAt, claim.claimedAt));

async function keepAnswer(claim: Keyed, answer: unknown): Promise<void> {
  await db.update(idempotencyKeys).set({ status: claim.status, answer }).where(ownClaim(claim));
}

/** Deletes what is kept no longer: a repeat after a day is a new request. */
export async function sweepIdempotencyKeys(): Promise<void> {
  await db.delete(idempotencyKeys).where(lt(idempotencyKeys.createdAt, new Date(Date.now() - KEPT_MS)));
}

/** Whether the key is now ours. */
async function take(claim: Keyed, bodyHash: string): Promise<boolean> {
  const { ctx, operation, key, claimedAt } = claim;
  const now = claimedAt.getTime();
  await db.delete(idempotencyKeys).where(and(mine(claim), lt(idempotencyKeys.createdAt, new Date(now - KEPT_MS))));
  await db
    .delete(idempotencyKeys)
    .where(
      and(mine(claim), isNull(idempotencyKeys.status), lt(idempotencyKeys.createdAt, new Date(now - ABANDONED_MS))),
    );
  try {
    await db
      .insert(idempotencyKeys)
      .values({ teamId: ctx.teamId, userId: ctx.userId, operation, key, bodyHash, createdAt: claimedAt });
    return true;
  } catch (error) {
    if (errnoOf(error) === ERRNO.duplicate) return false;
    throw error;
  }
}

async function firstAnswer(claim: Keyed, bodyHash: string): Promise<Settled> {
  for (const end = Date.now() + WAIT_MS; Date.now() < end; ) {
    const [row] = await db.select().from(idempotencyKeys).where(mine(claim));
    if (!row) throw new Conflict('The first request with this key failed. Send it again.');
    if (row.bodyHash !== bodyHash)
      throw new Invalid({
        'Idempotency-Key': 'This key came before with another address or body. Use a new key for a new request.',
      });
    if (row.status !== null) return { status: row.status, answer: row.answer };
    await new Promise((resolve) => setTimeout(resolve, POLL_MS));
  }
  throw new Conflict('The first request with this key is still at work.');
}
