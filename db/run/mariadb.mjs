import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, openSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import os from 'node:os';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { fileURLToPath } from 'node:url';
import { lastLines, run } from './command.mjs';
import { SERVER_SETTINGS } from './mariadb-settings.mjs';
import { ensurePrograms, findProgram } from './packages.mjs';
import { freePort } from './port.mjs';
import { inData } from './root.mjs';
import { CannotGoOn, endWith } from './sentence.mjs';

export const PRODUCT_SERVER = { folder: inData('mariadb'), preferredPort: 3316 };
export const TEST_SERVER = { folder: inData('test', 'mariadb'), preferredPort: 3416 };

const READY_WITHIN_MS = 60_000; // after a crash it first repairs itself
const STOPPED_WITHIN_MS = 60_000;

/**
 * Starts our own MariaDB on loopback in its own folder, or takes up the one that is running there already.
 *
 * Answers `{ port, started, sql, stop }`: `sql` runs statements as the server's administrator over its socket, `stop`
 * ends the server in an orderly way. A server whose starter is still alive is only borrowed, and its `stop` does
 * nothing; one that a killed starter left behind is adopted.
 */
export async function startMariadb({ folder, preferredPort, say = () => {} }) {
  await ensurePrograms({
    programs: ['mariadbd', 'mariadb-install-db', 'mariadb'],
    packages: ['mariadb-server-core', 'mariadb-client-core'],
    purpose: 'The database',
    say,
  });
  const place = layOut(folder);
  const running = findRunning(place);
  if (running !== null) return takeUp(place, running);
  await initialise(place, say);
  return launch(place, preferredPort);
}

/** Where everything of one server lies. Only the person who runs it may look inside. */
function layOut(folder) {
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  return {
    data: path.join(folder, 'data'),
    socket: socketPath(folder),
    pidFile: path.join(folder, 'mariadb.pid'),
    log: path.join(folder, 'mariadb.log'),
    note: path.join(folder, 'running.json'),
  };
}

/** A socket's path holds at most 107 bytes: deep folders get a short one under the temporary folder. */
function socketPath(folder) {
  const inside = path.join(folder, 'mariadb.sock');
  if (Buffer.byteLength(inside) <= 107) return inside;
  const name = createHash('sha256').update(folder).digest('hex').slice(0, 16);
  const short = path.join(os.tmpdir(), `stillroom-${process.getuid?.() ?? 0}-${name}`);
  mkdirSync(short, { recursive: true, mode: 0o700 });
  return path.join(short, 'mariadb.sock');
}

/**
 * The note about the server that runs on this folder, or null. Asked before anything is started: a second server on
 * a live data folder would wait half a minute for its lock and then fail.
 */
function findRunning({ note, data }) {
  if (!existsSync(note)) return null;
  const { pid, port, owner } = JSON.parse(readFileSync(note, 'utf8'));
  return commandLine(pid).includes(`--datadir=${data}`) ? { pid, port, owner } : null;
}

async function takeUp(place, { pid, port, owner }) {
  const sql = administrator(place);
  await untilReady(place, sql, () => isAlive(pid));
  const borrowed = owner !== process.pid && commandLine(owner).includes('node');
  if (!borrowed) takeNote(place, { pid, port });
  return { port, started: false, sql, stop: borrowed ? async () => {} : () => stop(place, pid) };
}

async function initialise({ data }, say) {
  if (existsSync(path.join(data, 'mysql'))) return;
  say('laying down an empty database');
  rmSync(data, { recursive: true, force: true }); // what an interrupted attempt left behind
  const { code, output, errors } = await run(findProgram('mariadb-install-db'), [
    '--no-defaults',
    '--force', // else it fails where the machine's own name does not resolve
    '--skip-name-resolve',
    '--skip-test-db',
    `--auth-root-socket-user=${os.userInfo().username}`,
    `--datadir=${data}`,
    ...asRoot(),
  ]);
  if (code !== 0)
    throw new CannotGoOn(`The database could not be laid down in ${data}:\n${lastLines(errors || output)}`);
}

/** Somebody may take the port between our look and the server's start, so a lost race is tried again elsewhere. */
async function launch(place, preferredPort) {
  for (let attempt = 0, from = preferredPort; ; attempt++) {
    const port = await freePort(from);
    const server = spawnServer(place, port);
    takeNote(place, { pid: server.pid, port });
    const sql = administrator(place);
    if (await untilReady(place, sql, () => server.exitCode === null && server.signalCode === null)) {
      return { port, started: true, sql, stop: () => stop(place, server.pid) };
    }
    const log = existsSync(place.log) ? lastLines(readFileSync(place.log, 'utf8'), 15) : '';
    rmSync(place.note, { force: true });
    if (attempt === 4 || !log.includes('Bind on TCP/IP port')) {
      throw new CannotGoOn(`The database did not start. The end of ${place.log}:\n${log}`);
    }
    from = port + 1;
  }
}

/** In a process group of its own, so that Ctrl-C reaches us first and the server ends last. */
function spawnServer({ data, socket, pidFile, log }, port) {
  const settings = Object.entries(SERVER_SETTINGS).map(([name, value]) => `--${name}=${value}`);
  const errors = openSync(log, 'a', 0o600);
  const own = [`--datadir=${data}`, `--port=${port}`, `--socket=${socket}`, `--pid-file=${pidFile}`];
  const server = spawn(findProgram('mariadbd'), ['--no-defaults', ...own, ...settings, ...asRoot()], {
    detached: true,
    stdio: ['ignore', errors, errors],
  });
  server.unref();
  return server;
}

async function untilReady({ log }, sql, isRunning) {
  for (const end = Date.now() + READY_WITHIN_MS; Date.now() < end; await sleep(50)) {
    if (!isRunning()) return false;
    if ((await sql('select 1', { mayFail: true })) !== null) return true;
  }
  throw new CannotGoOn(`The database is not ready after ${READY_WITHIN_MS / 1000} s; its log is ${log}.`);
}

/** Runs statements as the server's administrator, over the socket that only this person can open. */
function administrator({ socket }) {
  const args = [
    '--no-defaults',
    '--batch',
    '--skip-column-names',
    `--socket=${socket}`,
    `--user=${os.userInfo().username}`,
  ];
  return async (statements, { mayFail = false } = {}) => {
    const { code, output, errors } = await run(findProgram('mariadb'), args, { input: statements });
    if (code === 0) return output.trim();
    if (mayFail) return null;
    throw new Error(`The database refused a statement of ours: ${lastLines(errors)}`);
  };
}

async function stop({ note }, pid) {
  if (isAlive(pid)) process.kill(pid, 'SIGTERM');
  for (const end = Date.now() + STOPPED_WITHIN_MS; isAlive(pid) && Date.now() < end; ) await sleep(50);
  if (isAlive(pid))
    throw new CannotGoOn(`The database (process ${pid}) did not stop within ${STOPPED_WITHIN_MS / 1000} s.`);
  rmSync(note, { force: true });
}

function takeNote({ note }, { pid, port }) {
  writeFileSync(note, JSON.stringify({ pid, port, owner: process.pid }), { mode: 0o600 });
}

/** The server refuses to run as root unless told so. */
const asRoot = () => (process.getuid?.() === 0 ? ['--user=root'] : []);

function isAlive(pid) {
  // A process that ended but was not yet waited for still has a number, and no command line.
  return commandLine(pid) !== '';
}

function commandLine(pid) {
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8');
  } catch {
    return '';
  }
}

/** `npm run db:start`: the product's own server by itself, until Ctrl-C. */
async function main() {
  const { prepareProductDatabase } = await import('./accounts.mjs');
  const server = await startMariadb({ ...PRODUCT_SERVER, say: console.log });
  const { appUrl, migrationUrl } = await prepareProductDatabase(server, PRODUCT_SERVER.folder);
  const environment = path.join(PRODUCT_SERVER.folder, 'environment');
  const lines = [`DATABASE_URL=${appUrl}`, `MIGRATION_DATABASE_URL=${migrationUrl}`];
  writeFileSync(environment, `${lines.join('\n')}\n`, { mode: 0o600 });
  console.log(`The database listens on port ${server.port}. In another terminal:\n  set -a; . ${environment}; set +a`);
  const end = () => server.stop().then(() => process.exit(0), endWith);
  process.once('SIGINT', end);
  process.once('SIGTERM', end);
  setInterval(() => {}, 2 ** 30); // the server is no child that keeps us alive
}

if (process.argv[1] === fileURLToPath(import.meta.url)) main().catch(endWith);
