'use client';

import { useState } from 'react';
import { Button } from '@/app/_components/ui/button';
import { Combobox } from '@/app/_components/ui/combobox';
import { Select, TextField } from '@/app/_components/ui/field';
import { sendApi } from '@/lib/shared/api-client';
import type { ConstituentView } from '@/lib/shared/constituent';
import { COMPLETENESS, COMPLETENESS_WORDS } from '@/lib/shared/material-words';
import type { QualityDraft, RangeDraft } from '../_client/quality-draft';
import { Field, FormPart } from './form-frame';
import type { QualityPartProps } from './quality-parts';

export function CompositionPart(props: QualityPartProps & { constituents: readonly ConstituentView[] }) {
  const { draft, set, errors } = props;
  const [added, setAdded] = useState<ConstituentView[]>([]);
  const known = [...props.constituents, ...added];
  const change = (at: number, what: Partial<RangeDraft>) =>
    set({ constituents: draft.constituents.map((range, place) => (place === at ? { ...range, ...what } : range)) });
  const add = (constituentId: string) =>
    set({
      constituents: [
        ...draft.constituents,
        { constituentId, min: '0', typical: '', max: '', source: draft.compositionSource },
      ],
    });
  return (
    <FormPart
      title="What it contains"
      about="Ranges in per cent by mass. Minima may not exceed 100 % together; maxima may."
    >
      <Field name="completeness">
        <Select
          label="How complete this is"
          hint={COMPLETENESS_WORDS[draft.completeness].long}
          value={draft.completeness}
          options={COMPLETENESS.map((word) => ({ value: word, label: COMPLETENESS_WORDS[word].short }))}
          onChange={(event) => set({ completeness: event.target.value as QualityDraft['completeness'] })}
        />
      </Field>
      <Field name="compositionSource">
        <TextField
          label="The document that says so"
          hint="Such as: SDS, 9 March 2026."
          value={draft.compositionSource}
          error={errors.compositionSource}
          onChange={(event) => set({ compositionSource: event.target.value })}
        />
      </Field>
      <Field name="constituents" className="grid gap-4 sm:col-span-2">
        {errors.constituents ? (
          <p role="alert" className="font-[560]">
            {errors.constituents}
          </p>
        ) : null}
        {draft.constituents.map((range, at) => (
          <RangeRow
            key={range.constituentId}
            name={known.find(({ id }) => id === range.constituentId)?.name ?? 'Constituent'}
            range={range}
            errors={errors}
            path={`constituents.${at}`}
            onChange={(what) => change(at, what)}
            onRemove={() => set({ constituents: draft.constituents.filter((_, place) => place !== at) })}
          />
        ))}
        <AddConstituent
          known={known.filter(({ id }) => !draft.constituents.some(({ constituentId }) => constituentId === id))}
          onChoose={add}
          onMade={(made) => {
            setAdded((before) => [...before, made]);
            add(made.id);
          }}
        />
      </Field>
    </FormPart>
  );
}

interface RangeRowProps {
  name: string;
  range: RangeDraft;
  errors: Record<string, string>;
  path: string;
  onChange: (what: Partial<RangeDraft>) => void;
  onRemove: () => void;
}

const FIELDS = [
  ['min', 'Least', 'minFraction'],
  ['typical', 'Typical', 'typicalFraction'],
  ['max', 'Most', 'maxFraction'],
] as const;

function RangeRow({ name, range, errors, path, onChange, onRemove }: RangeRowProps) {
  return (
    <fieldset className="border-t border-grout pt-3">
      <legend className="float-left font-[600]">{name}</legend>
      <Button look="quiet" size="small" className="float-right" onClick={onRemove} aria-label={`Remove ${name}`}>
        Remove
      </Button>
      <div className="clear-both grid grid-cols-3 gap-3 pt-2 md:grid-cols-[repeat(3,6.5rem)_minmax(0,1fr)]">
        {FIELDS.map(([field, label, column]) => (
          <TextField
            key={field}
            label={label}
            unit="%"
            inputMode="decimal"
            value={range[field]}
            error={errors[`${path}.${column}`]}
            onChange={(event) => onChange({ [field]: event.target.value })}
          />
        ))}
        <TextField
          label="Known from"
          className="max-md:col-span-3"
          value={range.source}
          error={errors[`${path}.source`] ?? errors[`${path}.constituentId`]}
          onChange={(event) => onChange({ source: event.target.value })}
        />
      </div>
    </fieldset>
  );
}

interface AddConstituentProps {
  known: readonly ConstituentView[];
  onChoose: (id: string) => void;
  onMade: (made: ConstituentView) => void;
}

function AddConstituent({ known, onChoose, onMade }: AddConstituentProps) {
  const [draft, setDraft] = useState<{ name: string; cas: string } | null>(null);
  const [fault, setFault] = useState<Record<string, string>>({});
  const key = useState(() => crypto.randomUUID())[0];
  async function make() {
    const body = { name: draft?.name ?? '', cas: draft?.cas.trim() || null };
    try {
      onMade(
        await sendApi<ConstituentView>(
          'POST',
          '/api/v1/constituents',
          body,
          `${key}${JSON.stringify(body)}`.slice(0, 128),
        ),
      );
      setDraft(null);
      setFault({});
    } catch (error) {
      const { fields = {}, message } = error as Error & { fields?: Record<string, string> };
      setFault(Object.keys(fields).length > 0 ? fields : { name: message });
    }
  }
  if (!draft)
    return (
      <div className="flex items-end gap-2">
        <Combobox
          label="Add a constituent"
          items={known.map(({ id, name, cas }) => ({ id, label: name, detail: cas ?? undefined }))}
          value={null}
          picksMany
          onChange={(id) => id && onChoose(id)}
          className="flex-1"
        />
        <Button onClick={() => setDraft({ name: '', cas: '' })}>New word</Button>
      </div>
    );
  return (
    <div className="grid gap-3 sm:grid-cols-2">
      <TextField
        label="Name of the new constituent"
        value={draft.name}
        error={fault.name}
        onChange={(event) => setDraft({ ...draft, name: event.target.value })}
      />
      <TextField
        label="CAS number, if it has one"
        value={draft.cas}
        error={fault.cas}
        onChange={(event) => setDraft({ ...draft, cas: event.target.value })}
      />
      <span className="flex gap-2">
        <Button size="small" onClick={make}>
          Add constituent
        </Button>
        <Button size="small" look="quiet" onClick={() => setDraft(null)}>
          Choose another
        </Button>
      </span>
    </div>
  );
}
