import path from 'node:path';
import type { Browser, Page } from 'playwright-core';
import { build } from 'vite';
import { afterAll, beforeAll, expect, it } from 'vitest';
import * as engine from '@/engine';
import type { BlendProblem, BlendSolution } from '@/engine/contract';
import { generatedProblem } from '../support/arbitraries/blend-problem';
import { launchChromium } from '../support/browser';

/** What the bundle leaves in the page. */
declare const stillroomEngine: typeof engine;

const SEEDS = Array.from({ length: 40 }, (_, seed) => seed);
let browser: Browser;
let page: Page;

beforeAll(async () => {
  browser = await launchChromium();
  page = await browser.newPage();
  await page.addScriptTag({ content: await bundledEngine() });
});
afterAll(async () => {
  await browser?.close();
});

/** The engine as one script for a browser, as the worker gets it. */
async function bundledEngine(): Promise<string> {
  const root = path.resolve(import.meta.dirname, '../..');
  const built = await build({
    root,
    configFile: false,
    logLevel: 'error',
    build: {
      write: false,
      minify: true,
      lib: { entry: path.join(root, 'engine/index.ts'), formats: ['iife'], name: 'stillroomEngine' },
    },
  });
  const [bundle] = [built].flat();
  if (!bundle || !('output' in bundle)) throw new Error('The engine was not bundled.');
  return bundle.output[0].code;
}

/** Every number as its 64 bits, so that even -0 and the last digit count. */
function bits(value: unknown): unknown {
  if (typeof value === 'number') return new BigUint64Array(Float64Array.of(value).buffer)[0]!.toString(16);
  if (Array.isArray(value)) return value.map(bits);
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(Object.entries(value).map(([key, inside]) => [key, bits(inside)]));
}

/** -0 and numbers that are not finite would not survive the way out of the page as JSON: they come as bits. */
function solvedInPage(problem: BlendProblem): Promise<unknown> {
  return page.evaluate(
    ([asked, source]) => {
      const toBits = new Function(`return ${source}`)() as typeof bits;
      return toBits(stillroomEngine.solveBlend(JSON.parse(asked!)));
    },
    [JSON.stringify(problem), bits.toString()],
  );
}

it('answers bit for bit alike in Node and in Chromium', async () => {
  const statuses = new Set<BlendSolution['status']>();
  for (const seed of SEEDS) {
    const { problem, story } = generatedProblem(seed);
    const here = engine.solveBlend(problem);
    statuses.add(here.status);
    expect(await solvedInPage(problem), story).toEqual(JSON.parse(JSON.stringify(bits(here))));
  }
  expect(statuses).toContain('optimal');
  expect(statuses).toContain('infeasible');
});
