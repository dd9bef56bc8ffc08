import 'server-only';
import { activity, blendLines, blends } from '@/db/schema';
import { transaction } from '@/db/transaction';
import { demand, type Member } from '@/lib/auth/member';
import { Invalid } from '@/lib/errors';
import { newId } from '@/lib/id';
import type { BlendRequest, SaveBlendInput } from '@/lib/shared/blend-input';
import type { SavedBlendView, SolvedBlendView } from '@/lib/shared/blend-view';
import { freezeContext } from './frozen';
import { exactCost, keepsCeiling } from './money';
import { getBlend } from './queries';
import { storedShares } from './shares';
import { type SolvedRequest, solveRequest, type Watch } from './solve';
import { solvedView } from './view';

/** Solves without keeping anything. */
export async function previewBlend(ctx: Member, request: BlendRequest, watch?: Watch): Promise<SolvedBlendView> {
  demand(ctx, 'blend.solve');
  const solved = await solveRequest(ctx, request, watch);
  return solvedView(ctx, { ...solved, asked: solved.built, limitsWithoutFigure: solved.built.limitsWithoutFigure });
}

/**
 * Solves again from the house's own rows and keeps request, problem, answer, certificate and the day's names, offers
 * and limits, never to be changed.
 *
 * @throws Invalid when no blend keeps the rules: there is nothing to save.
 */
export async function saveBlend(ctx: Member, input: SaveBlendInput, watch?: Watch): Promise<SavedBlendView> {
  demand(ctx, 'blend.save');
  const solved = await solveRequest(ctx, input.request, watch);
  const { solution, certificate, built } = solved;
  if (solution.lines.length === 0)
    throw new Invalid({ request: 'No blend keeps all these rules, so there is nothing to save.' });
  if (!certificate.agrees || !certificate.feasible)
    throw new Error('The certificate does not agree with the answer of the engine.');
  const shares = storedShares(solution.lines.map(({ share }) => share));
  checkMoney(solved, shares);
  const id = newId();
  await transaction(async (tx) => {
    await tx.insert(blends).values({
      ...{ teamId: ctx.teamId, id, name: input.name, note: input.note || null, createdBy: ctx.userId },
      targetName: built.target.name,
      status: solution.status,
      distance: solution.distance,
      costPerKg: solution.costPerKg,
      request: input.request,
      problem: built.problem,
      solution,
      certificate,
      context: freezeContext(solved),
    });
    await tx.insert(blendLines).values(
      solution.lines.map(({ id: materialId, impact }, position) => ({
        ...{ teamId: ctx.teamId, blendId: id, position, materialId },
        materialName: built.materials.get(materialId)?.name ?? materialId,
        share: shares[position] ?? '0',
        impact: impact.toFixed(14),
      })),
    );
    await tx.insert(activity).values({
      ...{ teamId: ctx.teamId, id: newId(), userId: ctx.userId, action: 'blend.saved', subjectId: id },
      detail: { materials: solution.lines.length },
    });
  });
  return getBlend(ctx, id);
}

/** The engine counts in binary; money does not. A ceiling that was not kept to a billionth is a fault of ours. */
function checkMoney({ request, solution, built }: SolvedRequest, shares: readonly string[]): void {
  const cost = exactCost(
    solution.lines.map(({ id }, index) => {
      const material = built.materials.get(id);
      return {
        share: shares[index] ?? '0',
        costPerKg: material?.costPerKg ?? '0',
        strength: material?.strength ?? 0,
      };
    }),
    built.target.referenceStrength,
  );
  if (!keepsCeiling(cost, request.ceiling))
    throw new Error('The price ceiling was not kept when the money was counted exactly.'); // no price in a log
}
