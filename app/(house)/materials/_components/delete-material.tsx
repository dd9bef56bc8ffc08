'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import { useState } from 'react';
import { Button } from '@/app/_components/ui/button';
import { Dialog } from '@/app/_components/ui/dialog';
import { announce } from '@/app/_components/ui/toast';
import { sendApi } from '@/lib/shared/api-client';
import type { MaterialView } from '@/lib/shared/material-view';
import { materialKeys } from '../_client/queries';

/** Asks once, and says what goes with it. */
export function DeleteMaterial({ material }: { material: MaterialView }) {
  const router = useRouter();
  const queries = useQueryClient();
  const [open, setOpen] = useState(false);
  const [fault, setFault] = useState<string | null>(null);
  const [isBusy, setBusy] = useState(false);

  async function remove() {
    setBusy(true);
    try {
      await sendApi('DELETE', `/api/v1/materials/${material.id}`);
      await queries.invalidateQueries({ queryKey: materialKeys.all });
      announce(`${material.name} is deleted.`);
      router.push('/materials');
    } catch (error) {
      setFault((error as Error).message);
      setBusy(false);
    }
  }

  return (
    <>
      <Button look="quiet" onClick={() => setOpen(true)}>
        Delete
      </Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        asks
        title={`Delete ${material.name}?`}
        actions={
          <>
            <Button onClick={() => setOpen(false)}>Keep it</Button>
            <Button look="solid" onClick={remove} disabled={isBusy}>
              Delete for good
            </Button>
          </>
        }
      >
        <p>
          Its ratings, {material.qualities.length === 1 ? 'its quality' : `its ${material.qualities.length} qualities`},
          compositions and offers go with it. This cannot be undone.
        </p>
        {fault ? (
          <p role="alert" className="font-[560]">
            {fault}
          </p>
        ) : null}
      </Dialog>
    </>
  );
}
