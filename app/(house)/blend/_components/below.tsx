import { Frontier } from '@/app/_components/charts/frontier';
import { MapAround } from '@/app/_components/map-around/map-around';
import { Tile } from '@/app/_components/ui/screen';
import { Skeleton } from '@/app/_components/ui/states';
import type { BlendAnswer } from '@/lib/shared/blend-answer';
import type { BlendRequest } from '@/lib/shared/blend-input';
import type { AskedBlend } from '@/lib/shared/blend-problem';
import type { FrontierStep } from '../_client/messages';
import { OtherBlends } from './other-blends';
import type { BenchParts } from './parts';

interface BelowProps extends Pick<BenchParts, 'facets' | 'currency' | 'inputs' | 'byId' | 'onChange'> {
  request: BlendRequest;
  answer: BlendAnswer;
  asked: AskedBlend;
  /** Null while it is being drawn. */
  frontier: readonly FrontierStep[] | null;
}

/** So many stand around the target; the rest is in the table. */
const AROUND = 10;

export function Below(props: BelowProps) {
  const { facets, currency, request, answer, asked, frontier, onChange } = props;
  const { target } = asked;
  return (
    <div className="tiles border-t-0 xl:grid-cols-2">
      <Tile title="Price against closeness">
        <p className="pb-3 text-ink-soft">
          {request.ceiling?.basis === 'per kg' ? 'Per kg' : 'At equal strength'}. Each point is the closest blend at its
          price{request.maxMaterials || request.minDose ? ', however many materials it takes' : ''}; pick one to set the
          ceiling.
        </p>
        {frontier === null ? (
          <Skeleton className="h-56" />
        ) : frontier.length > 1 ? (
          <FrontierPick request={request} steps={frontier} currency={currency} onChange={onChange} />
        ) : (
          <p className="text-ink-soft">The price makes no difference under these rules.</p>
        )}
      </Tile>
      <Tile title={`Around ${target.name}`}>
        {/* A long name at the rim may reach beyond a phone's edge; it must not widen the page. */}
        <div className="overflow-x-clip">
          <MapAround
            facets={facets}
            target={{
              id: target.material?.id ?? 'target',
              name: target.name,
              profile: target.profile,
              phases: target.material?.phases,
            }}
            nodes={answer.lines.slice(0, AROUND).map(({ material, impact }) => ({
              ...{ id: material.id, name: material.name, profile: material.profile, phases: material.phases, impact },
            }))}
          />
        </div>
      </Tile>
      <OtherBlends {...props} />
    </div>
  );
}

interface PickProps extends Pick<BelowProps, 'request' | 'currency' | 'onChange'> {
  steps: readonly FrontierStep[];
}

function FrontierPick({ request, steps, currency, onChange }: PickProps) {
  const basis = request.ceiling?.basis ?? 'equal strength';
  const chosen = steps.find(({ ceiling }) => String(ceiling) === request.ceiling?.amount);
  return (
    <Frontier
      points={steps.map(({ ceiling, distance }) => ({ id: String(ceiling), price: ceiling, distance }))}
      selectedId={chosen ? String(chosen.ceiling) : null}
      onSelect={(amount) => onChange({ ...request, ceiling: { basis, amount } })}
      priceUnit={`${currency}/kg`}
    />
  );
}
