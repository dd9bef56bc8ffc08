import 'server-only';
import { and, asc, desc, eq, inArray, lt, sql } from 'drizzle-orm';
import { z } from 'zod';
import { db } from '@/db/connection';
import { blendLines, blends, users } from '@/db/schema';
import type { BlendSolution, Certificate } from '@/engine/contract';
import { demand, type Member } from '@/lib/auth/member';
import { NotFound } from '@/lib/errors';
import { readLimitTables } from '@/lib/limits/queries';
import { changesSince } from '@/lib/shared/blend-changes';
import type { BlendRequest } from '@/lib/shared/blend-input';
import type { SavedBlendList, SavedBlendView } from '@/lib/shared/blend-view';
import { Decimal } from '@/lib/shared/decimal';
import { groupedBy } from '@/lib/shared/grouped-by';
import { limitsInForce, limitVerdicts } from '@/lib/shared/limit-verdict';
import { may } from '@/lib/shared/permissions';
import { readCandidates } from './candidates';
import {
  askedBlend,
  type FrozenContext,
  frozenCertificate,
  frozenContext,
  frozenRequest,
  frozenSolution,
} from './frozen';
import { requestView, solvedView } from './view';

const PAGE = 30;

/** The house's saved blends, newest first. */
export async function listBlends(ctx: Member, after?: string): Promise<SavedBlendList> {
  demand(ctx, 'blend.read');
  const rows = await db
    .select({
      id: blends.id,
      name: blends.name,
      targetName: blends.targetName,
      distance: blends.distance,
      costPerKg: blends.costPerKg,
      profile: sql<unknown>`json_extract(${blends.solution}, '$.profile')`,
      createdAt: blends.createdAt,
      createdBy: users.name,
    })
    .from(blends)
    .innerJoin(users, eq(users.id, blends.createdBy))
    .where(and(eq(blends.teamId, ctx.teamId), after ? lt(blends.id, after) : undefined))
    .orderBy(desc(blends.id))
    .limit(PAGE + 1);
  const page = rows.slice(0, PAGE);
  const names = await lineNames(
    ctx,
    page.map(({ id }) => id),
  );
  const seesPrices = may(ctx.roles, 'price.read');
  return {
    items: page.map(({ costPerKg, profile, createdAt, ...row }) => ({
      ...row,
      costPerKg: seesPrices ? new Decimal(costPerKg).toFixed(4) : null,
      currency: ctx.currency,
      profile: z.array(z.number()).parse(profile),
      materials: names.get(row.id) ?? [],
      createdAt: createdAt.toISOString(),
    })),
    next: rows.length > PAGE ? (page.at(-1)?.id ?? null) : null,
  };
}

/** Names by blend, most impact first. */
async function lineNames(ctx: Member, ids: string[]): Promise<Map<string, string[]>> {
  if (ids.length === 0) return new Map();
  const rows = await db
    .select({ blendId: blendLines.blendId, name: blendLines.materialName })
    .from(blendLines)
    .where(and(eq(blendLines.teamId, ctx.teamId), inArray(blendLines.blendId, ids)))
    .orderBy(desc(blendLines.impact), asc(blendLines.position));
  return new Map(
    [...groupedBy(rows, ({ blendId }) => blendId)].map(([id, lines]) => [id, lines.map(({ name }) => name)]),
  );
}

/** A saved blend as it was, from what was frozen with it, and what has changed since. */
export async function getBlend(ctx: Member, id: string): Promise<SavedBlendView> {
  demand(ctx, 'blend.read');
  const [row] = await db
    .select({ blend: blends, createdBy: users.name })
    .from(blends)
    .innerJoin(users, eq(users.id, blends.createdBy))
    .where(and(eq(blends.teamId, ctx.teamId), eq(blends.id, id)));
  if (!row) throw new NotFound();
  const { blend, createdBy } = row;
  const request = frozenRequest.parse(blend.request);
  const context = frozenContext.parse(blend.context);
  const solution = frozenSolution.parse(blend.solution) satisfies BlendSolution;
  const certificate = frozenCertificate.parse(blend.certificate) as Certificate;
  const { facets, currency, limitsWithoutFigure } = context;
  const asked = askedBlend(context);
  return {
    ...{ id, name: blend.name, note: blend.note, createdAt: blend.createdAt.toISOString(), createdBy },
    request: requestView(ctx, request),
    solved: solvedView(ctx, { request, asked, facets, currency, limitsWithoutFigure, solution, certificate }),
    changes: await changesOf(ctx, request, context, solution),
  };
}

async function changesOf(
  ctx: Member,
  request: BlendRequest,
  context: FrozenContext,
  solution: Pick<BlendSolution, 'lines'>,
): Promise<string[]> {
  const [candidates, tables] = await Promise.all([readCandidates(ctx, request.packGrams), readLimitTables(ctx)]);
  const materials = new Map(context.materials.map((material) => [material.id, material]));
  const lines = solution.lines.flatMap(({ id, share }) => {
    const material = materials.get(id);
    return material ? [{ share, material }] : [];
  });
  const changes = changesSince(
    {
      lines,
      verdicts: limitVerdicts(context.limits, lines, context.concentrate),
      concentrate: context.concentrate,
      currency: context.currency,
    },
    {
      candidates: new Map(candidates.items.map((candidate) => [candidate.id, candidate])),
      limits: request.product ? limitsInForce(tables, request.product.category) : null,
    },
  );
  const seesPrices = may(ctx.roles, 'price.read');
  return changes.filter(({ isAboutPrice }) => seesPrices || !isAboutPrice).map(({ words }) => words);
}
