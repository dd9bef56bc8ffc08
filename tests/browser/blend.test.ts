import AxeBuilder from '@axe-core/playwright';
import type { Page } from 'playwright-core';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { transaction } from '@/db/transaction';
import type { Member } from '@/lib/auth/member';
import { listCandidates } from '@/lib/blends/candidates';
import { saveBlend } from '@/lib/blends/commands';
import { getBlend, listBlends } from '@/lib/blends/queries';
import { loadLibrary } from '@/lib/library/load-library';
import type { Candidate } from '@/lib/shared/blend-candidate';
import { blendRequest } from '@/lib/shared/blend-input';
import { closePool } from '@/lib/solving/pool';
import { browserForFile } from '../support/browser';
import { makeMember, makeTeam } from '../support/database';

const { visit } = browserForFile();
let perfumer: Member;
let safety: Member;
let rose: Candidate;
/** A blend that stands saved whatever the tests do. */
let savedId: string;

beforeAll(async () => {
  const team = await makeTeam({ name: 'House of the Dear Rose' });
  await transaction((tx) => loadLibrary(tx, { teamId: team.id, begin: 'sample', currency: 'EUR' }));
  perfumer = await makeMember(team, 'perfumer');
  safety = await makeMember(team, 'safety');
  const { items } = await listCandidates(perfumer, '100');
  rose = items.find(({ name }) => name.startsWith('Rose absolute'))!;
  const request = blendRequest.parse({ target: { kind: 'material', materialId: rose.id } });
  savedId = (await saveBlend(perfumer, { name: 'Kept', note: '', request })).id;
});

afterAll(closePool);

/** A busy machine may take its time; how quick a drag is answered is measured elsewhere. */
const SOON = { timeout: 20_000 };

const lines = (page: Page) => page.getByRole('region', { name: 'The blend, line by line' });
const rowsOf = (page: Page) => lines(page).getByRole('row').allTextContents();
/** A figure of the headline, by its term: the number alone. */
const figure = async (page: Page, term: string) => {
  const words = await page
    .locator('dl > div', { has: page.getByText(term, { exact: true }) })
    .first()
    .locator('dd > span')
    .first()
    .textContent();
  return Number(words?.replace(/[^\d.]/g, ''));
};

async function expectNoFindings(page: Page) {
  const { violations } = await new AxeBuilder({ page })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
    .analyze();
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' ')}`)).toEqual([]);
}

/** Sets the ceiling as a person types it, and waits for the answer under it. */
async function setCeiling(page: Page, amount: number) {
  const field = page.getByRole('textbox', { name: /^Price ceiling/ });
  await field.fill(String(amount));
  await field.press('Enter');
  await expect.poll(() => figure(page, 'At equal strength'), SOON).toBeLessThanOrEqual(amount);
}

it('builds a rose accord at a third of its price, saves it, and opens the same again', async () => {
  const third = Math.floor(Number(rose.costPerKg) / 3);
  const page = await visit({ as: perfumer, path: '/blend', viewport: { width: 1440, height: 1000 } });
  await page.getByRole('combobox', { name: 'Smell like' }).fill(rose.name.slice(0, 20));
  await page.getByRole('option', { name: rose.name }).first().click();
  await lines(page).waitFor();
  await page.getByLabel('What it goes into').selectOption('4');
  await setCeiling(page, third);
  expect(new URL(page.url()).searchParams.get('category')).toBe('4');
  expect(page.url()).not.toContain(String(third));
  await page.getByText(/^Proven: no blend of these materials within these rules/).waitFor();
  expect(await page.getByText('exceeded', { exact: true }).count()).toBe(0);
  const before = await rowsOf(page);
  expect(before.length).toBeGreaterThan(5);

  await page.getByRole('button', { name: 'Save the blend' }).click();
  await page.getByRole('textbox', { name: 'Name' }).fill('Rose at a third');
  await page.getByRole('button', { name: 'Save', exact: true }).click();
  await page.waitForURL(/\/blends\/\w{26}$/);
  await page.getByRole('heading', { level: 1, name: 'Rose at a third' }).waitFor();
  const names = (rows: string[]) =>
    rows
      .slice(1, -1)
      .map((row) => row.match(/^(.+?)(ready base|absolute|oil|synthetic|isolate|extract|resinoid|solvent)/)?.[1]);
  expect(names(await rowsOf(page))).toEqual(names(before));

  const saved = await rowsOf(page);
  await page.reload();
  expect(await rowsOf(page)).toEqual(saved);
  await page.getByText('Prices, materials and limits are today as they were then.').waitFor();
  const { items } = await listBlends(perfumer);
  const { solved } = await getBlend(perfumer, items[0]!.id);
  expect(Number(solved.money!.costAtEqualStrength)).toBeLessThanOrEqual(third * (1 + 1e-9));
});

it('answers while the price is pulled down, and says what more money would bring', async () => {
  const page = await visit({ as: perfumer, path: `/blend?target=${rose.id}`, viewport: { width: 1440, height: 1000 } });
  await lines(page).waitFor();
  const distance = await figure(page, 'Distance');
  const slider = page.getByRole('slider', { name: 'At most' });
  await slider.focus();
  await page.keyboard.press('Home');
  await setCeiling(page, 40);
  expect(await figure(page, 'Distance')).toBeGreaterThan(distance);
  await page.getByText(/^The price ceiling is what holds you back: .+ EUR\/kg more would bring it about/).waitFor();
});

it('finds an alternative that is natural throughout', async () => {
  const page = await visit({ as: perfumer, path: `/blend?target=${rose.id}`, viewport: { width: 1440, height: 1000 } });
  await lines(page).waitFor();
  await page.getByRole('slider', { name: 'Natural share, at least' }).focus();
  await page.keyboard.press('End');
  await expect.poll(() => figure(page, 'Natural'), SOON).toBe(100);
  expect((await rowsOf(page)).join()).not.toContain('synthetic');
});

it('says which rules clash, and one press makes room', async () => {
  const page = await visit({ as: perfumer, path: `/blend?target=${rose.id}`, viewport: { width: 1440, height: 1000 } });
  await lines(page).waitFor();
  const field = page.getByRole('textbox', { name: /^Price ceiling/ });
  await field.fill('0.01');
  await field.press('Enter');
  await page.getByRole('heading', { name: 'Nothing fits these rules' }).waitFor();
  await page.getByRole('button', { name: /^Apply: Raise the price ceiling to/ }).click();
  await lines(page).waitFor();
});

it('leaves a material out from its line, and takes it back from the rules', async () => {
  const page = await visit({ as: perfumer, path: `/blend?target=${rose.id}`, viewport: { width: 1440, height: 1000 } });
  await lines(page).waitFor();
  const first = (await lines(page).getByRole('link').first().textContent())!;
  await page.getByRole('button', { name: `Leave out ${first}` }).click();
  await expect.poll(() => lines(page).getByRole('link', { name: first, exact: true }).count(), SOON).toBe(0);
  await page.getByRole('button', { name: `Take back the rule for ${first}` }).click();
  await lines(page).getByRole('link', { name: first, exact: true }).waitFor();
});

it('shows safety a saved blend without any price', async () => {
  const page = await visit({ as: safety, path: `/blends/${savedId}` });
  await lines(page).waitFor();
  expect(await page.locator('main').textContent()).not.toMatch(/EUR/);
});

describe.each([
  ['light', 1440],
  ['dark', 1440],
  ['light', 390],
  ['dark', 390],
] as const)('in the %s theme at %i px', (colorScheme, width) => {
  it('has no finding of axe and nothing that runs off the screen', async () => {
    const viewport = { width, height: 900 };
    const page = await visit({ as: perfumer, path: `/blend?target=${rose.id}&category=4`, colorScheme, viewport });
    await lines(page).waitFor();
    await page
      .getByRole('radio', { name: /, distance/ })
      .first()
      .waitFor({ state: 'attached' });
    await expectNoFindings(page);
    expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(width);
    for (const path of ['/blends', `/blends/${savedId}`]) {
      await page.goto(path);
      await page.getByRole('heading', { level: 1 }).waitFor();
      await expectNoFindings(page);
      expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBeLessThanOrEqual(width);
    }
  });
});

it('opens the rules from below on a phone, with the answer first', async () => {
  const page = await visit({ as: perfumer, path: `/blend?target=${rose.id}`, viewport: { width: 390, height: 844 } });
  await lines(page).waitFor();
  expect(await page.getByRole('slider', { name: 'At most' }).count()).toBe(0);
  await page.getByRole('button', { name: /^Rules/ }).click();
  await page.getByRole('dialog').getByRole('slider', { name: 'At most' }).waitFor();
  await expectNoFindings(page);
});
