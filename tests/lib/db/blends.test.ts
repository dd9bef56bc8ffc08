import { and, eq } from 'drizzle-orm';
import { afterAll, beforeAll, expect, it } from 'vitest';
import { activity, blendLines, blends, limitMaxima, limits, materials, offers, qualities } from '@/db/schema';
import { transaction } from '@/db/transaction';
import type { Member } from '@/lib/auth/member';
import { listCandidates } from '@/lib/blends/candidates';
import { previewBlend, saveBlend } from '@/lib/blends/commands';
import { getBlend, listBlends } from '@/lib/blends/queries';
import { Forbidden, Invalid, NotFound } from '@/lib/errors';
import { loadLibrary } from '@/lib/library/load-library';
import { getLimitTables } from '@/lib/limits/queries';
import { type BlendRequest, saveBlendInput } from '@/lib/shared/blend-input';
import { savedBlendView, solvedBlendView } from '@/lib/shared/blend-view';
import { Decimal } from '@/lib/shared/decimal';
import { closePool } from '@/lib/solving/pool';
import { db, makeMember, makeTeam } from '../../support/database';

let perfumer: Member;
let safety: Member;
let student: Member;
let roseId: string;
let ceiling: string;

beforeAll(async () => {
  const team = await makeTeam();
  await transaction((tx) => loadLibrary(tx, { teamId: team.id, begin: 'sample', currency: 'EUR' }));
  [perfumer, safety, student] = await Promise.all([
    makeMember(team, 'perfumer'),
    makeMember(team, 'safety'),
    makeMember(team, 'student'),
  ]);
  const { items } = await listCandidates(perfumer, '100');
  const rose = items.find(({ name }) => name.startsWith('Rose absolute'))!;
  roseId = rose.id;
  ceiling = new Decimal(rose.costPerKg!).div(3).toFixed(2);
});
afterAll(closePool);

const input = (name: string, over: Partial<BlendRequest> = {}) =>
  saveBlendInput.parse({
    name,
    request: {
      target: { kind: 'material', materialId: roseId },
      ceiling: { basis: 'equal strength', amount: ceiling },
      product: { category: '4', concentratePct: '20' },
      ...over,
    },
  });

async function faultOf(work: Promise<unknown>): Promise<unknown> {
  return work.then(
    () => null,
    (error: unknown) => error,
  );
}

it('saves a rose at a third of its price, within every limit that is known, and proves it', async () => {
  const { solved } = await saveBlend(perfumer, input('Rose on a budget'));
  expect(solved.status).toBe('optimal');
  expect(solved.certificate).toMatchObject({ feasible: true, boundProven: true, agrees: true });
  expect(Number(solved.money!.costAtEqualStrength)).toBeLessThanOrEqual(Number(ceiling) * (1 + 1e-9));
  expect(solved.strengthOfTarget).toBeGreaterThanOrEqual(0.5 - 1e-9);
  expect(solved.verdicts.filter(({ verdict }) => verdict === 'exceeded')).toEqual([]);
  expect(solved.verdicts.length).toBeGreaterThan(5);
  expect(solved.lines.reduce((sum, { share }) => sum.plus(share), new Decimal(0)).toFixed()).toBe('1');
});

it('writes blend, lines and activity together, shares to the last digit', async () => {
  const saved = await saveBlend(perfumer, input('Written whole'));
  const rows = await db.select().from(blendLines).where(eq(blendLines.blendId, saved.id));
  expect(rows.map(({ materialId, share }) => [materialId, share]).sort()).toEqual(
    saved.solved.lines.map(({ materialId, share }) => [materialId, share]).sort(),
  );
  const [entry] = await db.select().from(activity).where(eq(activity.subjectId, saved.id));
  expect(entry).toMatchObject({ action: 'blend.saved', userId: perfumer.userId });
});

it('opens identically after prices changed, and says what has changed', async () => {
  const saved = await saveBlend(perfumer, input('Kept as it was'));
  expect(saved.changes).toEqual([]);
  const dearest = saved.solved.lines.toSorted((a, b) => Number(b.price!.part) - Number(a.price!.part))[0]!;
  const grades = db.select({ id: qualities.id }).from(qualities).where(eq(qualities.materialId, dearest.materialId));
  const { inArray, sql } = await import('drizzle-orm');
  await db
    .update(offers)
    .set({ price: sql`${offers.price} * 2` })
    .where(inArray(offers.qualityId, grades));
  const again = await getBlend(perfumer, saved.id);
  expect({ ...again, changes: [] }).toEqual(saved);
  expect(again.changes[0]).toMatch(/^The blend would be dearer today: [\d,.]+ EUR\/kg instead of/);
  expect(again.changes.some((words) => words.startsWith(`${dearest.name} is dearer`))).toBe(true);
  await db
    .update(offers)
    .set({ price: sql`${offers.price} / 2` })
    .where(inArray(offers.qualityId, grades));
});

it('still opens when a material of it has left the library', async () => {
  const saved = await saveBlend(perfumer, input('Outlives its materials'));
  const gone = saved.solved.lines.at(-1)!;
  const [row] = await db.select().from(materials).where(eq(materials.id, gone.materialId));
  await db
    .update(materials)
    .set({ name: `${gone.name}, renamed` })
    .where(eq(materials.id, gone.materialId));
  const again = await getBlend(perfumer, saved.id);
  expect(again.solved).toEqual(saved.solved);
  expect(again.changes).toContain(`${gone.name} is called ${gone.name}, renamed today.`);
  await db.update(materials).set({ name: row!.name }).where(eq(materials.id, gone.materialId));
});

it('says when a limit has changed since', async () => {
  const saved = await saveBlend(perfumer, input('Under a tighter limit'));
  const near = saved.solved.verdicts.find(({ worst }) => worst > 0)!;
  const where = and(eq(limitMaxima.limitId, near.id), eq(limitMaxima.category, '4'));
  await db.update(limitMaxima).set({ maxFraction: '0.00000001' }).where(where);
  const { changes } = await getBlend(perfumer, saved.id);
  expect(changes.some((words) => words.includes(near.name) && words.includes('in the product today'))).toBe(true);
  await db
    .update(limitMaxima)
    .set({ maxFraction: near.maxFraction.toFixed(8) })
    .where(where);
});

it('shows safety the proportions and verdicts, and no price in any form', async () => {
  const saved = await saveBlend(perfumer, input('Seen without prices'));
  const seen = await getBlend(safety, saved.id);
  expect(seen.solved.lines.map(({ share }) => share)).toEqual(saved.solved.lines.map(({ share }) => share));
  expect(seen.solved.money).toBeNull();
  expect(seen.request.ceiling).toBeNull();
  const { items } = await listBlends(safety);
  const text = JSON.stringify([seen, items]);
  expect(text).not.toMatch(/EUR\/kg|"costPerKg":"|"part":"|price ceiling/);
  expect(JSON.stringify(saved)).toMatch(/"costPerKg":"/);
});

it('is closed to roles without a formula, and to other houses as if it were not there', async () => {
  const saved = await saveBlend(perfumer, input('Secret of the house'));
  const stranger = await makeMember(await makeTeam(), 'owner');
  expect(await faultOf(getBlend(stranger, saved.id))).toBeInstanceOf(NotFound);
  expect((await listBlends(stranger)).items).toEqual([]);
  for (const work of [getBlend(student, saved.id), listBlends(student), listCandidates(student, '100')])
    expect(await faultOf(work)).toBeInstanceOf(Forbidden);
  expect(await faultOf(saveBlend(safety, input('Not mine')))).toBeInstanceOf(Forbidden);
  expect(await faultOf(previewBlend(safety, input('x').request))).toBeInstanceOf(Forbidden);
  expect(await faultOf(getLimitTables(student))).toBeInstanceOf(Forbidden);
});

it('cannot blend with another house’s material', async () => {
  const stranger = await makeMember(await makeTeam(), 'perfumer');
  expect(await faultOf(previewBlend(stranger, input('x').request))).toBeInstanceOf(Invalid);
});

it('finds a natural alternative that is natural to the last gram', async () => {
  const { solved } = await saveBlend(perfumer, input('All natural', { minNatural: 1, ceiling: null }));
  expect(solved.natural).toBeGreaterThanOrEqual(1 - 1e-9);
  for (const line of solved.lines) expect(line.natural).toBe(1);
});

it('refuses to save what no blend can keep, and writes nothing', async () => {
  const before = await db.select({ id: blends.id }).from(blends);
  const impossible = input('Impossible', { ceiling: { basis: 'equal strength', amount: '0.01' } });
  expect(await faultOf(saveBlend(perfumer, impossible))).toBeInstanceOf(Invalid);
  expect(await db.select({ id: blends.id }).from(blends)).toHaveLength(before.length);
  const solved = await previewBlend(perfumer, impossible.request);
  expect(solved).toMatchObject({ status: 'infeasible', lines: [], money: null });
  expect(solved.certificate.infeasibilityProven).toBe(true);
});

it('names the field of a request at fault', async () => {
  const fault = await faultOf(previewBlend(perfumer, input('x', { required: ['nothing'] }).request));
  expect((fault as Invalid).fields).toHaveProperty(['request.required.0']);
});

it('lists page by page, newest first, each once', async () => {
  const team = await makeTeam();
  const owner = await makeMember(team, 'owner');
  const saved = await saveBlend(perfumer, input('One of many'));
  const [row] = await db.select().from(blends).where(eq(blends.id, saved.id));
  const { newId } = await import('@/lib/id');
  const ids = Array.from({ length: 65 }, (_, index) => newId(Date.now() + index));
  await db.insert(blends).values(ids.map((id) => ({ ...row!, teamId: team.id, id, createdBy: owner.userId })));
  const seen: string[] = [];
  for (let after: string | undefined, page = await listBlends(owner); ; page = await listBlends(owner, after)) {
    seen.push(...page.items.map(({ id }) => id));
    if (!page.next) break;
    after = page.next;
  }
  expect(seen).toEqual(ids.toReversed());
});

it('answers in the shape it promises', async () => {
  const saved = await saveBlend(perfumer, input('In shape'));
  expect(savedBlendView.parse(saved)).toEqual(saved);
  expect(() => solvedBlendView.parse(saved.solved)).not.toThrow();
});

it('reads the limit tables with their figures, sources and categories', async () => {
  const tables = await getLimitTables(safety);
  const [{ length }] = [await db.select().from(limits).where(eq(limits.teamId, safety.teamId))];
  expect(tables.sets.flatMap((set) => set.limits)).toHaveLength(length);
  for (const limit of tables.sets.flatMap((set) => set.limits)) {
    expect(limit.source).not.toBe('');
    for (const code of Object.keys(limit.maxima)) expect(tables.categories.map((each) => each.code)).toContain(code);
  }
});
