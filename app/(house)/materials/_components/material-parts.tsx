'use client';

import { Button } from '@/app/_components/ui/button';
import { Select, TextArea, TextField } from '@/app/_components/ui/field';
import { KIND_NAMES, MATERIAL_KINDS, STRENGTH_CLASSES } from '@/lib/shared/material-words';
import type { MaterialDraft } from '../_client/material-draft';
import { EstimateOffer } from './estimate-offer';
import { Field, FormPart } from './form-frame';

export interface PartProps {
  draft: MaterialDraft;
  set: (change: Partial<MaterialDraft>) => void;
  errors: Record<string, string>;
}

type TextName = { [K in keyof MaterialDraft]: MaterialDraft[K] extends string ? K : never }[keyof MaterialDraft];

interface TextProps extends PartProps {
  name: TextName;
  label: string;
  hint?: string;
  unit?: string;
  className?: string;
  /** Numbers bring up the figures of a phone. */
  numeric?: boolean;
}

function Text({ draft, set, errors, name, label, hint, unit, className, numeric }: TextProps) {
  return (
    <Field name={name} className={className}>
      <TextField
        label={label}
        hint={hint}
        unit={unit}
        name={name}
        value={draft[name]}
        error={errors[name]}
        inputMode={numeric ? 'decimal' : undefined}
        autoComplete="off"
        onChange={(event) => set({ [name]: event.target.value })}
      />
    </Field>
  );
}

export function IdentityPart(part: PartProps) {
  const { draft, set, errors } = part;
  return (
    <FormPart title="What it is" about="CAS alone is not identity: unlike qualities share numbers.">
      <Text {...part} name="name" label="Name" />
      <Field name="kind">
        <Select
          label="Kind"
          name="kind"
          value={draft.kind}
          error={errors.kind}
          options={MATERIAL_KINDS.map((kind) => ({ value: kind, label: KIND_NAMES[kind] }))}
          onChange={(event) => set({ kind: event.target.value as MaterialDraft['kind'] })}
        />
      </Field>
      <Text {...part} name="botanicalName" label="Botanical name" hint="In Latin, as botany writes it." />
      <Text {...part} name="plantPart" label="Plant part" />
      <Text {...part} name="chemicalName" label="Chemical name" />
      <Text {...part} name="inciName" label="INCI name" />
      <CasList {...part} />
      <Field name="synonyms">
        <TextArea
          label="Synonyms"
          hint="One a line."
          value={draft.synonyms}
          error={firstOf(errors, 'synonyms')}
          onChange={(event) => set({ synonyms: event.target.value })}
        />
      </Field>
      <Text
        {...part}
        name="naturalShare"
        label="Natural share"
        unit="%"
        numeric
        hint="100 for a natural, 0 for a synthetic."
      />
      <Field name="note" className="sm:col-span-2">
        <TextArea
          label="Note"
          value={draft.note}
          error={errors.note}
          onChange={(event) => set({ note: event.target.value })}
        />
      </Field>
    </FormPart>
  );
}

function CasList({ draft, set, errors }: PartProps) {
  const change = (at: number, value: string) =>
    set({ cas: draft.cas.map((cas, place) => (place === at ? value : cas)) });
  // Empty lines are left out of what is sent, so faults count only the others.
  const sentAt = (at: number) => draft.cas.slice(0, at).filter((cas) => cas.trim()).length;
  return (
    <Field name="cas">
      <fieldset className="grid gap-2">
        <legend className="sr-only">CAS numbers</legend>
        {draft.cas.map((cas, at) => (
          // biome-ignore lint/suspicious/noArrayIndexKey: a line is known by its place; it has nothing else
          <div key={at} className="flex items-end gap-2">
            <TextField
              label={draft.cas.length > 1 ? `CAS number ${at + 1}` : 'CAS number'}
              hint={at === 0 ? 'As in 106-22-9; the check digit is verified.' : undefined}
              value={cas}
              error={cas.trim() ? errors[`cas.${sentAt(at)}`] : undefined}
              onChange={(event) => change(at, event.target.value)}
              className="flex-1"
              autoComplete="off"
            />
            {draft.cas.length > 1 ? (
              <Button
                look="quiet"
                className="self-start mt-6.5"
                aria-label={`Remove CAS number ${at + 1}`}
                onClick={() => set({ cas: draft.cas.filter((_, place) => place !== at) })}
              >
                Remove
              </Button>
            ) : null}
          </div>
        ))}
        <Button size="small" className="justify-self-start" onClick={() => set({ cas: [...draft.cas, ''] })}>
          Add a CAS number
        </Button>
      </fieldset>
    </Field>
  );
}

export function StrengthPart(part: PartProps) {
  const { draft, set, errors } = part;
  return (
    <FormPart
      title="Strength and volatility"
      about="Strength is odour impact per gram on the house’s own scale. Estimates are welcome; say that they are."
    >
      <Text {...part} name="strength" label="Odour strength" unit="per g" numeric hint="0 for a solvent." />
      <Text
        {...part}
        name="strengthSpread"
        label="Known within a factor of"
        numeric
        hint="2 means between half and twice that."
      />
      <Field name="strengthClass">
        <Select
          label="Strength in words"
          value={draft.strengthClass}
          error={errors.strengthClass}
          options={STRENGTH_CLASSES.map((word) => ({ value: word, label: word }))}
          onChange={(event) => set({ strengthClass: event.target.value as MaterialDraft['strengthClass'] })}
        />
      </Field>
      <Text {...part} name="strengthSource" label="Where that is known from" />
      <Text
        {...part}
        name="evaporationPerHour"
        label="Evaporation from a blotter"
        unit="1/h"
        numeric
        hint="The part that leaves each hour at first, such as 0.07."
      />
      <Text {...part} name="evaporationSource" label="Source of the evaporation" />
      <Text {...part} name="vapourPressurePa" label="Vapour pressure at 25 °C" unit="Pa" numeric />
      <Text {...part} name="vapourPressureSource" label="Source of the vapour pressure" />
      <Text {...part} name="odourThresholdUgPerM3" label="Odour threshold in air" unit="µg/m³" numeric />
      <Text {...part} name="odourThresholdSource" label="Source of the odour threshold" />
      <EstimateOffer draft={draft} set={set} />
    </FormPart>
  );
}

export function UsePart(part: PartProps) {
  return (
    <FormPart title="How it is used">
      <Text {...part} name="usualDilution" label="Usual dilution" unit="%" numeric hint="100 for as it is." />
      <Text {...part} name="dilutionSolvent" label="Solvent of the dilution" />
      <Text
        {...part}
        name="maxShare"
        label="Largest share in a concentrate"
        unit="%"
        numeric
        hint="Your own advice; limits are kept elsewhere."
      />
    </FormPart>
  );
}

/** The fault of a list, or of the first of its items at fault. */
export const firstOf = (errors: Record<string, string>, name: string): string | undefined =>
  errors[name] ?? Object.entries(errors).find(([path]) => path.startsWith(`${name}.`))?.[1];
