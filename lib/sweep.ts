import 'server-only';
import { sweepIdempotencyKeys } from '@/lib/api/idempotency';
import { sweepAttempts } from '@/lib/auth/attempts';
import { sweepSessions } from '@/lib/auth/session';
import { log } from '@/lib/log';

const HOUR_MS = 3_600_000;

/** Deletes what has served its time: ended sessions, the counts of hours gone by, answers kept for repeats. */
export async function sweep(): Promise<void> {
  for (const [what, work] of Object.entries({ sweepSessions, sweepAttempts, sweepIdempotencyKeys }))
    await work().catch((error) => log.error({ event: 'sweep_failed', what, err: error }));
}

/** Every hour, as long as the process lives for other reasons. */
export function sweepHourly(): void {
  setInterval(sweep, HOUR_MS).unref();
}
