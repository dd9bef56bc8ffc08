'use client';

import { useMutation } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import { useMemo, useState } from 'react';
import { Button } from '@/app/_components/ui/button';
import { Dialog } from '@/app/_components/ui/dialog';
import { TextArea, TextField } from '@/app/_components/ui/field';
import { announce } from '@/app/_components/ui/toast';
import { ApiProblem, sendApi } from '@/lib/shared/api-client';
import type { BlendAnswer } from '@/lib/shared/blend-answer';
import type { BlendRequest } from '@/lib/shared/blend-input';
import type { SavedBlendView } from '@/lib/shared/blend-view';

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
  const save = useMutation({
    mutationFn: () => sendApi<SavedBlendView>('POST', '/api/v1/blends', { name, note, request }, key),
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
          <Button onClick={onClose}>Not yet</Button>
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
