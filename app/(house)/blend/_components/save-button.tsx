'use client';

import { useMutation } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import { useEffect, useMemo, useRef, useState } from 'react';
import { Button } from '@/app/_components/ui/button';
import { Dialog } from '@/app/_components/ui/dialog';
import { TextArea, TextField } from '@/app/_components/ui/field';
import { announce } from '@/app/_components/ui/toast';
import { ApiProblem, watchApi } from '@/lib/shared/api-client';
import type { BlendAnswer } from '@/lib/shared/blend-answer';
import type { BlendRequest } from '@/lib/shared/blend-input';
import type { SavedBlendView, SolveProgress } from '@/lib/shared/blend-view';

interface SaveButtonProps {
  request: BlendRequest | null;
  answer: BlendAnswer | null;
}

/** Sends what was asked, not what was answered: the server solves again and keeps its own answer. */
export function SaveButton({ request, answer }: SaveButtonProps) {
  const [open, setOpen] = useState(false);
  const hasBlend = Boolean(request && answer && answer.lines.length > 0);
  return (
    <>
      <Button look="solid" disabled={!hasBlend} onClick={() => setOpen(true)}>
        Save the blend
      </Button>
      {open && request ? <SaveDialog request={request} onClose={() => setOpen(false)} /> : null}
    </>
  );
}

function SaveDialog({ request, onClose }: { request: BlendRequest; onClose: () => void }) {
  const router = useRouter();
  const [name, setName] = useState('');
  const [note, setNote] = useState('');
  const body = useMemo(() => JSON.stringify({ name, note, request }), [name, note, request]);
  // One key for one content: sent twice it is saved once, and a changed name is a new wish.
  // biome-ignore lint/correctness/useExhaustiveDependencies: a new body must get a new key
  const key = useMemo(() => crypto.randomUUID(), [body]);
  const [progress, setProgress] = useState<SolveProgress | null>(null);
  const giveUp = useRef<AbortController | null>(null);
  useEffect(() => () => giveUp.current?.abort(), []);
  const save = useMutation({
    mutationFn: () => {
      giveUp.current = new AbortController();
      return watchApi<SavedBlendView>(
        '/api/v1/blends',
        { name, note, request },
        { key, signal: giveUp.current.signal, onProgress: (told) => setProgress(told as SolveProgress) },
      );
    },
    onSettled: () => setProgress(null),
    onSuccess: ({ id }) => {
      announce('Saved.');
      router.push(`/blends/${id}`);
    },
  });
  const fields = save.error instanceof ApiProblem ? save.error.fields : {};
  const other = Object.entries(fields).filter(([field]) => field !== 'name' && field !== 'note');
  return (
    <Dialog
      open
      onOpenChange={(open) => !open && onClose()}
      title="Save the blend"
      actions={
        <>
          <Button onClick={onClose}>{save.isPending ? 'Stop' : 'Not yet'}</Button>
          <Button look="solid" disabled={save.isPending} onClick={() => save.mutate()}>
            {save.isPending ? 'Solving and saving' : 'Save'}
          </Button>
        </>
      }
    >
      <p className="text-ink-soft">
        It is solved once more on the server and kept with today’s names, prices and limits, so that it opens the same
        later.
      </p>
      <TextField
        label="Name"
        value={name}
        maxLength={160}
        autoComplete="off"
        onChange={(event) => setName(event.target.value)}
        error={fields.name}
      />
      <TextArea
        label="Note"
        value={note}
        maxLength={2000}
        onChange={(event) => setNote(event.target.value)}
        error={fields.note}
      />
      {save.isPending && progress ? (
        <p role="status" className="text-ink-soft">
          The best so far is {progress.distance.toFixed(2)} from the target, and none can be nearer than{' '}
          {progress.bound.toFixed(2)}. The search goes on.
        </p>
      ) : null}
      {save.isError && other.length + Object.keys(fields).length === 0 ? (
        <p role="alert">{save.error.message}</p>
      ) : null}
      {other.map(([field, sentence]) => (
        <p key={field} role="alert">
          {sentence}
        </p>
      ))}
    </Dialog>
  );
}
