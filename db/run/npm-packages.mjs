import { existsSync, readFileSync } from 'node:fs';
import { lastLines, run } from './command.mjs';
import { findProgram } from './packages.mjs';
import { inRoot, ROOT } from './root.mjs';
import { CannotGoOn } from './sentence.mjs';

/** Installs what the lock names, where that is not what lies in `node_modules` already. */
export async function ensureNpmPackages() {
  if (isInstalled(readLock('package-lock.json'), readLock('node_modules/.package-lock.json'))) return 'already there';
  const [program, ...before] = npm();
  // Scripts of packages are not run: none of ours needs one, and one that came in later should not run unseen.
  const args = ['ci', '--include=dev', '--ignore-scripts', '--prefer-offline', '--no-audit', '--no-fund'];
  const { code, errors, output } = await run(program, [...before, ...args], { cwd: ROOT });
  if (code !== 0) throw new CannotGoOn(`The npm packages could not be installed:\n${lastLines(errors || output)}`);
  return 'installed';
}

/**
 * npm keeps a list of what it installed, written when it was done. Packages for other systems are in the lock but not
 * in that list, so only those that may be left out may be missing.
 */
export function isInstalled(lock, installed) {
  if (installed === null) return false;
  const wanted = Object.entries(lock).filter(([place]) => place !== '');
  const isThere = ([place, { version, optional }]) =>
    installed[place]?.version === version || (optional && !installed[place]);
  return wanted.every(isThere) && Object.keys(installed).every((place) => place in lock);
}

function readLock(name) {
  const file = inRoot(name);
  return existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')).packages : null;
}

/** The npm that runs us, or the one on the path. */
function npm() {
  const cli = process.env.npm_execpath;
  if (cli?.endsWith('npm-cli.js') && existsSync(cli)) return [process.execPath, cli];
  const found = findProgram('npm');
  if (found === null) throw new CannotGoOn('npm was not found; it comes with Node.');
  return [found];
}
