import { Select } from '@/app/_components/ui/field';
import { NumberField } from '@/app/_components/ui/number-field';
import { Slider } from '@/app/_components/ui/slider';
import { Switch } from '@/app/_components/ui/switch';
import { type BlendRequest, PACK_SIZES } from '@/lib/shared/blend-input';
import { PHASE_HOURS } from '@/lib/shared/blend-target';
import type { RulesProps } from './rules-panel';

/** What the bench asks for, and what is set once and then left alone. */
export function MoreRules({ request, onChange }: RulesProps) {
  return (
    <>
      <div className="grid grid-cols-2 gap-3">
        <NumberField
          label="At most"
          unit="materials"
          value={request.maxMaterials}
          min={1}
          max={60}
          digits={0}
          onChange={(value) => onChange({ ...request, maxMaterials: value === null ? null : Math.round(value) })}
        />
        <NumberField
          label="No line below"
          unit="%"
          value={request.minDose === null ? null : request.minDose * 100}
          min={0}
          max={50}
          digits={4}
          onChange={(value) => onChange({ ...request, minDose: value ? value / 100 : null })}
        />
      </div>
      <PhaseRule request={request} onChange={onChange} />
      <Select
        label="Priced in packs of"
        value={request.packGrams}
        onChange={(event) => onChange({ ...request, packGrams: event.target.value as BlendRequest['packGrams'] })}
        options={PACK_SIZES.map((grams) => ({
          value: grams,
          label: Number(grams) >= 1000 ? `${Number(grams) / 1000} kg` : `${grams} g`,
        }))}
        hint="Each material at the cheapest way to have so much of it."
      />
    </>
  );
}

const PHASES = [
  ['opening', `Opening, ${PHASE_HOURS.opening * 60} min`],
  ['heart', `Heart, ${PHASE_HOURS.heart} h`],
  ['dry', `Dry phase, ${PHASE_HOURS.dry} h`],
] as const;

function PhaseRule({ request, onChange }: Pick<RulesProps, 'request' | 'onChange'>) {
  const { phases, target } = request;
  if (target.kind === 'drawn') return null;
  return (
    <div className="grid gap-3">
      <Switch
        label="Follow it as it dries down"
        hint="Closest over the opening, the heart and the dry phase, as much as each counts."
        checked={phases !== null}
        onChange={(event) =>
          onChange({ ...request, phases: event.target.checked ? { opening: 1, heart: 1, dry: 1 } : null })
        }
      />
      {phases
        ? PHASES.map(([phase, label]) => (
            <Slider
              key={phase}
              label={label}
              value={phases[phase]}
              min={0}
              max={3}
              step={0.25}
              graduations={12}
              unit="×"
              onChange={(value) => {
                const next = { ...phases, [phase]: value };
                if (next.opening + next.heart + next.dry > 0) onChange({ ...request, phases: next });
              }}
            />
          ))
        : null}
    </div>
  );
}
