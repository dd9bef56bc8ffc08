import { Choice } from '@/app/_components/ui/choice';
import { NumberField } from '@/app/_components/ui/number-field';
import { Slider } from '@/app/_components/ui/slider';
import { roundOut } from '@/lib/shared/blend-figures';
import type { BlendRequest } from '@/lib/shared/blend-input';
import type { Relief } from '@/lib/shared/blend-relief';
import { Decimal } from '@/lib/shared/decimal';
import { usualCeiling } from '../_client/begin';
import { ReliefNote } from './relief-note';
import type { RulesProps } from './rules-panel';

const NONE = 'none';
/** Where neither a target nor an answer says what things cost. */
const SOME_CEILING = '100';

export function PriceRule(props: RulesProps & { reliefs: readonly Relief[] }) {
  const { request, answer, byId, currency, reliefs, faults, onChange } = props;
  const { ceiling, target } = request;
  const material = target.kind === 'material' ? byId.get(target.materialId) : undefined;
  const usual =
    (material && usualCeiling(material)?.amount) ?? drawnCeiling(answer?.costAtEqualStrength) ?? SOME_CEILING;
  const set = (amount: number | null) => {
    if (ceiling && amount && amount > 0)
      onChange({ ...request, ceiling: { ...ceiling, amount: new Decimal(amount).toFixed() } });
  };
  const amount = Number(ceiling?.amount ?? 0);
  const top = Math.max(roundOut(Number(material?.costPerKg ?? 0) * 1.02 || Number(usual) * 4, 'up'), amount);
  return (
    <div className="grid gap-3">
      <Choice
        label="Price ceiling"
        value={ceiling?.basis ?? NONE}
        onChange={(basis) =>
          onChange({ ...request, ceiling: basis === NONE ? null : { basis, amount: ceiling?.amount ?? usual } })
        }
        options={[
          { value: 'equal strength', label: 'At equal strength' },
          { value: 'per kg', label: 'Per kg' },
          { value: NONE, label: 'None' },
        ]}
      />
      {ceiling ? (
        <>
          <Slider
            label="At most"
            value={amount}
            onChange={set}
            min={0}
            max={top}
            step={sliderStep(top)}
            unit={`${currency}/kg`}
            ends={['cheaper', 'closer']}
          />
          <NumberField
            label="Price ceiling"
            hideLabel
            unit={`${currency}/kg`}
            value={amount}
            onChange={set}
            min={0}
            digits={2}
            error={faults['ceiling.amount']}
          />
        </>
      ) : null}
      <p className="text-ink-soft">{explain(ceiling, material?.name)}</p>
      <ReliefNote reliefs={reliefs} />
    </div>
  );
}

const drawnCeiling = (cost: number | undefined): string | null =>
  cost && Number.isFinite(cost) && cost > 0 ? new Decimal(cost / 2).toSignificantDigits(2).toFixed() : null;

const sliderStep = (top: number): number => 10 ** Math.max(-2, Math.floor(Math.log10(top)) - 3);

function explain(ceiling: BlendRequest['ceiling'], name: string | undefined): string {
  if (!ceiling) return 'The price does not matter.';
  if (ceiling.basis === 'per kg') return 'Of the blend as it is, weak or strong: thinning would count as saving.';
  return name
    ? `What it may cost to smell as strong as 1 kg of ${name}.`
    : 'What it may cost to smell as strong as 1 kg of linalool (1,000 units of impact).';
}
