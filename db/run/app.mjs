import { spawn } from 'node:child_process';
import { closeSync, mkdirSync, openSync, readFileSync, rmSync } from 'node:fs';
import http from 'node:http';
import path from 'node:path';
import { setTimeout as sleep } from 'node:timers/promises';
import { lastLines } from './command.mjs';
import { inRoot, ROOT } from './root.mjs';
import { CannotGoOn } from './sentence.mjs';

const READY_WITHIN_MS = 120_000;
const STOPPED_WITHIN_MS = 10_000;

/**
 * Serves the built app (or, with `dev`, the sources as they change) and waits until it answers. What it prints goes
 * to `logFile`, or to the terminal where there is none.
 *
 * Answers `{ url, ended, stop }`; `ended` resolves when the app is gone, for whatever reason.
 */
export async function startApp({ databaseUrl, host, port, logFile, dev = false }) {
  const url = `http://${isThisMachine(host) ? 'localhost' : host}:${port}`;
  const log = logFile ? openLog(logFile) : 'inherit';
  const app = spawn(
    process.execPath,
    [inRoot('node_modules/next/dist/bin/next'), dev ? 'dev' : 'start', '-H', host, '-p', String(port)],
    {
      cwd: ROOT,
      env: {
        ...process.env,
        DATABASE_URL: databaseUrl,
        NODE_ENV: dev ? 'development' : 'production',
        NEXT_TELEMETRY_DISABLED: '1',
      },
      stdio: ['ignore', log, log],
      detached: true, // Ctrl-C reaches us alone; we end the app, then the database
    },
  );
  if (logFile) closeSync(log);
  const ended = new Promise((resolve) => app.once('exit', resolve));
  const isRunning = () => app.exitCode === null && app.signalCode === null;
  const stop = () => stopApp(app, ended, isRunning);
  if (await untilAnswering({ host, port }, isRunning)) return { url, ended, stop };
  await stop();
  const why = logFile
    ? `The end of ${logFile}:\n${lastLines(readFileSync(logFile, 'utf8'), 20)}`
    : 'Its reason stands above.';
  throw new CannotGoOn(`The app did not start. ${why}`);
}

/** Each start has a log of its own, so that the reason of a failure is this start's. */
function openLog(file) {
  mkdirSync(path.dirname(file), { recursive: true });
  rmSync(file, { force: true });
  return openSync(file, 'a', 0o600);
}

async function untilAnswering(address, isRunning) {
  for (const end = Date.now() + READY_WITHIN_MS; Date.now() < end && isRunning(); await sleep(100)) {
    if (await answers(address)) return isRunning();
  }
  return false;
}

/** Any answer will do: which page it is, is the app's own affair. */
function answers({ host, port }) {
  return new Promise((resolve) => {
    const request = http.get({ host, port, path: '/', timeout: READY_WITHIN_MS }, (response) => {
      response.resume();
      resolve(true);
    });
    request.on('error', () => resolve(false));
    request.on('timeout', () => request.destroy());
  });
}

/** Asks politely first. Whatever of its process group is left after that is ended. */
async function stopApp(app, ended, isRunning) {
  const signal = (name) => {
    try {
      process.kill(-app.pid, name);
    } catch {
      // the group is gone already
    }
  };
  if (isRunning()) {
    signal('SIGTERM');
    await Promise.race([ended, sleep(STOPPED_WITHIN_MS, undefined, { ref: false })]);
  }
  signal('SIGKILL');
}

const isThisMachine = (host) => ['127.0.0.1', '0.0.0.0', '::', '::1'].includes(host);
