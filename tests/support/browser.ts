import { mkdirSync } from 'node:fs';
import path from 'node:path';
import { type Browser, type BrowserContext, type BrowserContextOptions, chromium, type Page } from 'playwright-core';
import { afterAll, afterEach, beforeAll, expect } from 'vitest';
import { closePool } from '@/db/connection';
import type { Member } from '@/lib/auth/member';
import { SESSION_COOKIE, startSession } from '@/lib/auth/session';
import { findProgram } from '../../db/run/packages.mjs';

const FLAGS = [
  '--no-sandbox',
  '--disable-gpu',
  '--disable-quic',
  '--no-first-run',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
  '--disable-dev-shm-usage',
];
const SCREENS = path.resolve('.data/test/screens');

/** Where the built app listens; `tests/run.mjs` starts it and says so. */
export function houseUrl(): string {
  const url = process.env.STILLROOM_URL;
  if (!url) throw new Error('Browser tests need the built app: npm test -- --only=browser');
  return url;
}

/** Debian's Chromium, as all browser tests use it. */
export function launchChromium(): Promise<Browser> {
  return chromium.launch({ executablePath: findProgram('chromium') ?? undefined, args: FLAGS });
}

interface Visit extends BrowserContextOptions {
  /** Who is signed in; nobody by default. */
  as?: Member;
  path?: string;
  /** What the console may say, where a test provokes it. */
  expectedErrors?: RegExp;
}

/**
 * One Chromium for a file of tests. `visit` opens a page of its own, with its own cookies. After each test every page
 * that was opened must have kept quiet: no error in the console, no exception, no breach of the content security
 * policy. A page of a test that failed leaves its picture in `.data/test/screens`.
 */
export function browserForFile() {
  let browser: Browser;
  let visits: { context: BrowserContext; page: Page; complaints: string[] }[] = [];

  beforeAll(async () => {
    browser = await launchChromium();
  });
  afterAll(async () => {
    await browser?.close();
    await closePool();
  });
  afterEach(async ({ task }) => {
    const ended = visits;
    visits = [];
    for (const [index, { page, context }] of ended.entries()) {
      if (task.result?.state === 'fail') await photograph(page, `${task.name} ${index + 1}`);
      await context.close();
    }
    expect(ended.flatMap(({ complaints }) => complaints)).toEqual([]);
  });

  async function visit({ as, path: place, expectedErrors, ...options }: Visit = {}): Promise<Page> {
    const context = await browser.newContext({
      baseURL: houseUrl(),
      locale: 'en-GB',
      timezoneId: 'Europe/Paris',
      ...options,
    });
    if (as) await context.addCookies([await sessionCookie(as)]);
    const page = await context.newPage();
    const complaints: string[] = [];
    const complain = (text: string) => !expectedErrors?.test(text) && complaints.push(text);
    page.on('console', (message) => message.type() === 'error' && complain(message.text()));
    page.on('pageerror', (error) => complain(error.stack ?? error.message));
    await context.exposeBinding('reportViolation', (_, text: string) => void complain(text));
    await context.addInitScript(listenForViolations);
    visits.push({ context, page, complaints });
    if (place) await page.goto(place);
    return page;
  }

  return { visit };
}

/** A session as signing in makes it; setting a test up by clicking would test the door again and again. */
async function sessionCookie({ userId, teamId }: Member) {
  const value = await startSession(userId, teamId);
  const { hostname } = new URL(houseUrl());
  return {
    name: SESSION_COOKIE,
    value,
    domain: hostname,
    path: '/',
    secure: true,
    httpOnly: true,
    sameSite: 'Lax' as const,
  };
}

/** Runs in the page. */
function listenForViolations() {
  const { reportViolation } = globalThis as unknown as { reportViolation: (text: string) => void };
  document.addEventListener('securitypolicyviolation', (event) => {
    reportViolation(`Content security policy: ${event.violatedDirective} refused ${event.blockedURI} ${event.sample}`);
  });
}

async function photograph(page: Page, name: string) {
  mkdirSync(SCREENS, { recursive: true });
  const file = `${name.replace(/[^\w]+/g, '-').slice(0, 100)}.png`;
  await page.screenshot({ path: path.join(SCREENS, file), fullPage: true }).catch(() => {});
}
