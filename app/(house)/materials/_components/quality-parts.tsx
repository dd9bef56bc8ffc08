'use client';

import { useState } from 'react';
import { Button } from '@/app/_components/ui/button';
import { Combobox } from '@/app/_components/ui/combobox';
import { Select, TextField } from '@/app/_components/ui/field';
import { Switch } from '@/app/_components/ui/switch';
import { sendApi } from '@/lib/shared/api-client';
import { FORMS } from '@/lib/shared/material-words';
import type { SupplierView } from '@/lib/shared/quality';
import type { QualityDraft } from '../_client/quality-draft';
import { Field, FormPart } from './form-frame';

export interface QualityPartProps {
  draft: QualityDraft;
  set: (change: Partial<QualityDraft>) => void;
  errors: Record<string, string>;
}

type TextName = 'code' | 'grade' | 'origin' | 'colour' | 'densityGPerMl' | 'warmToC' | 'flashPointC';

export function GradePart(props: QualityPartProps & { suppliers: readonly SupplierView[] }) {
  const { draft, set, errors, suppliers } = props;
  const text = (name: TextName, label: string, more: { unit?: string; hint?: string } = {}) => (
    <Field name={name}>
      <TextField
        label={label}
        value={draft[name]}
        error={errors[name]}
        inputMode={more.unit ? 'decimal' : undefined}
        autoComplete="off"
        onChange={(event) => set({ [name]: event.target.value })}
        {...more}
      />
    </Field>
  );
  return (
    <FormPart title="The grade">
      <SupplierField {...props} suppliers={suppliers} />
      {text('code', 'Supplier’s code')}
      {text('grade', 'Grade')}
      {text('origin', 'Origin')}
      <Field name="form">
        <Select
          label="Form"
          value={draft.form}
          options={FORMS.map((form) => ({ value: form, label: form }))}
          onChange={(event) => set({ form: event.target.value as QualityDraft['form'] })}
        />
      </Field>
      {text('densityGPerMl', 'Density', { unit: 'g/mL', hint: 'Needed to cost packs by volume; it is never assumed.' })}
      {text('warmToC', 'Warm before pouring, at most to', { unit: '°C' })}
      {text('flashPointC', 'Flash point', { unit: '°C' })}
      {text('colour', 'Colour')}
      <Field name="preferred" className="self-end">
        <Switch
          label="Preferred: the material shows this one"
          checked={draft.preferred}
          onChange={(event) => set({ preferred: event.target.checked })}
        />
      </Field>
    </FormPart>
  );
}

/** One of the house's suppliers, or a new one by name. */
function SupplierField({ draft, set, errors, suppliers }: QualityPartProps & { suppliers: readonly SupplierView[] }) {
  const [added, setAdded] = useState<SupplierView[]>([]);
  const [name, setName] = useState<string | null>(null);
  const [fault, setFault] = useState<string>();
  const items = [...suppliers, ...added].map((supplier) => ({ id: supplier.id, label: supplier.name }));
  const key = useState(() => crypto.randomUUID())[0];

  async function add() {
    try {
      const made = await sendApi<SupplierView>('POST', '/api/v1/suppliers', { name }, `${key}-${name}`);
      setAdded((before) => [...before, made]);
      set({ supplierId: made.id });
      setName(null);
      setFault(undefined);
    } catch (error) {
      setFault((error as Error).message);
    }
  }

  return (
    <Field name="supplierId" className="grid content-start gap-2">
      {name === null ? (
        <>
          <Combobox
            label="Supplier"
            items={items}
            value={draft.supplierId || null}
            error={errors.supplierId}
            onChange={(id) => set({ supplierId: id ?? '' })}
          />
          <Button size="small" className="justify-self-start" onClick={() => setName('')}>
            New supplier
          </Button>
        </>
      ) : (
        <>
          <TextField
            label="Name of the new supplier"
            value={name}
            error={fault}
            onChange={(event) => setName(event.target.value)}
            onKeyDown={(event) => {
              if (event.key !== 'Enter') return;
              event.preventDefault(); // the form itself is not done
              void add();
            }}
          />
          <span className="flex gap-2">
            <Button size="small" onClick={add}>
              Add supplier
            </Button>
            <Button size="small" look="quiet" onClick={() => setName(null)}>
              Choose another
            </Button>
          </span>
        </>
      )}
    </Field>
  );
}
