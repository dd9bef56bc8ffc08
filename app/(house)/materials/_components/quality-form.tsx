'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import { useRef, useState } from 'react';
import type { z } from 'zod';
import { ScreenHead } from '@/app/_components/ui/screen';
import { announce } from '@/app/_components/ui/toast';
import { sendApi } from '@/lib/shared/api-client';
import type { ConstituentView } from '@/lib/shared/constituent';
import { revisionField } from '@/lib/shared/material';
import type { QualityView } from '@/lib/shared/material-view';
import { moneyWords, packWords } from '@/lib/shared/number-words';
import { compositionUpdate, offersUpdate, qualityInput, type SupplierView } from '@/lib/shared/quality';
import {
  compositionOfDraft,
  NEW_QUALITY,
  offersOfDraft,
  QUALITY_FIELDS,
  type QualityDraft,
  qualityDraft,
  qualityOfDraft,
} from '../_client/quality-draft';
import { materialKeys } from '../_client/queries';
import { useRecordForm } from '../_client/use-record-form';
import { CompositionPart } from './composition-part';
import { Conflict } from './conflict';
import { FormFrame } from './form-frame';
import { OffersPart } from './offers-part';
import { GradePart } from './quality-parts';

/** What of a quality the roles let one write: all of it, its offers alone, or its composition alone. */
export type QualityScope = 'all' | 'offers' | 'composition';

interface QualityFormProps {
  material: { id: string; name: string };
  /** Null for a new one. */
  quality: QualityView | null;
  scope: QualityScope;
  suppliers: readonly SupplierView[];
  constituents: readonly ConstituentView[];
  currency: string;
  /** The day that a new offer begins with, from the server so that both sides write the same. */
  today: string;
}

const SCOPES: Record<
  QualityScope,
  { schema: z.ZodType; inputOf: (draft: QualityDraft) => object; path: string; wrap: (input: object) => object }
> = {
  all: { schema: qualityInput, inputOf: qualityOfDraft, path: '', wrap: (quality) => ({ quality }) },
  offers: {
    schema: offersUpdate.omit({ revision: true }),
    inputOf: (draft) => ({ offers: offersOfDraft(draft) }),
    path: '/offers',
    wrap: (input) => input,
  },
  composition: {
    schema: compositionUpdate.omit({ revision: true }),
    inputOf: compositionOfDraft,
    path: '/constituents',
    wrap: (input) => input,
  },
};

export function QualityForm(props: QualityFormProps) {
  const { material, quality, scope, suppliers, constituents, currency, today } = props;
  const router = useRouter();
  const queries = useQueryClient();
  const revision = useRef(quality?.revision ?? 0);
  const [initial] = useState(() => (quality ? qualityDraft(quality) : NEW_QUALITY));
  const { schema, inputOf, path, wrap } = SCOPES[scope];
  const back = `/materials/${material.id}`;
  const form = useRecordForm<QualityDraft, QualityView>({
    initial,
    inputOf,
    schema,
    send: (input, key) =>
      quality
        ? sendApi('PUT', `/api/v1/qualities/${quality.id}${path}`, {
            revision: revisionField.parse(revision.current),
            ...wrap(input as object),
          })
        : sendApi('POST', `/api/v1/materials/${material.id}/qualities`, input, key),
    onSaved: () => {
      void queries.invalidateQueries({ queryKey: materialKeys.all });
      announce(`The quality of ${material.name} is saved.`);
      router.push(back);
      router.refresh();
    },
  });
  const { draft, set, errors, conflict } = form;
  const part = { draft, set, errors };

  if (conflict) {
    const theirs = qualityDraft(conflict);
    return (
      <Conflict
        what="quality"
        base={form.base}
        mine={draft}
        theirs={theirs}
        names={QUALITY_FIELDS}
        show={(field, value) => showField(field, value, suppliers, constituents)}
        onCancel={form.leave}
        onSettle={(merged) => {
          revision.current = conflict.revision;
          form.settle(merged, theirs);
        }}
      />
    );
  }
  return (
    <>
      <ScreenHead
        title={quality ? `Edit a quality of ${material.name}` : `New quality of ${material.name}`}
        about="One supplier’s grade: what it is like, what it contains, what it costs."
      />
      <FormFrame
        {...form}
        saveWords={quality ? 'Save quality' : 'Enter quality'}
        onSubmit={form.submit}
        onCancel={() => router.push(back)}
      >
        {scope === 'all' ? <GradePart {...part} suppliers={suppliers} /> : null}
        {scope === 'offers' ? null : <CompositionPart {...part} constituents={constituents} />}
        {scope === 'composition' ? null : <OffersPart {...part} currency={currency} today={today} />}
      </FormFrame>
    </>
  );
}

function showField(
  field: keyof QualityDraft,
  value: QualityDraft[keyof QualityDraft],
  suppliers: readonly SupplierView[],
  constituents: readonly ConstituentView[],
) {
  const nameIn = (list: readonly { id: string; name: string }[], id: string) =>
    list.find((each) => each.id === id)?.name;
  if (field === 'supplierId') return nameIn(suppliers, String(value));
  if (field === 'preferred') return value ? 'yes' : 'no';
  if (field === 'constituents')
    return (value as QualityDraft['constituents'])
      .map(
        ({ constituentId, min, typical, max }) =>
          `${nameIn(constituents, constituentId)}: ${min}–${max} %${typical ? `, typical ${typical} %` : ''}`,
      )
      .join('\n');
  if (field === 'offers')
    return (value as QualityDraft['offers'])
      .map(
        ({ packAmount, packUnit, price, currency }) => `${packOf(packAmount, packUnit)}: ${priceOf(price, currency)}`,
      )
      .join('\n');
  return String(value);
}

/** What is typed may not be a number yet. */
const isNumber = (text: string) => /^\d+(\.\d+)?$/.test(text);
const packOf = (amount: string, unit: 'g' | 'mL') => (isNumber(amount) ? packWords(amount, unit) : `${amount} ${unit}`);
const priceOf = (price: string, currency: string) =>
  isNumber(price) ? moneyWords(price, currency) : `${price} ${currency}`;
