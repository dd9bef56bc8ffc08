import 'server-only';
import { closePool } from '@/db/connection';
import { makeDemoHouse } from './demo-house';

/** `npm run db:demo`: makes the demo house once. Run again it changes nothing. */
try {
  const made = await makeDemoHouse();
  process.stdout.write(made ? 'The demo house is made.\n' : 'There is a demo house already.\n');
} finally {
  await closePool();
}
