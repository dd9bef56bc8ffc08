import { Strip } from '@/app/_components/strip/strip';
import { Combobox } from '@/app/_components/ui/combobox';
import { NumberField } from '@/app/_components/ui/number-field';
import type { BlendRequest } from '@/lib/shared/blend-input';
import type { Relief } from '@/lib/shared/blend-relief';
import { type MaterialRule, rulesOfMaterials, withMaterialRule } from '../_client/material-rule';
import { ReliefNote } from './relief-note';
import type { RulesProps } from './rules-panel';

const WORDS: Record<MaterialRule['kind'], string> = {
  excluded: 'left out',
  required: 'must be in it',
  kept: 'kept at',
  most: 'at most',
  added: 'may be in it',
};

export function MaterialRules(props: RulesProps & { reliefs: readonly Relief[] }) {
  const { request, facets, inputs, byId, faults, reliefs, onChange } = props;
  const rules = rulesOfMaterials(request);
  const set = (id: string, rule: Omit<MaterialRule, 'id'> | null) => onChange(withMaterialRule(request, id, rule));
  return (
    <section aria-label="Rules for single materials" className="grid gap-3">
      <Combobox
        label="A rule for a material"
        placeholder="Leave out, keep or require"
        items={inputs.candidates.map((one) => ({ ...one, label: one.name, detail: one.botanicalName ?? undefined }))}
        value={null}
        onChange={(id) => id && set(id, { kind: usualRule(request, id, byId.get(id)?.strength ?? 1) })}
        lead={(item) => <Strip size="node" facets={facets} profile={item.profile} decorative />}
        error={faults.kept ?? Object.entries(faults).find(([field]) => /^(required|kept)\./.test(field))?.[1]}
      />
      {rules.length > 0 ? (
        <ul className="grid gap-2">
          {rules.map((rule) => (
            <Row
              key={rule.id}
              rule={rule}
              name={byId.get(rule.id)?.name ?? 'A material that is gone'}
              onSet={(next) => set(rule.id, next)}
            />
          ))}
        </ul>
      ) : null}
      <ReliefNote reliefs={reliefs} />
    </section>
  );
}

/** The target and what has no smell are out already: naming one lets it in. */
function usualRule(request: BlendRequest, id: string, strength: number): MaterialRule['kind'] {
  const isTarget = request.target.kind === 'material' && request.target.materialId === id;
  return isTarget || strength === 0 ? 'added' : 'excluded';
}

interface RowProps {
  rule: MaterialRule;
  name: string;
  onSet: (rule: Omit<MaterialRule, 'id'> | null) => void;
}

function Row({ rule, name, onSet }: RowProps) {
  const hasShare = rule.kind === 'kept' || rule.kind === 'most';
  return (
    <li className="grid grid-cols-[minmax(0,1fr)_auto] items-center gap-2 border-b border-grout pb-2">
      <span className="truncate" title={name}>
        {name}
      </span>
      <button
        type="button"
        aria-label={`Take back the rule for ${name}`}
        className="grid size-7 place-items-center rounded-tile hover:bg-wash"
        onClick={() => onSet(null)}
      >
        <svg viewBox="0 0 12 12" width="9" height="9" aria-hidden="true">
          <path d="m1 1 10 10M11 1 1 11" stroke="currentColor" strokeWidth="1.6" />
        </svg>
      </button>
      <span className="col-span-2 grid grid-cols-[minmax(0,1fr)_7rem] gap-2">
        <select
          aria-label={`Rule for ${name}`}
          value={rule.kind}
          className="min-h-9 rounded-tile border border-rule bg-paper px-2 hover:border-ink"
          onChange={(event) => onSet({ kind: event.target.value as MaterialRule['kind'], share: rule.share ?? 0.05 })}
        >
          {Object.entries(WORDS).map(([kind, words]) => (
            <option key={kind} value={kind}>
              {words}
            </option>
          ))}
        </select>
        {hasShare ? (
          <NumberField
            label={`Share of ${name}`}
            hideLabel
            unit="%"
            digits={4}
            min={0}
            max={100}
            value={(rule.share ?? 0) * 100}
            onChange={(value) => value !== null && onSet({ kind: rule.kind, share: value / 100 })}
          />
        ) : null}
      </span>
    </li>
  );
}
