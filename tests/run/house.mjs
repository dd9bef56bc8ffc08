import { grantRows, prepareProductDatabase, prepareTestDatabase } from '../../db/run/accounts.mjs';
import { startApp } from '../../db/run/app.mjs';
import { TEST_SERVER } from '../../db/run/mariadb.mjs';
import { freePort } from '../../db/run/port.mjs';
import { inData } from '../../db/run/root.mjs';
import { loadDemo, migrate } from '../../db/run/scripts.mjs';

const DATABASE = 'stillroom_test_app';
const FIRST_PORT = 3200;

/**
 * The built app on a port of its own, with nothing but the demo house in its database. As in the product, its account
 * can change rows and no table.
 *
 * Answers `{ stop, variables }`: what the browser tests need to know, by the names under which they find it.
 */
export async function openHouse(server) {
  await server.sql(`drop database if exists ${DATABASE}`);
  const { appUrl, migrationUrl } = await prepareProductDatabase(server, TEST_SERVER.folder, DATABASE);
  await migrate(migrationUrl);
  await grantRows(server, DATABASE);
  await loadDemo(appUrl);
  const testsUrl = new URL(await prepareTestDatabase(server, TEST_SERVER.folder));
  testsUrl.pathname = `/${DATABASE}`;
  const logFile = inData('test', 'app.log');
  const app = await startApp({ databaseUrl: appUrl, host: '127.0.0.1', port: await freePort(FIRST_PORT), logFile });
  return { stop: app.stop, variables: { STILLROOM_URL: app.url, STILLROOM_LOG: logFile, DATABASE_URL: testsUrl.href } };
}
