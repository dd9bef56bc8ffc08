import 'server-only';
import { checkServer } from '@/db/settings';
import { refuseMethods } from '@/lib/api/refuse-methods';
import { sweepHourly } from '@/lib/sweep';

/** Before a server process answers anyone: an unsafe database ends it, with the reason. */
export async function startUp(): Promise<void> {
  refuseMethods();
  try {
    await checkServer();
    sweepHourly();
  } catch (error) {
    console.error(error instanceof Error ? error.message : error);
    process.exit(1);
  }
}
