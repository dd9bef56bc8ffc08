'use client';

import { useQueryClient } from '@tanstack/react-query';
import { useRouter } from 'next/navigation';
import { useRef, useState } from 'react';
import { ScreenHead } from '@/app/_components/ui/screen';
import { announce } from '@/app/_components/ui/toast';
import { sendApi } from '@/lib/shared/api-client';
import type { FacetView } from '@/lib/shared/facet';
import { materialInput } from '@/lib/shared/material';
import type { MaterialView } from '@/lib/shared/material-view';
import { CAUTIONS, KIND_NAMES } from '@/lib/shared/material-words';
import {
  MATERIAL_FIELDS,
  type MaterialDraft,
  materialDraft,
  materialOfDraft,
  NEW_MATERIAL,
} from '../_client/material-draft';
import { materialKeys } from '../_client/queries';
import { useRecordForm } from '../_client/use-record-form';
import { CautionPart } from './caution-part';
import { Conflict } from './conflict';
import { DeleteMaterial } from './delete-material';
import { FacetEditor } from './facet-editor';
import { FormFrame, FormPart } from './form-frame';
import { IdentityPart, StrengthPart, UsePart } from './material-parts';

/** Writing a material: a new one, or over the revision that was read. */
export function MaterialForm({ material, facets }: { material: MaterialView | null; facets: readonly FacetView[] }) {
  const router = useRouter();
  const queries = useQueryClient();
  const revision = useRef(material?.revision ?? 0);
  const [initial] = useState(() => (material ? materialDraft(material) : NEW_MATERIAL));
  const form = useRecordForm<MaterialDraft, MaterialView>({
    initial,
    inputOf: materialOfDraft,
    schema: materialInput,
    send: (input, key) =>
      material
        ? sendApi('PUT', `/api/v1/materials/${material.id}`, { revision: revision.current, material: input })
        : sendApi('POST', '/api/v1/materials', input, key),
    onSaved: (saved) => {
      void queries.invalidateQueries({ queryKey: materialKeys.all });
      announce(`${saved.name} is saved.`);
      router.push(`/materials/${saved.id}`);
      router.refresh();
    },
  });
  const { draft, set, errors, conflict } = form;
  const part = { draft, set, errors };
  const back = material ? `/materials/${material.id}` : '/materials';

  if (conflict) {
    const theirs = materialDraft(conflict);
    return (
      <Conflict
        what="material"
        base={form.base}
        mine={draft}
        theirs={theirs}
        names={MATERIAL_FIELDS}
        show={(field, value) => showField(field, value, facets)}
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
      <ScreenHead title={material ? `Edit ${material.name}` : 'New material'} />
      <FormFrame
        {...form}
        saveWords={material ? 'Save material' : 'Enter material'}
        onSubmit={form.submit}
        onCancel={() => router.push(back)}
        more={material ? <DeleteMaterial material={material} /> : null}
      >
        <IdentityPart {...part} />
        <FormPart
          title="What it smells like"
          about="From 0 to 10. The spread is how far noses differ, one standard deviation."
        >
          <FacetEditor {...part} facets={facets} />
        </FormPart>
        <StrengthPart {...part} />
        <UsePart {...part} />
        <CautionPart {...part} />
      </FormFrame>
    </>
  );
}

function showField(
  field: keyof MaterialDraft,
  value: MaterialDraft[keyof MaterialDraft],
  facets: readonly FacetView[],
) {
  const nameOf = (id: string) => facets.find((facet) => facet.id === id)?.name ?? 'a facet';
  if (field === 'kind') return KIND_NAMES[value as MaterialDraft['kind']];
  if (field === 'cas') return (value as string[]).filter(Boolean).join(', ');
  if (field === 'cautions')
    return (value as MaterialDraft['cautions']).map(({ code }) => CAUTIONS[code].title).join(', ');
  if (field === 'facets')
    return (value as MaterialDraft['facets'])
      .map(({ facetId, phase, intensity, sd }) =>
        [nameOf(facetId), intensity, `± ${sd}`, phase === 'all' ? '' : `(${phase})`].filter(Boolean).join(' '),
      )
      .join('\n');
  return String(value);
}
