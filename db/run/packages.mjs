import { accessSync, constants } from 'node:fs';
import path from 'node:path';
import { lastLines, run } from './command.mjs';
import { CannotGoOn } from './sentence.mjs';

/** `/usr/sbin` holds the server and is not on everybody's path. */
const FOLDERS = [...(process.env.PATH ?? '').split(path.delimiter), '/usr/sbin', '/usr/local/sbin', '/usr/bin'];

/** The full path of a program, or null. */
export function findProgram(name) {
  const found = FOLDERS.filter(Boolean)
    .map((folder) => path.join(folder, name))
    .find(isExecutable);
  return found ?? null;
}

/**
 * Makes sure that programs are there, by Debian's packages if need be. Only the parts that start no service of their
 * own are ever asked for.
 */
export async function ensurePrograms({ programs, packages, purpose, say }) {
  const missing = () => programs.filter((name) => findProgram(name) === null);
  if (missing().length === 0) return;
  const wish = `${purpose} needs ${missing().join(' and ')}`;
  const asRoot = await rootPrefix();
  if (findProgram('apt-get') === null || asRoot === null) {
    throw new CannotGoOn(`${wish}. Install it as an administrator and start again:\n  ${byHand(packages)}`);
  }
  say(`installing ${packages.join(', ')}`);
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  const [program, ...before] = [...asRoot, 'apt-get'];
  const apt = (...args) => run(program, [...before, ...args], { env });
  await apt('update', '-q'); // an old list may still do, so its failure alone is no reason to stop
  const { code, errors, output } = await apt('install', '-y', '-q', '--no-install-recommends', ...packages);
  if (code !== 0 || missing().length > 0) {
    throw new CannotGoOn(
      `${wish}, and apt-get could not install it:\n${lastLines(errors || output)}\nBy hand:\n  ${byHand(packages)}`,
    );
  }
}

const byHand = (packages) =>
  `sudo apt-get update && sudo apt-get install --no-install-recommends ${packages.join(' ')}`;

/** How to become root without being asked for a password: not at all, by sudo, or null when there is no way. */
async function rootPrefix() {
  if (process.getuid?.() === 0) return [];
  const sudo = findProgram('sudo');
  if (sudo !== null && (await run(sudo, ['-n', 'true'])).code === 0) return [sudo, '-n'];
  return null;
}

function isExecutable(file) {
  try {
    accessSync(file, constants.X_OK);
    return true;
  } catch {
    return false;
  }
}
