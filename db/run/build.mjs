import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import path from 'node:path';
import { lastLines, run } from './command.mjs';
import { inData, inRoot, ROOT } from './root.mjs';
import { CannotGoOn } from './sentence.mjs';

const STAMP = inData('build.json');
const BUILD_ID = inRoot('.next', 'BUILD_ID');
const FOLDERS = ['app', 'db', 'engine', 'lib', 'public'];
/** Read by the commands, or while the app runs; no part of a build. */
const NOT_BUILT = /^db\/(run|demo|migrations)\//;

/** Builds the app where its sources have changed since the build that lies in `.next`. */
export async function ensureBuild() {
  const sources = sourcesHash();
  if (existsSync(BUILD_ID) && isSameBuild({ sources, build: readFileSync(BUILD_ID, 'utf8') })) return 'unchanged';
  const { code, errors, output } = await run(process.execPath, [inRoot('node_modules/next/dist/bin/next'), 'build'], {
    cwd: ROOT,
    env: { ...process.env, NODE_ENV: 'production', NEXT_TELEMETRY_DISABLED: '1' },
  });
  if (code !== 0) throw new CannotGoOn(`The app could not be built:\n${lastLines(`${output}\n${errors}`, 40)}`);
  mkdirSync(path.dirname(STAMP), { recursive: true });
  writeFileSync(STAMP, JSON.stringify({ sources, build: readFileSync(BUILD_ID, 'utf8') }));
  return 'built';
}

/** Somebody may have built by hand meanwhile: the stamp holds only for the very build that it was written for. */
function isSameBuild({ sources, build }) {
  if (!existsSync(STAMP)) return false;
  const stamp = JSON.parse(readFileSync(STAMP, 'utf8'));
  return stamp.sources === sources && stamp.build === build;
}

/** Everything that the build reads: the source folders, and the files of the root (the lock and settings of tools). */
function sourcesHash() {
  const hash = createHash('sha256').update(process.versions.node);
  const rootFiles = readdirSync(ROOT, { withFileTypes: true }).filter(
    (entry) => entry.isFile() && isSource(entry.name),
  );
  for (const file of [...rootFiles.map((entry) => entry.name), ...FOLDERS.flatMap(filesIn)].sort()) {
    hash.update(`${file}\0`).update(readFileSync(inRoot(file)));
  }
  return hash.digest('hex');
}

const isSource = (name) => /\.(ts|mjs|json|env)$/.test(name) && name !== 'next-env.d.ts';

function filesIn(folder) {
  if (!existsSync(inRoot(folder))) return [];
  return readdirSync(inRoot(folder), { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => path.relative(ROOT, path.join(entry.parentPath ?? entry.path, entry.name)))
    .filter((file) => !NOT_BUILT.test(file));
}
