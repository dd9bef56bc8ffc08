import 'server-only';
import type { Member } from '@/lib/auth/member';
import { Invalid, TooMany } from '@/lib/errors';
import { listFacets } from '@/lib/facets/queries';
import { readLimitTables } from '@/lib/limits/queries';
import { type BlendRequest, RequestFault } from '@/lib/shared/blend-input';
import { type BuiltProblem, buildBlendProblem } from '@/lib/shared/blend-problem';
import type { FacetView } from '@/lib/shared/facet';
import { type Solved, type SolveOptions, solveInPool } from '@/lib/solving/pool';
import { listCandidates } from './candidates';

/** Discrete rules can take long; what was found by then is answered with an honest bound. */
const TIME_LIMIT_MS = 20_000;

export interface SolvedRequest extends Solved {
  request: BlendRequest;
  built: BuiltProblem;
  facets: FacetView[];
  currency: string;
}

/** Ends the solve when nobody waits, and hears of every better blend on the way. */
export type Watch = Pick<SolveOptions, 'signal' | 'onBetter'>;

/** Builds the problem from the house's rows, never from what a client says of them, and solves it. */
export async function solveRequest(ctx: Member, request: BlendRequest, watch: Watch = {}): Promise<SolvedRequest> {
  const [candidates, limits, facets] = await Promise.all([
    listCandidates(ctx, request.packGrams),
    readLimitTables(ctx),
    listFacets(ctx),
  ]);
  const built = buildOrRefuse(request, { facetIds: candidates.facetIds, candidates: candidates.items, limits });
  const { solution, certificate } = await inTurn(ctx.userId, () =>
    solveInPool(built.problem, { timeLimitMs: TIME_LIMIT_MS, ...watch }),
  );
  return { request, built, facets, currency: candidates.currency, solution, certificate };
}

/** So many solves of one person may be at work or wait, so that nobody fills the queue before the others. */
const MOST_OF_ONE_PERSON = 4;
const RETRY_S = 10;
const atWork = new Map<string, number>();

async function inTurn<T>(userId: string, work: () => Promise<T>): Promise<T> {
  const others = atWork.get(userId) ?? 0;
  if (others >= MOST_OF_ONE_PERSON)
    throw new TooMany(`${others} of your blends are being solved. Wait for one of them.`, RETRY_S);
  atWork.set(userId, others + 1);
  try {
    return await work();
  } finally {
    const left = (atWork.get(userId) ?? 1) - 1;
    if (left > 0) atWork.set(userId, left);
    else atWork.delete(userId);
  }
}

function buildOrRefuse(...args: Parameters<typeof buildBlendProblem>): BuiltProblem {
  try {
    return buildBlendProblem(...args);
  } catch (error) {
    if (error instanceof RequestFault)
      throw new Invalid(
        Object.fromEntries(Object.entries(error.fields).map(([field, words]) => [`request.${field}`, words])),
      );
    throw error;
  }
}
