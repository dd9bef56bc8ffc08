import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';

export const ROOT = path.resolve(import.meta.dirname, '..', '..');

/** The source files under a folder, as paths from the root. */
export function sourcesIn(folder: string): string[] {
  return readdirSync(path.join(ROOT, folder), { recursive: true, encoding: 'utf8' })
    .filter((file) => /\.(ts|tsx|mjs)$/.test(file))
    .map((file) => path.posix.join(folder, file))
    .sort();
}

export const textOf = (file: string) => readFileSync(path.join(ROOT, file), 'utf8');

const withoutComments = (text: string) => text.replace(/\/\*[\s\S]*?\*\//g, '').replace(/(^|\s)\/\/.*$/gm, '');

export interface Import {
  /** A path from the root for a file of ours, else the name of a package or `node:…`. */
  target: string;
  isOurs: boolean;
  isType: boolean;
}

/** Everything a file imports or re-exports, also late (`import('…')`) and by URL, as workers are. */
export const importsOf = (file: string) => importsIn(textOf(file), file);

export function importsIn(source: string, file: string): Import[] {
  const text = withoutComments(source);
  const found = [
    ...text.matchAll(
      /(?:^|\n)\s*(?:import|export)\s+(?:(?<type>type)\s+)?(?:[\w*\s{},$]+?\s+from\s+)?['"](?<name>[^'"]+)['"]/g,
    ),
    ...text.matchAll(/\b(?:import|require)\(\s*['"](?<name>[^'"]+)['"]\s*\)/g),
    ...text.matchAll(/new URL\(\s*['"](?<name>\.[^'"]+\.\w+)['"]\s*,\s*import\.meta\.url/g),
  ];
  return found.map(({ groups }) => ({ ...resolve(file, groups?.name ?? ''), isType: groups?.type !== undefined }));
}

function resolve(file: string, name: string) {
  if (name.startsWith('@/')) return { target: name.slice(2), isOurs: true };
  if (name.startsWith('.')) return { target: path.posix.join(path.posix.dirname(file), name), isOurs: true };
  return { target: packageOf(name), isOurs: false };
}

const packageOf = (name: string) =>
  name.startsWith('node:')
    ? name
    : name
        .split('/')
        .slice(0, name.startsWith('@') ? 2 : 1)
        .join('/');

/** The file behind an import of ours, or null where it is no source (a style sheet, a picture). */
export function fileOf(target: string, sources: ReadonlySet<string>): string | null {
  const names = [target, ...['.ts', '.tsx', '.mjs', '/index.ts', '/index.tsx'].map((end) => target + end)];
  return names.find((name) => sources.has(name)) ?? null;
}

/** Whether a file does nothing but hand on what others export. */
export function isOnlyReexports(file: string): boolean {
  const rest = withoutComments(textOf(file))
    .replace(/export\s+(type\s+)?(\*(\s+as\s+\w+)?|\{[^}]*\})\s+from\s+['"][^'"]+['"];?/g, '')
    .replace(/^\s*import\s+['"]server-only['"];?/, '');
  return rest.trim() === '' && /export[\s\S]+from/.test(textOf(file));
}
