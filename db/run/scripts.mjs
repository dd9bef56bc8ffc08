import { existsSync, readFileSync } from 'node:fs';
import { lastLines, run } from './command.mjs';
import { inRoot, ROOT } from './root.mjs';
import { CannotGoOn } from './sentence.mjs';

/** Brings the tables to their newest shape. */
export const migrate = (migrationUrl) =>
  runScript('db/migrate.ts', { MIGRATION_DATABASE_URL: migrationUrl }, 'The database could not be migrated');

/** Loads the demo house, with its people, materials and limits; the script itself leaves one alone that is there. */
export const loadDemo = (databaseUrl) =>
  runScript('lib/library/load-demo.ts', { DATABASE_URL: databaseUrl }, 'The demo house could not be loaded');

/** The people of the demo house: `{ name, email, roles }`. */
export function demoPeople() {
  const file = inRoot('db', 'demo', 'people.json');
  return existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')).members : [];
}

/** A TypeScript file of ours, run by itself on the server's side. */
async function runScript(file, variables, fault) {
  const args = [inRoot('node_modules/tsx/dist/cli.mjs'), '--conditions=react-server', inRoot(file)];
  const { code, errors, output } = await run(process.execPath, args, {
    cwd: ROOT,
    env: { ...process.env, ...variables },
  });
  if (code !== 0) throw new CannotGoOn(`${fault}:\n${lastLines(errors || output)}`);
}
