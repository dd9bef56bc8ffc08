'use client';

import { type ChangeEvent, useEffect, useState } from 'react';
import { FacetSwatch } from '@/app/_components/facet-swatch';
import { Button } from '@/app/_components/ui/button';
import { Sheet } from '@/app/_components/ui/dialog';
import { inputClasses } from '@/app/_components/ui/field';
import { Tag } from '@/app/_components/ui/mark';
import type { FacetView } from '@/lib/shared/facet';
import { KIND_NAMES } from '@/lib/shared/material-words';
import { moneyWords, percentWords } from '@/lib/shared/number-words';
import { filtersOn, type ListState, NO_FILTERS } from '../_client/list-state';
import { Filters, type SetListState } from './filters';

interface FilterBarProps {
  state: ListState;
  setState: SetListState;
  facets: readonly FacetView[];
  currency: string | null;
}

/** The search in sight, the filters behind a button, and those in force as labels that can be taken off. */
export function FilterBar({ state, setState, facets, currency }: FilterBarProps) {
  const [open, setOpen] = useState(false);
  const count = filtersOn(state);
  return (
    <div className="grid gap-3 px-5 pb-4 md:px-8" data-print="no">
      <search className="flex gap-2">
        <SearchField value={state.q} onSearch={(q) => setState({ q: q || null })} />
        <Button onClick={() => setOpen(true)} aria-haspopup="dialog">
          Filters{count > 0 ? <span className="figures">, {count}</span> : null}
        </Button>
      </search>
      {count > 0 ? <InForce state={state} setState={setState} facets={facets} currency={currency} /> : null}
      <Sheet open={open} onOpenChange={setOpen} title="Filter materials">
        <Filters state={state} setState={setState} facets={facets} currency={currency} />
      </Sheet>
    </div>
  );
}

/** The field answers to every key at once; the address and the list follow a moment later. */
function SearchField({ value, onSearch }: { value: string; onSearch: (value: string) => void }) {
  const [text, setText] = useState(value);
  useEffect(() => setText(value), [value]);
  return (
    <input
      type="search"
      aria-label="Search by name, botanical name, synonym or CAS"
      placeholder="Name, botanical name, synonym or CAS"
      value={text}
      onChange={(event: ChangeEvent<HTMLInputElement>) => {
        setText(event.target.value);
        onSearch(event.target.value);
      }}
      className={`${inputClasses} max-w-[34rem]`}
      maxLength={200}
      spellCheck={false}
      autoComplete="off"
    />
  );
}

function InForce({ state, setState, facets, currency }: FilterBarProps) {
  const { kind, natural, minPrice, maxPrice, maxEqual } = state;
  const money = (value: string) => (currency && /^\d+(\.\d+)?$/.test(value) ? moneyWords(value, currency) : value);
  const without = <T extends string>(list: readonly T[], item: T) => list.filter((each) => each !== item);
  return (
    <ul className="flex flex-wrap items-center gap-1.5" aria-label="Filters in force">
      {state.facets.map((floor) => {
        const [slug, min] = floor.split(':');
        const facet = facets.find((each) => each.slug === slug);
        return (
          <li key={floor}>
            <Tag
              removeLabel={`Remove the filter ${facet?.name ?? slug}`}
              onRemove={() => setState({ facets: without(state.facets, floor) })}
            >
              <FacetSwatch facet={facet ?? null} />
              {facet?.name ?? slug}
              {min ? ` from ${min}` : null}
            </Tag>
          </li>
        );
      })}
      {kind.map((each) => (
        <li key={each}>
          <Tag
            removeLabel={`Remove the filter ${KIND_NAMES[each]}`}
            onRemove={() => setState({ kind: without(kind, each) })}
          >
            {KIND_NAMES[each]}
          </Tag>
        </li>
      ))}
      {natural && /^\d(\.\d+)?$/.test(natural) ? (
        <Single words={`natural from ${percentWords(natural)}`} onRemove={() => setState({ natural: null })} />
      ) : null}
      {minPrice ? (
        <Single words={`from ${money(minPrice)} per kg`} onRemove={() => setState({ minPrice: null })} />
      ) : null}
      {maxPrice ? (
        <Single words={`up to ${money(maxPrice)} per kg`} onRemove={() => setState({ maxPrice: null })} />
      ) : null}
      {maxEqual ? (
        <Single words={`up to ${money(maxEqual)} at equal strength`} onRemove={() => setState({ maxEqual: null })} />
      ) : null}
      <li>
        <Button size="small" look="quiet" onClick={() => setState(NO_FILTERS)}>
          Clear all
        </Button>
      </li>
    </ul>
  );
}

const Single = ({ words, onRemove }: { words: string; onRemove: () => void }) => (
  <li>
    <Tag removeLabel={`Remove the filter ${words}`} onRemove={onRemove}>
      {words}
    </Tag>
  </li>
);
