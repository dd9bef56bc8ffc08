'use client';

import { FieldNote, Select, TextField } from '@/app/_components/ui/field';
import { CURRENCIES } from '@/lib/shared/currencies';
import { DoorForm } from '../_components/door-form';
import { PasswordField } from '../_components/password-field';
import { signUp } from '../actions';

const currencyName = new Intl.DisplayNames('en-GB', { type: 'currency' });
const CURRENCY_OPTIONS = CURRENCIES.map((code) => ({ value: code, label: `${code}, ${currencyName.of(code)}` }));

export function SignUpForm() {
  return (
    <DoorForm
      action={signUp}
      words={['Open the house', 'Opening the house']}
      fields={({ errors, values }) => (
        <>
          <TextField
            label="Name of the house"
            name="houseName"
            autoComplete="organization"
            defaultValue={values.houseName}
            error={errors.houseName}
          />
          <TextField label="Your name" name="name" autoComplete="name" defaultValue={values.name} error={errors.name} />
          <TextField
            label="E-mail address"
            name="email"
            type="email"
            autoComplete="username"
            defaultValue={values.email}
            error={errors.email}
          />
          <PasswordField
            autoComplete="new-password"
            hint="At least 15 characters. Four or five words are easy to remember."
            error={errors.password}
          />
          <Select
            // A form that was sent falls back to its first option unless the select is made anew.
            key={values.currency}
            label="Currency"
            name="currency"
            hint="The house calculates in this one."
            defaultValue={values.currency ?? 'EUR'}
            options={CURRENCY_OPTIONS}
            error={errors.currency}
          />
          <Beginnings key={values.begin} chosen={values.begin ?? 'sample'} error={errors.begin} />
        </>
      )}
    />
  );
}

const BEGINNINGS = [
  {
    value: 'sample',
    label: 'With the sample library',
    about: 'Some hundred materials to try everything with. Prices and ratings are invented.',
  },
  {
    value: 'facets',
    label: 'With an empty shelf',
    about: 'The words for smells and the limits; the materials are yours.',
  },
];

function Beginnings({ chosen, error }: { chosen: string; error?: string }) {
  return (
    <fieldset className="grid gap-2" aria-describedby={error ? 'begin-note' : undefined}>
      <legend className="mb-1.5 font-[560]">Begin</legend>
      {BEGINNINGS.map(({ value, label, about }) => (
        <label
          key={value}
          className="grid grid-cols-[auto_1fr] gap-x-3 rounded-tile border border-rule p-3 hover:border-ink has-checked:border-ink has-checked:shadow-[inset_0_0_0_1px_var(--ink)]"
        >
          <input
            type="radio"
            name="begin"
            value={value}
            defaultChecked={value === chosen}
            className="mt-0.5 size-4 accent-ink"
          />
          <span className="font-[560]">{label}</span>
          <span className="col-start-2 text-ink-soft">{about}</span>
        </label>
      ))}
      <FieldNote id="begin-note" error={error} />
    </fieldset>
  );
}
