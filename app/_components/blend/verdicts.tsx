import { listed, percent } from '@/lib/shared/blend-figures';
import { knownHow } from '@/lib/shared/limit-view';
import { Mark } from '../ui/mark';

export interface VerdictShown {
  id: string;
  name: string;
  setTitle: string;
  edition: string;
  source: string;
  via: string;
  note: string | null;
  verdict: 'met' | 'exceeded' | 'unknown';
  /** Mass fractions of the finished product. */
  maxFraction: number;
  worst: number;
  typical: number;
  unknownBecause: readonly string[];
  from: readonly { name: string; worst: number }[];
}

interface VerdictsProps {
  /** The worst first. */
  verdicts: readonly VerdictShown[];
  withoutFigure: readonly string[];
}

/** Used by less than this of its figure, a limit is met with room to spare and needs no line of its own. */
const NEAR = 0.25;

/** What the limit tables in force say of it, each figure with its source. Never a claim of compliance. */
export function Verdicts({ verdicts, withoutFigure }: VerdictsProps) {
  const incomplete = verdicts[0]?.unknownBecause ?? [];
  const isNear = ({ verdict, worst, maxFraction }: VerdictShown) =>
    verdict === 'exceeded' || (worst >= NEAR * maxFraction && worst > 0);
  const near = verdicts.filter(isNear);
  const far = verdicts.filter((verdict) => !isNear(verdict));
  return (
    <div className="grid gap-3">
      {incomplete.length > 0 ? (
        <p>
          <Mark state="unknown" /> The composition of {listed(incomplete)} is not fully stated, so no limit counts as
          met. Leave out incomplete compositions, or ask the supplier.
        </p>
      ) : null}
      <ul className="grid">
        {near.map((verdict) => (
          <Verdict key={verdict.id} verdict={verdict} />
        ))}
      </ul>
      {far.length > 0 ? (
        <details className="group">
          <summary className="min-h-6 list-none underline decoration-rule underline-offset-4 hover:decoration-ink">
            {far.length} more {far.length === 1 ? 'limit is' : 'limits are'} used by less than a quarter
          </summary>
          <ul className="mt-2 grid">
            {far.map((verdict) => (
              <Verdict key={verdict.id} verdict={verdict} />
            ))}
          </ul>
        </details>
      ) : null}
      {withoutFigure.length > 0 ? (
        <p className="text-ink-soft">
          No figure here for this category: {listed(withoutFigure)}. That is not the same as no limit.
        </p>
      ) : null}
      <p className="text-ink-soft">
        The tables here may be incomplete or out of date. Check the current standard and ask a qualified safety
        assessor.
      </p>
    </div>
  );
}

function Verdict({ verdict }: { verdict: VerdictShown }) {
  const { name, setTitle, edition, source, via, note, maxFraction, worst, typical, from } = verdict;
  const over = worst - maxFraction;
  return (
    <li className="border-b border-grout last:border-0">
      <details className="group">
        <summary className="grid min-h-10 list-none grid-cols-[minmax(0,1fr)_auto] items-center gap-x-3 py-1">
          <span className="min-w-0">
            <span className="underline decoration-grout underline-offset-4 group-hover:decoration-ink">{name}</span>
            <span className="block truncate text-note text-ink-soft">
              {setTitle}
              {via === 'memory' ? ' · from memory' : ''}
            </span>
          </span>
          <span className="flex flex-wrap items-center justify-end gap-x-3 gap-y-1">
            <span className="figures whitespace-nowrap">
              {percent(worst)} of {percent(maxFraction)}
            </span>
            <Mark state={verdict.verdict}>
              {over > 0 && verdict.verdict === 'exceeded' ? `by ${percent(over)}` : null}
            </Mark>
          </span>
        </summary>
        <dl className="grid grid-cols-[auto_1fr] gap-x-4 pb-3 text-ink-soft [&>dd]:text-ink">
          <dt>Worst case in the product</dt>
          <dd className="figures">
            {percent(worst)}, usually {percent(typical)}
          </dd>
          <dt>Room left</dt>
          <dd className="figures">{over > 0 ? 'none' : percent(-over)}</dd>
          <dt>Brought by</dt>
          <dd>
            {from.length > 0
              ? listed(from.map((part) => `${part.name} (${percent(part.worst)})`))
              : 'nothing that is stated'}
          </dd>
          <dt>Source</dt>
          <dd>
            {source}; {edition}
          </dd>
          <dt>The figure is</dt>
          <dd>{knownHow(via)}</dd>
          {note ? (
            <>
              <dt>Note</dt>
              <dd>{note}</dd>
            </>
          ) : null}
        </dl>
      </details>
    </li>
  );
}
