import { mkdirSync, readdirSync, rmSync } from 'node:fs';
import path from 'node:path';
import { parseArgs } from 'node:util';
import { ensureBuild } from '../db/run/build.mjs';
import { startMariadb, TEST_SERVER } from '../db/run/mariadb.mjs';
import { checkNode } from '../db/run/node-version.mjs';
import { ensureNpmPackages } from '../db/run/npm-packages.mjs';
import { ensurePrograms } from '../db/run/packages.mjs';
import { inData, inRoot } from '../db/run/root.mjs';
import { endWith } from '../db/run/sentence.mjs';
import { openHouse } from './run/house.mjs';
import { runTool, runVitest } from './run/tools.mjs';

/**
 * `npm test`: from a fresh clone to one last line, `N passed, N failed`. It installs what is missing, checks types and
 * style, runs the unit and database tests on a MariaDB of their own, builds the app, serves it with the demo house and
 * drives it with Chromium. A type check or a build counts as one; a failure does not keep the rest from running.
 */
const HELP = `npm test -- [--only=PART] [PATH …]

  --only  one of: types, style, unit, database, browser
  PATH    only test files whose path contains it, such as engine/solve

npm run test:long  tries more cases of every property, and what takes minutes`;

const PARTS = {
  types: () => check('Types', typeCheck),
  style: () =>
    check('Style', () => runTool('node_modules/@biomejs/biome/bin/biome', ['check', '--config-path=tests/lint.json'])),
  unit: () => check('Unit tests', () => runVitest('pure', paths)),
  database: () => check('Database tests', databaseTests),
  browser: browserTests,
};

const { values: options, positionals: paths } = parseArgs({
  allowPositionals: true,
  options: { only: { type: 'string' }, long: { type: 'boolean' }, help: { type: 'boolean' } },
});
const total = { passed: 0, failed: 0 };
/** The last one started is the first to end. */
const running = [];
let isEnding = false;

async function main() {
  if (options.help || !(options.only === undefined || options.only in PARTS)) return console.log(HELP);
  checkNode();
  setEnvironment();
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => end(130));
  rmSync(inData('test', 'results'), { recursive: true, force: true });
  mkdirSync(inData('test', 'results'), { recursive: true });
  console.log(`npm packages: ${await ensureNpmPackages()}`);
  for (const part of wantedParts()) await PARTS[part]();
  await end(total.failed === 0 ? 0 : 1);
}

/** The tests make their own ground: nothing of the terminal they are started from leads them to another. */
function setEnvironment() {
  for (const name of ['DATABASE_URL', 'MIGRATION_DATABASE_URL', 'APP_ORIGIN', 'NODE_ENV', 'PORT', 'HOST'])
    delete process.env[name];
  if (options.long) process.env.LONG = '1';
}

/** Everything, or one part, or only the parts in which a named path has tests. */
function wantedParts() {
  if (options.only) return [options.only];
  if (paths.length === 0) return Object.keys(PARTS);
  const named = readdirSync(inRoot('tests'), { recursive: true })
    .map((file) => path.join('tests', file))
    .filter((file) => /\.test\.tsx?$/.test(file) && paths.some((part) => file.includes(part)));
  return [...new Set(named.map(partOf))];
}

function partOf(file) {
  if (file.startsWith('tests/browser/')) return 'browser';
  return /^tests\/(lib\/)?db\//.test(file) ? 'database' : 'unit';
}

/** Runs one part, tells how it went, and adds it up. @returns whether all of it held. */
async function check(title, work) {
  const start = Date.now();
  console.log(`\n${title} …`);
  const { passed, failed, words } = await work().catch((error) => ({ passed: 0, failed: 1, words: error.stack }));
  if (words) console.log(words);
  console.log(`${title}: ${passed} passed, ${failed} failed (${((Date.now() - start) / 1000).toFixed(1)} s)`);
  total.passed += passed;
  total.failed += failed;
  return failed === 0;
}

async function typeCheck() {
  // Next describes its own pages to the compiler in files that it writes itself.
  const types = await runTool('node_modules/next/dist/bin/next', ['typegen']);
  return types.failed > 0 ? types : runTool('node_modules/typescript/bin/tsc', ['--noEmit']);
}

async function databaseTests() {
  await database();
  return runVitest('database', paths);
}

async function browserTests() {
  const built = await check('Build', async () => ({ passed: 1, failed: 0, words: await ensureBuild() }));
  if (!built) return;
  await check('Browser tests', async () => {
    await ensurePrograms({
      programs: ['chromium'],
      packages: ['chromium'],
      purpose: 'The browser tests',
      say: console.log,
    });
    const house = await openHouse(await database());
    running.push(house);
    return runVitest('browser', paths, house.variables);
  });
}

let server;
async function database() {
  if (server === undefined) {
    server = await startMariadb({ ...TEST_SERVER, say: console.log });
    running.push(server);
  }
  return server;
}

/** The last line is read by machines: exactly so many passed, so many failed. */
async function end(code) {
  if (isEnding) return;
  isEnding = true;
  for (const each of running.reverse()) await each.stop();
  if (code <= 1) console.log(`\n${total.passed} passed, ${total.failed} failed`);
  process.exit(code);
}

main().catch(endWith);
