import { readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { fileOf, type Import, importsIn, importsOf, isOnlyReexports, ROOT, sourcesIn, textOf } from './support/sources';

/** Who may import what: the table in DEVELOPERS.md. Change both together. */

const FOLDERS = ['engine', 'db', 'lib', 'app'] as const;
const sources = new Set(FOLDERS.flatMap(sourcesIn));
const all = [...sources];
const under = (folder: string) => all.filter((file) => file.startsWith(`${folder}/`));

const isIn =
  (...folders: string[]) =>
  ({ target, isOurs }: Import) =>
    isOurs && folders.some((folder) => target === folder || target.startsWith(`${folder}/`));
const isPackage =
  (...names: string[]) =>
  ({ target, isOurs }: Import) =>
    !isOurs && names.includes(target);
const isNode = ({ target }: Import) => target.startsWith('node:');

/** Lists what breaks a rule as `file → import`, so that the failure says where to look. */
function strangers(files: string[], ...allowed: ((each: Import) => boolean)[]): string[] {
  return files.flatMap((file) =>
    importsOf(file)
      .filter((each) => !allowed.some((may) => may(each)))
      .map(({ target }) => `${file} → ${target}`),
  );
}

describe('each folder imports only what the table allows', () => {
  it('engine/: itself and ml-matrix; d3-force for the map alone', () => {
    const map = under('engine').filter((file) => file.startsWith('engine/map/'));
    expect(strangers(map, isIn('engine'), isPackage('ml-matrix', 'd3-force'))).toEqual([]);
    const rest = under('engine').filter((file) => !map.includes(file));
    expect(strangers(rest, isIn('engine'), isPackage('ml-matrix'))).toEqual([]);
  });

  it('db/: itself, Drizzle and its driver', () => {
    const tables = under('db').filter((file) => !file.startsWith('db/run/'));
    expect(strangers(tables, isIn('db'), isNode, isPackage('drizzle-orm', 'mysql2'))).toEqual([]);
  });

  it('the commands, which run before any package is installed: Node alone', () => {
    expect(
      strangers([...under('db/run'), ...sourcesIn('tests/run'), 'tests/run.mjs'], isIn('db/run', 'tests/run'), isNode),
    ).toEqual([]);
  });

  it('lib/: nothing of the screens', () => {
    expect(
      under('lib').flatMap((file) =>
        importsOf(file)
          .filter(isIn('app', 'tests'))
          .map((each) => `${file} → ${each.target}`),
      ),
    ).toEqual([]);
  });

  it('lib/shared/, which runs in the browser too: the engine, zod and decimals', () => {
    expect(strangers(under('lib/shared'), isIn('lib/shared', 'engine'), isPackage('zod', 'decimal.js'))).toEqual([]);
  });

  it('app/: never the database', () => {
    const broken = under('app').flatMap((file) =>
      importsOf(file)
        .filter((each) => isIn('db', 'tests')(each) || isPackage('drizzle-orm', 'mysql2')(each))
        .map((each) => `${file} → ${each.target}`),
    );
    expect(broken).toEqual([]);
  });

  it('code that reaches the browser: of lib/ only lib/shared/', () => {
    const files = reachedInBrowser();
    expect(files.length).toBeGreaterThan(0);
    expect(strangers(files, isBrowserSafe)).toEqual([]);
  });
});

const isBrowserSafe = (each: Import) => {
  if (each.isOurs) return each.isType || isIn('app', 'engine', 'lib/shared')(each);
  return !each.target.startsWith('node:') && each.target !== 'server-only';
};

/** From each `'use client'` file and worker along its imports; a `'use server'` file is a door, not a part of them. */
function reachedInBrowser(): string[] {
  const startsWith = (file: string, words: string) => new RegExp(`^(['"])${words}\\1`, 'm').test(textOf(file));
  const reached = new Set(
    under('app').filter((file) => startsWith(file, 'use client') || /worker\.(ts|mjs)$/.test(file)),
  );
  for (const file of reached) {
    for (const { target, isOurs, isType } of importsOf(file)) {
      const next = isOurs && !isType ? fileOf(target, sources) : null;
      if (next?.startsWith('app/') && !startsWith(next, 'use server')) reached.add(next);
    }
  }
  return [...reached];
}

it('keeps the server to the server: lib/ outside lib/shared/ begins by saying so', () => {
  const silent = under('lib').filter(
    (file) =>
      !file.startsWith('lib/shared/') && !file.endsWith('.mjs') && !textOf(file).startsWith("import 'server-only';\n"),
  );
  expect(silent).toEqual([]);
});

it('keeps clocks, chance, files and the network out of engine/', () => {
  const worldly = /\b(Math\.random|Date\.now|new Date|performance\.|process\.|fetch\(|console\.|crypto\.|setTimeout)/;
  expect(
    under('engine').filter((file) => worldly.test(textOf(file).replace(/\/\*[\s\S]*?\*\/|\/\/.*$/gm, ''))),
  ).toEqual([]);
});

it('has no drawer for things without a name', () => {
  expect(
    [...all, ...sourcesIn('tests')].filter((file) => /(^|\/)(utils?|helpers?|misc|common)(\/|\.)/.test(file)),
  ).toEqual([]);
});

it('has two files that only hand on, the faces of engine/ and of the tables', () => {
  const faces = ['engine/index.ts', 'db/schema/index.ts'];
  expect(all.filter((file) => isOnlyReexports(file) && !faces.includes(file))).toEqual([]);
  expect(isOnlyReexports('db/schema/index.ts')).toBe(true);
});

it('names files in kebab-case', () => {
  const odd = all.filter((file) => {
    const name = file.split('/').at(-1) ?? '';
    return !/^[a-z0-9]+(-[a-z0-9]+)*(\.[a-z]+)+$/.test(name);
  });
  expect(odd).toEqual([]);
});

it('keeps the root to the agreed names', () => {
  const agreed = [
    ...FOLDERS,
    ...['public', 'tests', '.ci', 'README.md', 'DEVELOPERS.md'],
    ...['package.json', 'package-lock.json', '.npmrc', '.gitignore', 'tsconfig.json'],
    ...[
      'next.config.ts',
      'proxy.ts',
      'instrumentation.ts',
      'instrumentation-client.ts',
      'postcss.config.mjs',
      'drizzle.config.ts',
    ],
    // Not committed: what tools leave behind.
    ...['.git', 'node_modules', '.next', '.data', 'next-env.d.ts', 'tsconfig.tsbuildinfo', 'coverage'],
  ];
  expect(readdirSync(ROOT).filter((name) => !agreed.includes(name))).toEqual([]);
});

it('sees static, late, re-exported and worker imports, and none in comments', () => {
  const text = `
    import fs from 'node:fs';
    import { type Input, z } from 'zod';
    // import a from 'left-out';
    export * from './a';
    export type {
      B,
    } from '@/engine/b';
    import './globals.css';
    const late = await import('mysql2/promise');
    const worker = new Worker(new URL('./_client/solve.worker.ts', import.meta.url));
  `;
  expect(importsIn(text, 'app/page.tsx').map(({ target, isType }) => (isType ? `type ${target}` : target))).toEqual([
    'node:fs',
    'zod',
    'app/a',
    'type engine/b',
    'app/globals.css',
    'mysql2',
    'app/_client/solve.worker.ts',
  ]);
});
