import type { TestProject } from 'vitest/node';
import { prepareTestDatabase } from '../../db/run/accounts.mjs';
import { startMariadb, TEST_SERVER } from '../../db/run/mariadb.mjs';

declare module 'vitest' {
  export interface ProvidedContext {
    testDatabaseUrl: string;
  }
}

/** Before the tests that need a database: their own server, started here unless it runs already. */
export default async function setup(project: TestProject) {
  const server = await startMariadb(TEST_SERVER);
  project.provide('testDatabaseUrl', await prepareTestDatabase(server, TEST_SERVER.folder));
  return () => server.stop();
}
