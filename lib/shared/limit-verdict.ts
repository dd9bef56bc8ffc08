import { type Candidate, isIncomplete } from './blend-candidate';
import type { LimitTables, LimitView } from './limit-view';

/** A limit in force that has a figure for the category asked for. Fractions are of the finished product. */
export interface AppliedLimit {
  id: string;
  name: string;
  setTitle: string;
  edition: string;
  source: string;
  via: string;
  note: string | null;
  terms: { constituentId: string; factor: number }[];
  maxFraction: number;
}

export interface LimitsInForce {
  applied: AppliedLimit[];
  /** Names of limits that have no figure for this category: not the same as no limit. */
  withoutFigure: string[];
}

/** The limits of all sets in force for one category; several on one constituent stand beside each other. */
export function limitsInForce(tables: LimitTables, category: string): LimitsInForce {
  const applied: AppliedLimit[] = [];
  const withoutFigure = new Set<string>();
  for (const set of tables.sets.filter((each) => each.inForce)) {
    for (const limit of set.limits) {
      const figure = limit.maxima[category];
      if (figure !== undefined) applied.push(appliedLimit(limit, set, Number(figure)));
      else if (limit.kind !== 'specification') withoutFigure.add(limit.name);
    }
  }
  // The same substance may have its figure for this category in another row.
  for (const { name } of applied) withoutFigure.delete(name);
  return { applied: applied.sort((a, b) => (a.id < b.id ? -1 : 1)), withoutFigure: [...withoutFigure].sort() };
}

function appliedLimit(limit: LimitView, set: { title: string; edition: string }, maxFraction: number): AppliedLimit {
  const { id, name, source, via, note, terms } = limit;
  return { id, name, setTitle: set.title, edition: set.edition, source, via, note, terms, maxFraction };
}

/** A material's part in a limit: sum of factor x fraction, in the worst case and as it usually comes. */
export function burdenOf(
  terms: AppliedLimit['terms'],
  constituents: Candidate['constituents'],
): { worst: number; typical: number } {
  let worst = 0;
  let typical = 0;
  for (const { constituentId, factor } of terms) {
    const held = constituents.find((one) => one.id === constituentId);
    if (!held) continue;
    worst += factor * held.max;
    typical += factor * (held.typical ?? held.max);
  }
  return { worst, typical };
}

export interface LimitVerdict {
  limit: AppliedLimit;
  verdict: 'met' | 'exceeded' | 'unknown';
  /** Mass fractions of the finished product. */
  worst: number;
  typical: number;
  margin: number;
  /** Names of materials in the blend whose composition is incomplete. */
  unknownBecause: string[];
  /** What brings it, most first. */
  from: { name: string; worst: number }[];
}

/** Rounding in the engine's sums, relative to the limit: the same allowance as its worst violation. */
const SAME = 1e-9;

export type VerdictLine = { share: number; material: Pick<Candidate, 'name' | 'completeness' | 'constituents'> };

/**
 * One verdict for each limit. What is known to exceed a limit exceeds it; otherwise one material whose composition is
 * incomplete is enough to leave the limit unknown, whatever the rest says.
 */
export function limitVerdicts(
  limits: readonly AppliedLimit[],
  lines: readonly VerdictLine[],
  concentrate: number,
): LimitVerdict[] {
  const incomplete = lines.filter(({ material }) => isIncomplete(material)).map(({ material }) => material.name);
  return limits.map((limit) => {
    const parts = lines.map(({ share, material }) => {
      const { worst, typical } = burdenOf(limit.terms, material.constituents);
      return { name: material.name, worst: share * worst * concentrate, typical: share * typical * concentrate };
    });
    const worst = parts.reduce((sum, part) => sum + part.worst, 0);
    const typical = parts.reduce((sum, part) => sum + part.typical, 0);
    const isExceeded = worst > limit.maxFraction * (1 + SAME);
    return {
      limit,
      verdict: isExceeded ? 'exceeded' : incomplete.length > 0 ? 'unknown' : 'met',
      worst,
      typical,
      margin: limit.maxFraction - worst,
      unknownBecause: incomplete,
      from: parts
        .filter((part) => part.worst > 0)
        .sort((a, b) => b.worst - a.worst)
        .map(({ name, worst: brings }) => ({ name, worst: brings })),
    };
  });
}

const ORDER = { exceeded: 0, unknown: 1, met: 2 } as const;

/** The worst first; among equals the one nearest to its limit. */
export function byUrgency(verdicts: readonly LimitVerdict[]): LimitVerdict[] {
  const used = ({ worst, limit }: LimitVerdict) =>
    limit.maxFraction > 0 ? worst / limit.maxFraction : Number(worst > 0);
  return verdicts.toSorted((a, b) => ORDER[a.verdict] - ORDER[b.verdict] || used(b) - used(a));
}
