import path from 'node:path';
import { defineConfig } from 'vitest/config';

const root = path.resolve(import.meta.dirname, '..');

/** Two projects: `pure` needs nothing beside Node; `database` needs the tests' own MariaDB (DATABASE_URL). */
export default defineConfig({
  root,
  resolve: {
    alias: {
      '@': root,
      'server-only': path.join(root, 'tests/support/server-only.ts'),
    },
  },
  test: {
    projects: [
      {
        extends: true,
        test: {
          name: 'pure',
          include: ['tests/**/*.test.ts', 'tests/**/*.test.tsx'],
          exclude: ['tests/lib/db/**', 'tests/browser/**'],
          testTimeout: 60_000,
        },
      },
      {
        extends: true,
        test: {
          name: 'database',
          include: ['tests/lib/db/**/*.test.ts'],
          testTimeout: 60_000,
          hookTimeout: 120_000,
        },
      },
    ],
  },
});
