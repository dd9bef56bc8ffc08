import { afterAll, inject } from 'vitest';
import { prepareWorkerDatabase } from './worker-database';

/** Runs before each file of tests that need a database. */
await prepareWorkerDatabase(inject('testDatabaseUrl'), `w${process.env.VITEST_POOL_ID}`);

afterAll(async () => {
  const { closePool } = await import('@/db/connection');
  await closePool();
});
