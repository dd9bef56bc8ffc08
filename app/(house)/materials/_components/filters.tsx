'use client';

import { FacetSwatch } from '@/app/_components/facet-swatch';
import { Combobox } from '@/app/_components/ui/combobox';
import { NumberField } from '@/app/_components/ui/number-field';
import { Slider } from '@/app/_components/ui/slider';
import { Checkbox } from '@/app/_components/ui/switch';
import { Decimal } from '@/lib/shared/decimal';
import type { FacetView } from '@/lib/shared/facet';
import { KIND_NAMES, MATERIAL_KINDS } from '@/lib/shared/material-words';
import { USUAL_PACK_GRAMS } from '@/lib/shared/price';
import type { ListState } from '../_client/list-state';

export type SetListState = (change: { [K in keyof ListState]?: ListState[K] | null }) => void;

interface FiltersProps {
  state: ListState;
  setState: SetListState;
  facets: readonly FacetView[];
  currency: string | null;
}

const FIRST_MIN = 3;

export function Filters({ state, setState, facets, currency }: FiltersProps) {
  const natural = state.natural ? Number(state.natural) * 100 : 0;
  return (
    <>
      <FacetFilter state={state} setState={setState} facets={facets} />
      <fieldset className="grid gap-2">
        <legend className="mb-2 font-[560]">Kind</legend>
        <div className="grid grid-cols-2 gap-x-3 gap-y-1">
          {MATERIAL_KINDS.map((kind) => (
            <Checkbox
              key={kind}
              label={KIND_NAMES[kind]}
              checked={state.kind.includes(kind)}
              onChange={(event) =>
                setState({
                  kind: event.target.checked ? [...state.kind, kind] : state.kind.filter((each) => each !== kind),
                })
              }
            />
          ))}
        </div>
      </fieldset>
      <Slider
        label="Natural share, at least"
        unit="%"
        min={0}
        max={100}
        step={5}
        value={Number.isFinite(natural) ? natural : 0}
        onChange={(percent) => setState({ natural: percent > 0 ? new Decimal(percent).div(100).toFixed() : null })}
      />
      {currency ? <CostFilters state={state} setState={setState} currency={currency} /> : null}
    </>
  );
}

function CostFilters({ state, setState, currency }: Omit<FiltersProps, 'facets'> & { currency: string }) {
  const numberOf = (text: string | null) => (text === null || Number.isNaN(Number(text)) ? null : Number(text));
  const textOf = (value: number | null) => (value === null ? null : new Decimal(value).toFixed());
  return (
    <fieldset className="grid gap-4">
      <legend className="mb-3 font-[560]">Cost</legend>
      <NumberField
        label="Bought for at least"
        unit="g"
        min={0.001}
        value={numberOf(state.pack) ?? Number(USUAL_PACK_GRAMS)}
        onChange={(value) => setState({ pack: textOf(value) })}
        hint="Small packs cost more per kg: costs are of the cheapest way to have this much."
      />
      <div className="grid grid-cols-2 gap-3">
        <NumberField
          label="From"
          unit={`${currency}/kg`}
          min={0}
          value={numberOf(state.minPrice)}
          onChange={(value) => setState({ minPrice: textOf(value) })}
        />
        <NumberField
          label="Up to"
          unit={`${currency}/kg`}
          min={0}
          value={numberOf(state.maxPrice)}
          onChange={(value) => setState({ maxPrice: textOf(value) })}
        />
      </div>
      <NumberField
        label="At equal strength, up to"
        unit={currency}
        min={0}
        value={numberOf(state.maxEqual)}
        onChange={(value) => setState({ maxEqual: textOf(value) })}
        hint="Per 1,000 units of odour impact: a cheap weak material can cost more than a dear strong one."
      />
    </fieldset>
  );
}

function FacetFilter({ state, setState, facets }: Pick<FiltersProps, 'state' | 'setState' | 'facets'>) {
  const floors = state.facets.map((text) => {
    const [slug = '', min = '0'] = text.split(':');
    return { text, slug, min: Number(min) || 0, facet: facets.find((facet) => facet.slug === slug) };
  });
  const items = facets.map((facet) => ({ id: facet.slug, label: facet.name, detail: facet.family, facet }));
  const set = (slug: string, min: number) =>
    setState({ facets: floors.map((floor) => (floor.slug === slug ? `${slug}:${min}` : floor.text)) });
  return (
    <div className="grid gap-3">
      <Combobox
        label="Smells of"
        placeholder="Rosy, green, smoky …"
        items={items.filter(({ id }) => !floors.some(({ slug }) => slug === id))}
        value={null}
        picksMany
        lead={({ facet }) => <FacetSwatch facet={facet} />}
        onChange={(slug) => slug && setState({ facets: [...state.facets, `${slug}:${FIRST_MIN}`] })}
      />
      {floors.map(({ slug, min, facet }) => (
        <Slider
          key={slug}
          label={
            <span className="inline-flex items-center gap-2">
              <FacetSwatch facet={facet ?? null} />
              {facet?.name ?? slug}, at least
            </span>
          }
          min={0}
          max={10}
          step={0.5}
          value={min}
          onChange={(value) => set(slug, value)}
        />
      ))}
    </div>
  );
}
