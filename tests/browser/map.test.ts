import { AxeBuilder } from '@axe-core/playwright';
import type { Page } from 'playwright-core';
import { beforeAll, describe, expect, it } from 'vitest';
import { browserForFile } from '../support/browser';
import { mapHouse } from '../support/map-house';

const { visit } = browserForFile();
let house: Awaited<ReturnType<typeof mapHouse>>;
beforeAll(async () => {
  house = await mapHouse();
});

const DESK = { width: 1440, height: 900 };
const PHONE = { width: 390, height: 844 };
/** A busy machine draws late; what is awaited is still awaited to the letter. */
const SOON = { timeout: 20_000 };
const WCAG = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'];

async function pick(page: Page, label: string, place: number, facet: string) {
  const field = page.getByRole('combobox', { name: label, exact: true }).nth(place);
  await field.fill(facet);
  await page.getByRole('option', { name: facet }).click();
}

const answer = (page: Page) => page.getByRole('region', { name: 'Who shares which facets' }).getByRole('paragraph');
const options = (page: Page) => page.getByRole('complementary', { name: 'On the map' }).getByRole('option');

describe('a student who asks which materials share two facets', () => {
  it('is told in a sentence, and finds the bridge and what leans in the list', async () => {
    const page = await visit({ as: house.student, path: '/map', viewport: DESK });
    await pick(page, 'Who smells of', 0, 'Rosy');
    await pick(page, 'and of', 0, 'Woody');
    await expect
      .poll(() => answer(page).textContent(), SOON)
      .toContain('2 materials share rosy and woody. 1 holds both in balance and so bridges the two; 1 leans to rosy.');
    expect(await options(page).allInnerTexts()).toEqual([
      expect.stringMatching(/^Rosewood\s+in balance/),
      expect.stringMatching(/^Pink pepper\s+leans to rosy: rosy 7, woody 2/),
    ]);
    expect(new URL(page.url()).searchParams.get('smells')).toBe('rosy,woody');
  });

  it('reads the same in the table, which has the same address, and sorts it', async () => {
    const page = await visit({ as: house.student, path: '/map?smells=rosy,woody&view=table', viewport: DESK });
    const rows = page.getByRole('rowheader');
    await expect.poll(() => rows.allInnerTexts(), SOON).toEqual(['Pink pepper', 'Rosewood']);
    await page.getByRole('button', { name: 'Woody' }).click();
    await expect.poll(() => rows.allInnerTexts(), SOON).toEqual(['Rosewood', 'Pink pepper']);
    expect(await page.getByRole('columnheader', { name: 'Woody' }).getAttribute('aria-sort')).toBe('descending');
    await page.reload();
    await expect.poll(() => rows.allInnerTexts(), SOON).toEqual(['Rosewood', 'Pink pepper']);
  });

  it('walks along the links by the keyboard alone, and sees one material with its kin', async () => {
    const page = await visit({ as: house.student, path: '/map?alike=0.5', viewport: DESK, reducedMotion: 'reduce' });
    await page.locator('canvas').first().waitFor();
    const list = page.getByRole('complementary', { name: 'On the map' }).getByRole('listbox');
    await list.focus();
    await page.keyboard.press('End');
    await page.keyboard.press('Home');
    const [first = ''] = ((await options(page).allInnerTexts())[0] ?? '').split('\n');
    await page.keyboard.press('Enter');
    await page.getByRole('heading', { name: first, exact: true }).waitFor();
    await page.keyboard.press('Enter');
    await expect.poll(() => page.getByRole('heading', { name: `Linked to ${first}` }).count(), SOON).toBe(0);
    await page.keyboard.press('ArrowLeft');
    await page.getByRole('heading', { name: `Linked to ${first}` }).waitFor();
    const kin = await options(page).count();
    await page.getByRole('button', { name: 'Only it and its kin' }).click();
    await expect
      .poll(() => page.getByText(/^\d+ materials?, /).textContent(), SOON)
      .toMatch(new RegExp(`^${kin + 1} material`));
    expect(await page.getByRole('link', { name: 'Use as target' }).count()).toBe(0);
  });

  it('moves and zooms the map by buttons', async () => {
    const page = await visit({ as: house.student, path: '/map', viewport: DESK, reducedMotion: 'reduce' });
    const canvas = page.locator('canvas').first();
    await canvas.waitFor();
    const before = await canvas.screenshot();
    await page.getByRole('button', { name: 'Zoom in' }).click();
    await expect.poll(async () => (await canvas.screenshot()).equals(before), SOON).toBe(false);
    const zoomed = await canvas.screenshot();
    await page.getByRole('button', { name: 'Move left' }).click();
    await expect.poll(async () => (await canvas.screenshot()).equals(zoomed), SOON).toBe(false);
  });
});

it('offers a perfumer the picked material as a target', async () => {
  const page = await visit({ as: house.perfumer, path: '/map?view=table', viewport: DESK });
  await page.getByRole('button', { name: 'Rosewood' }).click();
  expect(await page.getByRole('link', { name: 'Use as target' }).getAttribute('href')).toMatch(
    /^\/blend\?target=\w{26}$/,
  );
});

describe.each(['light', 'dark'] as const)('in the %s theme', (colorScheme) => {
  it.each([
    ['the graph at a desk', '/map?smells=rosy,woody', DESK],
    ['the graph on a phone', '/map?smells=rosy,woody', PHONE],
    ['the table at a desk', '/map?view=table', DESK],
    ['the table on a phone', '/map?view=table&smells=rosy', PHONE],
  ])('axe finds nothing in %s', async (_, path, viewport) => {
    const page = await visit({ as: house.student, path, viewport, colorScheme, reducedMotion: 'reduce' });
    await page
      .locator(path.includes('table') ? 'tbody th' : 'canvas')
      .first()
      .waitFor();
    const { violations } = await new AxeBuilder({ page }).withTags(WCAG).analyze();
    expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' ')}`)).toEqual([]);
    const tooWide = await page.evaluate(() => {
      const { scrollWidth, clientWidth } = document.documentElement;
      return scrollWidth - clientWidth;
    });
    expect(tooWide).toBeLessThanOrEqual(0);
  });
});
