'use client';

import { Button } from '@/app/_components/ui/button';
import { Select, TextField } from '@/app/_components/ui/field';
import type { OfferDraft } from '../_client/quality-draft';
import { Field, FormPart } from './form-frame';
import type { QualityPartProps } from './quality-parts';

const UNITS = [
  { value: 'g', label: 'g' },
  { value: 'mL', label: 'mL' },
];

/** The packs that a supplier offers; costs per kg and at equal strength follow from them. */
export function OffersPart({
  draft,
  set,
  errors,
  currency,
  today,
}: QualityPartProps & { currency: string; today: string }) {
  const change = (at: number, what: Partial<OfferDraft>) =>
    set({ offers: draft.offers.map((offer, place) => (place === at ? { ...offer, ...what } : offer)) });
  const add = () =>
    set({ offers: [...draft.offers, { packAmount: '', packUnit: 'g', price: '', currency, offeredOn: today }] });
  return (
    <FormPart title="Offers" about={`Only offers in ${currency} count in costs: nothing is converted here.`}>
      <Field name="offers" className="grid gap-4 sm:col-span-2">
        {draft.offers.map((offer, at) => (
          <fieldset
            key={offer.id ?? at}
            className="grid grid-cols-2 items-start gap-3 border-t border-grout pt-3 md:grid-cols-[7rem_5rem_8rem_5rem_minmax(9rem,1fr)_auto]"
          >
            <legend className="sr-only">Offer {at + 1}</legend>
            <TextField
              label="Pack"
              inputMode="decimal"
              value={offer.packAmount}
              error={errors[`offers.${at}.packAmount`]}
              onChange={(event) => change(at, { packAmount: event.target.value })}
            />
            <Select
              label="Unit"
              options={UNITS}
              value={offer.packUnit}
              onChange={(event) => change(at, { packUnit: event.target.value as OfferDraft['packUnit'] })}
            />
            <TextField
              label="Price"
              inputMode="decimal"
              value={offer.price}
              error={errors[`offers.${at}.price`] ?? errors[`offers.${at}.id`]}
              onChange={(event) => change(at, { price: event.target.value })}
            />
            <TextField
              label="Currency"
              value={offer.currency}
              maxLength={3}
              error={errors[`offers.${at}.currency`]}
              onChange={(event) => change(at, { currency: event.target.value.toUpperCase() })}
            />
            <TextField
              label="Offered on"
              type="date"
              value={offer.offeredOn}
              error={errors[`offers.${at}.offeredOn`]}
              onChange={(event) => change(at, { offeredOn: event.target.value })}
            />
            <Button
              look="quiet"
              className="md:mt-6.5"
              aria-label={`Remove offer ${at + 1}`}
              onClick={() => set({ offers: draft.offers.filter((_, place) => place !== at) })}
            >
              Remove
            </Button>
          </fieldset>
        ))}
        <Button className="justify-self-start" onClick={add}>
          Add an offer
        </Button>
      </Field>
    </FormPart>
  );
}
