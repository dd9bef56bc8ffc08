/** Which test files belong to which project; everything else is `pure` and needs nothing beside Node. */
export const DATABASE_TESTS = ['tests/db/**/*.test.ts', 'tests/lib/db/**/*.test.ts'];
export const BROWSER_TESTS = ['tests/browser/**/*.test.ts'];
/** These take minutes: only `npm run test:long` runs them. */
export const LONG_TESTS = ['tests/**/*.long.test.ts'];
