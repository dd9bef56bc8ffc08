'use client';

import { useEffect, useRef, useState } from 'react';
import type { z } from 'zod';
import { ApiProblem } from '@/lib/shared/api-client';

interface RecordFormOptions<D, V> {
  initial: D;
  /** The draft as the schema wants it. */
  inputOf: (draft: D) => unknown;
  schema: z.ZodType;
  /** Sends what the schema has accepted. `key` is the same for the same content, so that a repeat does nothing twice. */
  send: (input: unknown, key: string) => Promise<V>;
  onSaved: (saved: V) => void;
}

/**
 * One form over one record: the same schema as the API's, faults beside their fields, and what was typed is kept
 * whatever happens. A conflict is handed on with what stands now.
 */
export function useRecordForm<D extends object, V>(options: RecordFormOptions<D, V>) {
  const { initial, inputOf, schema, send, onSaved } = options;
  const [base, setBase] = useState(initial);
  const [draft, setDraft] = useState(initial);
  const [errors, setErrors] = useState<Record<string, string>>({});
  const [fault, setFault] = useState<string | null>(null);
  const [conflict, setConflict] = useState<V | null>(null);
  const [isSaving, setSaving] = useState(false);
  const sent = useRef({ text: '', key: '' });
  const isDirty = JSON.stringify(draft) !== JSON.stringify(base);
  useWarningBeforeLeaving(isDirty && !isSaving);

  function set(change: Partial<D>) {
    setDraft((before) => ({ ...before, ...change }));
    const touched = Object.keys(change);
    setErrors((before) =>
      Object.fromEntries(Object.entries(before).filter(([path]) => !touched.includes(path.split('.')[0] ?? ''))),
    );
  }

  async function submit() {
    setFault(null);
    const parsed = schema.safeParse(inputOf(draft));
    if (!parsed.success) return setErrors(sentences(parsed.error));
    setErrors({});
    setSaving(true);
    const text = JSON.stringify(parsed.data);
    if (sent.current.text !== text) sent.current = { text, key: crypto.randomUUID() };
    try {
      onSaved(await send(parsed.data, sent.current.key));
    } catch (error) {
      setSaving(false);
      if (!(error instanceof ApiProblem)) throw error;
      if (error.status === 409 && error.current) setConflict(error.current as V);
      else if (Object.keys(error.fields).length > 0) setErrors(withoutWrapping(error.fields));
      else setFault(error.message + (error.reference ? ` (${error.reference})` : ''));
    }
  }

  /** After a conflict: the merged draft stands on what the others wrote. */
  function settle(merged: D, theirs: D) {
    setConflict(null);
    setBase(theirs);
    setDraft(merged);
  }

  return {
    draft,
    base,
    set,
    errors,
    fault,
    isSaving,
    isDirty,
    submit,
    conflict,
    settle,
    leave: () => setConflict(null),
  };
}

function sentences(error: z.ZodError): Record<string, string> {
  const found: Record<string, string> = {};
  for (const { path, message } of error.issues) found[path.map(String).join('.')] ??= message;
  return found;
}

/** The server's paths begin with the record's name in a body: "material.cas.0". */
const withoutWrapping = (fields: Readonly<Record<string, string>>) =>
  Object.fromEntries(
    Object.entries(fields).map(([path, sentence]) => [path.replace(/^(material|quality)\./, ''), sentence]),
  );

function useWarningBeforeLeaving(isDirty: boolean) {
  useEffect(() => {
    if (!isDirty) return;
    const warn = (event: BeforeUnloadEvent) => event.preventDefault();
    addEventListener('beforeunload', warn);
    return () => removeEventListener('beforeunload', warn);
  }, [isDirty]);
}
