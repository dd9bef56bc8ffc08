'use client';

import { useMemo, useState } from 'react';
import { FacetSwatch } from '@/app/_components/facet-swatch';
import { Strip } from '@/app/_components/strip/strip';
import { Button } from '@/app/_components/ui/button';
import { Choice } from '@/app/_components/ui/choice';
import { inputClasses, TextArea } from '@/app/_components/ui/field';
import { NumberField } from '@/app/_components/ui/number-field';
import { Slider } from '@/app/_components/ui/slider';
import type { FacetView } from '@/lib/shared/facet';
import { fuzzyScore } from '@/lib/shared/fuzzy';
import { PHASE_NAMES, PHASES, type Phase } from '@/lib/shared/material-words';
import type { FacetEntry } from '../_client/material-draft';
import { Field } from './form-frame';
import { firstOf, type PartProps } from './material-parts';

type When = FacetEntry['phase'];
const USUAL_SPREAD = 1;

/** What it smells of: a slider and a number for every facet, by family, and the strip that comes of it. */
export function FacetEditor({ draft, set, errors, facets }: PartProps & { facets: readonly FacetView[] }) {
  const [when, setWhen] = useState<When>('all');
  const [search, setSearch] = useState('');
  const entries = useMemo(
    () => new Map(draft.facets.map((entry) => [`${entry.facetId} ${entry.phase}`, entry])),
    [draft],
  );
  const of = (facetId: string, phase: When) => entries.get(`${facetId} ${phase}`);

  function write(facetId: string, change: Partial<Pick<FacetEntry, 'intensity' | 'sd'>>) {
    const base = of(facetId, when) ?? of(facetId, 'all');
    const entry = { facetId, phase: when, intensity: base?.intensity ?? 0, sd: base?.sd ?? USUAL_SPREAD, ...change };
    const others = draft.facets.filter((each) => each.facetId !== facetId || each.phase !== when);
    const isNothing = when === 'all' && entry.intensity === 0;
    set({ facets: isNothing ? others : [...others, entry] });
  }
  const forget = (facetId: string) =>
    set({ facets: draft.facets.filter((each) => each.facetId !== facetId || each.phase !== when) });

  const row = (facet: FacetView) => (
    <FacetRow
      key={`${facet.id} ${when}`}
      facet={facet}
      when={when}
      entry={of(facet.id, when)}
      base={of(facet.id, 'all')}
      onWrite={(change) => write(facet.id, change)}
      onForget={() => forget(facet.id)}
    />
  );
  const used = facets.filter((facet) => draft.facets.some(({ facetId }) => facetId === facet.id));
  const unused = facets.filter((facet) => !used.includes(facet));
  const found = search.trim()
    ? facets.filter((facet) => fuzzyScore(search, `${facet.name} ${facet.family}`) !== null)
    : null;
  const families = [...new Set(unused.map(({ family }) => family))];
  const fault = firstOf(errors, 'facets');

  return (
    <>
      <Field name="smell" className="sm:col-span-2">
        <TextArea
          label="In a smeller’s words"
          value={draft.smell}
          error={errors.smell}
          onChange={(event) => set({ smell: event.target.value })}
          className="[&_textarea]:font-serif [&_textarea]:text-lead [&_textarea]:italic"
        />
      </Field>
      <Field name="facets" className="grid gap-6 sm:col-span-2 md:grid-cols-[minmax(0,1fr)_17rem]">
        <div className="grid content-start gap-4">
          <Choice
            label="When"
            value={when}
            onChange={setWhen}
            options={[
              { value: 'all', label: 'All along' },
              ...PHASES.map((phase) => ({ value: phase, label: PHASE_NAMES[phase] })),
            ]}
          />
          {when === 'all' ? null : (
            <p className="text-ink-soft">Move only what differs in this phase; the rest stays as it is all along.</p>
          )}
          <input
            type="search"
            aria-label="Search facets"
            placeholder="Search facets"
            value={search}
            onChange={(event) => setSearch(event.target.value)}
            className={inputClasses}
          />
          {fault ? (
            <p role="alert" className="font-[560]">
              {fault}
            </p>
          ) : null}
          {found ? (
            <div className="grid">
              {found.map(row)}
              {found.length === 0 ? <p className="text-ink-soft">The house has no facet by that name.</p> : null}
            </div>
          ) : (
            <>
              <div className="grid">{used.map(row)}</div>
              {families.map((family) => (
                <details key={family} className="group border-t border-grout pt-2">
                  <summary className="flex min-h-8 list-none items-center gap-2 font-[560] hover:underline">
                    <span aria-hidden="true" className="inline-block transition-transform group-open:rotate-90">
                      ›
                    </span>
                    {family}
                    <span className="flex gap-1">
                      {unused
                        .filter((facet) => facet.family === family)
                        .map((facet) => (
                          <FacetSwatch key={facet.id} facet={facet} />
                        ))}
                    </span>
                  </summary>
                  {unused.filter((facet) => facet.family === family).map(row)}
                </details>
              ))}
            </>
          )}
        </div>
        <div className="pl-5 max-md:hidden">
          <div className="sticky top-6">
            <Strip size="page" facets={facets} {...smellOf(draft.facets, facets)} name="As rated so far" />
          </div>
        </div>
      </Field>
    </>
  );
}

interface FacetRowProps {
  facet: FacetView;
  when: When;
  entry?: FacetEntry;
  base?: FacetEntry;
  onWrite: (change: Partial<Pick<FacetEntry, 'intensity' | 'sd'>>) => void;
  onForget: () => void;
}

function FacetRow({ facet, when, entry, base, onWrite, onForget }: FacetRowProps) {
  const shown = entry ?? base;
  const intensity = shown?.intensity ?? 0;
  const differs = when !== 'all' && entry;
  return (
    <div className="grid grid-cols-[minmax(0,1fr)_6.25rem_6.25rem] items-start gap-x-3 border-t border-grout pt-2">
      <Slider
        label={
          <span className="inline-flex items-center gap-2" title={facet.description}>
            <FacetSwatch facet={facet} />
            {facet.name}
          </span>
        }
        min={0}
        max={10}
        step={0.05}
        graduations={10}
        value={intensity}
        onChange={(value) => onWrite({ intensity: value })}
      />
      <NumberField
        label={`${facet.name}, intensity`}
        hideLabel
        unit="/10"
        min={0}
        max={10}
        digits={2}
        value={intensity}
        onChange={(value) => onWrite({ intensity: value ?? 0 })}
      />
      <div>
        <NumberField
          label={`${facet.name}, spread`}
          hideLabel
          unit="±"
          min={0}
          max={10}
          digits={2}
          value={shown?.sd ?? null}
          disabled={!shown}
          onChange={(value) => onWrite({ sd: value ?? 0 })}
        />
        {differs ? (
          <Button look="quiet" size="small" className="w-full px-0!" onClick={onForget}>
            As all along<span className="sr-only">: {facet.name}</span>
          </Button>
        ) : null}
      </div>
    </div>
  );
}

/** The vectors that the entries make, for the strip. */
function smellOf(entries: readonly FacetEntry[], facets: readonly FacetView[]) {
  const at = (facetId: string, phase: When) =>
    entries.find((entry) => entry.facetId === facetId && entry.phase === phase)?.intensity;
  const profile = facets.map(({ id }) => at(id, 'all') ?? 0);
  const phases: Partial<Record<Phase, number[]>> = {};
  for (const phase of PHASES) {
    if (entries.some((entry) => entry.phase === phase))
      phases[phase] = facets.map(({ id }, place) => at(id, phase) ?? profile[place] ?? 0);
  }
  return { profile, phases };
}
