import { existsSync, mkdirSync, rmSync, writeFileSync } from 'node:fs';
import { parseArgs } from 'node:util';
import { grantRows, prepareProductDatabase } from './accounts.mjs';
import { startApp } from './app.mjs';
import { ensureBuild } from './build.mjs';
import { PRODUCT_SERVER, startMariadb } from './mariadb.mjs';
import { checkNode } from './node-version.mjs';
import { ensureNpmPackages } from './npm-packages.mjs';
import { portIsFree } from './port.mjs';
import { step } from './progress.mjs';
import { inData, inRoot } from './root.mjs';
import { demoPeople, loadDemo, migrate } from './scripts.mjs';
import { CannotGoOn, endWith } from './sentence.mjs';

/**
 * `npm start`: from a fresh clone to a served house. It installs what is missing, starts MariaDB, migrates, loads the
 * demo house once, builds what has changed, serves, and ends app and database in that order when it is told to stop.
 *
 * DATABASE_URL names another server instead (with MIGRATION_DATABASE_URL for an account that may change tables). No
 * demo house is loaded there: anyone could enter it.
 */
const HELP = `npm start -- [--dev] [--port=3000] [--ready-file=FILE]

  --dev         serve the sources as they change, instead of a build
  --port        where to serve; PORT does the same. HOST (127.0.0.1) says on which address
  --ready-file  a file that appears, with the address in it, once the house is open
  DATABASE_URL  work on this MariaDB server instead of starting one`;

function readOptions() {
  try {
    const { values } = parseArgs({
      options: {
        dev: { type: 'boolean', default: false },
        help: { type: 'boolean', default: false },
        port: { type: 'string', default: process.env.PORT || '3000' },
        'ready-file': { type: 'string' },
      },
    });
    const port = Number(values.port);
    if (!Number.isInteger(port) || port < 1 || port > 65_535) throw new Error(`“${values.port}” is no port number.`);
    return { ...values, port, host: process.env.HOST || '127.0.0.1', readyFile: values['ready-file'] };
  } catch (error) {
    throw new CannotGoOn(`${error.message}\n\n${HELP}`);
  }
}

/** What has been started, in that order; it is stopped in the other. */
const running = [];
let isStopping = false;

async function main() {
  const options = readOptions();
  if (options.help) return console.log(HELP);
  checkNode();
  await checkGround(options);
  stopWhenTold();
  console.log('\nStillroom\n');
  await step('npm packages', ensureNpmPackages);
  const { databaseUrl, people } = await (process.env.DATABASE_URL ? otherDatabase() : ownDatabase());
  if (!options.dev) await step('Build', ensureBuild);
  const app = await step('App', () => serve(options, databaseUrl));
  if (isStopping) return;
  if (options.readyFile) writeFileSync(options.readyFile, JSON.stringify({ url: app.url, pid: process.pid }));
  console.log(openingWords(app.url, people));
  await app.ended;
  if (!isStopping) {
    console.error(`The app has ended by itself. Its log: ${logFile}`);
    await stopEverything(1);
  }
}

const logFile = inData('app.log');

/** What would fail late is asked early. */
async function checkGround({ host, port, readyFile }) {
  if (readyFile) rmSync(readyFile, { force: true });
  try {
    mkdirSync(inData(), { recursive: true });
  } catch (error) {
    throw new CannotGoOn(`Stillroom keeps its data in ${inData()}, which cannot be written: ${error.message}`);
  }
  if (await portIsFree(port, host)) return;
  throw new CannotGoOn(
    `Port ${port} is taken, perhaps by another Stillroom. Stop that program, or choose another port: PORT=${port + 1} npm start`,
  );
}

async function ownDatabase() {
  const server = await step('MariaDB', (say) => startMariadb({ ...PRODUCT_SERVER, say }));
  running.push(server);
  const { appUrl, migrationUrl } = await prepareProductDatabase(server, PRODUCT_SERVER.folder);
  await step('Tables', async () => {
    await migrate(migrationUrl);
    await grantRows(server);
  });
  await step('Demo house', () => demoOnce(server, appUrl));
  return { databaseUrl: appUrl, people: (await hasDemo(server)) ? demoPeople() : [] };
}

const hasDemo = async ({ sql }) => (await sql('select count(*) from stillroom.teams where is_demo')) !== '0';

async function demoOnce(server, appUrl) {
  if (!existsSync(inRoot('lib/library/load-demo.ts'))) return 'not part of this version yet';
  if (await hasDemo(server)) return 'kept as it is';
  await loadDemo(appUrl);
  return 'loaded';
}

async function otherDatabase() {
  const databaseUrl = process.env.DATABASE_URL;
  await step('Tables', () => migrate(process.env.MIGRATION_DATABASE_URL ?? databaseUrl));
  return { databaseUrl, people: [] };
}

async function serve({ host, port, dev }, databaseUrl) {
  const app = await startApp({ databaseUrl, host, port, dev, logFile: dev ? undefined : logFile });
  running.push(app);
  return app;
}

function openingWords(url, people) {
  const width = Math.max(...people.map((person) => person.name.length));
  const lines = people.map(({ name, roles }) => `    ${name.padEnd(width)}  ${roles.join(', ')}`);
  const demo =
    people.length === 0 ? '' : `\n  The demo house is open without a password. Enter as one of:\n${lines.join('\n')}\n`;
  return `\n  Open ${url}\n${demo}\n  Ctrl-C stops it. What you enter is kept in ${inData()}.\n`;
}

/** Told by a signal, or by the end of the npm that started us (which a hard kill of npm does not pass on). */
function stopWhenTold() {
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => stopEverything(0));
  if (!process.env.npm_lifecycle_event) return;
  const parent = process.ppid;
  setInterval(() => process.ppid !== parent && stopEverything(0), 1000).unref();
}

async function stopEverything(code) {
  if (isStopping) return;
  isStopping = true;
  console.log('\n  Stopping.');
  for (const each of running.reverse()) await each.stop();
  process.exit(code);
}

main().catch(async (error) => {
  if (isStopping) return;
  isStopping = true;
  for (const each of running.reverse()) await each.stop().catch(() => {});
  endWith(error);
});
