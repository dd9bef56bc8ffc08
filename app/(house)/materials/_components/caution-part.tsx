'use client';

import { TextField } from '@/app/_components/ui/field';
import { Checkbox } from '@/app/_components/ui/switch';
import { CAUTION_CODES, CAUTIONS, type CautionCode } from '@/lib/shared/material-words';
import { Field, FormPart } from './form-frame';
import type { PartProps } from './material-parts';

const USUAL_SOURCE = 'Supplier’s safety data sheet';

/** What can hurt someone, each with where it is known from. */
export function CautionPart({ draft, set, errors }: PartProps) {
  const toggle = (code: CautionCode, on: boolean) =>
    set({
      cautions: on
        ? [...draft.cautions, { code, source: USUAL_SOURCE }]
        : draft.cautions.filter((caution) => caution.code !== code),
    });
  return (
    <FormPart title="Cautions" about="Copy them from the SDS. They remind at the bench; they replace nothing.">
      <Field name="cautions" className="grid gap-3 sm:col-span-2">
        {CAUTION_CODES.map((code) => {
          const at = draft.cautions.findIndex((caution) => caution.code === code);
          const caution = draft.cautions[at];
          return (
            <div key={code} className="grid items-start gap-x-5 gap-y-1 sm:grid-cols-2">
              <Checkbox
                label={CAUTIONS[code].title}
                checked={Boolean(caution)}
                onChange={(event) => toggle(code, event.target.checked)}
              />
              {caution ? (
                <TextField
                  label={`Where “${CAUTIONS[code].title.toLowerCase()}” is known from`}
                  value={caution.source}
                  error={errors[`cautions.${at}.source`]}
                  onChange={(event) =>
                    set({
                      cautions: draft.cautions.map((each) =>
                        each.code === code ? { code, source: event.target.value } : each,
                      ),
                    })
                  }
                />
              ) : null}
            </div>
          );
        })}
      </Field>
    </FormPart>
  );
}
