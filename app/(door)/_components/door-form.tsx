'use client';

import { type ReactNode, useActionState, useEffect, useRef } from 'react';
import { Button } from '@/app/_components/ui/button';
import { FieldNote } from '@/app/_components/ui/field';
import type { DoorState } from '../actions';

export interface DoorFormProps {
  action: (state: DoorState, form: FormData) => Promise<DoorState>;
  /** On the button, and while it works. */
  words: [doing: string, waiting: string];
  fields: (state: DoorState) => ReactNode;
}

/** A form at the door: works before any script has come; what was typed stays, and the first fault gets the focus. */
export function DoorForm({ action, words, fields }: DoorFormProps) {
  const [state, submit, pending] = useActionState(action, { errors: {}, values: {} });
  const form = useRef<HTMLFormElement>(null);
  useEffect(() => {
    if (Object.keys(state.errors).length > 0)
      form.current?.querySelector<HTMLElement>('[aria-invalid="true"]')?.focus();
  }, [state]);
  return (
    <form ref={form} action={submit} noValidate className="grid gap-5">
      {fields(state)}
      <div role="alert">{state.errors.form ? <FieldNote id="door-fault" error={state.errors.form} /> : null}</div>
      <Button type="submit" look="solid" disabled={pending} className="min-h-12 text-body">
        {pending ? words[1] : words[0]}
      </Button>
    </form>
  );
}
