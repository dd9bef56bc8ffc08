import fc from 'fast-check';
import { afterEach, beforeEach, expect, vi } from 'vitest';

/** The same cases in every run; another seed finds others: `SEED=7 npm test`. A failing property prints it. */
fc.configureGlobal({ ...fc.readConfigureGlobal(), seed: Number(process.env.SEED ?? 20_261_201) });

/** An error nobody expected to be printed is a failure. A test that expects one replaces the spy by its own. */
beforeEach(() => {
  vi.spyOn(console, 'error');
});
afterEach(() => {
  if (vi.isMockFunction(console.error)) expect(console.error).not.toHaveBeenCalled();
  vi.restoreAllMocks();
});
