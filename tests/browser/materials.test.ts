import AxeBuilder from '@axe-core/playwright';
import type { Page } from 'playwright-core';
import { beforeAll, describe, expect, it } from 'vitest';
import type { Member } from '@/lib/auth/member';
import { createMaterial, updateMaterial } from '@/lib/materials/commands';
import { getMaterial } from '@/lib/materials/queries';
import { createQuality } from '@/lib/qualities/commands';
import { browserForFile } from '../support/browser';
import { makeMember } from '../support/database';
import { aMaterial, anOffer, aQuality, type MaterialHouse, materialHouse } from '../support/material-house';

const { visit: visitRaw } = browserForFile();
/** A machine at its limit is slow, and that is not what is tested here. */
const SLOW = { timeout: 20_000 };

async function visit(options: Parameters<typeof visitRaw>[0]) {
  const page = await visitRaw(options);
  await page.waitForLoadState('networkidle'); // what is typed before the page has woken up is not the question
  return page;
}

let house: MaterialHouse;
let perfumer: Member;

const smelling = (name: string, rosy: number, green: number, more: object = {}) =>
  createMaterial(
    house.owner,
    aMaterial({
      ...{ name, smell: `${name}, as a nose has it.`, evaporationPerHour: 0.05, evaporationSource: 'estimate' },
      facets: [
        { facetId: house.rosy, phase: 'all', intensity: rosy, sd: 1 },
        { facetId: house.green, phase: 'all', intensity: green, sd: 0.5 },
        { facetId: house.green, phase: 'dry', intensity: 0, sd: 0.5 },
      ],
      cautions: [{ code: 'sensitiser', source: 'SDS' }],
      ...more,
    }),
  );

const offered = async (materialId: string, price: string) => {
  const { geraniol } = house;
  const range = {
    constituentId: geraniol,
    minFraction: '0.1',
    typicalFraction: '0.2',
    maxFraction: '0.3',
    source: 'SDS',
  };
  const composition = { completeness: 'declared', compositionSource: 'SDS', constituents: [range] };
  const offers = [anOffer({ price }), anOffer({ packAmount: '10', packUnit: 'mL', price })];
  return createQuality(house.owner, materialId, aQuality(house, { ...composition, offers, densityGPerMl: '0.9' }));
};

beforeAll(async () => {
  house = await materialHouse();
  perfumer = await makeMember(house.team, 'perfumer');
});

async function expectNoFindings(page: Page) {
  const { violations } = await new AxeBuilder({ page })
    .withTags(['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa'])
    .analyze();
  expect(violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(' ')}`)).toEqual([]);
}

describe('the list', () => {
  beforeAll(async () => {
    await offered((await smelling('Rosé otto', 9, 1, { botanicalName: 'Rosa × damascena', kind: 'oil' })).id, '40');
    await offered((await smelling('Cut stem', 1, 8)).id, '5');
    for (let number = 100; number < 250; number++)
      await createMaterial(house.owner, aMaterial({ name: `Base ${number}` }));
  });

  it('finds by name without accents, cuts by facet, orders by price, and keeps all that in the address', async () => {
    const page = await visit({ as: perfumer, path: '/materials' });
    await expect.poll(() => page.getByRole('status').first().textContent(), SLOW).toBe('152 materials');
    await page.getByRole('searchbox').fill('rose damascena');
    await expect.poll(() => page.getByRole('row').count(), SLOW).toBe(2);
    expect(await page.getByRole('link', { name: 'Rosé otto' }).isVisible()).toBe(true);
    await page.getByRole('searchbox').fill('');
    await page.getByRole('button', { name: /^Filters/ }).click();
    await page.getByRole('combobox', { name: 'Smells of' }).fill('green');
    await page.keyboard.press('Enter');
    await page.keyboard.press('Escape');
    await page.getByRole('button', { name: 'Close' }).click();
    await expect.poll(() => page.getByRole('status').first().textContent(), SLOW).toBe('1 material found');
    await page.getByRole('button', { name: 'Remove the filter Green' }).click();
    await page.getByRole('button', { name: 'Per kg' }).click();
    await expect.poll(() => page.getByRole('row').nth(1).textContent(), SLOW).toContain('Cut stem');
    expect(new URL(page.url()).search).toContain('sort=price');
    await page.reload();
    expect(await page.getByRole('row').nth(2).textContent()).toContain('Rosé otto');
  });

  it('is walked by keys to its last row, of which only those in sight exist', async () => {
    const page = await visit({ as: perfumer, path: '/materials' });
    await page.getByRole('link', { name: 'Base 100' }).focus();
    await page.keyboard.press('ArrowDown');
    await expect.poll(() => page.locator(':focus').textContent(), SLOW).toBe('Base 101');
    await page.keyboard.press('End');
    await expect.poll(() => page.getByRole('link', { name: 'Base 199' }).isVisible(), SLOW).toBe(true);
    await expect
      .poll(async () => {
        await page.keyboard.press('End');
        return page.locator(':focus').textContent();
      }, SLOW)
      .toBe('Rosé otto');
    expect(await page.getByRole('row').count()).toBeLessThan(80);
    await page.keyboard.press('Enter');
    await page.getByRole('heading', { level: 1, name: 'Rosé otto' }).waitFor();
  });

  it('shows a student no price and no supplier, on the list and on the page', async () => {
    const student = await makeMember(house.team, 'student');
    const page = await visit({ as: student, path: '/materials?q=stem' });
    await page.getByRole('link', { name: 'Cut stem' }).waitFor();
    const list = await page.content();
    await page.getByRole('link', { name: 'Cut stem' }).click();
    await page.getByRole('heading', { name: 'What it contains' }).waitFor();
    for (const html of [list, await page.content()]) expect(html).not.toMatch(/€|Quiet Weir|costAt|New material/);
    expect(await page.getByRole('heading', { name: 'What it costs' }).count()).toBe(0);
  });
});

describe('writing a material', () => {
  it('says what is wrong beside the field, keeps what was typed, and saves what is right', async () => {
    const page = await visit({ as: perfumer, path: '/materials/new' });
    await page.getByLabel('Name', { exact: true }).fill('Clean rose alcohol');
    await page.getByLabel('CAS number').fill('106-22-8');
    await page.getByLabel('Natural share').fill('120');
    await page.getByRole('button', { name: 'Enter material' }).click();
    const summary = page.getByRole('alert', { name: 'What needs correcting' });
    await summary.waitFor();
    expect(await summary.textContent()).toContain('it was 120 %');
    await summary.getByRole('link', { name: /106-22-8/ }).click();
    expect(await page.locator(':focus').inputValue()).toBe('106-22-8');
    expect(await page.locator(':focus').getAttribute('aria-invalid')).toBe('true');
    await page.getByLabel('CAS number').fill('106-22-9');
    await page.getByLabel('Natural share').fill('0');
    await page.getByRole('searchbox', { name: 'Search facets' }).fill('rosy');
    const intensity = page.getByRole('textbox', { name: /Rosy, intensity/ });
    await intensity.fill('7,5');
    await intensity.blur();
    await page.getByRole('button', { name: 'Enter material' }).click();
    await page.getByRole('heading', { level: 1, name: 'Clean rose alcohol' }).waitFor();
    const id = new URL(page.url()).pathname.split('/').at(-1) ?? '';
    expect(await getMaterial(perfumer, id)).toMatchObject({
      cas: ['106-22-9'],
      profile: [7.5, 0],
      naturalShare: '0.00000000',
    });
  });

  it('shows both sides when two wrote at once, and saves what was chosen of each', async () => {
    const { id, name } = await smelling('Contested', 5, 2);
    const page = await visit({ as: perfumer, path: `/materials/${id}/edit`, expectedErrors: /409/ });
    await page.getByLabel('In a smeller’s words').fill('mine');
    await page.getByLabel('Botanical name').fill('Rosa mea');
    const theirs = aMaterial({ name, smell: 'theirs', note: 'only theirs' });
    await updateMaterial(house.owner, id, { revision: 1, material: theirs });
    await page.getByRole('button', { name: 'Save material' }).click();
    await page.getByRole('heading', { name: 'Changed meanwhile' }).waitFor();
    await page.getByRole('group', { name: 'Which In a smeller’s words to keep' }).getByText('Take theirs').click();
    await page.getByRole('button', { name: 'Go on with these' }).click();
    await page.getByRole('button', { name: 'Save material' }).click();
    await page.getByRole('heading', { level: 1, name, exact: true }).waitFor();
    expect(await getMaterial(perfumer, id)).toMatchObject({
      ...{ revision: 3, smell: 'theirs', note: 'only theirs', botanicalName: 'Rosa mea' },
    });
  });

  it('enters a quality, whose cost the material then shows', async () => {
    const { id } = await smelling('Priced', 5, 2, { strength: 2 });
    const page = await visit({ as: perfumer, path: `/materials/${id}/qualities/new` });
    await page.getByRole('combobox', { name: 'Supplier' }).fill('weir');
    await page.keyboard.press('Enter');
    await page.getByLabel('Supplier’s code').fill('QW-7');
    await page.getByRole('button', { name: 'Add an offer' }).click();
    await page.getByLabel('Pack').fill('250');
    await page.getByLabel('Price').fill('12,5');
    await page.getByRole('button', { name: 'Enter quality' }).click();
    await page.getByRole('heading', { name: 'What it costs' }).waitFor();
    const figures = page.locator('dl').first();
    await expect.poll(() => figures.textContent(), SLOW).toContain('Per kg€50.00');
    expect(await figures.textContent()).toContain('At equal strength€25.00');
  });
});

describe('every screen of materials', () => {
  const SIZES = [
    { width: 1440, height: 900 },
    { width: 390, height: 844 },
  ];

  it.each(SIZES.flatMap((viewport) => (['light', 'dark'] as const).map((colorScheme) => ({ viewport, colorScheme }))))(
    'has no finding by axe at $viewport.width px, $colorScheme',
    async (context) => {
      const { id } = await smelling(`Seen ${context.viewport.width} ${context.colorScheme}`, 6, 3);
      const quality = await offered(id, '18');
      await offered(id, '25');
      const screens = [
        ...['/materials', `/materials/${id}`, `/materials/${id}/edit`],
        `/materials/${id}/qualities/${quality.id}`,
      ];
      for (const path of screens) {
        const page = await visit({ as: perfumer, path, ...context });
        await page.getByRole('heading', { level: 1 }).waitFor();
        await expectNoFindings(page);
        const overflow = await page.evaluate(() => document.documentElement.scrollWidth - window.innerWidth);
        expect(overflow, path).toBeLessThanOrEqual(0);
      }
    },
  );
});
