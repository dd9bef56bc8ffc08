import path from 'node:path';
import { defineConfig } from 'vitest/config';
import { BROWSER_TESTS, DATABASE_TESTS, LONG_TESTS } from './run/projects.mjs';

const root = path.resolve(import.meta.dirname, '..');
const support = (file: string) => path.join(root, 'tests/support', file);
const long = process.env.LONG ? [] : LONG_TESTS;

/**
 * Three projects: `pure` needs nothing beside Node; `database` needs MariaDB and starts its own; `browser` drives
 * Chromium against the built app, which `tests/run.mjs` builds and starts (STILLROOM_URL says where).
 */
export default defineConfig({
  root,
  resolve: {
    alias: { '@': root, 'server-only': support('server-only.ts') },
  },
  test: {
    testTimeout: 60_000,
    hookTimeout: 120_000,
    maxWorkers: 2,
    setupFiles: support('every-file.ts'),
    projects: [
      {
        extends: true,
        test: {
          name: 'pure',
          include: ['tests/**/*.test.ts', 'tests/**/*.test.tsx'],
          exclude: [...DATABASE_TESTS, ...BROWSER_TESTS, ...long],
        },
      },
      {
        extends: true,
        test: {
          name: 'database',
          include: DATABASE_TESTS,
          exclude: long,
          pool: 'forks',
          globalSetup: support('database-server.ts'),
          setupFiles: [support('database-setup.ts')],
        },
      },
      {
        extends: true,
        test: {
          name: 'browser',
          include: BROWSER_TESTS,
          exclude: long,
          pool: 'forks',
          maxWorkers: 1,
          testTimeout: 120_000,
        },
      },
    ],
  },
});
