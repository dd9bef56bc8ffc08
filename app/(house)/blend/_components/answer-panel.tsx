import { memo } from 'react';
import { Headline } from '@/app/_components/blend/headline';
import { type BlendLineShown, LinesTable } from '@/app/_components/blend/lines-table';
import { Sentences } from '@/app/_components/blend/sentences';
import { Verdicts } from '@/app/_components/blend/verdicts';
import { ProfileBars } from '@/app/_components/charts/profile-bars';
import { Button } from '@/app/_components/ui/button';
import type { BlendAnswer } from '@/lib/shared/blend-answer';
import { isIncomplete } from '@/lib/shared/blend-candidate';
import { pointsOf } from '@/lib/shared/blend-figures';
import type { BlendRequest } from '@/lib/shared/blend-input';
import type { AskedBlend } from '@/lib/shared/blend-problem';
import { withMaterialRule } from '../_client/material-rule';
import type { Solved } from '../_client/messages';
import type { Search } from '../_client/use-long-search';
import { ClashPanel } from './clash-panel';
import type { BenchParts } from './parts';

interface AnswerPanelProps extends BenchParts {
  request: BlendRequest;
  answer: BlendAnswer;
  solved: Solved;
  asked: AskedBlend;
  search: Search | null;
}

export const AnswerPanel = memo(function AnswerPanel(props: AnswerPanelProps) {
  const { facets, currency, request, answer, solved, asked, search, faults, onChange } = props;
  const { target } = asked;
  if (answer.clash) return <ClashPanel clash={answer.clash} proof={answer.proof} onChange={onChange} />;
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-6 pt-5 pb-6">
      <Faults sentences={Object.values(faults)} />
      <SearchNote search={search} />
      <div className="grid gap-5 px-5 md:px-6">
        <h2 className="sr-only">The closest blend</h2>
        <Headline
          distance={answer.distance}
          expectedDistance={answer.expectedDistance}
          targetName={target.material?.name ?? null}
          strengthOfTarget={answer.strengthOfTarget}
          natural={answer.natural}
          money={{
            currency,
            costPerKg: answer.costPerKg,
            costAtEqualStrength: answer.costAtEqualStrength,
            targetCostPerKg: target.material?.costPerKg ? Number(target.material.costPerKg) : null,
          }}
        />
        <Sentences heldBack={answer.heldBack} proof={answer.proof} cautions={answer.cautions} />
      </div>
      <LinesTable
        facets={facets}
        currency={currency}
        lines={shownLines(answer)}
        actionsOf={(line) => <LineActions line={line} request={request} onChange={onChange} />}
      />
      <section className="px-5 md:px-6">
        <h2 className="pb-2 text-lead">What is missing, what is too much</h2>
        <ProfileBars
          facets={facets}
          target={target.profile}
          blend={answer.profile}
          targetName={target.name}
          most={16}
        />
      </section>
      <section className="px-5 md:px-6">
        <h2 className="pb-2 text-lead">Limits</h2>
        {solved.request.product ? (
          <Verdicts
            verdicts={answer.verdicts.map(({ limit, ...verdict }) => ({ ...limit, ...verdict }))}
            withoutFigure={solved.limitsWithoutFigure}
          />
        ) : (
          <p className="text-ink-soft">Say what it goes into, and the limits in force come in.</p>
        )}
      </section>
      <LeftOut solved={solved} />
    </div>
  );
});

function shownLines(answer: BlendAnswer): BlendLineShown[] {
  return answer.lines.map(({ material, share, impact, costPart }) => ({
    ...{
      id: material.id,
      name: material.name,
      kind: material.kind,
      profile: material.profile,
      phases: material.phases,
    },
    ...{ share, impact, costPart, isIncomplete: isIncomplete(material) },
  }));
}

interface LineButtonProps {
  label: string;
  isPressed?: boolean;
  onPress: () => void;
  drawing: string;
}

function LineButton({ label, isPressed, onPress, drawing }: LineButtonProps) {
  return (
    <button
      type="button"
      aria-label={label}
      aria-pressed={isPressed}
      title={label}
      onClick={onPress}
      className="grid size-8 place-items-center rounded-tile border border-transparent text-ink-soft hover:bg-wash hover:text-ink aria-pressed:border-ink aria-pressed:text-ink"
    >
      <svg viewBox="0 0 14 14" width="14" height="14" aria-hidden="true">
        <path d={drawing} fill="none" stroke="currentColor" strokeWidth="1.3" />
      </svg>
    </button>
  );
}

interface LineActionsProps {
  line: BlendLineShown;
  request: BlendRequest;
  onChange: BenchParts['onChange'];
}

/** To keep it as it is now, or to see what happens without it. */
function LineActions({ line, request, onChange }: LineActionsProps) {
  const isKept = request.kept.some(({ materialId }) => materialId === line.id);
  const keep = isKept ? null : { kind: 'kept' as const, share: Number(line.share.toPrecision(3)) };
  return (
    <span className="flex justify-end gap-1">
      <LineButton
        label={`Keep ${line.name} at this share`}
        isPressed={isKept}
        onPress={() => onChange(withMaterialRule(request, line.id, keep))}
        drawing={isKept ? 'M3 7V5a4 4 0 0 1 8 0v2M2 7h10v6H2Z' : 'M3 7V5a4 4 0 0 1 7.700-1.500M2 7h10v6H2Z'}
      />
      <LineButton
        label={`Leave out ${line.name}`}
        onPress={() => onChange(withMaterialRule(request, line.id, { kind: 'excluded' }))}
        drawing="m2.500 2.500 9 9M11.500 2.500l-9 9"
      />
    </span>
  );
}

function Faults({ sentences }: { sentences: readonly string[] }) {
  return sentences.length > 0 ? (
    <div role="alert" className="mx-5 border-l-4 border-ink bg-wash p-3 md:mx-6">
      {sentences.map((sentence) => (
        <p key={sentence}>{sentence}</p>
      ))}
      <p className="text-ink-soft">Below stands the last blend that could be solved.</p>
    </div>
  ) : null;
}

/** Rules that count materials leave many blends to look through. */
function SearchNote({ search }: { search: Search | null }) {
  if (!search) return null;
  return (
    <p role="status" className="mx-5 flex items-center justify-between gap-3 border-l-4 border-ink bg-wash p-3 md:mx-6">
      <span>
        Still looking for a closer one
        {search.best === null ? '' : `; the best so far is ${pointsOf(search.best)} points away`}
      </span>
      <Button size="small" onClick={search.stop}>
        Stop
      </Button>
    </p>
  );
}

const REASONS = {
  target: 'the target itself',
  odourless: 'without a smell',
  'no price': 'without a price',
  incomplete: 'with an incomplete composition',
  'by hand': 'left out by you',
} as const;

function LeftOut({ solved }: { solved: Solved }) {
  const counts = Object.entries(REASONS).flatMap(([reason, words]) => {
    const found = solved.leftOut.filter((one) => one.reason === reason);
    return found.length > 0 ? [{ words, names: found.map(({ name }) => name) }] : [];
  });
  if (counts.length === 0) return null;
  return (
    <details className="px-5 text-ink-soft md:px-6">
      <summary className="min-h-6 list-none underline decoration-rule underline-offset-4 hover:text-ink">
        {solved.leftOut.length} {solved.leftOut.length === 1 ? 'material was' : 'materials were'} not considered
      </summary>
      <ul className="mt-2 grid gap-1">
        {counts.map(({ words, names }) => (
          <li key={words}>
            {names.length} {words}: {names.slice(0, 12).join(', ')}
            {names.length > 12 ? ` and ${names.length - 12} more` : ''}
          </li>
        ))}
      </ul>
    </details>
  );
}
