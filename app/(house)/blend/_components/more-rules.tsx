import { Select } from '@/app/_components/ui/field';
import { type BlendRequest, PACK_SIZES } from '@/lib/shared/blend-input';
import type { RulesProps } from './rules-panel';

/** What is set once and then left alone. */
export function MoreRules({ request, onChange }: RulesProps) {
  return (
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
  );
}
